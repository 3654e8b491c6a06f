import { bandsOf, reach, type ColumnBands } from './bands.ts'
import type { Column } from './columns.ts'
import { outerWidths, solveColumns, wall, widthOf, type Row } from './columnSpacing.ts'
import { metrics } from './metrics.ts'
import type { HouseRoom, Storey } from './readHouse.ts'
import type { Exit } from './readTrips.ts'
import { roomNeed, spreadRoom, type Contents, type RoomNeed } from './roomWidths.ts'
import type { RunMark } from './riserLayout.ts'
import type { Strand } from './strands.ts'
import { seatTags, tagRows, type TagWish } from './tagRows.ts'

export interface PlacedBay {
  readonly room: HouseRoom
  readonly storey: number
  readonly x0: number
  readonly x1: number
}

/** The section from left to right. */
export interface Placing {
  readonly bays: readonly PlacedBay[]
  readonly slots: Map<Exit, number>
  /** Middle of each fixture. */
  readonly centres: Map<string, number>
  /** Middle of each column. */
  readonly columns: readonly number[]
  readonly bands: readonly ColumnBands[]
  /** What a column takes on each storey. */
  readonly gaps: readonly (readonly { readonly x0: number; readonly x1: number }[])[]
  /** Edges of the building on each storey. */
  readonly edges: readonly { readonly x0: number; readonly x1: number }[]
  readonly folded: readonly boolean[]
  /** So many runs that everything is drawn to be looked at from farther away. */
  readonly isLarge: boolean
  readonly width: number
}

interface Wants {
  readonly storeys: readonly Storey[]
  readonly columns: readonly Column[]
  readonly strands: readonly Strand[]
  readonly contents: Contents
  readonly mark: (runId: string) => RunMark | undefined
  readonly crossers: readonly number[]
  readonly apart: boolean
  /** Space beside the house for what hangs on its end walls. */
  readonly leftExtra: number
  readonly rightExtra: number
}

export function placeRooms(wants: Wants): Placing {
  const { storeys, columns, strands, apart } = wants
  const bands = columns.map((column) => bandsOf(column, strands.filter((strand) => strand.column === column.index), wants.crossers[column.index] ?? 0, apart))
  const reaches = storeys.map((storey) => columns.map((column, index) => reach(column, bands[index]!, strands, storey.index, storey.kind === 'full' && storeys.length > 1)))
  const loads = storeys.map((storey) => exitsIn(storey, wants.contents))
  const isLarge = loads.reduce((sum, load) => sum + load, 0) > metrics.largeJob
  const folded = loads.map((load) => load > (isLarge ? metrics.foldOverInLarge : metrics.foldOver))
  const parts = reaches.map((row) => columns.filter((column) => row[column.index]!.left + row[column.index]!.right > 0).map((column) => column.index))
  const rows = storeys.map((storey, index) => (storey.kind === 'full' ? rowOf(storey, wants, bands, parts[index]!, folded[index]!) : { parts: [], inside: [], outsideLeft: [], outsideRight: [] }))
  const outer = outerWidths(storeys, rows, columns)
  const left = (isLarge ? metrics.margin.leftLarge : metrics.margin.left) + wants.leftExtra
  const centres = solveColumns(rows, reaches, outer, columns.length, left)
  const placing = { bays: [] as PlacedBay[], slots: new Map<Exit, number>(), centres: new Map<string, number>() }
  const own = rows.map((row, index) => (hasRooms(row) ? placeRow(row, storeys[index]!, { centres, reaches: reaches[index]!, outer: outer[index]!, left }, placing) : null))
  const edges = own.map((edge, index) => edge ?? nearestEdge(own, index) ?? { x0: left, x1: left + 320 })
  const width = Math.max(...placing.bays.map((bay) => bay.x1), ...edges.map((edge) => edge.x1 + wants.rightExtra), left + 320) + wall + metrics.margin.right
  const gaps = reaches.map((row) => row.map((each, index) => ({ x0: centres[index]! - each.left, x1: centres[index]! + each.right })))
  return { ...placing, columns: centres, bands, gaps, edges, folded, isLarge, width }
}

const hasRooms = (row: Row) => row.inside.some((needs) => needs.length > 0)

/** A storey without bays is as wide as the nearest that has some. */
function nearestEdge(edges: readonly ({ x0: number; x1: number } | null)[], index: number): { x0: number; x1: number } | null {
  const found = edges.flatMap((edge, at) => (edge ? [{ edge, distance: Math.abs(at - index) }] : []))
  return found.sort((a, b) => a.distance - b.distance)[0]?.edge ?? null
}

const exitsIn = (storey: Storey, contents: Contents) => storey.rooms.reduce((sum, room) => sum + room.fixtures.reduce((own, fixture) => own + (contents.exits.get(fixture.key)?.length ?? 0), 0), 0)

