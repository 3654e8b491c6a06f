import { packSpools } from './packSpools.ts'
import { type Bought, purchases } from './purchases.ts'

export interface CutRun {
  id: string
  lengthMm: number
}

/** A length that the cable is sold in; as many as wanted. */
export interface PutUp {
  id: string
  lengthMm: number
}

export interface SpoolOnHand {
  id: string
  leftMm: number
}

export interface CutPlanAsk {
  runs: readonly CutRun[]
  putUps: readonly PutUp[]
  onHand: readonly SpoolOnHand[]
  /** End of a spool that no run can use, mm; about 3 m is usual (common practice, no source). */
  stubMm: number
  /** Share of each spool kept in reserve, 0 to below 1, as lengths are estimates. */
  reserve: number
  /** Steps of search in all; ten million are about half a second. */
  effort?: number
}

export interface CutSpool {
  id: string
  isBought: boolean
  lengthMm: number
  runIds: string[]
  cutMm: number
  /** What is left on the spool, reserve and stub included. */
  leftMm: number
}

export interface CutPlan {
  spools: CutSpool[]
  /** Runs that no spool is long enough for; runs are never spliced. */
  tooLong: string[]
  boughtMm: number
  /** Whether no plan buys less. */
  isProved: boolean
}

interface Source {
  id: string
  isBought: boolean
  lengthMm: number
  usableMm: number
}

/**
 * Which runs to cut from which spool, so that the bought length is least and, at the same length, the pieces are
 * fewest. Spools on hand are used first and cost nothing. Purchases are tried from the least that total length allows;
 * each is searched for a packing. Null: a length that is no number or not above nothing, a negative stub, or a reserve
 * outside 0 to 1.
 */
export function cutPlan(ask: CutPlanAsk): CutPlan | null {
  const { runs, putUps, onHand, stubMm, reserve, effort = 20_000_000 } = ask
  const isLength = (length: number) => Number.isFinite(length) && length > 0
  if (![...runs, ...putUps].every(({ lengthMm }) => isLength(lengthMm))) return null
  if (!onHand.every(({ leftMm }) => Number.isFinite(leftMm) && leftMm >= 0)) return null
  if (!Number.isFinite([...runs, ...putUps].reduce((sum, { lengthMm }) => sum + lengthMm, 0) * (runs.length + 1)))
    return null
  if (!Number.isFinite(stubMm) || stubMm < 0 || !(reserve >= 0 && reserve < 1)) return null

  const usable = (lengthMm: number) => Math.floor(lengthMm * (1 - reserve)) - stubMm
  const held = onHand
    .map(({ id, leftMm }): Source => ({ id, isBought: false, lengthMm: leftMm, usableMm: usable(leftMm) }))
    .filter(({ usableMm }) => usableMm > 0)
  const sold = putUps
    .map(({ id, lengthMm }): Source => ({ id, isBought: true, lengthMm, usableMm: usable(lengthMm) }))
    .filter(({ usableMm }) => usableMm > 0)
  const longest = Math.max(0, ...[...held, ...sold].map(({ usableMm }) => usableMm))
  const cuttable = runs.filter(({ lengthMm }) => lengthMm <= longest)
  const tooLong = runs.filter(({ lengthMm }) => lengthMm > longest).map(({ id }) => id)

  const lengths = cuttable.map(({ lengthMm }) => lengthMm)
  const offers = purchases(lengths, held.map(({ usableMm }) => usableMm), sold)
  let isProved = offers.isWhole
  for (const offer of offers.list) {
    const sources = [...held, ...boughtSources(offer, sold)]
    const share = effort / Math.max(1, offers.list.length)
    const packing = packSpools(lengths, sources.map(({ usableMm }) => usableMm), share)
    if (packing.outcome === 'packed') {
      const spools = assign(packing.spools, sources, cuttable)
      return { spools, tooLong, boughtMm: boughtOf(spools), isProved }
    }
    if (packing.outcome === 'gave up') isProved = false
  }
  const spools = assign(offers.sure, [...held, ...sold.flatMap((source) => offers.sure.map(() => source))], cuttable)
  return { spools, tooLong, boughtMm: boughtOf(spools), isProved }
}

const boughtOf = (spools: readonly CutSpool[]) =>
  spools.reduce((sum, spool) => sum + (spool.isBought ? spool.lengthMm : 0), 0)

const boughtSources = (offer: Bought, sold: readonly Source[]): Source[] =>
  sold.flatMap((source, place) => Array.from<Source>({ length: offer.counts[place] ?? 0 }).fill(source))

/** Gives packed lengths back to their runs, and packed spools to sources with that much usable length. */
function assign(
  packed: readonly { capacity: number; lengths: readonly number[] }[],
  sources: readonly Source[],
  runs: readonly CutRun[],
): CutSpool[] {
  const freeSources = [...sources]
  const freeRuns = [...runs]
  const take = <T>(list: T[], is: (entry: T) => boolean): T[] => {
    const place = list.findIndex(is)
    return place < 0 ? [] : list.splice(place, 1)
  }
  return packed.flatMap(({ capacity, lengths }) => {
    const own = lengths.flatMap((length) => take(freeRuns, ({ lengthMm }) => lengthMm === length))
    const cutMm = own.reduce((sum, { lengthMm }) => sum + lengthMm, 0)
    return take(freeSources, ({ usableMm }) => usableMm === capacity).map(({ id, isBought, lengthMm }) => ({
      id, isBought, lengthMm, runIds: own.map((run) => run.id), cutMm, leftMm: lengthMm - cutMm,
    }))
  })
}
