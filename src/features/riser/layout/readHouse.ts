import type { Device } from '../../../../shared/model/device.ts'
import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Level, Plate, Rack, Room } from '../../../../shared/model/place.ts'
import type { StoreyKind } from './riserLayout.ts'
import { extentOf, platePoint, wallOf, type Side } from './wallSpot.ts'

/** Something in a room where runs come out: a plate, or a device that stands on its own. */
export interface Fixture {
  readonly key: string
  readonly plate: Plate | null
  readonly device: Device | null
  /** Across the room from west to east, 0 to 1. */
  readonly across: number
  /** Up the wall, 0 floor to 1 ceiling. */
  readonly up: number
  readonly side: Side | null
  readonly isOutside: boolean
}

export interface HouseRoom {
  readonly room: Room
  readonly isOutside: boolean
  readonly minX: number
  readonly maxX: number
  readonly centre: number
  readonly minY: number
  readonly maxY: number
  /** How far east it is drawn of where it is, mm. */
  readonly shift: number
  readonly fixtures: readonly Fixture[]
  readonly racks: readonly Rack[]
}

export interface Storey {
  readonly index: number
  readonly kind: StoreyKind
  /** The level it is drawn for first, then outside levels drawn beside it. */
  readonly levels: readonly Level[]
  readonly ceilingMm: number
  readonly rooms: readonly HouseRoom[]
}

/** What the section is made of: storeys from the lowest up, their rooms from west to east, and what hangs in them. */
export function readHouse(doc: JobDocument): Storey[] {
  const rooms = roomsByLevel(doc)
  const levels = recordsOf(doc, 'level').sort((a, b) => a.elevationMm - b.elevationMm || a.id.localeCompare(b.id))
  const inside = levels.filter((level) => level.use !== 'outside')
  const bands = inBands(inside.length ? inside : levels, rooms)
  if (!bands.some((band) => band.kind === 'full')) for (const band of bands) band.kind = 'full'
  for (const level of levels) if (!bands.some((band) => band.levels.includes(level))) nearest(bands, level).beside.push(level)
  return bands.map(({ kind, levels: own, beside }, index) => {
    const all = [...own, ...beside]
    const inAll = all.flatMap((each) => (rooms.get(each.id) ?? []).map((room) => (own.includes(each) ? room : { ...room, isOutside: true })))
    return {
      index,
      kind,
      levels: all,
      ceilingMm: Math.max(...own.map((level) => level.ceilingHeightMm)),
      rooms: inAll.sort((a, b) => a.centre - b.centre || a.room.code.localeCompare(b.room.code)),
    }
  })
}

interface Band {
  kind: StoreyKind
  readonly levels: Level[]
  readonly beside: Level[]
}

const nearlyLevel = 1500

/** Levels about as high as each other that do not lie over each other, such as a guest house, share a band. */
function inBands(levels: readonly Level[], rooms: Map<string, HouseRoom[]>): Band[] {
  const bands: Band[] = []
  for (const level of levels) {
    const own = rooms.get(level.id) ?? []
    const kind = kindOf(level, own)
    const band = bands.find((each) => kind === 'full' && each.kind === 'full' && each.levels[0]!.use === level.use && Math.abs(each.levels[0]!.elevationMm - level.elevationMm) < nearlyLevel && !lieOver(each.levels, own, rooms))
    if (!band) {
      bands.push({ kind, levels: [level], beside: [] })
      continue
    }
    rooms.set(level.id, setBeside(band.levels.flatMap((each) => rooms.get(each.id) ?? []), own))
    band.levels.push(level)
  }
  return bands
}

function lieOver(levels: readonly Level[], own: readonly HouseRoom[], rooms: ReadonlyMap<string, readonly HouseRoom[]>): boolean {
  const others = levels.flatMap((each) => rooms.get(each.id) ?? [])
  const slack = 300
  return !own.length || !others.length || own.some((room) => others.some((other) => room.minX < other.maxX - slack && other.minX < room.maxX - slack && room.minY < other.maxY - slack && other.minY < room.maxY - slack))
}

/** A building behind or before another is drawn beside it, on the side it lies to. */
function setBeside(others: readonly HouseRoom[], own: readonly HouseRoom[]): HouseRoom[] {
  const [west, east] = [Math.min(...others.map((room) => room.minX)), Math.max(...others.map((room) => room.maxX))]
  const [from, to] = [Math.min(...own.map((room) => room.minX)), Math.max(...own.map((room) => room.maxX))]
  if (from >= east - 300 || to <= west + 300) return [...own]
  const shift = (from + to) / 2 >= (west + east) / 2 ? east - from : west - to
  return own.map((room) => ({ ...room, minX: room.minX + shift, maxX: room.maxX + shift, centre: room.centre + shift, shift }))
}

