import type { PackedSpool } from './packSpools.ts'

/**
 * Best-fit decreasing into given spools: each piece, from the longest, goes where least is left over. Null: that way
 * they do not fit, which proves nothing.
 */
export function fitGiven(lengths: readonly number[], capacities: readonly number[]): PackedSpool[] | null {
  const spools = capacities.map((capacity) => ({ capacity, left: capacity, lengths: [] as number[] }))
  for (const length of lengths.toSorted((a, b) => b - a)) {
    let best: (typeof spools)[number] | null = null
    for (const spool of spools) if (spool.left >= length && (best === null || spool.left < best.left)) best = spool
    if (best === null) return null
    best.lengths.push(length)
    best.left -= length
  }
  return spools
    .filter((spool) => spool.lengths.length > 0)
    .map(({ capacity, lengths: own }) => ({ capacity, lengths: own }))
}
