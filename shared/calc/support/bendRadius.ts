import { finite, usable } from '../usable.ts'

/**
 * Least inside bend radius as a multiple of the outer diameter. Source: TIA-568.0-D and others (cablinginstall.com
 * 16466578; terousa; pingdo); coaxial from memory, unverified.
 */
export const bendFactors = {
  'four-pair': 4,
  'multipair backbone': 10,
  'fibre at rest': 10,
  'fibre under load': 20,
  'bonding backbone': 8,
  coaxial: 10,
} as const
export type BentCable = keyof typeof bendFactors

/** Least radius of a fibre cord, mm, whatever its diameter. Same source. */
export const fibreCordRadiusMm = 25

/** Least inside bend radius, mm: factor x outer diameter. Null: a value that is no number, or not above nothing. */
export const radiusForFactorMm = (factor: number, outerDiameterMm: number): number | null =>
  usable(factor, outerDiameterMm) && factor > 0 && outerDiameterMm > 0 ? finite(factor * outerDiameterMm) : null

/** The same by the kind of cable. */
export const bendRadiusMm = (cable: BentCable, outerDiameterMm: number): number | null =>
  radiusForFactorMm(bendFactors[cable], outerDiameterMm)
