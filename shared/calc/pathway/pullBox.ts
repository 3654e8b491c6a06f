import { finite, usable } from '../usable.ts'

/**
 * Least length of a box for a straight pull, in: eight times the largest trade size. Null: a value that is no number,
 * or not above nothing. Source: NEC 314.28, written for large power conductors and used as guidance; a 3 in raceway
 * needs 24 in.
 */
export function straightPullBoxIn(largestTradeSizeIn: number): number | null {
  return usable(largestTradeSizeIn) && largestTradeSizeIn > 0 ? finite(8 * largestTradeSizeIn) : null
}

/**
 * Least distance across a box for an angle pull, in: six times the largest trade size and the sum of the others on that
 * wall. BICSI wants no change of direction inside a pull box at all (weak source). Null as above.
 * Source: NEC 314.28, as guidance; a 3 in raceway and another of 3 in need 21 in.
 */
export function anglePullBoxIn(largestTradeSizeIn: number, othersIn: readonly number[]): number | null {
  if (!usable(largestTradeSizeIn, ...othersIn) || largestTradeSizeIn <= 0 || othersIn.some((size) => size < 0))
    return null
  return finite(othersIn.reduce((sum, size) => sum + size, 6 * largestTradeSizeIn))
}
