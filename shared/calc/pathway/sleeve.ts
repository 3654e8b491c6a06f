import { finite, usable } from '../usable.ts'
import { type CableLot, cablesAreaIn2, fillPercent } from './cableArea.ts'

export interface Sleeve {
  insideDiameterIn: number
  /**
   * Fill that the listed firestop system allows, percent, as its drawing says. Null: not a rated assembly, or not
   * known.
   */
  listedFillPercent: number | null
}

export interface SleeveFill {
  fillPercent: number
  /** The limit that was judged by. */
  limitPercent: number
  isOver: boolean
  /** Whether the limit is the listing's; otherwise it is the 40 % of design practice. */
  isListed: boolean
}

/** Fill of a sleeve without a listing, percent. Source: TIA-569 and BICSI design rule. */
export const sleeveDesignPercent = 40

/**
 * Fill of a sleeve against the fill that its firestop listing allows, or 40 % where there is none. In a rated wall or
 * floor only the listed system for the actual cables counts (NEC 800.26, 820.26); this is arithmetic, not approval.
 * Null: a value that is no number, a bore of nothing, or a listing outside 0 to 100 %.
 */
export function sleeveFill(sleeve: Sleeve, lots: readonly CableLot[]): SleeveFill | null {
  const { insideDiameterIn, listedFillPercent } = sleeve
  if (!usable(insideDiameterIn) || insideDiameterIn <= 0) return null
  if (listedFillPercent !== null && !(listedFillPercent >= 0 && listedFillPercent <= 100)) return null
  const area = cablesAreaIn2(lots)
  const bore = finite((Math.PI / 4) * insideDiameterIn ** 2)
  const filled = area === null || bore === null ? null : fillPercent(area, bore)
  if (filled === null) return null
  const limitPercent = listedFillPercent ?? sleeveDesignPercent
  return { fillPercent: filled, limitPercent, isOver: filled > limitPercent, isListed: listedFillPercent !== null }
}
