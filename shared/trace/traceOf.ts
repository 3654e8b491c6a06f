import type { Derived } from '../derive/deriveJob.ts'
import type { RunFacts } from '../derive/facts.ts'
import { endKey } from '../derive/jobIndex.ts'
import type { Device } from '../model/device.ts'
import { find, type JobDocument } from '../model/jobDocument.ts'
import { endLabel, isPanel, rackIdOfEnd, terminalOf } from '../model/naming.ts'
import type { CordEnd, EndName, Run, RunEnd } from '../model/run.ts'
import { cordsHere, devicesAt, runsAtPlate, runsHere } from './joints.ts'
import { cordStop, deviceStop, missingStop, plateStop, portStop, rackStop, runStop, type TraceStop } from './traceStops.ts'

export type { TraceStop } from './traceStops.ts'

export interface Trace {
  readonly runId: string
  /** From the device out in the building to the channel, port or source it comes from. */
  readonly stops: readonly TraceStop[]
}

export type TraceStart = { readonly runId: string } | { readonly plateId: string; readonly jackId?: string } | { readonly deviceId: string; readonly terminal: string }

type Way = 'in' | 'out'
const other = (end: EndName): EndName => (end === 'a' ? 'b' : 'a')

/**
 * The runs that may be meant by a start: the one itself, those on a plate or jack, those on a port or terminal; where a
 * terminal has no run of its own, those its cords lead to, and those on the plate that the device stands at.
 */
export function runsFrom(doc: JobDocument, start: TraceStart): Run[] {
  if ('runId' in start) {
    const run = find(doc, 'run', start.runId)
    return run ? [run] : []
  }
  return [...new Set('plateId' in start ? runsOfPlate(doc, start) : runsOfTerminal(doc, start))].sort((a, b) => a.serial - b.serial)
}

function runsOfPlate(doc: JobDocument, { plateId, jackId }: { plateId: string; jackId?: string }): Run[] {
  if (jackId !== undefined) return runsHere(doc, endKey({ plateId, jackId })).map(({ run }) => run)
  const onDevices = devicesAt(doc, plateId).flatMap((device) => [null, ...terminalKeys(doc, device)].flatMap((terminal) => runsHere(doc, endKey({ deviceId: device.id, terminal }))))
  return [...runsAtPlate(doc, plateId), ...onDevices].map(({ run }) => run)
}

function runsOfTerminal(doc: JobDocument, at: { deviceId: string; terminal: string }): Run[] {
  const own = runsHere(doc, endKey(at)).map(({ run }) => run)
  if (own.length) return own
  const byCord = cordsHere(doc, endKey(at)).flatMap(({ far }) => runsHere(doc, endKey(far)).map(({ run }) => run))
  if (byCord.length) return byCord
  const plateId = find(doc, 'device', at.deviceId)?.plateId
  return plateId ? runsAtPlate(doc, plateId).filter(({ run, end }) => guessAt(doc, run, end).some((device) => device.id === at.deviceId)).map(({ run }) => run) : []
}

const terminalKeys = (doc: JobDocument, device: Device) => find(doc, 'deviceModel', device.modelId)?.terminals.map((terminal) => terminal.key) ?? []

/**
 * The whole way of a run: from the device at its far end to what feeds it, with what is missing said. From a plate, port
 * or terminal it is the way of the first run there. Null: there is none.
 */
