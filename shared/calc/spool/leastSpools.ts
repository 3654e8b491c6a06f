import { bestFitDecreasing, firstFitDecreasing } from './firstFitDecreasing.ts'
import { packSpools } from './packSpools.ts'
import { fewestSpools } from './spoolBounds.ts'

export interface SpoolCount {
  /** Pieces of each spool. */
  spools: number[][]
  /** No plan can do with fewer than this. */
  fewest: number
  /** Whether the plan is proved to be the best. Otherwise say "within n of the bound". */
  isProved: boolean
}

/** Steps of search for each count before it gives up: two or three seconds at most, and seldom needed. */
const usualEffort = 40_000_000

/**
 * Fewest equal spools for pieces that may not be spliced: one-dimensional cutting stock with one stock size, which is
 * bin packing. Bounds first, then first and best fit, then a search for each count between the two.
 * Null: a piece that is no number, not above nothing, or longer than the spool.
 */
export function leastSpools(lengths: readonly number[], capacity: number, effort = usualEffort): SpoolCount | null {
  const bound = fewestSpools(lengths, capacity)
  const byFirst = firstFitDecreasing(lengths, capacity)
  const byBest = bestFitDecreasing(lengths, capacity)
  if (bound === null || byFirst === null || byBest === null) return null
  const best = byBest.length < byFirst.length ? byBest : byFirst
  let fewest = bound
  let isProved = true
  for (let count = bound; count < best.length; count++) {
    const packing = packSpools(lengths, Array.from<number>({ length: count }).fill(capacity), effort)
    if (packing.outcome === 'packed') return { spools: packing.spools.map((spool) => spool.lengths), fewest, isProved }
    if (packing.outcome === 'gave up') isProved = false
    else if (isProved) fewest = count + 1
  }
  return { spools: best, fewest, isProved }
}
