import type { JobReader } from '../derive/jobReader.ts'
import type { Point } from '../model/fields.ts'
import type { Level, Outline, Plate, Room } from '../model/place.ts'
import type { RunEnd } from '../model/run.ts'

/** Where a run's end is: on which level, where on it, and how high above its floor, mm. */
export interface EndSpot {
  readonly level: Level
  readonly room: Room
  readonly at: Point
  readonly heightMm: number
  readonly atRack: boolean
}

/** Height of one rack unit, mm (EIA-310, known): 1.75 in. */
export const rackUnitMm = 44.45

/** A point on a wall, from its left end as one faces it from inside. Outlines go clockwise, so that end is where the wall begins. */
export function wallPoint(outline: Outline, wall: number, alongMm: number): Point | null {
  const from = outline[wall]
  const to = outline[(wall + 1) % outline.length]
  if (!from || !to) return null
  const length = Math.hypot(to.xMm - from.xMm, to.yMm - from.yMm)
  const share = length === 0 ? 0 : Math.min(1, Math.max(0, alongMm / length))
  return { xMm: Math.round(from.xMm + (to.xMm - from.xMm) * share), yMm: Math.round(from.yMm + (to.yMm - from.yMm) * share) }
}

/** Where an end is, or a sentence that says what is missing. */
export function endSpot(reader: JobReader, end: RunEnd | null): EndSpot | string {
  if (!end) return 'it has no end there yet'
  if ('plateId' in end) return plateSpot(reader, end.plateId)
  if ('rackId' in end) return rackSpot(reader, end.rackId, null)
  const device = reader.find('device', end.deviceId)
  if (!device) return 'its device is gone'
  if (device.plateId) return plateSpot(reader, device.plateId)
  if (device.rackId) return rackSpot(reader, device.rackId, device.unit)
  const place = placed(reader, device.roomId)
  if (typeof place === 'string') return place
  return device.at ? { ...place, at: device.at, heightMm: device.heightMm ?? 0, atRack: false } : `${device.name} has no position in ${place.room.name}`
}

function plateSpot(reader: JobReader, plateId: string): EndSpot | string {
  const plate = reader.find('plate', plateId)
  if (!plate) return 'its plate is gone'
  const place = placed(reader, plate.roomId)
  if (typeof place === 'string') return place
  const at = pointOf(plate, place.room)
  return at ? { ...place, at, heightMm: plate.heightMm, atRack: false } : `${place.room.code}${plate.number} has no position in ${place.room.name}`
}

const pointOf = (plate: Plate, room: Room): Point | null => (plate.wall !== null ? wallPoint(room.outline, plate.wall, plate.alongMm ?? 0) : plate.at)

/** A rack stands on the floor; a device in it is as high as its lowest unit, the rack itself as its middle. */
function rackSpot(reader: JobReader, rackId: string, unit: number | null): EndSpot | string {
  const rack = reader.find('rack', rackId)
  if (!rack) return 'its rack is gone'
  const place = placed(reader, rack.roomId)
  if (typeof place === 'string') return place
  return { ...place, at: rack.at, heightMm: Math.round((unit ?? rack.units / 2) * rackUnitMm), atRack: true }
}

function placed(reader: JobReader, roomId: string | null): { room: Room; level: Level } | string {
  const room = reader.find('room', roomId)
  const level = reader.find('level', room?.levelId)
  return room && level ? { room, level } : 'its room is gone'
}
