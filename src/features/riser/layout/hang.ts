import type { Device } from '../../../../shared/model/device.ts'
import type { JobDocument } from '../../../../shared/model/jobDocument.ts'
import { plateCode } from '../../../../shared/model/naming.ts'
import type { Plate } from '../../../../shared/model/place.ts'
import { glyphOf, glyphSize } from './glyphs.ts'
import type { Heights } from './heights.ts'
import { metrics, monoWidth } from './metrics.ts'
import type { PlacedBay, Placing } from './placeRooms.ts'
import type { Box, DeviceSpot, Glyph, PlateSpot, StoreyBox } from './riserLayout.ts'
import type { Exit } from './readTrips.ts'
import { onGable, type FixturePlace } from './strands.ts'

/** Size of a plate's face at full size, in the units of the plate drawing. */
export function faceSize(plate: Plate): { w: number; h: number } {
  if (plate.form === 'ceiling-opening') return { w: 56, h: 56 }
  if (plate.form === 'exterior-box' || plate.form === 'stub') return { w: 48, h: 62 }
  return { w: 44 + 32 * (plate.gangs - 1), h: 70 }
}

/** Where runs enter what hangs somewhere: its middle, top and bottom. */
export interface Hung extends Box {
  readonly key: string
}

export interface Hanging {
  readonly plates: readonly PlateSpot[]
  readonly devices: readonly DeviceSpot[]
  readonly hung: ReadonlyMap<string, Hung>
}

const codeFont = 8.5
const headroom = 3
const foot = 33
const nameRoom = 17

interface Piece {
  readonly place: FixturePlace
  readonly w: number
  readonly h: number
  readonly glyphs: readonly { readonly device: Device; readonly glyph: Glyph; readonly above: boolean }[]
  readonly x: number
  readonly code: string
  readonly runs: number
  readonly isDense: boolean
}

/** Hangs plates and devices at their heights; where two would cover each other, the later one moves up or down a little. */
export function hang(doc: JobDocument, places: ReadonlyMap<string, FixturePlace>, exits: ReadonlyMap<string, readonly Exit[]>, placing: Placing, heights: Heights): Hanging {
  const plates: PlateSpot[] = []
  const devices: DeviceSpot[] = []
  const hung = new Map<string, Hung>()
  const atPlate = devicesByPlate(doc)
  const keep = (piece: Piece, y: number) => {
    const spots = drawPiece(piece, y, heights)
    if (spots.plate) plates.push(spots.plate)
    devices.push(...spots.devices)
    hung.set(piece.place.fixture.key, { key: piece.place.fixture.key, x: piece.x - piece.w / 2, y: y - piece.h / 2, w: piece.w, h: piece.h })
  }
  const bays = new Map(placing.bays.map((bay) => [bay.room.room.id, bay]))
  const gableCount = new Map<string, number>()
  const taken = new Map<string, Box[]>()
  for (const place of places.values()) {
    const piece = pieceOf(doc, place, exits, placing, atPlate, heights)
    const box = heights.storeys[place.storey.index]!
    const bay = bays.get(place.room.room.id)
    if (bay) keep(piece, seatIn(piece, box, bay, taken))
    else keep(piece, endHeight(piece, heights, placing, gableCount))
  }
  return { plates, devices, hung }
}

function devicesByPlate(doc: JobDocument): Map<string, Device[]> {
  const byPlate = new Map<string, Device[]>()
  for (const device of [...doc.records.device.values()].sort((a, b) => a.id.localeCompare(b.id))) if (device.plateId) byPlate.set(device.plateId, [...(byPlate.get(device.plateId) ?? []), device])
  return byPlate
}

