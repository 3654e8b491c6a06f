import { find, jobOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Mounting, Plate, Room } from '../../../../shared/model/place.ts'
import { mmPerInch, type LengthUnit } from '../../../../shared/units.ts'
import { extentOf, wallOf, type Side } from '../layout/wallSpot.ts'

/** A place in a room as the section shows it: across from west to east, and up from floor to ceiling, 0 to 1 each. */
export interface RoomPoint {
  readonly roomId: string
  readonly across: number
  readonly up: number
}

/** Where a plate goes: the part of a plate's record that says so. */
export type PlatePlace = Pick<Plate, 'roomId' | 'mounting' | 'wall' | 'alongMm' | 'at' | 'heightMm' | 'heightTo'>

/** Usual heights that a drag snaps to, mm over the floor: common practice, no source, but for 305 and 1219. */
export const usualHeightsMm: readonly number[] = [51, 305, 406, 610, 762, 914, 1016, 1118, 1219, 1372, 1524, 1676, 1829, 1981, 2134, 2235, 2438, 2743]
const ceilingShare = 0.94
const snapMm = 90

export const ceilingOf = (doc: JobDocument, room: Room): number => room.ceilingHeightMm ?? find(doc, 'level', room.levelId)?.ceilingHeightMm ?? 2743

/** The nearest usual height, or the height itself to the inch or centimetre where none is near. */
export function snapHeight(heightMm: number, ceilingMm: number, unit: LengthUnit = 'ft'): number {
  const within = Math.min(Math.max(0, Math.round(heightMm)), ceilingMm)
  const usual = usualHeightsMm.filter((each) => each < ceilingMm).reduce((best, each) => (Math.abs(each - within) < Math.abs(best - within) ? each : best), 305)
  const step = unit === 'm' ? 10 : mmPerInch
  return Math.abs(usual - within) <= snapMm ? usual : Math.round(Math.round(within / step) * step)
}

/** Whether a point is so high that the ceiling is meant. */
export const isCeiling = (point: RoomPoint): boolean => point.up > ceilingShare

/**
 * Where a plate of this mounting goes at a point of the section. On a wall: the wall behind the point that one sees in the
 * section, or an end wall at either end; the height snaps to a usual one unless it is given.
 */
export function placeAt(doc: JobDocument, point: RoomPoint, mounting: Mounting, heightMm: number | null = null): PlatePlace {
  const room = find(doc, 'room', point.roomId)!
  const ceilingMm = ceilingOf(doc, room)
  const { minX, maxX } = extentOf(room)
  const xMm = Math.round(minX + point.across * (maxX - minX))
  if (mounting === 'ceiling' || mounting === 'floor') return { roomId: room.id, mounting, wall: null, alongMm: null, at: { xMm, yMm: middleY(room, xMm) }, heightMm: mounting === 'ceiling' ? ceilingMm : 0, heightTo: 'centre' }
  const side: Side = point.across < 0.03 ? 'W' : point.across > 0.97 ? 'E' : 'N'
  const { wall, alongMm } = wallAt(room, side, xMm)
  return { roomId: room.id, mounting, wall, alongMm, at: null, heightMm: heightMm ?? snapHeight(point.up * ceilingMm, ceilingMm, jobOf(doc).lengthUnit), heightTo: 'centre' }
}

/**
 * A new place for a plate that stays what it is: on its own wall where that wall reaches the point. From where it was
 * drawn counts as well: what was dragged only sideways keeps its height, and what was dragged only up or down its place.
 */
export function moveTo(doc: JobDocument, plate: Plate, to: RoomPoint, from: RoomPoint | null = null): PlatePlace {
  const room = find(doc, 'room', to.roomId)!
  const isHere = plate.roomId === room.id
  const keepsAcross = isHere && from !== null && Math.abs(to.across - from.across) < 0.008
  if (plate.wall === null) return keepsAcross && plate.at ? { ...placeAt(doc, to, plate.mounting), at: plate.at } : placeAt(doc, to, plate.mounting)
  const ceilingMm = ceilingOf(doc, room)
  const rise = from ? to.up - from.up : 0
  const up = from ? plate.heightMm / ceilingMm + rise : to.up
  const heightMm = isHere && from && Math.abs(rise) < 0.02 ? plate.heightMm : snapHeight(up * ceilingMm, ceilingMm, jobOf(doc).lengthUnit)
  const base = { ...placeAt(doc, to, plate.mounting), heightMm, heightTo: plate.heightTo }
  if (keepsAcross) return { ...base, wall: plate.wall, alongMm: plate.alongMm }
  const side = isHere ? wallOf(room, plate.wall)?.side : undefined
  const { minX, maxX } = extentOf(room)
  const alongMm = side === 'N' || side === 'S' ? alongOf(room, plate.wall, Math.round(minX + to.across * (maxX - minX))) : null
  return alongMm === null ? base : { ...base, wall: plate.wall, alongMm }
}

/** The wall on a side of the room that a point lies on, and how far along it; the first wall where none does. */
function wallAt(room: Room, side: Side, xMm: number): { wall: number; alongMm: number } {
  const own = room.outline.flatMap((_, wall) => (wallOf(room, wall)?.side === side ? [wall] : []))
  if (side === 'W' || side === 'E') {
    const wall = own[0] ?? 0
    return { wall, alongMm: Math.round(lengthOf(room, wall) / 2) }
  }
  for (const wall of own) {
    const alongMm = alongOf(room, wall, xMm)
    if (alongMm !== null) return { wall, alongMm }
  }
  return { wall: own[0] ?? 0, alongMm: Math.round(lengthOf(room, own[0] ?? 0) / 2) }
}

/** How far along a wall a plan x is, mm; null where the wall does not reach there. */
function alongOf(room: Room, wall: number, xMm: number): number | null {
  const ends = wallOf(room, wall)
  if (!ends) return null
  const run = ends.to.xMm - ends.from.xMm
  const share = run === 0 ? -1 : (xMm - ends.from.xMm) / run
  return share < -0.001 || share > 1.001 ? null : Math.round(Math.min(1, Math.max(0, share)) * lengthOf(room, wall))
}

/** Length of a wall, mm. */
export function lengthOf(room: Room, wall: number): number {
  const ends = wallOf(room, wall)
  return ends ? Math.round(Math.hypot(ends.to.xMm - ends.from.xMm, ends.to.yMm - ends.from.yMm)) : 0
}

/** Half way through the room at a plan x, so that a ceiling plate is inside a room of any shape. */
function middleY(room: Room, xMm: number): number {
  const cuts: number[] = []
  room.outline.forEach((from, index) => {
    const to = room.outline[(index + 1) % room.outline.length]!
    const [low, high] = from.xMm < to.xMm ? [from, to] : [to, from]
    if (xMm >= low.xMm && xMm < high.xMm) cuts.push(low.yMm + ((high.yMm - low.yMm) * (xMm - low.xMm)) / (high.xMm - low.xMm))
  })
  cuts.sort((a, b) => a - b)
  const { minY, maxY } = extentOf(room)
  return Math.round(cuts.length >= 2 ? (cuts[0]! + cuts[1]!) / 2 : (minY + maxY) / 2)
}
