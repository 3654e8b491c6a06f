import { ceilOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'

/**
 * Longest span between non-continuous supports, mm (5 ft). Source: TIA-569-C 9.7 extract; Santa Ana city
 * specification. Practice is 4 to 5 ft, uneven, and within 12 to 18 in of conduit and tray ends; never on ceiling
 * tile, grid or its wires.
 */
export const longestSpanMm = 1524

/** Four-pair cables that a hook holds. Source: ecmweb. One campus keeps to 24 (montana.edu). */
export const hookCapacity = { small: 50, large: 75 } as const

/**
 * Supports between the two ends of a way: ceil(length / spacing) - 1, never less than none. Null: a value that is no
 * number, a negative length, or a spacing of nothing. Derived.
 */
export function supportsBetween(lengthMm: number, spacingMm: number): number | null {
  if (!usable(lengthMm, spacingMm) || lengthMm < 0 || spacingMm <= 0) return null
  return finite(Math.max(0, ceilOf(lengthMm / spacingMm) - 1))
}

/** Whether a span between supports is short enough. Null: a value that is no number, or negative. Source above. */
export function isSpanShortEnough(spanMm: number): boolean | null {
  return usable(spanMm) && spanMm >= 0 ? spanMm <= longestSpanMm + 1e-6 : null
}
