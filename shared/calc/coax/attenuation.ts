import { finite, usable } from '../usable.ts'
import { coaxAttenuation, type CoaxKind } from './attenuation.table.ts'

const metresPer100Ft = 30.48

/** dB per 100 ft as dB per 100 m. Null for a value that is no number, or negative. */
export const dbPer100MOf = (dbPer100Ft: number): number | null =>
  usable(dbPer100Ft) && dbPer100Ft >= 0 ? finite((dbPer100Ft * 100) / metresPer100Ft) : null

/** What a length loses, dB: attenuation per 100 m times length in metres. Null for a negative figure. */
export const coaxLossDb = (dbPer100M: number, lengthM: number): number | null =>
  usable(dbPer100M, lengthM) && dbPer100M >= 0 && lengthM >= 0 ? finite((dbPer100M * lengthM) / 100) : null

/**
 * Attenuation taken from one frequency to another by the skin effect, in the unit given: a root(f/fref). Within 5 %
 * above 200 MHz as long as neither is more than an octave or two from the other; between table points interpolate
 * instead. Null for a negative attenuation, or no frequency.
 */
export const attenuationByRoot = (attenuation: number, referenceMhz: number, mhz: number): number | null =>
  usable(attenuation, referenceMhz, mhz) && attenuation >= 0 && referenceMhz > 0 && mhz > 0
    ? finite(attenuation * Math.sqrt(mhz / referenceMhz))
    : null

export interface AttenuationPoint {
  readonly mhz: number
  readonly attenuation: number
}

/**
 * Attenuation between two points, in their unit: linear in the root of frequency. Null for a frequency outside the two,
 * two of the same frequency, or a negative figure.
 */
export function attenuationBetween(low: AttenuationPoint, high: AttenuationPoint, mhz: number): number | null {
  if (!usable(low.mhz, low.attenuation, high.mhz, high.attenuation, mhz)) return null
  if (low.mhz < 0 || low.attenuation < 0 || high.attenuation < 0 || high.mhz <= low.mhz) return null
  if (mhz < low.mhz || mhz > high.mhz) return null
  const share = (Math.sqrt(mhz) - Math.sqrt(low.mhz)) / (Math.sqrt(high.mhz) - Math.sqrt(low.mhz))
  return finite(low.attenuation + share * (high.attenuation - low.attenuation))
}

/**
 * Most attenuation of a kind of cable at a frequency, dB per 100 m at 20 °C: the table, between its points linear in
 * the root of frequency. Null below 5 or above 3000 MHz, where the table does not go.
 */
export function coaxDbPer100M(kind: CoaxKind, mhz: number): number | null {
  if (!usable(mhz)) return null
  const at = coaxAttenuation.findIndex((row) => row.mhz >= mhz)
  const [high, low] = [coaxAttenuation[at], coaxAttenuation[at - 1]]
  if (!high) return null
  if (high.mhz === mhz) return dbPer100MOf(high.dbPer100Ft[kind])
  if (!low) return null
  const point = (row: typeof high): AttenuationPoint => ({ mhz: row.mhz, attenuation: row.dbPer100Ft[kind] })
  const dbPer100Ft = attenuationBetween(point(low), point(high), mhz)
  return dbPer100Ft === null ? null : dbPer100MOf(dbPer100Ft)
}
