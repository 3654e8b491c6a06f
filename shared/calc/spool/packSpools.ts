import { completions, type Filling } from './completions.ts'
import { fitGiven } from './fitGiven.ts'
import { gatherSizes } from './sizeStock.ts'
import { boundL2, canCountFit } from './spoolBounds.ts'

export interface PackedSpool {
  capacity: number
  lengths: number[]
}

export type Packing = { outcome: 'packed'; spools: PackedSpool[] } | { outcome: 'impossible' } | { outcome: 'gave up' }

const mostFillings = 4000
const mostSteps = 20_000

/** Limited discrepancy search: first ways that leave the fullest filling seldom, then all. */
const waves = [0, 1, 2, 3, 4, 6, 8, 12, Infinity]
const stepsPerState = 40

/**
 * Whether pieces fit into given spools, and how. Search by bin completion (Korf 2002): the longest piece left goes
 * into each kind of spool in turn, with every undominated filling that wastes no more than may still be wasted; states
 * that failed are remembered. `effort` is the number of steps after which it gives up; ten million are about half a
 * second.
 */
export function packSpools(lengths: readonly number[], capacities: readonly number[], effort: number): Packing {
  const { sizes, counts: all } = gatherSizes(lengths)
  const { sizes: kinds, counts: stock } = gatherSizes(capacities)
  const counts = [...all]
  const spools = [...stock]
  /** Deviations with which each state was found to fail. */
  const failed = new Map<string, number>()
  const packed: PackedSpool[] = []
  let steps = 0
  let limit = 0
  let isCertain = true

  const longest = sizes[0] ?? 0
  const total = lengths.reduce((sum, length) => sum + length, 0)
  const spare = capacities.reduce((sum, capacity) => sum + capacity, 0) - total
  if (lengths.length > 0 && (spare < 0 || longest > (kinds[0] ?? 0))) return { outcome: 'impossible' }
  const fitted = fitGiven(lengths, capacities)
  if (fitted !== null) return { outcome: 'packed', spools: fitted }
  for (const deviations of waves) {
    limit += effort / waves.length
    isCertain = true
    if (pack(spare, deviations)) return { outcome: 'packed', spools: packed }
  }
  return { outcome: isCertain ? 'impossible' : 'gave up' }

  /** `deviations`: how often the way down may still leave the fullest filling for a later one. */
  function pack(waste: number, deviations: number): boolean {
    const first = counts.findIndex((count) => count > 0)
    if (first < 0) return true
    const state = `${counts.join()}/${spools.join()}`
    if ((failed.get(state) ?? -1) >= deviations) return false
    const hopeless = isHopeless()
    if (!hopeless && tryKinds(first, waste, deviations)) return true
    if (steps <= limit) failed.set(state, hopeless ? Infinity : deviations)
    return false
  }

  /** Bounds that need all spools left to be of one kind. */
  function isHopeless(): boolean {
    const open = spools.flatMap((count, kind) => (count > 0 ? [kind] : []))
    const [only, another] = open
    if (only === undefined) return true
    if (another !== undefined) return false
    const capacity = kinds[only] ?? 0
    const left = spools[only] ?? 0
    return boundL2({ sizes, counts }, capacity) > left || !canCountFit({ sizes, counts }, capacity, left)
  }

  function tryKinds(first: number, waste: number, deviations: number): boolean {
    const size = sizes[first] ?? 0
    for (let kind = kinds.length - 1; kind >= 0; kind--) {
      const capacity = kinds[kind] ?? 0
      if ((spools[kind] ?? 0) === 0 || capacity < size) continue
      counts[first] = (counts[first] ?? 0) - 1
      spools[kind] = (spools[kind] ?? 0) - 1
      const room = capacity - size
      const {
        fillings,
        isCut,
        steps: taken,
      } = completions({ sizes, counts, room, least: room - waste, most: mostFillings, steps: mostSteps })
      steps += taken + fillings.length ** 2 / 4
      if (isCut) isCertain = false
      const within = fillings.slice(0, deviations + 1)
      if (within.length < fillings.length) isCertain = false
      const found = within.some((filling, skipped) =>
        tryFilling(filling, first, capacity, waste - (room - filling.sum), deviations - skipped),
      )
      if (found) return true
      counts[first] = (counts[first] ?? 0) + 1
      spools[kind] = (spools[kind] ?? 0) + 1
    }
    return false
  }

  function tryFilling({ taken }: Filling, first: number, capacity: number, waste: number, deviations: number): boolean {
    steps += stepsPerState
    if (steps > limit) {
      isCertain = false
      return false
    }
    for (const [place, count] of taken) counts[place] = (counts[place] ?? 0) - count
    const rest = taken.flatMap(([place, count]) => Array.from<number>({ length: count }).fill(sizes[place] ?? 0))
    packed.push({ capacity, lengths: [sizes[first] ?? 0, ...rest] })
    if (pack(waste, deviations)) return true
    packed.pop()
    for (const [place, count] of taken) counts[place] = (counts[place] ?? 0) + count
    return false
  }
}
