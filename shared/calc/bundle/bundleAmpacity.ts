import { finite, usable } from '../usable.ts'
import { bundleAmpacityTable, bundleColumns, type BundleGauge, type CableRatingC } from './bundleAmpacity.table.ts'

/** Ambient temperature that the table is for, degrees Celsius. */
export const tableAmbientC = 30

/**
 * Ampacity per conductor of powered cables in a bundle, A, all conductors loaded, 30 degrees Celsius. Null: more than
 * 192 cables (an engineer's work), a count that is no whole number, or no entry. Source beside the table.
 */
export function bundleAmpacityA(awg: BundleGauge, cables: number, ratingC: CableRatingC): number | null {
  if (!Number.isSafeInteger(cables) || cables < 1) return null
  return bundleAmpacityTable[awg][ratingC][bundleColumns.findIndex((most) => cables <= most)] ?? null
}

/**
 * Factor for another ambient temperature: sqrt((rating - ambient) / (rating - 30)). Null: an ambient above the rating,
 * a rating of 30 or less, or a value that is no number. Source: the usual ampacity correction, NEC 310.15(B).
 */
export function ambientFactor(ratingC: number, ambientC: number): number | null {
  if (!usable(ratingC, ambientC) || ratingC <= tableAmbientC || ambientC > ratingC) return null
  return finite(Math.sqrt((ratingC - ambientC) / (ratingC - tableAmbientC)))
}

export interface PoweredBundle {
  awg: BundleGauge
  ratingC: CableRatingC
  ambientC: number
  /** Current in each conductor, A. */
  currentA: number
}

/**
 * Most cables in a bundle that may carry this current: the last column whose corrected ampacity suffices; 0 when none
 * does. Null: a current that is no number or negative, or an ambient above the rating. Source beside the table.
 */
export function largestBundle({ awg, ratingC, ambientC, currentA }: PoweredBundle): number | null {
  const factor = ambientFactor(ratingC, ambientC)
  if (factor === null || !usable(currentA) || currentA < 0) return null
  let most = 0
  bundleColumns.forEach((cables, column) => {
    const ampacity = bundleAmpacityTable[awg][ratingC][column] ?? null
    if (ampacity !== null && ampacity * factor >= currentA - 1e-12) most = cables
  })
  return most
}

/**
 * Whether the table need not be asked: not more than 0.3 A per conductor, in 24 AWG or thicker. Null: a value that is
 * no number, or a negative current. Source: a cable maker's note on NEC 2020, which has the table bite above 60 W per
 * port only.
 */
export function isBundleExempt(currentA: number, awg: number): boolean | null {
  return usable(currentA, awg) && currentA >= 0 ? currentA <= 0.3 + 1e-12 && awg <= 24 : null
}

/**
 * Ampacity when only half the conductors are loaded, A: x 1.4. Null: no number, or negative. From memory, unverified.
 */
export function halfLoadedAmpacityA(ampacityA: number): number | null {
  return usable(ampacityA) && ampacityA >= 0 ? finite(1.4 * ampacityA) : null
}
