import { finite } from '../usable.ts'
import {
  circuitFactorAbove, circuitFactors, type Containment, type Divider2000, type Screening, type SegregationClass,
  separation2000Mm, separationMm,
} from './en50174.table.ts'

/**
 * Separation from power by EN 50174-2 (2009 scheme), mm: A = S x P, by class, containment and count of single-phase 20
 * A circuits. No circuits, no separation. Null: a count that is no whole number, or negative. Source beside the table.
 * Its handbook prints 400 for class b, ladder, over 75 circuits: a slip, 75 x 6 is 450.
 */
export function separationEn50174Mm(
  segregation: SegregationClass,
  containment: Containment,
  circuits: number,
): number | null {
  const factor = circuitFactor(circuits)
  return factor === null ? null : finite(separationMm[segregation][containment] * factor)
}

/** Factor P for a count of circuits; 0 for none. Null as above. */
export function circuitFactor(circuits: number): number | null {
  if (!Number.isSafeInteger(circuits) || circuits < 0) return null
  if (circuits === 0) return 0
  return circuitFactors.find(({ upTo }) => circuits <= upTo)?.factor ?? circuitFactorAbove
}

/**
 * Circuits that a power cable counts for: a three-phase cable three, and over 20 A as many times 20 A as it carries.
 * Null: a current that is no number, or not above nothing. From memory, unverified.
 */
export function equivalentCircuits(phases: 1 | 3, currentA: number): number | null {
  if (!Number.isFinite(currentA) || currentA <= 0) return null
  return finite(phases * Math.ceil(currentA / 20))
}

/**
 * Separation by the 2000 edition, mm, from the screening of power and data and the divider between. Source beside the
 * table.
 */
export function separationEn2000Mm(power: Screening, data: Screening, divider: Divider2000): number {
  return separation2000Mm[power][data][divider]
}
