/** Lengths gathered by size, from the longest: the form in which packing is searched. */
export interface SizeStock {
  sizes: readonly number[]
  counts: readonly number[]
}

/** Gathers lengths by size, longest first. */
export function gatherSizes(lengths: readonly number[]): SizeStock {
  const counts = new Map<number, number>()
  for (const length of lengths) counts.set(length, (counts.get(length) ?? 0) + 1)
  const sizes = [...counts.keys()].sort((a, b) => b - a)
  return { sizes, counts: sizes.map((size) => counts.get(size) ?? 0) }
}

/**
 * Whether pieces can be cut at all: lengths above nothing, none longer than the spool, and a total that is a number.
 */
export function canBeCut(lengths: readonly number[], capacity: number): boolean {
  if (!Number.isFinite(capacity) || capacity <= 0) return false
  return lengths.every((length) => length > 0 && length <= capacity) && Number.isFinite(capacity * (lengths.length + 1))
}
