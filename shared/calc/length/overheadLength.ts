import { finite, usable } from '../usable.ts'

/** A run that goes up its two walls and over the ceiling. All in one unit of length; named in millimetres. */
export interface OverheadRun {
  /** Plan distance along each axis; the sign is of no account. */
  alongXMm: number
  alongYMm: number
  ceilingHeightMm: number
  boxHeightMm: number
  headHeightMm: number
  slackBoxMm: number
  slackHeadMm: number
  /** Climb over plates and insulation at each end, 0 to about 300 mm. */
  overheadMm?: number
}

/**
 * Length of a run over the ceiling, mm: |x| + |y| + (ceiling - box) + (ceiling - head) + 2 overhead + slacks. The way
 * follows the framing, so it is orthogonal: a straight line in plan would be short by up to a factor of 1.41. Null: a
 * value that is no number, a negative height, slack or overhead, or an end above the ceiling. Source: horizontal and
 * vertical straight segments, engineerfix.com wire-estimating page; the model is common practice.
 */
export function overheadLengthMm(run: OverheadRun): number | null {
  const {
    alongXMm,
    alongYMm,
    ceilingHeightMm,
    boxHeightMm,
    headHeightMm,
    slackBoxMm,
    slackHeadMm,
    overheadMm = 0,
  } = run
  const heights = [ceilingHeightMm, boxHeightMm, headHeightMm, slackBoxMm, slackHeadMm, overheadMm]
  if (!usable(alongXMm, alongYMm, ...heights) || heights.some((value) => value < 0)) return null
  const rise = ceilingHeightMm - boxHeightMm
  const drop = ceilingHeightMm - headHeightMm
  if (rise < 0 || drop < 0) return null
  return finite(Math.abs(alongXMm) + Math.abs(alongYMm) + rise + drop + 2 * overheadMm + slackBoxMm + slackHeadMm)
}
