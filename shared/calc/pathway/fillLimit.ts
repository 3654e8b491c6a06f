import { finite, usable } from '../usable.ts'

/** Longest raceway that counts as a nipple, in. NEC Chapter 9 Note 4. */
export const nippleLengthIn = 24

const shares = { one: 0.53, two: 0.31, more: 0.4, nipple: 0.6 } as const

/**
 * Share of a raceway that its cables may fill: one cable 53 %, two 31 %, three or more 40 %; a nipple up to 24 in 60 %.
 * A multiconductor cable counts as one; an oval one as a circle of its greater diameter (Notes 5 and 9, from memory).
 * Null: a count that is no whole number above nothing. Source: NEC Chapter 9 Table 1.
 */
export function fillLimitShare(cables: number, isNipple = false): number | null {
  if (!Number.isSafeInteger(cables) || cables < 1) return null
  if (isNipple) return shares.nipple
  return cables === 1 ? shares.one : cables === 2 ? shares.two : shares.more
}

/** Area that so many cables may take up in a bore, in2. Null as above, or an area that is not above nothing. */
export function allowedFillIn2(boreAreaIn2: number, cables: number, isNipple = false): number | null {
  const share = fillLimitShare(cables, isNipple)
  return share === null || !usable(boreAreaIn2) || boreAreaIn2 <= 0 ? null : finite(share * boreAreaIn2)
}
