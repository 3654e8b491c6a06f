import type { Heights } from './heights.ts'
import { metrics } from './metrics.ts'
import type { PlacedBay, Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { BayBox, LevelCaption } from './riserLayout.ts'

/** Bays with the place of their names: at the foot, or at the head where a rack leaves no width below. */
export function drawBays(placing: Placing, heights: Heights): BayBox[] {
  return placing.bays.map((bay): BayBox => {
    const box = heights.storeys[bay.storey]!
    const isOutside = bay.x0 >= box.x1 - 1 || bay.x1 <= box.x0 + 1
    const inset = isOutside ? 0 : metrics.bayInset
    const rackLeft = rackEdge(bay, placing)
    const free = (rackLeft ?? bay.x1) - bay.x0
    const isHead = rackLeft !== null && free < 40 + bay.room.room.name.length * 6.3
    return {
      roomId: bay.room.room.id, storey: bay.storey, outside: isOutside,
      x: bay.x0 + inset, y: box.ceiling, w: bay.x1 - bay.x0 - 2 * inset, h: box.floor - box.ceiling,
      name: { x: bay.x0 + (isOutside && bay.x1 <= box.x0 + 1 ? 20 : 9), y: isHead ? box.ceiling + 15 : box.floor - 29, width: isHead ? bay.x1 - bay.x0 - 14 : free - 46, place: isHead ? 'head' : 'foot' },
    }
  })
}

function rackEdge(bay: PlacedBay, placing: Placing): number | null {
  const ids = new Set(bay.room.racks.map((rack) => rack.id))
  if (!ids.size) return null
  const lefts = placing.bands.flatMap((bands, column) => bands.racks.filter((band) => ids.has(band.rackId)).map((band) => placing.columns[column]! + band.offset - band.width / 2))
  return Math.min(...lefts)
}

/** Names of the levels at the left edge, each with its datum where the level has a floor. */
export function drawCaptions(storeys: readonly Storey[], heights: Heights, step: number): LevelCaption[] {
  return storeys.flatMap((storey) => {
    const box = heights.storeys[storey.index]!
    const small = storey.kind !== 'full'
    const middle = storey.kind === 'roof' ? heights.eave + 16 : (box.ceiling + box.floor) / 2
    return storey.levels.map((level, index): LevelCaption => ({
      levelId: level.id, x: 10, y: (small ? middle - 12 : middle - 30) - (storey.levels.length > 1 ? 24 : 0) + (index - (storey.levels.length - 1) / 2) * step, small,
      datum: small || index > 0 ? null : { y: box.floor, x1: box.x0 - 2, elevationMm: level.elevationMm },
    }))
  })
}
