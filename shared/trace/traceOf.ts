import type { Derived } from '../derive/deriveJob.ts'
import type { HowKnown, RunFacts } from '../derive/facts.ts'
import type { Connector } from '../model/place.ts'
import { find, jobOf, type JobDocument } from '../model/jobDocument.ts'
import { endLabel, isPanel, plateCode, portLabel, rackIdOfEnd, roomOfDevice, terminalOf } from '../model/naming.ts'
import type { Cord, CordEnd, EndName, Run, RunEnd } from '../model/run.ts'
import { isStruck } from '../model/struck.ts'
import { formatLength } from '../units.ts'

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
  /** Where the way parts: one list for each branch, outward. */
  readonly branches?: readonly (readonly TraceStop[])[]
}

export interface Trace {
  readonly runId: string
  /** From the device out in the building to the channel, port or source it comes from. */
  readonly stops: readonly TraceStop[]
}

export type TraceStart = { readonly runId: string } | { readonly plateId: string; readonly jackId?: string } | { readonly deviceId: string; readonly terminal: string }

type At = { plateId: string; jackId: string | null } | { deviceId: string; terminal: string | null } | { rackId: string }

/** The runs that may be meant by a start: the one itself, those on a plate or jack, those on a port. */
export function runsFrom(doc: JobDocument, start: TraceStart): Run[] {
  const runs = [...doc.records.run.values()].filter((run) => run.dropped === null || 'runId' in start)
  if ('runId' in start) return runs.filter((run) => run.id === start.runId)
  const meets = (end: RunEnd | null) => {
    if (!end) return false
    if ('plateId' in start) return 'plateId' in end ? end.plateId === start.plateId && (start.jackId === undefined || end.jackId === start.jackId) : 'deviceId' in end && find(doc, 'device', end.deviceId)?.plateId === start.plateId
    return 'deviceId' in end && end.deviceId === start.deviceId && end.terminal === start.terminal
  }
  return runs.filter((run) => meets(run.a) || meets(run.b))
}

/** The whole way of a run: from the device at its far end to what feeds it, with what is missing said. */
export function traceOf(derived: Derived, runId: string): Trace | null {
  const facts = derived.runs.get(runId)
  if (!facts) return null
  const walk = new Walk(derived)
  const source = sourceOf(derived.doc, facts.run)
  const outward = walk.from(facts.run[source === 'a' ? 'b' : 'a'], 'out', facts)
  const inward = walk.from(facts.run[source], 'in', facts)
  return { runId, stops: [...turned(outward), runStop(derived, facts), ...inward] }
}

/** Outward stops are walked from the run; they are read from the far device back to it. */
const turned = (stops: readonly TraceStop[]): TraceStop[] => [...stops].reverse()

function sourceOf(doc: JobDocument, run: Run): EndName {
  const [a, b] = [rackIdOfEnd(doc, run.a), rackIdOfEnd(doc, run.b)]
  if ((a === undefined) !== (b === undefined)) return a === undefined ? 'b' : 'a'
  const gives = (end: RunEnd | null) => {
    const device = end && 'deviceId' in end ? find(doc, 'device', end.deviceId) : undefined
    return device && end && 'deviceId' in end ? terminalOf(doc, device, end.terminal)?.direction === 'out' : false
  }
  return gives(run.b) && !gives(run.a) ? 'b' : 'a'
}

class Walk {
  private readonly seen = new Set<string>()
  private readonly doc: JobDocument

  constructor(private readonly derived: Derived) {
    this.doc = derived.doc
  }

  /** Stops from an end of a run onward, nearest first. */
  from(end: RunEnd | null, way: 'in' | 'out', run: RunFacts): TraceStop[] {
    if (!end) return [missing(`${run.run.id}-${way}`, `${run.run.label} has no end there yet`)]
    return this.at(end, way, run)
  }

  private at(at: At, way: 'in' | 'out', run: RunFacts | null): TraceStop[] {
    if ('rackId' in at) {
      const rack = find(this.doc, 'rack', at.rackId)
      return [{ id: `rack-${at.rackId}`, kind: 'rack', title: rack?.name ?? 'Rack', lines: ['port still open'], known: 'drawn' }, missing(`open-${at.rackId}-${run?.run.id ?? ''}`, `${run?.run.label ?? 'It'} lands on no port yet`)]
    }
    const key = 'plateId' in at ? `plate:${at.plateId}:${at.jackId}` : `device:${at.deviceId}:${at.terminal}`
    if (this.seen.has(key)) return []
    this.seen.add(key)
    if ('plateId' in at) return [this.plateStop(at, run), ...this.beyondJack(at, way)]
    const device = find(this.doc, 'device', at.deviceId)
    if (!device) return [missing(key, 'The device is gone')]
    return isPanel(this.doc, device) ? [this.portStop(at, run), ...this.beyondPort(at, way)] : this.throughDevice(at, way, false)
  }

