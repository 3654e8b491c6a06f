import type { Catalog } from '../../../../shared/api/catalog.ts'
import type { Intent } from '../../../../shared/commands/index.ts'
import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { endLabel, isPanel, terminalOf } from '../../../../shared/model/naming.ts'
import type { Connector } from '../../../../shared/model/place.ts'
import type { CordEnd, RunEnd } from '../../../../shared/model/run.ts'
import { connectorOf, connectorWord, fits } from './connectors.ts'
import { takenPorts, takePortOf } from './freePorts.ts'
import { copyOfCable } from './jobCopies.ts'
import { descriptionOf, usualCable, type CableChoice } from './planPlate.ts'

/** Something a run or a cord can be dragged from and to. A panel without a terminal: its next free port. */
export type Landing =
  | { readonly kind: 'jack'; readonly plateId: string; readonly jackId: string }
  | { readonly kind: 'plate'; readonly plateId: string }
  | { readonly kind: 'port'; readonly deviceId: string; readonly terminal: string }
  | { readonly kind: 'device'; readonly deviceId: string }
  | { readonly kind: 'rack'; readonly rackId: string }

export type Joined = { readonly intent: Intent; readonly runId: string | null } | { readonly refusal: string }

/** What takes a landing, or null where it is not said. */
export function connectorAt(doc: JobDocument, landing: Landing): Connector | null {
  if (landing.kind === 'jack') return find(doc, 'plate', landing.plateId)?.jacks.find((jack) => jack.id === landing.jackId)?.connector ?? null
  if (landing.kind === 'port') {
    const device = find(doc, 'device', landing.deviceId)
    return (device && terminalOf(doc, device, landing.terminal)?.connector) ?? null
  }
  if (landing.kind === 'device') return find(doc, 'deviceModel', find(doc, 'device', landing.deviceId)?.modelId)?.terminals[0]?.connector ?? null
  return null
}

/** A run between two landings: from the rack's side to the building's. Where no cable is chosen, the usual one for the jack. */
export function planRun(doc: JobDocument, catalog: Catalog | null, from: Landing, to: Landing, options: { cable?: CableChoice | undefined; newId: () => string }): Joined {
  const taken = takenPorts(doc)
  const [rackSide, fieldSide] = isAtRack(doc, to) && !isAtRack(doc, from) ? [to, from] : [from, to]
  const connector = connectorAt(doc, fieldSide) ?? connectorAt(doc, rackSide)
  const other = connectorAt(doc, rackSide)
  if (connector && other && rackSide.kind !== 'device' && !fits(connector, other)) return { refusal: `A ${connectorWord[connector]} jack does not fit a ${connectorWord[other]} port. Choose another port, or another jack` }
  const cable = options.cable ?? (connector && usualCable(doc, catalog, connector))
  if (!cable) return { refusal: 'Choose a cable first: no cable of this job fits that jack' }
  const type = descriptionOf(doc, cable)!
  if (connector && !fits(connectorOf(type), connector) && !(connector === 'bare')) return { refusal: `${type.code} does not fit a ${connectorWord[connector]} jack. Choose another cable` }
  const a = runEndOf(doc, rackSide, connector ?? connectorOf(type), taken)
  const b = runEndOf(doc, fieldSide, connector ?? connectorOf(type), taken)
  if (typeof a === 'string') return { refusal: a }
  if (typeof b === 'string') return { refusal: b }
  const copy = 'entry' in cable ? copyOfCable(doc, cable.entry, options.newId) : { id: cable.cableTypeId, steps: [] }
  const runId = options.newId()
  const plate = b && 'plateId' in b ? find(doc, 'plate', b.plateId) : undefined
  return {
    runId,
    intent: { verb: 'batch', args: { label: `Lay a ${type.code} run to ${endLabel(doc, b)}`, steps: [...copy.steps, { verb: 'run.add', args: { id: runId, cableTypeId: copy.id, a, b, purpose: plate?.name ?? '' } }] } },
  }
}

/** A cord that one can see: between the fronts of two ports, of a jack and a device, or of two devices. */
export function planCord(doc: JobDocument, from: Landing, to: Landing, newId: () => string): Joined {
  const taken = cordedAt(doc)
  const a = cordEndOf(doc, from, connectorAt(doc, to), taken)
  const b = cordEndOf(doc, to, connectorAt(doc, from), taken)
  if (typeof a === 'string') return { refusal: a }
  if (typeof b === 'string') return { refusal: b }
  const isPatch = connectorAt(doc, from) === 'modular'
  return { runId: null, intent: { verb: 'cord.add', args: { id: newId(), a, b, form: isPatch ? 'patch cord' : 'lead' } } }
}

