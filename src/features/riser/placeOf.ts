import type { Item } from '../../../shared/commands/items.ts'
import type { RiserLayout, XY } from './layout/riserLayout.ts'

const middle = (box: { x: number; y: number; w: number; h: number }): XY => ({ x: box.x + box.w / 2, y: box.y + box.h / 2 })

/** Where something is on the drawing, to bring it into view; null where it is not drawn. */
export function placeOf(layout: RiserLayout, item: Item): XY | null {
  switch (item.kind) {
    case 'run': {
      const tag = layout.tags.find((each) => each.runId === item.id)
      return tag ? middle(tag) : (layout.runs.find((run) => run.runId === item.id)?.exit ?? null)
    }
    case 'plate':
      return layout.plates.find((spot) => spot.plate.id === item.id) ?? null
    case 'device': {
      const spot = layout.devices.find((each) => each.device.id === item.id) ?? layout.racks.flatMap((rack) => rack.units).find((unit) => unit.device.id === item.id)
      return spot ? middle(spot) : null
    }
    case 'rack': {
      const rack = layout.racks.find((box) => box.rack.id === item.id)
      return rack ? middle(rack) : null
    }
    case 'room': {
      const bay = layout.bays.find((each) => each.roomId === item.id)
      return bay ? middle(bay) : null
    }
    case 'pathway':
      return layout.chases.find((chase) => chase.pathwayIds.includes(item.id))?.note ?? null
    default:
      return null
  }
}