/** An attic or crawl with a rack in it is drawn with bays like any other level. */
function kindOf(level: Level, rooms: readonly HouseRoom[]): StoreyKind {
  if (rooms.some((room) => room.racks.length)) return 'full'
  return level.use === 'attic' ? 'roof' : level.use === 'crawl' ? 'crawl' : 'full'
}

function nearest(bands: readonly Band[], level: Level): Band {
  const distance = (each: Band) => Math.abs(each.levels[0]!.elevationMm - level.elevationMm)
  return bands.filter((band) => band.kind === 'full').reduce((best, each) => (distance(each) < distance(best) ? each : best))
}

function roomsByLevel(doc: JobDocument): Map<string, HouseRoom[]> {
  const fixtures = new Map<string, Fixture[]>()
  const put = (roomId: string, fixture: Fixture) => fixtures.set(roomId, [...(fixtures.get(roomId) ?? []), fixture])
  for (const plate of doc.records.plate.values()) {
    const room = find(doc, 'room', plate.roomId)
    if (room) put(room.id, plateFixture(doc, plate, room))
  }
  for (const device of doc.records.device.values()) {
    const room = find(doc, 'room', device.roomId)
    if (room) put(room.id, deviceFixture(doc, device, room))
  }
  const byLevel = new Map<string, HouseRoom[]>()
  for (const room of doc.records.room.values()) {
    const { minX, maxX, minY, maxY } = extentOf(room)
    const own = (fixtures.get(room.id) ?? []).sort((a, b) => a.across - b.across || rank(a) - rank(b) || a.key.localeCompare(b.key))
    const racks = recordsOf(doc, 'rack').filter((rack) => rack.roomId === room.id).sort((a, b) => a.at.xMm - b.at.xMm || a.code.localeCompare(b.code))
    const entry = { room, minX, maxX, minY, maxY, shift: 0, centre: (minX + maxX) / 2, isOutside: isOutside(doc, room, own), fixtures: own, racks }
    byLevel.set(room.levelId, [...(byLevel.get(room.levelId) ?? []), entry])
  }
  return byLevel
}

const rank = (fixture: Fixture) => fixture.plate?.number ?? 1000

/** A room in the open: by its space class, or because all that hangs in it hangs outside. */
function isOutside(doc: JobDocument, room: Room, fixtures: readonly Fixture[]): boolean {
  const use = find(doc, 'level', room.levelId)?.use
  if (use === 'outside' || room.spaceClass === 'outdoor' || room.spaceClass === 'buried') return use !== 'attic' && use !== 'crawl'
  return use === 'living' && fixtures.length > 0 && fixtures.every((fixture) => fixture.plate?.mounting === 'outside')
}

const ceilingOf = (doc: JobDocument, room: Room) => room.ceilingHeightMm ?? find(doc, 'level', room.levelId)?.ceilingHeightMm ?? 2743

function plateFixture(doc: JobDocument, plate: Plate, room: Room): Fixture {
  const point = platePoint(plate, room)
  const side = plate.wall === null ? null : (wallOf(room, plate.wall)?.side ?? null)
  const up = plate.mounting === 'ceiling' ? 1 : plate.mounting === 'floor' ? 0 : plate.heightMm / ceilingOf(doc, room)
  const isOutside = plate.form === 'exterior-box' || plate.form === 'stub' || plate.mounting === 'outside'
  return { key: `plate:${plate.id}`, plate, device: null, across: share(room, point?.xMm), up: clamp01(up), side, isOutside }
}

function deviceFixture(doc: JobDocument, device: Device, room: Room): Fixture {
  const up = (device.heightMm ?? 1200) / ceilingOf(doc, room)
  return { key: `device:${device.id}`, plate: null, device, across: share(room, device.at?.xMm), up: clamp01(up), side: null, isOutside: false }
}

function share(room: Room, xMm: number | undefined): number {
  const { minX, maxX } = extentOf(room)
  return xMm === undefined || maxX === minX ? 0.5 : clamp01((xMm - minX) / (maxX - minX))
}
const clamp01 = (value: number) => Math.min(1, Math.max(0, value))