export function traceOf(derived: Pick<Derived, 'doc' | 'runs'>, start: string | TraceStart): Trace | null {
  const [run] = runsFrom(derived.doc, typeof start === 'string' ? { runId: start } : start)
  const facts = run && derived.runs.get(run.id)
  if (!facts) return null
  const walk = new Walk(derived, facts.run.id)
  const source = sourceOf(derived.doc, facts.run)
  const outward = walk.fromEnd(facts, other(source), 'out')
  const inward = walk.fromEnd(facts, source, 'in')
  return { runId: facts.run.id, stops: [...turned(outward), runStop(derived, facts), ...inward] }
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

/**
 * Devices at a plate that a run without a cord may go to: those with a terminal for that jack which nothing is joined to.
 * Several such runs share them out by the jacks' positions.
 */
function guessAt(doc: JobDocument, run: Run, end: EndName): Device[] {
  const at = run[end]
  if (!at || !('plateId' in at)) return []
  const plate = find(doc, 'plate', at.plateId)
  const jackOf = (each: RunEnd | null) => (each && 'plateId' in each ? plate?.jacks.find((jack) => jack.id === each.jackId) : undefined)
  const connector = jackOf(at)?.connector
  const isOpen = (device: Device) =>
    find(doc, 'deviceModel', device.modelId)?.terminals.some(
      (terminal) => (connector === undefined || terminal.connector === connector) && [cordsHere, runsHere].every((joined) => !joined(doc, `device:${device.id}:${terminal.key}`).length),
    ) ?? false
  const devices = devicesAt(doc, at.plateId).filter(isOpen).sort((a, b) => (a.id < b.id ? -1 : 1))
  const waiting = runsAtPlate(doc, at.plateId)
    .filter((each) => jackOf(each.run[each.end])?.connector === connector && !cordsHere(doc, endKey(each.run[each.end]!)).length)
    .sort((x, y) => (jackOf(x.run[x.end])?.position ?? 0) - (jackOf(y.run[y.end])?.position ?? 0) || x.run.serial - y.run.serial)
  const turn = waiting.findIndex((each) => each.run.id === run.id && each.end === end)
  return turn < 0 || waiting.length === 1 ? devices : devices.filter((_, index) => index % waiting.length === turn)
}

class Walk {
  private readonly seen = new Set<string>()
  private readonly doc: JobDocument

  constructor(private readonly derived: Pick<Derived, 'doc' | 'runs'>, runId: string) {
    this.doc = derived.doc
    this.seen.add(`run:${runId}`)
  }

  /** Stops from an end of a run onward, nearest first. */
  fromEnd(facts: RunFacts, end: EndName, way: Way): TraceStop[] {
    const { run } = facts
    const at = run[end]
    if (!at) return [missingStop(`${run.id}-${end}`, `${run.label} has no end there yet`)]
    if ('rackId' in at) return [rackStop(this.doc, at.rackId), missingStop(`open-${run.id}-${end}`, `${run.label} lands on no port yet`)]
    if (this.isSeen(endKey(at))) return []
    if ('plateId' in at) return [plateStop(this.doc, at, facts), ...this.beyondJack(facts.run, end, at, way)]
    return this.atDevice(at.deviceId, at.terminal, facts, way)
  }

  /** Stops from where a cord goes. */
  private fromCord(far: CordEnd, way: Way): TraceStop[] {
    if (this.isSeen(endKey(far))) return []
    if ('deviceId' in far) return this.atDevice(far.deviceId, far.terminal, null, way)
    const behind = runsHere(this.doc, endKey(far)).flatMap(({ run, end }) => this.alongRun(run.id, end, way))
    return [plateStop(this.doc, far, null), ...behind]
  }

  private atDevice(deviceId: string, terminal: string | null, facts: RunFacts | null, way: Way): TraceStop[] {
    const device = find(this.doc, 'device', deviceId)
    if (!device) return [missingStop(deviceId, 'The device is gone')]
    if (!isPanel(this.doc, device)) return this.throughDevice(device, terminal, way, false)
    const behind = facts || terminal === null ? [] : runsHere(this.doc, endKey({ deviceId, terminal }))
    // Come by cord to a panel's front, the way goes on over the run on its back; come by the run, over the cord.
    const onward = behind.length ? behind.flatMap(({ run, end }) => this.alongRun(run.id, end, way)) : this.byCords({ deviceId, terminal }, way)
    return [portStop(this.doc, device, terminal, facts), ...onward]
  }

  private alongRun(runId: string, end: EndName, way: Way): TraceStop[] {
    const facts = this.derived.runs.get(runId)
    if (!facts || this.isSeen(`run:${runId}`)) return []
    return [runStop(this.derived, facts), ...this.fromEnd(facts, other(end), way)]
  }

  private beyondJack(run: Run, end: EndName, at: { plateId: string; jackId: string | null }, way: Way): TraceStop[] {
    if (at.jackId !== null && cordsHere(this.doc, endKey(at)).length) return this.byCords(at, way)
    const guesses = guessAt(this.doc, run, end)
    if (guesses.length) return this.parted(guesses.map((device) => this.throughDevice(device, null, way, true)), way)
    return [missingStop(`none-${endKey(at)}`, `no cord from ${endLabel(this.doc, at)} yet`)]
  }

  private byCords(at: { plateId: string; jackId: string | null } | { deviceId: string; terminal: string | null }, way: Way): TraceStop[] {
    const cords = cordsHere(this.doc, endKey(at))
    if (!cords.length) return [missingStop(`none-${endKey(at)}`, `no cord from ${endLabel(this.doc, at)} yet`)]
    return this.parted(cords.map(({ cord, far }) => [cordStop(this.doc, cord), ...this.fromCord(far, way)]), way)
  }

  /** A device's terminal, and on through what passes the signal on inside it. */
  private throughDevice(device: Device, terminal: string | null, way: Way, assumed: boolean): TraceStop[] {
    const passes = find(this.doc, 'deviceModel', device.modelId)?.passes ?? []
    const onward = passes.flatMap((pass) => (way === 'out' ? (pass.from === (terminal ?? pass.from) ? [pass.to] : []) : pass.to === terminal ? [pass.from] : []))
    const branches = [...new Set(onward)].flatMap((key) => this.leave({ deviceId: device.id, terminal: key }, way)).filter((branch) => branch.length)
    return [deviceStop(this.doc, device, terminal, assumed), ...this.parted(branches, way)]
  }

  private leave(at: { deviceId: string; terminal: string }, way: Way): TraceStop[][] {
    if (this.isSeen(endKey(at))) return []
    const cords = cordsHere(this.doc, endKey(at)).map(({ cord, far }) => [cordStop(this.doc, cord), ...this.fromCord(far, way)])
    return [...cords, ...runsHere(this.doc, endKey(at)).map(({ run, end }) => this.alongRun(run.id, end, way))]
  }

  private parted(branches: readonly TraceStop[][], way: Way): TraceStop[] {
    if (branches.length <= 1) return branches[0] ?? []
    return [{ id: `parts-${branches.map((branch) => branch[0]?.id).join('+')}`, kind: 'device', title: `${branches.length} ways on`, lines: [], known: 'drawn', branches: way === 'out' ? branches.map(turned) : branches }]
  }

  private isSeen(key: string): boolean {
    if (this.seen.has(key)) return true
    this.seen.add(key)
    return false
  }
}
