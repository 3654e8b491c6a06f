import { finite, usable } from '../usable.ts'

/** A run from a head-end on a lower level to a box on the level above it, or higher. */
export interface StoreyRun {
  alongXMm: number
  alongYMm: number
  /** Wall height of the level that the head-end is on. */
  lowerCeilingHeightMm: number
  headHeightMm: number
  /** Joist and subfloor of each floor that is crossed. */
  floorDepthMm: number
  /** Height of the box above the floor of its own level. */
  upperBoxHeightMm: number
  slackBoxMm: number
  slackHeadMm: number
  /** Whole wall heights of levels that the run passes by on its way; none when the levels are neighbours. */
  passedWallHeightsMm?: readonly number[]
}

/**
 * Length of a run between storeys, mm: |x| + |y| + (lower ceiling - head) + floor depth + upper box height + slacks,
 * and a wall and a floor more for each level passed by.
 * Null: a value that is no number, a negative height, depth or slack, or a head-end above its ceiling.
 * Source: common practice, no source.
 */
export function storeyLengthMm(run: StoreyRun): number | null {
  const { alongXMm, alongYMm, lowerCeilingHeightMm, headHeightMm, floorDepthMm, upperBoxHeightMm } = run
  const { slackBoxMm, slackHeadMm, passedWallHeightsMm = [] } = run
  const parts = [
    lowerCeilingHeightMm,
    headHeightMm,
    floorDepthMm,
    upperBoxHeightMm,
    slackBoxMm,
    slackHeadMm,
    ...passedWallHeightsMm,
  ]
  if (!usable(alongXMm, alongYMm, ...parts) || parts.some((value) => value < 0)) return null
  const rise = lowerCeilingHeightMm - headHeightMm
  if (rise < 0) return null
  const passed = passedWallHeightsMm.reduce((sum, wall) => sum + wall + floorDepthMm, 0)
  return finite(
    Math.abs(alongXMm) +
      Math.abs(alongYMm) +
      rise +
      floorDepthMm +
      upperBoxHeightMm +
      passed +
      slackBoxMm +
      slackHeadMm,
  )
}