function pieceOf(doc: JobDocument, place: FixturePlace, exits: ReadonlyMap<string, readonly Exit[]>, placing: Placing, atPlate: ReadonlyMap<string, readonly Device[]>, heights: Heights): Piece {
  const { plate, device, key } = place.fixture
  const isDense = heights.storeys[place.storey.index]!.folded
  const x = placing.centres.get(key) ?? 0
  if (!plate) {
    const glyph = (device && glyphOf(doc, device, null)) ?? 'service'
    const [w, h] = glyphSize(glyph)
    return { place, w, h, glyphs: [], x, code: '', runs: 0, isDense }
  }
  const face = faceSize(plate)
  const scale = scaleOf(plate, isDense)
  const pictures = (atPlate.get(plate.id) ?? []).flatMap((each) => {
    const glyph = glyphOf(doc, each, plate)
    return glyph ? [{ device: each, glyph, above: glyphSize(glyph)[2] === 'above' }] : []
  })
  const glyphs = isDense ? [] : [pictures.find((each) => each.above), pictures.find((each) => !each.above)].filter((each) => each !== undefined)
  return { place, w: face.w * scale, h: face.h * scale, glyphs: glyphs.slice(0, 1), x, code: plateCode(doc, plate), runs: exits.get(key)?.length ?? 0, isDense }
}

const scaleOf = (plate: Plate, isDense: boolean) => (isDense ? metrics.densePlateScale : plate.form === 'ceiling-opening' ? metrics.ceilingScale : metrics.plateScale)

/** Height in a bay: where it is on the wall, moved until nothing covers it. */
function seatIn(piece: Piece, box: StoreyBox, bay: PlacedBay, taken: Map<string, Box[]>): number {
  const { fixture } = piece.place
  // The name of a room with a rack stands at the head of its bay.
  const ceiling = box.ceiling + (piece.place.room.racks.length ? nameRoom : 0)
  const top = ceiling + headroom + piece.h / 2
  const { over, under } = extentOf(piece)
  const bottom = Math.max(top, box.floor - foot - under)
  const highest = Math.min(bottom, ceiling + headroom + over)
  const isUp = fixture.plate?.mounting === 'ceiling' || fixture.up > 0.97
  const wanted = isUp ? top : Math.min(bottom, Math.max(highest, bottom - fixture.up * (bottom - top)))
  const others = taken.get(bay.room.room.id) ?? []
  let best = { y: wanted, overlap: Infinity }
  for (const y of candidates(wanted, highest, bottom)) {
    const overlap = overlapOf(boxesOf(piece, y), others)
    if (overlap < best.overlap) best = { y, overlap }
    if (overlap === 0) break
  }
  const y = Math.round(best.y * 10) / 10
  taken.set(bay.room.room.id, [...others, ...boxesOf(piece, y)])
  return y
}

function candidates(wanted: number, top: number, bottom: number): number[] {
  const found = [wanted]
  for (let off = 5; off < bottom - top + 5; off += 5) for (const y of [wanted + off, wanted - off]) if (y >= top - 0.5 && y <= bottom + 0.5) found.push(y)
  return found
}

/** How much of some boxes is covered by others, in square units. */
function overlapOf(own: readonly Box[], others: readonly Box[]): number {
  let area = 0
  for (const a of own)
    for (const b of others) {
      const w = Math.min(a.x + a.w, b.x + b.w) - Math.max(a.x, b.x)
      const h = Math.min(a.y + a.h, b.y + b.h) - Math.max(a.y, b.y)
      if (w > 0.3 && h > 0.3) area += w * h
    }
  return area
}

/** What a plate covers at a height: its face, its code, and its device. */
function boxesOf(piece: Piece, y: number): Box[] {
  const boxes: Box[] = [{ x: piece.x - piece.w / 2, y: y - piece.h / 2, w: piece.w, h: piece.h + 1 }]
  const codeWidth = piece.code && !piece.isDense ? monoWidth(piece.code, codeFont) : 0
  if (codeWidth) boxes.push({ x: piece.x - codeWidth / 2, y: y + piece.h / 2 + 2.5, w: codeWidth, h: 9.5 })
  for (const { glyph } of piece.glyphs) {
    const [w, h, place] = glyphSize(glyph, piece.runs)
    if (place === 'above') boxes.push({ x: piece.x - w / 2, y: y - piece.h / 2 - 7 - h, w, h })
    else if (place === 'beside') boxes.push({ x: piece.x + piece.w / 2, y: y - h / 2, w, h })
    else boxes.push({ x: piece.x - w / 2, y: y + piece.h / 2 + 12, w, h: h + 3 })
  }
  return boxes
}

