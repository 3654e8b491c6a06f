import { finite, usable } from '../usable.ts'

/** A run that goes down its two walls and under the floor. */
export interface UnderfloorRun {
  alongXMm: number
  alongYMm: number
  boxHeightMm: number
  headHeightMm: number
  /** Subfloor and plate that each end passes through. */
  floorThicknessMm: number
  slackBoxMm: number
  slackHeadMm: number
}

/**
 * Length of a run through a crawlspace or basement, mm: |x| + |y| + box height + head height + 2 floor + slacks.
 * Null: a value that is no number, or a negative height, thickness or slack.
 * Source: common practice, no source.
 */
export function underfloorLengthMm(run: UnderfloorRun): number | null {
  const { alongXMm, alongYMm, boxHeightMm, headHeightMm, floorThicknessMm, slackBoxMm, slackHeadMm } = run
  const parts = [boxHeightMm, headHeightMm, floorThicknessMm, slackBoxMm, slackHeadMm]
  if (!usable(alongXMm, alongYMm, ...parts) || parts.some((value) => value < 0)) return null
  return finite(
    Math.abs(alongXMm) +
      Math.abs(alongYMm) +
      boxHeightMm +
      headHeightMm +
      2 * floorThicknessMm +
      slackBoxMm +
      slackHeadMm,
  )
}
