import { floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'
import { fillLimitShare } from './fillLimit.ts'

/**
 * Most equal cables that a bore takes by the 53/31/40 rule: the largest n with n x pi/4 d2 within its own share of the
 * area. As two may fill less than one, a bore can take three and yet not two. Note 7, which rounds a count up, is for
 * conductors and is not used. Null: a value that is no number, or not above nothing.
 * Source: NEC Chapter 9 Table 1; for communications cable it is a TIA and BICSI design rule, not code (NEC 800.110(B)).
 */
export function cablesInRaceway(boreAreaIn2: number, outerDiameterIn: number, isNipple = false): number | null {
  if (!usable(boreAreaIn2, outerDiameterIn) || boreAreaIn2 <= 0 || outerDiameterIn <= 0) return null
  const each = (Math.PI / 4) * outerDiameterIn ** 2
  const fits = (cables: number) => cables * each <= (fillLimitShare(cables, isNipple) ?? 0) * boreAreaIn2
  const many = floorOf(((fillLimitShare(3, isNipple) ?? 0) * boreAreaIn2) / each)
  if (many >= 3) return finite(many)
  return fits(2) ? 2 : fits(1) ? 1 : 0
}
