import { wallPoint } from '../../../../shared/routing/endSpot.ts'
import type { Plate, Room } from '../../../../shared/model/place.ts'
import type { Point } from '../../../../shared/model/fields.ts'

export type Side = 'N' | 'E' | 'S' | 'W'

/** The wall from corner i to the next, clockwise on the drawing, and which way it looks. */
export function wallOf(room: Room, wall: number): { from: Point; to: Point; side: Side } | undefined {
  const from = room.outline[wall]
  const to = room.outline[(wall + 1) % room.outline.length]
  if (!from || !to) return undefined
  const east = to.xMm - from.xMm
  const south = to.yMm - from.yMm
  const side: Side = Math.abs(east) >= Math.abs(south) ? (east >= 0 ? 'N' : 'S') : south >= 0 ? 'E' : 'W'
  return { from, to, side }
}

/** Where a plate is on the plan: along its wall from the left end, or at its own point. Null where nothing says. */
export function platePoint(plate: Plate, room: Room): Point | null {
  if (plate.wall === null) return plate.at
  return wallPoint(room.outline, plate.wall, plate.alongMm ?? 0) ?? plate.at
}

/** The smallest and largest x and y of a room. */
export function extentOf(room: Room): { minX: number; maxX: number; minY: number; maxY: number } {
  const xs = room.outline.map((point) => point.xMm)
  const ys = room.outline.map((point) => point.yMm)
  return { minX: Math.min(...xs), maxX: Math.max(...xs), minY: Math.min(...ys), maxY: Math.max(...ys) }
}
