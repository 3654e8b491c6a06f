import { finite, usable } from '../usable.ts'
import { type RacewayKind, type TradeSize } from './raceway.table.ts'
import { smallestBore } from './racewayBore.ts'

export interface PlugSize {
  widthIn: number
  heightIn: number
}

/** An HDMI plug with its moulding. Source: common practice, no source. */
export const hdmiPlugIn: PlugSize = { widthIn: 0.85, heightIn: 0.45 }

/**
 * A plug tilts and catches at couplings, so the bore is taken this much wider than its diagonal. Common practice, no
 * source.
 */
export const plugClearance = 1.25

/** Least bore for a plug, in: its diagonal x 1.25. Null: a value that is no number, or not above nothing. Geometry. */
export function boreForPlugIn({ widthIn, heightIn }: PlugSize): number | null {
  if (!usable(widthIn, heightIn) || widthIn <= 0 || heightIn <= 0) return null
  return finite(Math.hypot(widthIn, heightIn) * plugClearance)
}

/**
 * Whether a ready-made plug passes a bore, in. A cable with a plug is judged by this, not by its jacket. Null as
 * above.
 */
export function doesPlugPass(plug: PlugSize, boreDiameterIn: number): boolean | null {
  const least = boreForPlugIn(plug)
  return least === null || !usable(boreDiameterIn) || boreDiameterIn <= 0 ? null : boreDiameterIn >= least
}

/**
 * Smallest trade size of a kind that a plug passes; 1-1/2 and up is the usual advice for HDMI. Null: none, or as
 * above.
 */
export function racewayForPlug(kind: RacewayKind, plug: PlugSize): TradeSize | null {
  const least = boreForPlugIn(plug)
  return least === null ? null : smallestBore(kind, least)
}
