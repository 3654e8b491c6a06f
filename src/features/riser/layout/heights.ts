import { mmPerFoot } from '../../../../shared/units.ts'
import { metrics } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { StoreyBox } from './riserLayout.ts'
import type { StoreySeats } from './seatStoreys.ts'

export interface Heights {
  readonly storeys: readonly StoreyBox[]
  /** Top of the roof, and where it meets the walls. */
  readonly apex: number
  readonly eave: number
  readonly pitched: boolean
  readonly ground: number
  readonly bottom: number
  readonly height: number
}

interface Wants {
  readonly storeys: readonly Storey[]
  readonly placing: Placing
  readonly trunks: readonly number[]
  readonly locals: readonly number[]
  readonly seats: readonly StoreySeats[]
  readonly rackUnits: ReadonlyMap<string, number>
}

/** The section from top to bottom: roof, then each storey's void with trunk and tags, then its bays. */
export function stackHeights({ storeys, placing, trunks, locals, seats, rackUnits }: Wants): Heights {
  const pitched = storeys.some((storey) => storey.kind === 'roof')
  const inRoof = seats.some((each) => each.roof.length > 0) || storeys.some((storey) => storey.kind === 'roof' && storey.rooms.some((room) => room.fixtures.some((fixture) => !fixture.isOutside)))
  const apex = metrics.margin.top + (inRoof ? 8 : 6)
  const eave = pitched ? apex + metrics.roof : apex + 10
  const boxes: StoreyBox[] = []
  let at = eave
  const order = [...storeys].reverse()
  const topFull = order.find((storey) => storey.kind === 'full')
  for (const storey of order) {
    const base = { levelIds: storey.levels.map((level) => level.id), kind: storey.kind, x0: placing.edges[storey.index]!.x0, x1: placing.edges[storey.index]!.x1, folded: placing.folded[storey.index]! }
    if (storey.kind === 'roof') {
      boxes.push({ ...base, top: apex, trunk: eave, ceiling: eave, floor: eave })
      continue
    }
    const roofTags = storey === topFull ? roofTagHeight(seats[storey.index]!) : 0
    const tags = seats[storey.index]!.rows * metrics.tag.rowHeight
    const top = at
    const trunk = top + metrics.voidTop + roofTags + trunks[storey.index]!
    const ceiling = Math.round(trunk + locals[storey.index]! + metrics.tagOver + tags + (tags ? metrics.tagUnder - (metrics.tag.rowHeight - metrics.tag.height) : 0))
    const floor = ceiling + (storey.kind === 'crawl' ? metrics.crawl + 8 : bayHeight(storey, rackUnits, placing.isLarge))
    boxes.push({ ...base, top, trunk, ceiling, floor })
    at = floor + (storey.kind === 'full' && storeys[storey.index - 1]?.kind === 'crawl' ? 14 : 0)
  }
  const byIndex = boxes.reverse()
  const lowest = byIndex.find((box) => box.kind !== 'roof')
  const bottom = (lowest?.floor ?? eave) + (lowest?.kind === 'crawl' ? 6 : 16)
  return { storeys: byIndex, apex, eave, pitched, ground: groundOf(storeys, byIndex, bottom), bottom, height: bottom + metrics.margin.bottom }
}

/** Tags of what leaves into the roof stand over the trunk, partly in the roof itself. */
export const roofTagHeight = ({ roofRows }: StoreySeats): number => Math.max(0, roofRows * metrics.tag.rowHeight - metrics.voidTop)

function bayHeight(storey: Storey, rackUnits: ReadonlyMap<string, number>, isLarge: boolean): number {
  const drawn = Math.min(metrics.bay.most, Math.max(metrics.bay.least, (storey.ceilingMm / mmPerFoot) * (isLarge ? metrics.bay.pxPerFootLarge : metrics.bay.pxPerFoot)))
  const rows = Math.max(0, ...storey.rooms.flatMap((room) => room.racks.map((rack) => rackUnits.get(rack.id) ?? 0)))
  return Math.round(Math.max(drawn, Math.min(300, rows ? metrics.rack.over + metrics.rack.under + 2 * metrics.rack.pad + rows * 8 : 0)))
}

/** The ground meets the house under the lowest level that is not a basement. */
function groundOf(storeys: readonly Storey[], boxes: readonly StoreyBox[], bottom: number): number {
  const living = storeys.find((storey) => storey.kind === 'full' && storey.levels[0]?.use !== 'basement')
  const box = living && boxes[living.index]
  if (!box) return (boxes.find((each) => each.kind === 'full')?.top ?? bottom) + 20
  const below = living.index > 0 ? boxes[living.index - 1] : undefined
  return box.floor + (below?.kind === 'crawl' ? 30 : below ? 14 : 9)
}
