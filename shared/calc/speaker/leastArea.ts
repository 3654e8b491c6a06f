import { copperOhmMm2PerKm } from '../conductor/resistance.ts'
import { finite, usable } from '../usable.ts'
import { type LossConvention, ratioForLoss } from './lineLoss.ts'

/**
 * Least conductor area, mm2, that keeps a one-way line within a limit: 2 r L/(x Z), resistivity in ohm mm2/km. By the
 * voltage convention this is a published 100 V sizing note (table T8). Null for impossible input, or a limit of
 * nothing.
 */
export function leastAreaMm2(
  lengthM: number,
  loadOhm: number,
  limit: number,
  convention: LossConvention,
  resistivityOhmMm2PerKm: number = copperOhmMm2PerKm,
): number | null {
  const ratio = ratioForLoss(limit, convention)
  if (ratio === null || ratio <= 0 || !usable(lengthM, loadOhm, resistivityOhmMm2PerKm)) return null
  if (lengthM < 0 || loadOhm <= 0 || resistivityOhmMm2PerKm <= 0) return null
  return finite((2 * resistivityOhmMm2PerKm * lengthM) / 1000 / (ratio * loadOhm))
}
