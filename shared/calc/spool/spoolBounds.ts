import { ceilOf } from '../roundUp.ts'
import { canBeCut, gatherSizes, type SizeStock } from './sizeStock.ts'

/**
 * Fewest spools by total length: L1 = ceil(sum / capacity). Null: a piece that is no number, not above nothing, or
 * longer than the spool. Source: Martello and Toth, Knapsack Problems (1990), ch. 8.
 */
export function spoolsByTotal(lengths: readonly number[], capacity: number): number | null {
  if (!canBeCut(lengths, capacity)) return null
  return ceilOf(lengths.reduce((sum, length) => sum + length, 0) / capacity)
}

/**
 * Fewest spools by Martello and Toth's L2: for each K up to half a spool, pieces over capacity - K lie alone, those
 * over half share with none of their kind, and what is at least K must find room beside them. Never less than L1. Null
 * as above. Source as above.
 */
export function spoolsByMartelloToth(lengths: readonly number[], capacity: number): number | null {
  return canBeCut(lengths, capacity) ? boundL2(gatherSizes(lengths), capacity) : null
}

/** Every bound there is, the highest of them: L1, L2, and how many pieces a spool can hold. Null as above. */
export function fewestSpools(lengths: readonly number[], capacity: number): number | null {
  if (!canBeCut(lengths, capacity)) return null
  const stock = gatherSizes(lengths)
  let bound = boundL2(stock, capacity)
  while (bound < lengths.length && !canCountFit(stock, capacity, bound)) bound++
  return bound
}

/** L2 on gathered sizes: K is 0, and then each size up to half a spool, from the longest. */
export function boundL2({ sizes, counts }: SizeStock, capacity: number): number {
  const lots = sizes.map((size, place) => ({ size, count: counts[place] ?? 0 }))
  const large = lots.filter(({ size }) => size > capacity / 2)
  const small = lots.filter(({ size }) => size <= capacity / 2)
  const largeCount = countOf(large)
  const boundWith = (smallSum: number, sharing: readonly Lot[]) => {
    const spare = countOf(sharing) * capacity - sumOf(sharing)
    return largeCount + Math.max(0, ceilOf((smallSum - spare) / capacity))
  }
  let best = boundWith(sumOf(small), large)
  let smallSum = 0
  for (const lot of small) {
    smallSum += lot.size * lot.count
    best = Math.max(best, boundWith(smallSum, large.filter(({ size }) => size <= capacity - lot.size)))
  }
  return best
}

interface Lot {
  size: number
  count: number
}
const countOf = (lots: readonly Lot[]) => lots.reduce((sum, { count }) => sum + count, 0)
const sumOf = (lots: readonly Lot[]) => lots.reduce((sum, { size, count }) => sum + size * count, 0)

/**
 * Whether so many spools can hold so many pieces by number: a spool with few pieces wastes at least what its longest
 * pieces leave, and the waste of all is least when pieces are spread evenly. Derived; a necessary condition only.
 */
export function canCountFit({ sizes, counts }: SizeStock, capacity: number, spools: number): boolean {
  const pieces = counts.reduce((sum, count) => sum + count, 0)
  if (pieces === 0) return true
  if (spools < 1) return false
  const total = sizes.reduce((sum, size, place) => sum + size * (counts[place] ?? 0), 0)
  const each = Math.floor(pieces / spools)
  const extra = pieces - each * spools
  if (sumOfFirst(sizes.toReversed(), counts.toReversed(), each + (extra > 0 ? 1 : 0)) > capacity) return false
  const wasteWith = (count: number) => Math.max(0, capacity - sumOfFirst(sizes, counts, count))
  const waste = extra * wasteWith(each + 1) + (spools - extra) * wasteWith(each)
  return waste <= spools * capacity - total
}

/** Sum of the first so many pieces in the order given. */
function sumOfFirst(sizes: readonly number[], counts: readonly number[], pieces: number): number {
  let left = pieces
  let sum = 0
  for (let place = 0; place < sizes.length && left > 0; place++) {
    const taken = Math.min(left, counts[place] ?? 0)
    sum += taken * (sizes[place] ?? 0)
    left -= taken
  }
  return sum
}
