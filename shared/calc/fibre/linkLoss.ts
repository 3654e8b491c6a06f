import { finite, usable } from '../usable.ts'
import { fibreJointDb } from './fibre.table.ts'

export interface FibreLink {
  readonly lengthKm: number
  readonly dbPerKm: number
  /** Mated pairs that the method of measuring counts. */
  readonly matedPairs: number
  readonly splices: number
  readonly matedPairDb?: number
  readonly spliceDb?: number
}

/**
 * Most loss that a link may have, dB: length, mated pairs and splices. How many pairs count is the reference method's
 * question. Null for a negative figure, or a count that is not whole.
 */
export function fibreLinkLossDb(link: FibreLink): number | null {
  const { lengthKm, dbPerKm, matedPairs, splices } = link
  const { matedPairDb = fibreJointDb.matedPair, spliceDb = fibreJointDb.splice } = link
  const figures = [lengthKm, dbPerKm, matedPairs, splices, matedPairDb, spliceDb]
  if (!usable(...figures) || figures.some((figure) => figure < 0)) return null
  if (!Number.isSafeInteger(matedPairs) || !Number.isSafeInteger(splices)) return null
  return finite(lengthKm * dbPerKm + matedPairs * matedPairDb + splices * spliceDb)
}

/** Losses one after another, dB, such as a limit made of unlike connections. Null for a negative one. */
export const lossSumDb = (lossesDb: readonly number[]): number | null =>
  usable(...lossesDb) && lossesDb.every((loss) => loss >= 0)
    ? finite(lossesDb.reduce((sum, loss) => sum + loss, 0))
    : null
