import { usable } from '../usable.ts'
import { allowedFillIn2 } from './fillLimit.ts'
import { type RacewayKind, racewayTable, type TradeSize } from './raceway.table.ts'

export interface RacewayLoad {
  cablesIn2: number
  cables: number
  isNipple?: boolean
}

/**
 * Smallest trade size of a kind whose allowed fill holds these cables. Null: no size does, or a value that is no
 * number. Source: NEC Chapter 9 Tables 1 and 4.
 */
export function smallestRaceway(
  kind: RacewayKind,
  { cablesIn2, cables, isNipple = false }: RacewayLoad,
): TradeSize | null {
  if (!usable(cablesIn2, cables) || cablesIn2 < 0) return null
  for (const [size, { areaIn2 }] of racewayTable[kind]) {
    const allowed = allowedFillIn2(areaIn2, cables, isNipple)
    if (allowed !== null && cablesIn2 <= allowed) return size
  }
  return null
}
