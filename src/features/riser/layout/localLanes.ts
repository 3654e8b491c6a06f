import { metrics } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { Exit, Trip } from './readTrips.ts'
import { corridorOf, fixturePlaces } from './strands.ts'

/** One stretch of a run that never sees a rack, under the trunk of a storey. */
export interface LocalLeg {
  readonly corridor: number
  readonly from: number
  readonly to: number
  /** How far under the lowest trunk lane. */
  readonly under: number
}

/** A run from plate to plate, or from a plate to nowhere yet. */
export interface LocalTrip {
  readonly trip: Trip
  readonly exits: readonly { readonly exit: Exit; readonly x: number; readonly corridor: number }[]
  readonly legs: readonly LocalLeg[]
  /** Where it changes levels. */
  readonly cross: number | null
}

const looseReach = 16

/** Which column each run takes that changes levels without a rack: the nearest. By trip, with its order there. */
export function crossersOf(storeys: readonly Storey[], planXs: readonly number[], trips: readonly Trip[]): Map<Trip, { column: number; order: number }> {
  const places = fixturePlaces(storeys)
  const counts = planXs.map(() => 0)
  const crossers = new Map<Trip, { column: number; order: number }>()
  for (const trip of trips) {
    if (trip.kind !== 'between') continue
    const a = places.get(trip.from.key)!
    const b = places.get(trip.to.key)!
    if (corridorOf(storeys, a.storey) === corridorOf(storeys, b.storey)) continue
    const middle = (a.room.centre + b.room.centre) / 2
    const column = planXs.reduce((best, planX, index) => (Math.abs(planX - middle) < Math.abs(planXs[best]! - middle) ? index : best), 0)
    crossers.set(trip, { column, order: counts[column]!++ })
  }
  return crossers
}

/** Lanes for runs from plate to plate, just under the trunk, each storey's as few as will do without two in one place. */
export function localLanes(storeys: readonly Storey[], trips: readonly Trip[], placing: Placing, crossers: ReadonlyMap<Trip, { column: number; order: number }>): { locals: LocalTrip[]; depths: number[] } {
  const places = fixturePlaces(storeys)
  const rows: { from: number; to: number }[][][] = storeys.map(() => [])
  const legOf = (corridor: number, a: number, b: number): LocalLeg => {
    const [from, to] = a < b ? [a, b] : [b, a]
    const own = rows[corridor]!
    let row = own.findIndex((taken) => !taken.some((each) => each.from < to + 2 && each.to > from - 2))
    if (row < 0) row = own.push([]) - 1
    own[row]!.push({ from, to })
    return { corridor, from: a, to: b, under: 4 + row * metrics.localLane }
  }
  const locals = trips.flatMap((trip): LocalTrip[] => {
    if (trip.kind !== 'between' && trip.kind !== 'loose-plate') return []
    const exits = (trip.kind === 'between' ? [trip.from, trip.to] : [trip.to]).map((exit) => ({ exit, x: placing.slots.get(exit) ?? 0, corridor: corridorOf(storeys, places.get(exit.key)!.storey) }))
    const [first, second] = exits
    if (!second) return [{ trip, exits, legs: [legOf(first!.corridor, first!.x, first!.x + looseReach)], cross: null }]
    const crosser = crossers.get(trip)
    if (!crosser) return [{ trip, exits, legs: [legOf(first!.corridor, first!.x, second.x)], cross: null }]
    const cross = placing.columns[crosser.column]! + placing.bands[crosser.column]!.rackWidth / 2 + 6 + crosser.order * metrics.localLane
    return [{ trip, exits, legs: [legOf(first!.corridor, first!.x, cross), legOf(second.corridor, cross, second.x)], cross }]
  })
  return { locals, depths: rows.map((own) => (own.length ? 4 + own.length * metrics.localLane : 0)) }
}
