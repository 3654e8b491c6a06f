import { ceilOf, floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'

/**
 * Boxes for equal runs that may not be spliced: each box gives floor(box / run) runs. Null: a value that is no number,
 * a run of nothing, a run longer than the box, or a count that is no whole number. Derived.
 */
export function boxesByRuns(boxMm: number, runMm: number, runs: number): number | null {
  if (!usable(boxMm, runMm, runs) || boxMm <= 0 || runMm <= 0 || runs < 0 || !Number.isSafeInteger(runs)) return null
  const perBox = floorOf(boxMm / runMm)
  return perBox < 1 ? null : finite(Math.ceil(runs / perBox))
}

/**
 * Boxes by total footage only, as is often done: ceil(runs x run / box). It is unsafe, as it splices runs together:
 * nine runs of 210 ft are two boxes here and need three. Null as above. Derived.
 */
export function boxesByTotal(boxMm: number, runMm: number, runs: number): number | null {
  if (!usable(boxMm, runMm, runs) || boxMm <= 0 || runMm <= 0 || runs < 0 || !Number.isSafeInteger(runs)) return null
  return finite(ceilOf((runs * runMm) / boxMm))
}
