import { recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Pathway, Rack } from '../../../../shared/model/place.ts'
import type { Storey } from './readHouse.ts'
import type { Trip } from './readTrips.ts'

export interface ColumnRack {
  readonly rack: Rack
  readonly storey: number
}

/** A place where runs go up and down through the house: the racks of one room, and the chases nearest to them. */
export interface Column {
  readonly index: number
  readonly planX: number
  readonly racks: readonly ColumnRack[]
  readonly pathways: readonly Pathway[]
}

const near = 3000

/**
 * The columns of the section, from west to east: one for each room with racks; where there is no rack, one for each
 * place with chases; and where runs change levels all the same, one in the middle.
 */
export function readColumns(doc: JobDocument, storeys: readonly Storey[], trips: readonly Trip[]): Column[] {
  const groups: { planX: number; racks: ColumnRack[]; pathways: Pathway[] }[] = []
  for (const storey of storeys)
    for (const room of storey.rooms)
      if (room.racks.length) groups.push({ planX: mean(room.racks.map((rack) => rack.at.xMm)) + room.shift, racks: room.racks.map((rack) => ({ rack, storey: storey.index })), pathways: [] })
  const pathways = recordsOf(doc, 'pathway').sort((a, b) => a.at.xMm - b.at.xMm || a.id.localeCompare(b.id))
  const hasRack = groups.length > 0
  for (const pathway of pathways) {
    const distance = (group: { planX: number }) => Math.abs(group.planX - pathway.at.xMm)
    const best = groups.reduce<(typeof groups)[number] | undefined>((least, each) => (!least || distance(each) < distance(least) ? each : least), undefined)
    if (best && (hasRack || distance(best) < near)) best.pathways.push(pathway)
    else groups.push({ planX: pathway.at.xMm, racks: [], pathways: [pathway] })
  }
  if (!groups.length && changesLevels(storeys, trips)) groups.push({ planX: middle(storeys), racks: [], pathways: [] })
  return groups.sort((a, b) => a.planX - b.planX).map((group, index) => ({ index, ...group }))
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / Math.max(1, values.length)

function middle(storeys: readonly Storey[]): number {
  const rooms = storeys.flatMap((storey) => storey.rooms)
  return (Math.min(...rooms.map((room) => room.minX)) + Math.max(...rooms.map((room) => room.maxX))) / 2
}

/** Which storey a fixture is in, by its key. */
export function storeyOfFixtures(storeys: readonly Storey[]): Map<string, number> {
  return new Map(storeys.flatMap((storey) => storey.rooms.flatMap((room) => room.fixtures.map((fixture) => [fixture.key, storey.index] as const))))
}

function changesLevels(storeys: readonly Storey[], trips: readonly Trip[]): boolean {
  const storeyOf = storeyOfFixtures(storeys)
  return trips.some((trip) => trip.kind === 'between' && storeyOf.get(trip.from.key) !== storeyOf.get(trip.to.key))
}
