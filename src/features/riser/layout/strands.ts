import type { Column } from './columns.ts'
import type { Fixture, HouseRoom, Storey } from './readHouse.ts'
import type { Exit, Trip } from './readTrips.ts'

/** A run on its way out of a rack: by which trunk, on which side, and how it leaves that trunk. */
export interface Strand {
  readonly trip: Trip
  readonly rackId: string
  readonly column: number
  readonly rackStorey: number
  /** The storey whose trunk it takes. */
  readonly corridor: number
  readonly up: boolean
  readonly side: 'left' | 'right'
  /** down: into a bay. up: into the roof. gable: down on the outside. rack: down onto another rack. loose: nowhere yet. */
  readonly leaves: 'down' | 'up' | 'gable' | 'rack' | 'loose'
  readonly exit: Exit | null
}

export interface FixturePlace {
  readonly storey: Storey
  readonly room: HouseRoom
  readonly fixture: Fixture
}

/** Every fixture of the house by its key. */
export function fixturePlaces(storeys: readonly Storey[]): Map<string, FixturePlace> {
  const places = new Map<string, FixturePlace>()
  for (const storey of storeys) for (const room of storey.rooms) for (const fixture of room.fixtures) places.set(fixture.key, { storey, room, fixture })
  return places
}

/** The storey whose trunk serves another: an attic hangs on the ceiling of the level under it. */
export function corridorOf(storeys: readonly Storey[], storey: Storey): number {
  if (storey.kind !== 'roof') return storey.index
  for (let index = storey.index - 1; index >= 0; index--) if (storeys[index]!.kind === 'full') return index
  return storeys.find((each) => each.kind === 'full')?.index ?? storey.index
}

/** Whether a fixture hangs on the end wall of the house, under the roof or beside the foundation. */
export const onGable = ({ storey, fixture }: FixturePlace): boolean =>
  storey.kind !== 'full' && fixture.isOutside && (fixture.side === 'E' || fixture.side === 'W')

const planX = ({ room, fixture }: FixturePlace) =>
  fixture.isOutside && fixture.side === 'W' ? room.minX : fixture.isOutside && fixture.side === 'E' ? room.maxX : room.minX + fixture.across * (room.maxX - room.minX)

/** All runs that come out of racks, as strands. */
export function readStrands(storeys: readonly Storey[], columns: readonly Column[], trips: readonly Trip[]): Strand[] {
  const places = fixturePlaces(storeys)
  const homes = new Map(columns.flatMap((column) => column.racks.map((rack, order) => [rack.rack.id, { column, storey: rack.storey, order }] as const)))
  const strands: Strand[] = []
  for (const trip of trips) {
    if (trip.kind !== 'home' && trip.kind !== 'racks' && trip.kind !== 'loose-rack') continue
    const home = homes.get(trip.rackId)!
    const base = { trip, rackId: trip.rackId, column: home.column.index, rackStorey: home.storey }
    if (trip.kind === 'loose-rack') strands.push({ ...base, corridor: home.storey, up: true, side: 'right', leaves: 'loose', exit: null })
    else if (trip.kind === 'racks') {
      const target = homes.get(trip.toRackId)!
      const isRight = target.column.index > home.column.index || (target.column === home.column && target.order >= home.order)
      strands.push({ ...base, corridor: target.storey, up: target.storey >= home.storey, side: isRight ? 'right' : 'left', leaves: 'rack', exit: null })
    } else {
      const place = places.get(trip.to.key)!
      const corridor = corridorOf(storeys, place.storey)
      const isLeft = place.room.racks.length > 0 || (place.storey.kind === 'full' ? place.room.centre : planX(place)) < home.column.planX
      const leaves = onGable(place) && place.storey.kind === 'roof' ? 'gable' : place.storey.kind === 'roof' ? 'up' : 'down'
      strands.push({ ...base, corridor, up: corridor >= home.storey, side: isLeft ? 'left' : 'right', leaves, exit: trip.to })
    }
  }
  return strands
}
