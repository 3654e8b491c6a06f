import type { Derived } from '../derive/deriveJob.ts'
import type { HowKnown, RunFacts } from '../derive/facts.ts'
import { ohmText } from '../derive/speakerLoad.ts'
import type { Device } from '../model/device.ts'
import { find, jobOf, type JobDocument } from '../model/jobDocument.ts'
import { plateCode, portLabel, rackIdOfEnd, roomOfDevice, terminalOf } from '../model/naming.ts'
import type { Connector } from '../model/place.ts'
import type { Cord } from '../model/run.ts'
import { formatLength, formatNumber } from '../units.ts'
import { pullsOf, runsHere } from './joints.ts'

/** A point on the way of a wire, as whoever stands there sees it. */
export interface TraceStop {
  readonly id: string
  readonly kind: 'device' | 'cord' | 'plate' | 'run' | 'port' | 'rack' | 'missing'
  readonly title: string
  readonly lines: readonly string[]
  /** How it is known that the wire comes by here. */
  readonly known: HowKnown
  readonly runId?: string
  readonly plateId?: string
  readonly jackId?: string
  readonly deviceId?: string
  readonly terminal?: string
  /** For a port: its neighbours and itself, to be drawn. */
  readonly ports?: readonly { readonly position: number; readonly connector: Connector; readonly lit: boolean; readonly used: boolean }[]
  /** Where the way parts: one list for each branch, from the far device in where it goes out to the building. */
  readonly branches?: readonly (readonly TraceStop[])[]
}

/** Ports that are drawn on each side of the lit one. */
const neighbours = 2
const portsShown = 6

/** A wire is known as well as the best that somebody said of it. */
export const wireKnown = ({ stage }: RunFacts): HowKnown => (stage === 'tested' ? 'tested' : stage === 'planned' ? 'drawn' : 'pulled')

const filled = (lines: readonly (string | undefined)[]): string[] => lines.filter((line): line is string => line !== undefined && line !== '')

export const missingStop = (id: string, title: string): TraceStop => ({ id: `missing-${id}`, kind: 'missing', title, lines: [], known: 'guess' })

export const cordStop = (doc: JobDocument, cord: Cord): TraceStop => ({ id: cord.id, kind: 'cord', title: `${cord.form}, ${formatLength(cord.lengthMm, jobOf(doc).lengthUnit, { as: 'whole' })}`, lines: [], known: 'drawn' })

export function rackStop(doc: JobDocument, rackId: string): TraceStop {
  return { id: `rack-${rackId}`, kind: 'rack', title: find(doc, 'rack', rackId)?.name ?? 'Rack', lines: ['port still open'], known: 'drawn' }
}

export function runStop({ doc }: Pick<Derived, 'doc'>, facts: RunFacts): TraceStop {
  const { run, length, ends } = facts
  const type = find(doc, 'cableType', run.cableTypeId)
  const pull = pullsOf(doc, run.id).findLast((each) => each.markA !== null && each.markB !== null)
  const on = ends.a && ends.b ? 'both ends on' : ends.a || ends.b ? 'one end on' : facts.stage
  const marks = pull ? `marks ${pull.markA} to ${pull.markB} ${pull.markUnit}` : ''
  return {
    id: `run-${run.id}`,
    kind: 'run',
    title: run.label,
    lines: filled([
      `${type?.code ?? ''}, ${type?.jacketColour ?? ''} jacket, ${facts.stage === 'tested' ? 'tested' : on}`,
      length ? `${formatLength(length.totalMm, jobOf(doc).lengthUnit, { as: 'whole' })} ${length.basis}` : 'length not known',
      filled([marks, run.bundle ? `bundle ${run.bundle}` : '', pull?.spool ? `spool ${pull.spool}` : '']).join(', '),
      run.dropped === null ? '' : `not pulled: ${run.dropped}`,
    ]),
    known: wireKnown(facts),
    runId: run.id,
  }
}