/** How far above and below its middle a plate reaches with all that belongs to it. */
function extentOf(piece: Piece): { over: number; under: number } {
  const boxes = boxesOf(piece, 0)
  return { over: -Math.min(...boxes.map((box) => box.y)), under: Math.max(...boxes.map((box) => box.y + box.h)) }
}

/** Under the roof, in the crawl and on the end walls. */
function endHeight(piece: Piece, heights: Heights, placing: Placing, gables: Map<string, number>): number {
  const { storey, fixture } = piece.place
  const box = heights.storeys[storey.index]!
  const top = heights.storeys[placing.bays.length ? topFull(heights) : storey.index] ?? box
  if (storey.kind === 'roof' && onGable(piece.place)) {
    const key = `${fixture.side}`
    const index = gables.get(key) ?? 0
    gables.set(key, index + 1)
    return top.trunk + 26 + index * 6
  }
  if (storey.kind === 'roof') return heights.eave - 8 - piece.h / 2
  return onGable(piece.place) ? box.floor - 8 - piece.h / 2 : box.floor - 12 - piece.h / 2
}

const topFull = (heights: Heights) => heights.storeys.findLastIndex((storey) => storey.kind === 'full')

function drawPiece(piece: Piece, y: number, heights: Heights): { plate: PlateSpot | null; devices: DeviceSpot[] } {
  const { fixture, storey } = piece.place
  const { plate, device } = fixture
  if (!plate) return { plate: null, devices: device ? [{ device, glyph: 'dome', mirrored: false, cord: null, x: piece.x - piece.w / 2, y: y - piece.h / 2, w: piece.w, h: piece.h }] : [] }
  const scale = scaleOf(plate, piece.isDense)
  const facing = fixture.isOutside ? (fixture.side === 'W' ? 'left' : 'right') : null
  const atMast = piece.glyphs.some((each) => each.glyph === 'mast')
  const codeAt = atMast
    ? ({ x: piece.x + 12, y: y + 3, anchor: 'start' } as const)
    : ({ x: piece.x, y: y + piece.h / 2 + 10, anchor: 'middle' } as const)
  const spot: PlateSpot = { plate, code: piece.code, storey: storey.index, scale, x: piece.x, y, w: piece.w, h: piece.h, codeAt, dense: piece.isDense, facing }
  return { plate: spot, devices: piece.glyphs.map((each) => drawGlyph(each, piece, y, facing, heights)) }
}

function drawGlyph({ device, glyph, above }: Piece['glyphs'][number], piece: Piece, y: number, facing: 'left' | 'right' | null, heights: Heights): DeviceSpot {
  const [w, h, place] = glyphSize(glyph, piece.runs)
  const half = piece.h / 2
  const base = { device, glyph, mirrored: facing === 'left', w, h }
  if (place === 'beside') return { ...base, x: facing === 'left' ? piece.x - piece.w / 2 - w : piece.x + piece.w / 2, y: y - h / 2, cord: null }
  if (glyph === 'mast') return { ...base, x: piece.x - w / 2, y: Math.min(y - half - h, heights.apex - 4), h: Math.max(h, y - half - heights.apex + 4), cord: null }
  if (above) return { ...base, x: piece.x - w / 2, y: y - half - 7 - h, cord: null }
  return { ...base, x: piece.x - w / 2, y: y + half + 14, cord: glyph === 'shade' || glyph === 'screen' || glyph === 'contact' ? null : [piece.x, y + half + 11.5, y + half + 14] }
}