  private beyondJack(at: { plateId: string; jackId: string | null }, way: 'in' | 'out'): TraceStop[] {
    if (at.jackId !== null) {
      const cords = this.cordsAt(`plate:${at.plateId}:${at.jackId}`)
      if (cords.length) return this.parted(cords.map(({ cord, far }) => [this.cordStop(cord), ...this.at(far, way, null)]))
    }
    const plate = find(this.doc, 'plate', at.plateId)!
    const devices = [...this.doc.records.device.values()].filter((device) => device.plateId === at.plateId)
    const jack = plate.jacks.find((each) => each.id === at.jackId)
    const fitting = devices.filter((device) => find(this.doc, 'deviceModel', device.modelId)?.terminals.some((terminal) => terminal.connector === jack?.connector || jack === undefined))
    if (fitting.length) return this.parted(fitting.map((device) => this.throughDevice({ deviceId: device.id, terminal: null }, way, true)))
    return [missing(`none-${at.plateId}-${at.jackId}`, `no cord from ${endLabel(this.doc, at)} yet`)]
  }

  private beyondPort(at: { deviceId: string; terminal: string | null }, way: 'in' | 'out'): TraceStop[] {
    const cords = at.terminal === null ? [] : this.cordsAt(`device:${at.deviceId}:${at.terminal}`)
    if (!cords.length) return [missing(`none-${at.deviceId}-${at.terminal}`, `no cord from ${endLabel(this.doc, at)} yet`)]
    return this.parted(cords.map(({ cord, far }) => [this.cordStop(cord), ...this.at(far, way, null)]))
  }

  /** A device's terminal, and on through what passes the signal on inside it. */
  private throughDevice(at: { deviceId: string; terminal: string | null }, way: 'in' | 'out', assumed: boolean): TraceStop[] {
    const device = find(this.doc, 'device', at.deviceId)!
    const model = find(this.doc, 'deviceModel', device.modelId)
    const terminal = terminalOf(this.doc, device, at.terminal)
    const zone = at.terminal === null ? undefined : device.zones[at.terminal]
    const load = device.tapW !== null ? `tap ${device.tapW} W` : (device.loadOhm ?? terminal?.ratings.loadOhm) !== undefined && (device.loadOhm ?? terminal?.ratings.loadOhm) !== null ? `${device.loadOhm ?? terminal?.ratings.loadOhm} ohm` : ''
    const stop: TraceStop = {
      id: `device-${at.deviceId}-${at.terminal}`,
      kind: 'device',
      title: terminal && rackIdOfEnd(this.doc, { deviceId: device.id, terminal: at.terminal }) ? `${device.name}, ${terminal.name.toLowerCase()}` : device.name,
      lines: [zone ? `zone ${zone}` : '', terminal && !rackIdOfEnd(this.doc, { deviceId: device.id, terminal: at.terminal }) ? terminal.name.toLowerCase() : '', load, assumed ? 'no cord drawn; it stands at this plate' : '', roomOfDevice(this.doc, device)?.name ?? ''].filter(Boolean),
      known: assumed ? 'guess' : 'drawn',
      deviceId: device.id,
      ...(at.terminal === null ? {} : { terminal: at.terminal }),
    }
    const onward = (model?.passes ?? []).flatMap((pass) => (way === 'out' ? (pass.from === (at.terminal ?? pass.from) ? [pass.to] : []) : pass.to === at.terminal ? [pass.from] : []))
    const branches = onward.flatMap((key) => this.leave({ deviceId: device.id, terminal: key }, way)).filter((branch) => branch.length)
    return [stop, ...this.parted(branches)]
  }

  private leave(at: { deviceId: string; terminal: string }, way: 'in' | 'out'): TraceStop[][] {
    const key = `device:${at.deviceId}:${at.terminal}`
    if (this.seen.has(key)) return []
    this.seen.add(key)
    const cords = this.cordsAt(key).map(({ cord, far }) => [this.cordStop(cord), ...this.at(far, way, null)])
    const runs = [...this.derived.runs.values()].flatMap((facts) =>
      (['a', 'b'] as const).flatMap((end) => {
        const here = facts.run[end]
        return facts.dropped === null && here && 'deviceId' in here && here.deviceId === at.deviceId && here.terminal === at.terminal ? [[runStop(this.derived, facts), ...this.from(facts.run[end === 'a' ? 'b' : 'a'], way, facts)]] : []
      }),
    )
    return [...cords, ...runs]
  }

  private parted(branches: TraceStop[][]): TraceStop[] {
    if (branches.length <= 1) return branches[0] ?? []
    return [{ id: `parts-${branches.map((branch) => branch[0]?.id).join('+')}`, kind: 'device', title: `${branches.length} ways on`, lines: [], known: 'drawn', branches: branches.map(turned) }]
  }

