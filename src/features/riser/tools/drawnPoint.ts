import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { bayAt } from '../layout/findAt.ts'
import type { BayBox, RiserLayout, XY } from '../layout/riserLayout.ts'
import { extentOf, platePoint } from '../layout/wallSpot.ts'
import type { RoomPoint } from './roomPoint.ts'

const headroom = 14
const foot = 46

/**
 * A point of the drawing as a place in a room. Bays keep the order of what hangs in them, not its distance, so a point
 * between two plates lies between their places on the plan.
 */
export function pointInBay(doc: JobDocument, layout: RiserLayout, bay: BayBox, at: XY, exceptPlateId: string | null = null): RoomPoint {
  const room = find(doc, 'room', bay.roomId)!
  const { minX, maxX } = extentOf(room)
  const anchors: [x: number, across: number][] = [[bay.x, 0]]
  const hung = layout.plates.filter((spot) => spot.plate.roomId === room.id && spot.plate.id !== exceptPlateId).sort((a, b) => a.x - b.x)
  for (const spot of hung) {
    const point = platePoint(spot.plate, room)
    const last = anchors.at(-1)!
    if (point && maxX > minX && spot.x > last[0]) anchors.push([spot.x, Math.max(last[1], Math.min(1, (point.xMm - minX) / (maxX - minX)))])
  }
  anchors.push([bay.x + bay.w, 1])
  const next = Math.max(1, anchors.findIndex(([x]) => x >= at.x))
  const [x0, a0] = anchors[next - 1]!
  const [x1, a1] = anchors[next] ?? anchors.at(-1)!
  const share = x1 > x0 ? (at.x - x0) / (x1 - x0) : 0.5
  const up = (bay.y + bay.h - foot - at.y) / Math.max(1, bay.h - foot - headroom)
  return { roomId: room.id, across: clamp(a0 + (a1 - a0) * clamp(share)), up: clamp(up) }
}

/** The place in an attic or crawl under a point of the drawing, where there are no bays. */
export function pointInBand(doc: JobDocument, layout: RiserLayout, at: XY): RoomPoint | null {
  const band = layout.storeys.find((box) => box.kind !== 'full' && at.y >= box.top && at.y <= box.floor + 4 && at.x >= box.x0 - 60 && at.x <= box.x1 + 60)
  if (!band) return null
  const rooms = [...doc.records.room.values()].filter((room) => band.levelIds.includes(room.levelId))
  const share = (at.x - band.x0) / Math.max(1, band.x1 - band.x0)
  const extents = rooms.map((room) => ({ room, ...extentOf(room) }))
  const min = Math.min(...extents.map((each) => each.minX))
  const max = Math.max(...extents.map((each) => each.maxX))
  const xMm = min + share * (max - min)
  const found = extents.find((each) => xMm >= each.minX && xMm <= each.maxX) ?? extents.sort((a, b) => a.minX - b.minX).at(share < 0.5 ? 0 : -1)
  if (!found) return null
  return { roomId: found.room.id, across: clamp((xMm - found.minX) / Math.max(1, found.maxX - found.minX)), up: band.kind === 'roof' ? 0.2 : 0.5 }
}

/** Where a point of the drawing is in the house; null on the structure, the sky or the ground. */
export function roomPointAt(doc: JobDocument, layout: RiserLayout, at: XY, exceptPlateId: string | null = null): RoomPoint | null {
  const bay = bayAt(layout, at)
  return bay ? pointInBay(doc, layout, bay, at, exceptPlateId) : pointInBand(doc, layout, at)
}

const clamp = (value: number) => Math.min(1, Math.max(0, value))