/** The rooms of a storey, split at the columns, each with the width it needs. */
function rowOf(storey: Storey, wants: Wants, bands: readonly ColumnBands[], parts: readonly number[], isDense: boolean): Row {
  const indoors = storey.rooms.filter((room) => !room.isOutside || room.racks.length)
  const house = indoors.length ? indoors : storey.rooms
  const middle = house.reduce((sum, room) => sum + room.centre, 0) / Math.max(1, house.length)
  const beside = storey.rooms.filter((room) => !house.includes(room))
  const columnOf = (room: HouseRoom) => wants.columns.find((column) => room.racks.length > 0 && column.racks.some((rack) => rack.rack.roomId === room.room.id))
  const segmentOf = (room: HouseRoom) => {
    const own = columnOf(room)
    return own ? parts.indexOf(own.index) : parts.filter((index) => wants.columns[index]!.planX <= room.centre).length
  }
  const need = (room: HouseRoom) => {
    const column = columnOf(room)
    return (pitch: number) => roomNeed(room, wants.contents, pitch, isDense, column ? bands[column.index]!.rackWidth : 0)
  }
  const segments = Array.from({ length: parts.length + 1 }, (_, index) =>
    house.filter((room) => segmentOf(room) === index).sort((a, b) => Number(a.racks.length > 0) - Number(b.racks.length > 0) || a.centre - b.centre),
  )
  const west = beside.filter((room) => room.centre < middle)
  const east = beside.filter((room) => room.centre >= middle)
  const inside = segments.map((rooms, index) => {
    const all = [...(index === 0 ? west : []), ...rooms, ...(index === parts.length ? east : [])]
    return fitPitch(all.map(need), wants.mark, isDense, tagRows(wants.storeys, wants.strands.length))
  })
  const of = (rooms: readonly HouseRoom[]) => inside.map((needs) => needs.filter((each) => rooms.includes(each.room)))
  return { parts, inside: of(house), outsideLeft: of(west).flat(), outsideRight: of(east).flat() }
}

/** Widens rooms of a stretch, each no more than it must, until all its tags find a seat. */
function fitPitch(needs: readonly ((pitch: number) => RoomNeed)[], mark: Wants['mark'], isDense: boolean, rows: number): RoomNeed[] {
  if (isDense) return needs.map((need) => need(metrics.densePitch))
  const pitches = needs.map((): number => (metrics.slotPitch * metrics.tag.rows) / rows)
  for (let tries = 0; ; tries++) {
    const tried = needs.map((need, index) => need(pitches[index]!))
    const wishes: (TagWish & { index: number })[] = []
    let at = 0
    tried.forEach((need, index) => {
      const slots = new Map<Exit, number>()
      spreadRoom(need, at, (at += need.width), slots, new Map())
      for (const [{ runId }, x] of slots) {
        const text = mark(runId)
        if (text) wishes.push({ runId, x, ...text, index })
      }
    })
    const { over } = seatTags(wishes, rows, { left: 0, right: at + 2 })
    if (!over.length || tries > 60) return tried
    const tight = new Set(over.map((wish) => wish.index))
    for (const index of tight) pitches[index]! *= 1.04
  }
}

interface RowSpace {
  readonly centres: readonly number[]
  readonly reaches: readonly { left: number; right: number }[]
  readonly outer: { left: number; right: number }
  readonly left: number
}

/** Lays the rooms of a storey out between its columns; returns the edges of the building there. */
function placeRow(row: Row, storey: Storey, space: RowSpace, placing: { bays: PlacedBay[]; slots: Map<Exit, number>; centres: Map<string, number> }): { x0: number; x1: number } {
  const { centres, reaches, outer } = space
  const lay = (needs: readonly RoomNeed[], from: number, to: number) => {
    const spare = Math.max(0, to - from - widthOf(needs))
    const weight = needs.reduce((sum, need) => sum + need.room.maxX - need.room.minX, 0) || 1
    let at = from
    for (const need of needs) {
      const width = need.width + (spare * (need.room.maxX - need.room.minX)) / weight
      const x1 = at + width + need.rackWidth + (need.rackWidth ? 5 : 0)
      spreadRoom(need, at, at + width, placing.slots, placing.centres)
      placing.bays.push({ room: need.room, storey: storey.index, x0: at, x1 })
      at += width
    }
  }
  let x0 = Infinity
  let x1 = -Infinity
  row.inside.forEach((needs, segment) => {
    const [west, east] = [row.parts[segment - 1], row.parts[segment]]
    const before = west === undefined ? null : centres[west]! + reaches[west]!.right
    const after = east === undefined ? null : centres[east]! - reaches[east]!.left
    const from = before ?? (after === null ? space.left + wall + widthOf(row.outsideLeft) : after - (outer.left || widthOf(needs)))
    const to = after ?? from + (outer.right || widthOf(needs))
    lay(needs, from, to)
    x0 = Math.min(x0, from)
    x1 = Math.max(x1, to)
  })
  const edge = { x0: x0 - wall, x1: x1 + wall }
  lay(row.outsideLeft, edge.x0 - widthOf(row.outsideLeft), edge.x0)
  lay(row.outsideRight, edge.x1, edge.x1 + widthOf(row.outsideRight))
  return edge
}
