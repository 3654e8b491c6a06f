import { finite, usable } from '../usable.ts'

/** A count of equal cables, by their outer diameter; an oval cable by its greater one (NEC Chapter 9 Note 9). */
export interface CableLot {
  cables: number
  outerDiameterIn: number
}

/**
 * Area that cables take up in a raceway, in2: the sum of count x pi/4 d2.
 * Null: a value that is no number, a count that is no whole number, or a diameter that is not above nothing.
 */
export function cablesAreaIn2(lots: readonly CableLot[]): number | null {
  const isSound = ({ cables, outerDiameterIn }: CableLot) =>
    Number.isSafeInteger(cables) && cables >= 0 && usable(outerDiameterIn) && outerDiameterIn > 0
  if (!lots.every(isSound)) return null
  return summedAreaIn2(
    lots.map(({ cables, outerDiameterIn }) => ({ cables, areaIn2: (Math.PI / 4) * outerDiameterIn ** 2 })),
  )
}

/** The same from areas that a table prints, in2: the sum of count x area. Null as above. */
export function summedAreaIn2(lots: readonly { cables: number; areaIn2: number }[]): number | null {
  if (
    !lots.every(({ cables, areaIn2 }) => Number.isSafeInteger(cables) && cables >= 0 && usable(areaIn2) && areaIn2 >= 0)
  )
    return null
  return finite(lots.reduce((sum, { cables, areaIn2 }) => sum + cables * areaIn2, 0))
}

/** Share of a bore that is filled, percent. Null: a value that is no number, or a bore of nothing. */
export function fillPercent(cablesIn2: number, boreAreaIn2: number): number | null {
  if (!usable(cablesIn2, boreAreaIn2) || cablesIn2 < 0 || boreAreaIn2 <= 0) return null
  return finite((100 * cablesIn2) / boreAreaIn2)
}
