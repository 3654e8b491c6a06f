import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Run, RunEnd } from '../../../../shared/model/run.ts'
import type { Storey } from './readHouse.ts'

/** Where an end of a run is on the drawing. */
export type Spot =
  | { readonly at: 'rack'; readonly rackId: string; readonly deviceId: string | null }
  | { readonly at: 'fixture'; readonly key: string; readonly jack: number }

/** One end that comes out of the trunk somewhere: a place of its own on the way along it. */
export interface Exit {
  readonly runId: string
  readonly key: string
  /** Order among the jacks of its plate. */
  readonly jack: number
}

/**
 * A run as a way to draw. home: from a rack to a plate, a device, or another rack. between: from plate to plate.
 * loose: one end has no place yet. tray: neither has.
 */
export type Trip =
  | { readonly kind: 'home'; readonly run: Run; readonly rackId: string; readonly deviceId: string | null; readonly to: Exit }
  | { readonly kind: 'racks'; readonly run: Run; readonly rackId: string; readonly deviceId: string | null; readonly toRackId: string }
  | { readonly kind: 'between'; readonly run: Run; readonly from: Exit; readonly to: Exit }
  | { readonly kind: 'loose-rack'; readonly run: Run; readonly rackId: string; readonly deviceId: string | null }
  | { readonly kind: 'loose-plate'; readonly run: Run; readonly to: Exit }
  | { readonly kind: 'tray'; readonly run: Run }

/** Every run of the job as a way to draw, in the order of their serial numbers. */
export function readTrips(doc: JobDocument, storeys: readonly Storey[]): Trip[] {
  const drawn = new Set(storeys.flatMap((storey) => storey.rooms.flatMap((room) => [...room.fixtures.map((fixture) => fixture.key), ...room.racks.map((rack) => `rack:${rack.id}`)])))
  const spotOf = (end: RunEnd | null) => {
    const spot = spotOfEnd(doc, end)
    return spot && drawn.has(spot.at === 'rack' ? `rack:${spot.rackId}` : spot.key) ? spot : null
  }
  return [...doc.records.run.values()].sort((a, b) => a.serial - b.serial).map((run) => tripOf(run, spotOf(run.a), spotOf(run.b)))
}

function tripOf(run: Run, a: Spot | null, b: Spot | null): Trip {
  const exit = (spot: Spot & { at: 'fixture' }): Exit => ({ runId: run.id, key: spot.key, jack: spot.jack })
  if (!a && !b) return { kind: 'tray', run }
  if (!a || !b) {
    const one = (a ?? b)!
    return one.at === 'rack' ? { kind: 'loose-rack', run, rackId: one.rackId, deviceId: one.deviceId } : { kind: 'loose-plate', run, to: exit(one) }
  }
  if (a.at === 'rack' && b.at === 'fixture') return { kind: 'home', run, rackId: a.rackId, deviceId: a.deviceId, to: exit(b) }
  if (a.at === 'fixture' && b.at === 'rack') return { kind: 'home', run, rackId: b.rackId, deviceId: b.deviceId, to: exit(a) }
  if (a.at === 'fixture' && b.at === 'fixture') return { kind: 'between', run, from: exit(a), to: exit(b) }
  const from = a as Spot & { at: 'rack' }
  return { kind: 'racks', run, rackId: from.rackId, deviceId: from.deviceId, toRackId: (b as Spot & { at: 'rack' }).rackId }
}

function spotOfEnd(doc: JobDocument, end: RunEnd | null): Spot | null {
  if (!end) return null
  if ('rackId' in end) return { at: 'rack', rackId: end.rackId, deviceId: null }
  if ('plateId' in end) {
    const jacks = find(doc, 'plate', end.plateId)?.jacks ?? []
    return { at: 'fixture', key: `plate:${end.plateId}`, jack: jacks.find((jack) => jack.id === end.jackId)?.position ?? 99 }
  }
  const device = find(doc, 'device', end.deviceId)
  if (!device) return null
  if (device.rackId) return { at: 'rack', rackId: device.rackId, deviceId: device.id }
  if (device.plateId) return { at: 'fixture', key: `plate:${device.plateId}`, jack: 50 }
  return { at: 'fixture', key: `device:${device.id}`, jack: 1 }
}

/** The ends of a trip that leave a trunk, with a place each. */
export const exitsOf = (trip: Trip): readonly Exit[] =>
  trip.kind === 'home' || trip.kind === 'loose-plate' ? [trip.to] : trip.kind === 'between' ? [trip.from, trip.to] : []