export function plateStop(doc: JobDocument, at: { plateId: string; jackId: string | null }, run: RunFacts | null): TraceStop {
  const plate = find(doc, 'plate', at.plateId)
  if (!plate) return missingStop(at.plateId, 'The plate is gone')
  const room = find(doc, 'room', plate.roomId)
  const jack = plate.jacks.find((each) => each.id === at.jackId)
  const height = plate.mounting === 'ceiling' ? 'ceiling' : plate.mounting === 'floor' ? 'floor' : `${formatLength(plate.heightMm, jobOf(doc).lengthUnit, { as: 'exact' })} up, ${plate.heightTo === 'centre' ? 'to the center' : 'to the bottom'}`
  return {
    id: `plate-${plate.id}-${at.jackId}`,
    kind: 'plate',
    title: plateCode(doc, plate),
    lines: filled([filled([room?.name, wallName(doc, plate)]).join(', '), height, jack ? `jack ${jack.position} of ${plate.jacks.length}` : '']),
    known: run ? wireKnown(run) : 'drawn',
    plateId: plate.id,
    ...(at.jackId === null ? {} : { jackId: at.jackId }),
  }
}

export function portStop(doc: JobDocument, device: Device, terminal: string | null, run: RunFacts | null): TraceStop {
  const terminals = find(doc, 'deviceModel', device.modelId)?.terminals ?? []
  const index = terminals.findIndex((each) => each.key === terminal)
  const first = Math.max(0, Math.min(index - neighbours, terminals.length - portsShown))
  const rack = find(doc, 'rack', device.rackId)
  return {
    id: `port-${device.id}-${terminal}`,
    kind: 'port',
    title: terminal === null ? device.name : portLabel(doc, device, terminal),
    lines: filled([filled([rack?.name, device.name, device.unit === null ? '' : `unit ${device.unit}`]).join(', ')]),
    known: run ? wireKnown(run) : 'drawn',
    deviceId: device.id,
    ...(terminal === null ? {} : { terminal }),
    ports: terminals.slice(first, first + portsShown).map((each) => ({ position: each.position, connector: each.connector, lit: each.key === terminal, used: runsHere(doc, `device:${device.id}:${each.key}`).length > 0 })),
  }
}

/** A device at one of its terminals; `assumed`: it stands at the plate, and no cord is drawn to it. */
export function deviceStop(doc: JobDocument, device: Device, key: string | null, assumed: boolean): TraceStop {
  const terminal = terminalOf(doc, device, key)
  const isInRack = rackIdOfEnd(doc, { deviceId: device.id, terminal: key }) !== undefined
  const zone = key === null ? undefined : device.zones[key]
  const ohm = device.loadOhm ?? terminal?.ratings.loadOhm
  return {
    id: `device-${device.id}-${key}`,
    kind: 'device',
    title: terminal && isInRack ? `${device.name}, ${terminal.name.toLowerCase()}` : device.name,
    lines: filled([
      zone ? `zone ${zone}` : '',
      terminal && !isInRack ? terminal.name.toLowerCase() : '',
      device.tapW !== null ? `tap ${formatNumber(device.tapW, device.tapW % 1 ? 2 : 0)} W` : ohm === undefined ? '' : ohmText(ohm),
      assumed ? 'no cord drawn; it stands at this plate' : '',
      roomOfDevice(doc, device)?.name,
    ]),
    known: assumed ? 'guess' : 'drawn',
    deviceId: device.id,
    ...(key === null ? {} : { terminal: key }),
  }
}

const compass = ['north', 'east', 'south', 'west'] as const

/** A wall by the way it faces on the drawing, where it faces one of four; else by its number. */
export function wallName(doc: JobDocument, plate: { roomId: string; wall: number | null; mounting: string }): string {
  if (plate.wall === null) return ''
  const outline = find(doc, 'room', plate.roomId)?.outline
  const from = outline?.[plate.wall]
  const to = outline?.[(plate.wall + 1) % outline.length]
  if (!from || !to) return ''
  const [dx, dy] = [to.xMm - from.xMm, to.yMm - from.yMm]
  const name = Math.abs(dx) > 3 * Math.abs(dy) ? compass[dx > 0 ? 0 : 2] : Math.abs(dy) > 3 * Math.abs(dx) ? compass[dy > 0 ? 1 : 3] : undefined
  return `${name ? `${name} wall` : `wall ${plate.wall + 1}`}${plate.mounting === 'outside' ? ', outside' : ''}`
}
