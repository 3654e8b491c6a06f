import { finite, usable } from '../usable.ts'

/** Size at which a symbol is plotted, mm (1/4 in). Common architectural practice, no source. */
export const plottedSymbolMm = 6.35

/**
 * How much of the building a plotted symbol covers, mm: plotted size x scale denominator, so 1/4 in at 1:48 is 1 ft.
 * Null: a value that is no number, or not above nothing. Derived.
 */
export function symbolExtentMm(plottedMm: number, scaleDenominator: number): number | null {
  if (!usable(plottedMm, scaleDenominator) || plottedMm <= 0 || scaleDenominator <= 0) return null
  return finite(plottedMm * scaleDenominator)
}
