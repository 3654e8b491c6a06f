import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { drawChases } from './chases.ts'
import { readColumns } from './columns.ts'
import { drawBays, drawCaptions } from './drawBays.ts'
import { drawRuns } from './drawRuns.ts'
import { drawCounts, drawFolds, drawTags } from './drawTags.ts'
import { glyphOf } from './glyphs.ts'
import { hang } from './hang.ts'
import { stackHeights } from './heights.ts'
import { drawHouse } from './house.ts'
import { orderLanes } from './lanes.ts'
import { crossersOf, localLanes } from './localLanes.ts'
import { placeEnds } from './placeEnds.ts'
import { placeRooms, type Placing } from './placeRooms.ts'
import { devicesByRack, drawRacks } from './rackFaces.ts'
import { readHouse, type Storey } from './readHouse.ts'
import { exitsOf, readTrips, type Exit, type Trip } from './readTrips.ts'
import type { Glyph, LayoutOptions, RiserLayout } from './riserLayout.ts'
import { seatStoreys } from './seatStoreys.ts'
import { fixturePlaces, onGable, readStrands, type FixturePlace } from './strands.ts'

/**
 * The section through the house: everything the riser draws, with its place. The same job gives the same drawing, whoever
 * looks. From left to right first (rooms, columns, slots), then lanes, then heights, then what hangs and runs between.
 */
export function layoutRiser(doc: JobDocument, options: LayoutOptions): RiserLayout {
  const storeys = readHouse(doc)
  if (!storeys.length) return emptyLayout([...doc.records.run.keys()])
  const trips = readTrips(doc, storeys)
  const columns = readColumns(doc, storeys, trips)
  const strands = readStrands(storeys, columns, trips)
  const places = fixturePlaces(storeys)
  const exits = exitsByFixture(trips)
  const glyphs = glyphsByFixture(doc, storeys)
  const crossers = crossersOf(storeys, columns.map((column) => column.planX), trips)
  const crossing = columns.map((column) => [...crossers.values()].filter((each) => each.column === column.index).length)
  const wants = { storeys, columns, strands, contents: { exits, glyphs }, mark: options.mark, crossers: crossing, apart: options.apart }
  const place = (extra: { left: number; right: number }) => {
    const placed = placeRooms({ ...wants, leftExtra: extra.left, rightExtra: extra.right })
    placeEnds(storeys, columns, exits, placed)
    return placed
  }
  const first = place({ left: 0, right: 0 })
  const beside = overhang([...places.values()].filter(onGable), first)
  const placing = beside.left || beside.right ? place(beside) : first
  const lanes = orderLanes(strands, placing, storeys.length, options.apart)
  const { locals, depths } = localLanes(storeys, trips, placing, crossers)
  const seats = seatStoreys(storeys, placing, lanes, locals, places, options.mark)
  const rackDevices = devicesByRack(doc)
  const heights = stackHeights({ storeys, placing, trunks: lanes.heights, locals: depths, seats, rackUnits: new Map([...rackDevices].map(([id, devices]) => [id, devices.length])) })
  const hanging = hang(doc, places, exits, placing, heights)
  const racks = drawRacks(doc, columns, placing, heights, rackDevices)
  const drawn = { doc, heights, hanging, racks: new Map(racks.map((box) => [box.rack.id, box])), exits }
  return {
    width: Math.ceil(placing.width),
    height: Math.ceil(heights.height),
    isLarge: placing.isLarge,
    house: drawHouse(heights, placing.bays, Math.ceil(placing.width)),
    storeys: heights.storeys,
    captions: drawCaptions(storeys, heights, placing.isLarge ? 108 : 62),
    bays: drawBays(placing, heights),
    plates: hanging.plates,
    devices: hanging.devices,
    racks,
    chases: drawChases(storeys, columns, placing, heights, lanes, locals),
    runs: drawRuns(drawn, lanes, locals),
    ...drawTags(seats, heights, depths),
    folds: drawFolds(seats, heights, roomsOfRuns(doc, trips, places), depths),
    counts: drawCounts(lanes, heights, placing),
    tray: trips.filter((trip) => trip.kind === 'tray').map((trip) => trip.run.id),
  }
}

/** How much wider the drawing must be for what hangs on the end walls and its tags. */
function overhang(gable: readonly FixturePlace[], placing: Placing): { left: number; right: number } {
  const xs = gable.map((place) => placing.centres.get(place.fixture.key) ?? 0)
  const tag = 64
  const left = Math.max(0, ...xs.map((x) => 16 + tag - x))
  const right = Math.max(0, ...gable.flatMap((place, index) => (place.fixture.side === 'E' ? [xs[index]! - placing.edges[place.storey.index]!.x1 + tag] : [])))
  return { left, right: placing.width - Math.max(0, ...xs) < tag ? right : 0 }
}

/** Exits of each fixture in the order of its jacks. */
function exitsByFixture(trips: readonly Trip[]): Map<string, Exit[]> {
  const byKey = new Map<string, Exit[]>()
  for (const trip of trips) for (const exit of exitsOf(trip)) byKey.set(exit.key, [...(byKey.get(exit.key) ?? []), exit])
  for (const exits of byKey.values()) exits.sort((a, b) => a.jack - b.jack)
  return byKey
}

function glyphsByFixture(doc: JobDocument, storeys: readonly Storey[]): Map<string, Glyph | null> {
  const atPlate = new Map([...doc.records.device.values()].sort((a, b) => b.id.localeCompare(a.id)).flatMap((device) => (device.plateId ? [[device.plateId, device] as const] : [])))
  return new Map(
    storeys.flatMap((storey) =>
      storey.rooms.flatMap((room) =>
        room.fixtures.map(({ key, plate, device }) => {
          const own = device ?? (plate && atPlate.get(plate.id))
          return [key, own ? glyphOf(doc, own, plate) : null] as const
        }),
      ),
    ),
  )
}

/** The room in which each run comes out; a run from rack to rack, and one that ends nowhere yet, belong to the rack's room. */
function roomsOfRuns(doc: JobDocument, trips: readonly Trip[], places: ReadonlyMap<string, FixturePlace>): Map<string, string> {
  const rooms = new Map<string, string>()
  for (const trip of trips) {
    const exit = exitsOf(trip).at(-1)
    const rackId = trip.kind === 'racks' ? trip.toRackId : trip.kind === 'loose-rack' ? trip.rackId : null
    const roomId = exit ? places.get(exit.key)?.room.room.id : find(doc, 'rack', rackId)?.roomId
    if (roomId) rooms.set(trip.run.id, roomId)
  }
  return rooms
}

const emptyLayout = (tray: string[]): RiserLayout => ({
  width: 960, height: 600, isLarge: false, house: { ground: '', groundLine: '', earth: '', body: '', voids: [], slabs: '', posts: '', joists: '' },
  storeys: [], captions: [], bays: [], plates: [], devices: [], racks: [], chases: [], runs: [], tags: [], closeTags: [], folds: [], counts: [], tray,
})
