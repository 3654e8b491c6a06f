import { finite, usable } from '../usable.ts'
import { type RacewayBore, type RacewayKind, racewayTable, type TradeSize } from './raceway.table.ts'

/**
 * Inside of a raceway by kind and trade size; null where that kind is not made in that size. Source beside the table.
 */
export function racewayBore(kind: RacewayKind, size: TradeSize): RacewayBore | null {
  return racewayTable[kind].get(size) ?? null
}

/** Area of a round bore, in2: pi/4 d2. Null: a value that is no number, or not above nothing. Geometry. */
export function boreAreaIn2(diameterIn: number): number | null {
  return usable(diameterIn) && diameterIn > 0 ? finite((Math.PI / 4) * diameterIn ** 2) : null
}

/** Smallest trade size of a kind with a bore at least this wide, by its diameter, in; null where none is made. */
export function smallestBore(kind: RacewayKind, leastDiameterIn: number): TradeSize | null {
  if (!usable(leastDiameterIn)) return null
  for (const [size, { diameterIn }] of racewayTable[kind]) if (diameterIn >= leastDiameterIn) return size
  return null
}
