import type { Column } from './columns.ts'
import type { Heights } from './heights.ts'
import type { Lanes } from './lanes.ts'
import type { LocalTrip } from './localLanes.ts'
import type { Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { ChaseBox } from './riserLayout.ts'

/** Draws chases where runs pass a storey; one that passes none is a small note where it begins. */
export function drawChases(storeys: readonly Storey[], columns: readonly Column[], placing: Placing, heights: Heights, { lanes }: Lanes, locals: readonly LocalTrip[]): ChaseBox[] {
  const indexOf = new Map(storeys.flatMap((storey) => storey.levels.map((level) => [level.id, storey.index] as const)))
  const boxes: ChaseBox[] = []
  for (const column of columns) {
    const shown = new Set<string>()
    for (const storey of storeys) {
      const gap = placing.gaps[storey.index]![column.index]!
      if (storey.kind !== 'full' || column.racks.some((rack) => rack.storey === storey.index) || gap.x1 - gap.x0 < 4) continue
      const here = column.pathways.filter((pathway) => {
        const [bottom, top] = [indexOf.get(pathway.bottomLevelId) ?? 0, indexOf.get(pathway.topLevelId) ?? 0]
        return Math.min(bottom, top) < storey.index && Math.max(bottom, top) >= storey.index
      })
      if (!here.length) continue
      for (const pathway of here) shown.add(pathway.id)
      const box = heights.storeys[storey.index]!
      const passing = lanes.filter(({ strand }) => strand.column === column.index && (strand.up ? strand.corridor >= storey.index && strand.rackStorey < storey.index : strand.corridor < storey.index && strand.rackStorey > storey.index))
      const crossing = locals.filter((local) => local.cross !== null && local.cross >= gap.x0 && local.cross <= gap.x1 && local.legs.some((leg) => leg.corridor >= storey.index) && local.legs.some((leg) => leg.corridor < storey.index))
      boxes.push({
        pathwayIds: here.map((pathway) => pathway.id),
        runIds: [...passing.map((lane) => lane.strand.trip.run.id), ...crossing.map((local) => local.trip.run.id)],
        x: gap.x0 + 2, y: box.ceiling - 2, w: gap.x1 - gap.x0 - 4, h: box.floor - box.ceiling + 6,
        note: { x: (gap.x0 + gap.x1) / 2, y: (box.ceiling + box.floor) / 2 - 4 },
      })
    }
    for (const pathway of column.pathways) if (!shown.has(pathway.id)) boxes.push(smallNote(pathway.id, column, indexOf.get(pathway.topLevelId) ?? 0, placing, heights, boxes.length))
  }
  return boxes
}

function smallNote(pathwayId: string, column: Column, top: number, placing: Placing, heights: Heights, index: number): ChaseBox {
  const box = heights.storeys[top]!
  const x = placing.columns[column.index]! + (index % 2 ? 1 : -1) * 2
  const y = box.kind === 'roof' ? heights.eave - 14 : box.floor + 7
  return { pathwayIds: [pathwayId], runIds: [], x: x - 24, y: y - 7, w: 48, h: 14, note: { x, y } }
}
