import { finite, usable } from '../usable.ts'

/** Ratios between which three cables may wedge side by side in a bend. */
export const jamBand = { from: 2.8, to: 3.2 } as const

/**
 * Jam ratio: inside diameter over outer diameter of one cable. Some references multiply the diameter by 1.05 for the
 * oval section of a bend; the NEC note does not. Null: a value that is no number, or not above nothing. Source: NEC
 * Chapter 9 Table 1, informational note.
 */
export function jamRatio(insideDiameterIn: number, outerDiameterIn: number): number | null {
  if (!usable(insideDiameterIn, outerDiameterIn) || insideDiameterIn <= 0 || outerDiameterIn <= 0) return null
  return finite(insideDiameterIn / outerDiameterIn)
}

/** Whether cables may jam: exactly three of them and a ratio of 2.8 to 3.2. Null as above. Source as above. */
export function mayJam(insideDiameterIn: number, outerDiameterIn: number, cables: number): boolean | null {
  const ratio = jamRatio(insideDiameterIn, outerDiameterIn)
  if (ratio === null || !Number.isSafeInteger(cables) || cables < 0) return null
  return cables === 3 && ratio >= jamBand.from - 1e-9 && ratio <= jamBand.to + 1e-9
}