  private cordsAt(key: string): { cord: Cord; far: CordEnd }[] {
    const nameOf = (end: CordEnd) => ('plateId' in end ? `plate:${end.plateId}:${end.jackId}` : `device:${end.deviceId}:${end.terminal}`)
    return [...this.doc.records.cord.values()].flatMap((cord) => (nameOf(cord.a) === key ? [{ cord, far: cord.b }] : nameOf(cord.b) === key ? [{ cord, far: cord.a }] : []))
  }

  private cordStop(cord: Cord): TraceStop {
    return { id: cord.id, kind: 'cord', title: `${cord.form}, ${formatLength(cord.lengthMm, jobOf(this.doc).lengthUnit, { as: 'whole' })}`, lines: [], known: 'drawn' }
  }

  private plateStop(at: { plateId: string; jackId: string | null }, run: RunFacts | null): TraceStop {
    const plate = find(this.doc, 'plate', at.plateId)!
    const room = find(this.doc, 'room', plate.roomId)
    const jack = plate.jacks.find((each) => each.id === at.jackId)
    const height = plate.mounting === 'ceiling' ? 'ceiling' : plate.mounting === 'floor' ? 'floor' : `${formatLength(plate.heightMm, jobOf(this.doc).lengthUnit, { as: 'exact' })} up, ${plate.heightTo === 'centre' ? 'to the center' : 'to the bottom'}`
    return {
      id: `plate-${plate.id}-${at.jackId}`,
      kind: 'plate',
      title: plateCode(this.doc, plate),
      lines: [[room?.name, wallName(this.doc, plate)].filter(Boolean).join(', '), height, jack ? `jack ${jack.position} of ${plate.jacks.length}` : ''].filter(Boolean),
      known: run ? wireKnown(run) : 'drawn',
      plateId: plate.id,
      ...(at.jackId === null ? {} : { jackId: at.jackId }),
    }
  }

  private portStop(at: { deviceId: string; terminal: string | null }, run: RunFacts | null): TraceStop {
    const device = find(this.doc, 'device', at.deviceId)!
    const terminals = find(this.doc, 'deviceModel', device.modelId)?.terminals ?? []
    const index = terminals.findIndex((terminal) => terminal.key === at.terminal)
    const first = Math.max(0, Math.min(index - 2, terminals.length - 6))
    const used = new Set([...this.doc.records.run.values()].flatMap((each) => [each.a, each.b]).flatMap((end) => (end && 'deviceId' in end && end.deviceId === device.id && end.terminal ? [end.terminal] : [])))
    const rack = find(this.doc, 'rack', device.rackId)
    return {
      id: `port-${device.id}-${at.terminal}`,
      kind: 'port',
      title: at.terminal === null ? device.name : portLabel(this.doc, device, at.terminal),
      lines: [[rack?.name, device.name, device.unit === null ? '' : `unit ${device.unit}`].filter(Boolean).join(', ')],
      known: run ? wireKnown(run) : 'drawn',
      deviceId: device.id,
      ...(at.terminal === null ? {} : { terminal: at.terminal }),
      ports: terminals.slice(first, first + 6).map((terminal) => ({ position: terminal.position, connector: terminal.connector, lit: terminal.key === at.terminal, used: used.has(terminal.key) })),
    }
  }
}

const missing = (id: string, title: string): TraceStop => ({ id: `missing-${id}`, kind: 'missing', title, lines: [], known: 'guess' })

/** A wire is known as well as the best that somebody said of it. */
function wireKnown({ stage }: RunFacts): HowKnown {
  return stage === 'tested' ? 'tested' : stage === 'planned' ? 'drawn' : 'pulled'
}

function runStop({ doc }: Derived, facts: RunFacts): TraceStop {
  const { run, length, ends } = facts
  const type = find(doc, 'cableType', run.cableTypeId)
  const unit = jobOf(doc).lengthUnit
  const pull = [...doc.records.pull.values()].filter((each) => each.runId === run.id && !isStruck(doc, 'pull', each.id)).at(-1)
  const on = ends.a && ends.b ? 'both ends on' : ends.a || ends.b ? 'one end on' : facts.stage
  return {
    id: `run-${run.id}`,
    kind: 'run',
    title: run.label,
    lines: [
      `${type?.code ?? ''}, ${type?.jacketColour ?? ''} jacket, ${on}`,
      length ? `${formatLength(length.totalMm, unit, { as: 'whole' })} ${length.basis}` : 'length not known',
      pull && pull.markA !== null && pull.markB !== null ? `marks ${pull.markA} to ${pull.markB} ${pull.markUnit}${run.bundle ? `, bundle ${run.bundle}` : ''}` : run.bundle ? `bundle ${run.bundle}` : '',
      run.dropped === null ? '' : `not pulled: ${run.dropped}`,
    ].filter(Boolean),
    known: wireKnown(facts),
    runId: run.id,
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
