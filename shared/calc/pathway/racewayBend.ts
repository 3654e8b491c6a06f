import { finite, usable } from '../usable.ts'

/**
 * Least inside radius of a raceway bend, in: six times the inside diameter up to 2 in, ten times above. Null: a value
 * that is no number, or not above nothing. Source: from memory, unverified; consistent with a public quiz list.
 * The 2 in is the trade size in telecom texts; a 2 in EMT of 2.067 in is above it here, on the safe side.
 */
export function racewayBendRadiusIn(insideDiameterIn: number): number | null {
  if (!usable(insideDiameterIn) || insideDiameterIn <= 0) return null
  return finite((insideDiameterIn <= 2 ? 6 : 10) * insideDiameterIn)
}