/** Two things side by side in racks, or a device and its own plate, are joined by a cord; all else by a run. */
export function isCordWay(doc: JobDocument, from: Landing, to: Landing): boolean {
  if (isAtRack(doc, from) && isAtRack(doc, to)) return true
  const plateOf = (landing: Landing) => ('plateId' in landing ? landing.plateId : 'deviceId' in landing ? (find(doc, 'device', landing.deviceId)?.plateId ?? null) : null)
  return plateOf(from) !== null && plateOf(from) === plateOf(to) && (from.kind === 'device' || from.kind === 'port' || to.kind === 'device' || to.kind === 'port')
}

export function isAtRack(doc: JobDocument, landing: Landing): boolean {
  if (landing.kind === 'rack') return true
  return 'deviceId' in landing && find(doc, 'device', landing.deviceId)?.rackId != null
}

function runEndOf(doc: JobDocument, landing: Landing, connector: Connector, taken: Set<string>): RunEnd | string {
  if (landing.kind === 'rack') return { rackId: landing.rackId }
  if (landing.kind === 'plate') return { plateId: landing.plateId, jackId: freeJack(doc, landing.plateId, connector) }
  if (landing.kind === 'jack') {
    const other = runAtJack(doc, landing.plateId, landing.jackId)
    return other ? `${other} is on that jack already. Take it off first, or add a jack` : { plateId: landing.plateId, jackId: landing.jackId }
  }
  if (landing.kind === 'port') return taken.has(`${landing.deviceId}:${landing.terminal}`) ? 'A run is on that port already. Choose a free one' : { deviceId: landing.deviceId, terminal: landing.terminal }
  const device = find(doc, 'device', landing.deviceId)
  const port = takePortOf(doc, landing.deviceId, connector, taken)
  if (port) return port
  return device && isPanel(doc, device) ? `${device.name} has no free ${connectorWord[connector]} port` : { deviceId: landing.deviceId, terminal: null }
}

function freeJack(doc: JobDocument, plateId: string, connector: Connector): string | null {
  return find(doc, 'plate', plateId)?.jacks.find((jack) => fits(jack.connector, connector) && !runAtJack(doc, plateId, jack.id))?.id ?? null
}

function runAtJack(doc: JobDocument, plateId: string, jackId: string): string | null {
  for (const run of doc.records.run.values()) for (const end of [run.a, run.b]) if (end && 'plateId' in end && end.plateId === plateId && end.jackId === jackId) return run.label
  return null
}

function cordedAt(doc: JobDocument): Set<string> {
  const taken = new Set<string>()
  for (const cord of doc.records.cord.values()) for (const end of [cord.a, cord.b]) taken.add('plateId' in end ? `${end.plateId}:${end.jackId}` : `${end.deviceId}:${end.terminal}`)
  return taken
}

function cordEndOf(doc: JobDocument, landing: Landing, connector: Connector | null, taken: ReadonlySet<string>): CordEnd | string {
  if (landing.kind === 'rack') return 'A cord ends at a port. Choose one in the rack'
  if (landing.kind === 'jack') return { plateId: landing.plateId, jackId: landing.jackId }
  if (landing.kind === 'port') return { deviceId: landing.deviceId, terminal: landing.terminal }
  if (landing.kind === 'plate') {
    const jack = find(doc, 'plate', landing.plateId)?.jacks.find((each) => !taken.has(`${landing.plateId}:${each.id}`) && (!connector || fits(each.connector, connector)))
    return jack ? { plateId: landing.plateId, jackId: jack.id } : 'That plate has no free jack that fits'
  }
  const device = find(doc, 'device', landing.deviceId)
  const model = find(doc, 'deviceModel', device?.modelId)
  const free = model?.terminals.find((terminal) => !taken.has(`${landing.deviceId}:${terminal.key}`) && (!connector || fits(terminal.connector, connector)))
  return free ? { deviceId: landing.deviceId, terminal: free.key } : `${device?.name ?? 'That device'} has no free terminal that fits`
}
