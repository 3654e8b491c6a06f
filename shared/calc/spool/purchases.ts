import type { PackedSpool } from './packSpools.ts'

/** How many of each put-up are bought, by place in the list of put-ups. */
export interface Bought {
  counts: readonly number[]
  boughtMm: number
}

export interface SoldSpool {
  lengthMm: number
  usableMm: number
}

export interface Purchases {
  /** Purchases worth trying, the least first: each might do, and each is better than the sure one. */
  list: Bought[]
  /** Whether the list has them all. */
  isWhole: boolean
  /** A plan that certainly works, by best fit. */
  sure: PackedSpool[]
}

const mostTried = 200
const mostSteps = 200_000

/**
 * Purchases between what the total length asks for at least and what best fit needs, by bought length and then by
 * pieces. Runs must each fit some spool on hand or sold. Derived.
 */
export function purchases(
  lengths: readonly number[],
  heldMm: readonly number[],
  sold: readonly SoldSpool[],
): Purchases {
  const sure = surePlan(lengths, heldMm, sold)
  const sureCounts = sold.map((_, kind) => sure.bought.filter((bought) => bought === kind).length)
  const most = boughtOf(sureCounts, sold)
  const missing = lengths.reduce((sum, length) => sum + length, 0) - heldMm.reduce((sum, held) => sum + held, 0)
  // The longest put-up outside and most of it first, so that few pieces come early; the shortest makes up the rest.
  const order = sold.map((_, kind) => kind).sort((a, b) => (sold[b]?.lengthMm ?? 0) - (sold[a]?.lengthMm ?? 0))
  const list: Bought[] = []
  const counts = sold.map(() => 0)
  let steps = 0

  function extend(depth: number, boughtMm: number, usableMm: number) {
    const kind = order[depth] ?? -1
    const spool = sold[kind]
    if (spool === undefined) {
      if (usableMm >= missing) list.push({ counts: [...counts], boughtMm })
      return
    }
    const highest = Math.floor((most - boughtMm) / spool.lengthMm)
    const isLast = depth === order.length - 1
    const lowest = isLast ? Math.max(0, Math.ceil((missing - usableMm) / spool.usableMm)) : 0
    for (let count = highest; count >= lowest; count--) {
      if (++steps > mostSteps) break
      counts[kind] = count
      extend(depth + 1, boughtMm + count * spool.lengthMm, usableMm + count * spool.usableMm)
    }
    counts[kind] = 0
  }
  extend(0, 0, 0)

  const pieces = ({ counts }: Bought) => counts.reduce((sum, count) => sum + count, 0)
  list.sort((a, b) => a.boughtMm - b.boughtMm || pieces(a) - pieces(b))
  const sureAt = list.findIndex(({ counts }) => counts.every((count, kind) => count === sureCounts[kind]))
  const better = sureAt < 0 ? list : list.slice(0, sureAt)
  return {
    list: better.slice(0, mostTried),
    isWhole: steps <= mostSteps && better.length <= mostTried,
    sure: sure.packed,
  }
}

const boughtOf = (counts: readonly number[], sold: readonly SoldSpool[]) =>
  counts.reduce((sum, count, kind) => sum + count * (sold[kind]?.lengthMm ?? 0), 0)

/**
 * Best fit, once with each put-up as the one that is opened; the least bought length wins, each spool then as short as
 * serves.
 */
function surePlan(lengths: readonly number[], heldMm: readonly number[], sold: readonly SoldSpool[]) {
  const plans = (sold.length === 0 ? [0] : sold.map((_, kind) => kind)).map((kind) =>
    planWith(kind, lengths, heldMm, sold),
  )
  return plans.reduce((best, plan) => {
    const longer = plan.boughtMm - best.boughtMm
    return longer < 0 || (longer === 0 && plan.bought.length < best.bought.length) ? plan : best
  })
}

function planWith(
  preferred: number,
  lengths: readonly number[],
  heldMm: readonly number[],
  sold: readonly SoldSpool[],
) {
  const spools: { capacity: number; left: number; lengths: number[]; kind: number | null }[] = heldMm.map((held) => ({
    capacity: held,
    left: held,
    lengths: [],
    kind: null,
  }))
  for (const length of lengths.toSorted((a, b) => b - a)) {
    let target = spools.filter(({ left }) => left >= length).sort((a, b) => a.left - b.left)[0]
    if (target === undefined) {
      const kind = (sold[preferred]?.usableMm ?? 0) >= length ? preferred : shortestFor(length, sold)
      const capacity = sold[kind]?.usableMm ?? 0
      target = { capacity, left: capacity, lengths: [], kind }
      spools.push(target)
    }
    target.lengths.push(length)
    target.left -= length
  }
  const used = spools.filter((spool) => spool.lengths.length > 0)
  const bought: number[] = []
  const packed = used.map((spool): PackedSpool => {
    if (spool.kind === null) return { capacity: spool.capacity, lengths: spool.lengths }
    const kind = shortestFor(spool.capacity - spool.left, sold)
    bought.push(kind)
    return { capacity: sold[kind]?.usableMm ?? 0, lengths: spool.lengths }
  })
  return { packed, bought, boughtMm: bought.reduce((sum, kind) => sum + (sold[kind]?.lengthMm ?? 0), 0) }
}

/** The shortest put-up with so much usable length. */
function shortestFor(needed: number, sold: readonly SoldSpool[]): number {
  let best = -1
  sold.forEach(({ usableMm, lengthMm }, kind) => {
    if (usableMm >= needed && (best < 0 || lengthMm < (sold[best]?.lengthMm ?? 0))) best = kind
  })
  return best
}
