import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { rackIdOfEnd, roomOfEnd } from '../../../../shared/model/naming.ts'
import type { Connector } from '../../../../shared/model/place.ts'
import type { RunEnd } from '../../../../shared/model/run.ts'
import { fits } from './connectors.ts'

const portKey = (deviceId: string, terminal: string) => `${deviceId}:${terminal}`

/** Panel ports that a run is landed on already. */
export function takenPorts(doc: JobDocument): Set<string> {
  const taken = new Set<string>()
  for (const run of doc.records.run.values()) for (const end of [run.a, run.b]) if (end && 'deviceId' in end && end.terminal) taken.add(portKey(end.deviceId, end.terminal))
  return taken
}

/** The next free port of one panel for a jack; null where it is full or does not fit. Takes the port. */
export function takePortOf(doc: JobDocument, deviceId: string, connector: Connector, taken: Set<string>): RunEnd | null {
  const device = find(doc, 'device', deviceId)
  const model = find(doc, 'deviceModel', device?.modelId)
  const free = [...(model?.terminals ?? [])].sort((a, b) => a.position - b.position).find((terminal) => fits(terminal.connector, connector) && !taken.has(portKey(deviceId, terminal.key)))
  if (!free) return null
  taken.add(portKey(deviceId, free.key))
  return { deviceId, terminal: free.key }
}

/**
 * Where a new run begins: the next free port of a fitting panel, in the rack that serves this room already, else the
 * nearest; else that rack with the port left open; else nothing yet. Takes the port.
 */
export function takePort(doc: JobDocument, roomId: string, connector: Connector, taken: Set<string>): RunEnd | null {
  const rackIds = racksFor(doc, roomId)
  const panels = recordsOf(doc, 'device')
    .filter((device) => device.rackId !== null && find(doc, 'deviceModel', device.modelId)?.category === 'panel')
    .sort((a, b) => rackIds.indexOf(a.rackId!) - rackIds.indexOf(b.rackId!) || (b.unit ?? 0) - (a.unit ?? 0))
  for (const panel of panels) {
    const port = takePortOf(doc, panel.id, connector, taken)
    if (port) return port
  }
  return rackIds[0] ? { rackId: rackIds[0] } : null
}

/** Racks in the order in which they would serve a room: by the runs that it has from each, then by how near they stand. */
export function racksFor(doc: JobDocument, roomId: string): string[] {
  const served = new Map<string, number>()
  for (const run of doc.records.run.values()) {
    const [here, there] = roomOfEnd(doc, run.a)?.id === roomId ? [run.a, run.b] : [run.b, run.a]
    if (roomOfEnd(doc, here)?.id !== roomId) continue
    const rackId = rackIdOfEnd(doc, there)
    if (rackId) served.set(rackId, (served.get(rackId) ?? 0) + 1)
  }
  const room = find(doc, 'room', roomId)
  const corner = room?.outline[0]
  const distance = (rackId: string) => {
    const rack = find(doc, 'rack', rackId)!
    const isOtherLevel = find(doc, 'room', rack.roomId)?.levelId !== room?.levelId
    return (corner ? Math.hypot(rack.at.xMm - corner.xMm, rack.at.yMm - corner.yMm) : 0) + (isOtherLevel ? 5000 : 0)
  }
  return recordsOf(doc, 'rack').map((rack) => rack.id).sort((a, b) => (served.get(b) ?? 0) - (served.get(a) ?? 0) || distance(a) - distance(b))
}
