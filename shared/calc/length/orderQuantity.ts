import { ceilOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'

/** Waste that is added when cable is ordered, as a share; a check never sees it. */
export const usualWaste = {
  /** Published: residential cost-book page. */
  residential: 0.05,
  /** Published: MIL-HDBK-1012/3 (navalfacilities.tpub.com 1012_30068). */
  outsidePlant: 0.1,
} as const

/**
 * Length to order, rounded up to whole steps: ceil(length x (1 + waste) / step) x step. The step is a foot, a metre or
 * what the cable is sold in, in the unit of the length. Null: a value that is no number, negative, or a step of
 * nothing. Source: 5 % waste, residential cost-book page; 5 to 15 % is common practice.
 */
export function orderLengthMm(lengthMm: number, waste: number, stepMm: number): number | null {
  if (!usable(lengthMm, waste, stepMm) || lengthMm < 0 || waste < 0 || stepMm <= 0) return null
  return roundUpToStepMm(lengthMm * (1 + waste), stepMm)
}

/** A length rounded up to whole steps, such as every 5 ft. Null as above. Arithmetic. */
export function roundUpToStepMm(lengthMm: number, stepMm: number): number | null {
  if (!usable(lengthMm, stepMm) || lengthMm < 0 || stepMm <= 0) return null
  return finite(ceilOf(lengthMm / stepMm) * stepMm)
}

/**
 * Outside-plant length, mm: (path + allowances at the ends) x (1 + waste). The allowance is usually 3 m at each end.
 * Null: a value that is no number, or negative. Source: MIL-HDBK-1012/3 (navalfacilities.tpub.com 1012_30068).
 */
export function outsidePlantLengthMm(pathMm: number, endAllowancesMm: number, waste: number): number | null {
  if (!usable(pathMm, endAllowancesMm, waste) || pathMm < 0 || endAllowancesMm < 0 || waste < 0) return null
  return finite((pathMm + endAllowancesMm) * (1 + waste))
}
