import { canBeCut } from './sizeStock.ts'

/**
 * First-fit decreasing: pieces from the longest, each cut from the first spool with room; gives the pieces of each
 * spool. Never more than 11/9 of the fewest, and 6/9 (Dosa 2007). Null: a piece that cannot be cut.
 */
export function firstFitDecreasing(lengths: readonly number[], capacity: number): number[][] | null {
  return canBeCut(lengths, capacity)
    ? fit(lengths, capacity, (rooms, length) => rooms.findIndex((room) => room >= length))
    : null
}

/** Best-fit decreasing: each piece is cut where least is left over. Null as above. */
export function bestFitDecreasing(lengths: readonly number[], capacity: number): number[][] | null {
  if (!canBeCut(lengths, capacity)) return null
  return fit(lengths, capacity, (rooms, length) => {
    let best = -1
    rooms.forEach((room, spool) => {
      if (room >= length && (best < 0 || room < (rooms[best] ?? 0))) best = spool
    })
    return best
  })
}

function fit(
  lengths: readonly number[],
  capacity: number,
  choose: (rooms: readonly number[], length: number) => number,
): number[][] {
  const spools: number[][] = []
  const rooms: number[] = []
  for (const length of lengths.toSorted((a, b) => b - a)) {
    const chosen = choose(rooms, length)
    const spool = chosen < 0 ? spools.length : chosen
    spools[spool] = [...(spools[spool] ?? []), length]
    rooms[spool] = (rooms[spool] ?? capacity) - length
  }
  return spools
}

/**
 * Most spools that first-fit decreasing takes where `fewest` would do: floor(11/9 n + 6/9). Null: no whole number.
 * Dosa 2007.
 */
export function firstFitGuarantee(fewest: number): number | null {
  return Number.isSafeInteger(fewest) && fewest >= 0 ? Math.floor((11 * fewest + 6) / 9) : null
}
