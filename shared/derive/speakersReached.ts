import type { Device, Ratings, Terminal } from '../model/device.ts'
import type { EndName, Run, RunEnd } from '../model/run.ts'
import { cordsOn, farEnd, runsOn, sourceEnd } from './ends.ts'
import { endKey } from './jobIndex.ts'
import type { JobReader } from './jobReader.ts'

/** A loudspeaker that a run feeds. */
export interface ReachedSpeaker {
  readonly device: Device
  readonly ratings: Ratings
  /** Whether its terminal is made for a constant-voltage line. */
  readonly isLine: boolean
  /** No cord is drawn to it; it stands at the plate, so the plate is taken to feed it. */
  readonly assumed: boolean
  /** Runs from the first one on, in order, that lead to it. */
  readonly runs: readonly Run[]
  /** Which way it lies where the run first parts, from 0: left and right of a volume control. Null: it does not part. */
  readonly side: number | null
}

/** How the search has come to where it is. */
interface Path {
  readonly runs: readonly Run[]
  readonly side: number | null
}

export const isSpeakerSignal = (signal: string) => signal === 'speaker' || signal === 'speaker-line'

/** Every loudspeaker a run feeds: at its far end, through cords, through what passes a signal on, and over hops. */
export function speakersReached(reader: JobReader, run: Run): ReachedSpeaker[] {
  const found: ReachedSpeaker[] = []
  const seen = new Set<string>()
  const start = farEnd(sourceEnd(reader, run))
  follow(run[start], start, { runs: [run], side: null })
  return found

  function follow(end: RunEnd | null, name: EndName, path: Path): void {
    if (!end || 'rackId' in end || seen.has(`${path.runs.at(-1)!.id} ${endKey(end)}`)) return
    seen.add(`${path.runs.at(-1)!.id} ${endKey(end)}`)
    if ('plateId' in end) followPlate(end, name, path)
    else enterDevice(end.deviceId, end.terminal, path, false)
  }

  function followPlate(end: { plateId: string; jackId: string | null }, name: EndName, path: Path): void {
    const cords = end.jackId === null ? [] : cordsOn(reader, { plateId: end.plateId, jackId: end.jackId })
    for (const { far } of cords) if ('deviceId' in far) enterDevice(far.deviceId, far.terminal, path, false)
    if (!cords.length) for (const device of standingAt(reader, end.plateId, path.runs.at(-1)!, name)) enterDevice(device.id, null, path, true)
  }

  function enterDevice(deviceId: string, key: string | null, path: Path, assumed: boolean): void {
    const device = reader.find('device', deviceId)
    const model = reader.find('deviceModel', device?.modelId)
    if (!device || !model || seen.has(`inside ${deviceId}:${key ?? ''}`)) return
    seen.add(`inside ${deviceId}:${key ?? ''}`)
    const terminal = model.terminals.find((each) => (key === null ? takesSpeaker(each) : each.key === key))
    if (!terminal || !isSpeakerSignal(terminal.signal)) return
    if (model.category === 'speaker' && terminal.direction !== 'out') found.push({ device, ratings: terminal.ratings, isLine: terminal.signal === 'speaker-line', assumed, runs: path.runs, side: path.side })
    const outs = model.passes.filter((pass) => pass.from === terminal.key).map((pass) => pass.to)
    outs.forEach((to, index) => leave({ deviceId, terminal: to }, outs.length > 1 && path.side === null ? { ...path, side: index } : path))
  }

  /** On from a terminal that passes the signal on: by cord, or by the run whose near end is there. */
  function leave(at: { deviceId: string; terminal: string }, path: Path): void {
    for (const { far } of cordsOn(reader, at)) {
      if ('deviceId' in far) enterDevice(far.deviceId, far.terminal, path, false)
      else followJack(far, path)
    }
    for (const { run: next, end } of runsOn(reader, at)) if (!path.runs.includes(next)) follow(next[farEnd(end)], farEnd(end), { ...path, runs: [...path.runs, next] })
  }

  /** A cord from a device back into a jack: on over the run that lies behind it. */
  function followJack(jack: { plateId: string; jackId: string }, path: Path): void {
    for (const { run: next, end } of runsOn(reader, jack)) if (!path.runs.includes(next)) follow(next[farEnd(end)], farEnd(end), { ...path, runs: [...path.runs, next] })
  }
}

const takesSpeaker = (terminal: Terminal) => terminal.direction !== 'out' && isSpeakerSignal(terminal.signal)

/**
 * Devices at a plate that a run without a cord is taken to feed: those with a loudspeaker terminal that nothing is
 * joined to. Where several such runs end at the plate the devices are dealt to them in turn, by position of the jack.
 */
function standingAt(reader: JobReader, plateId: string, run: Run, end: EndName): Device[] {
  const devices = reader.under<Device>(`devices at plate:${plateId}`).filter((device) => isOpen(reader, device))
  const plate = reader.find('plate', plateId)
  const positionOf = (jackId: string | null) => plate?.jacks.find((jack) => jack.id === jackId)?.position ?? Infinity
  const waiting = reader
    .under<Run>(`runs at plate:${plateId}`)
    .filter((each) => each.dropped === null && reader.find('cableType', each.cableTypeId)?.family === 'speaker')
    .flatMap((each) => (['a', 'b'] as const).map((name) => ({ id: each.id, serial: each.serial, name, at: each[name] })))
    .flatMap(({ at, ...each }) => (at && 'plateId' in at && at.plateId === plateId && !(at.jackId !== null && cordsOn(reader, { plateId, jackId: at.jackId }).length) ? [{ ...each, position: positionOf(at.jackId) }] : []))
    .sort((x, y) => x.position - y.position || x.serial - y.serial)
  const turn = waiting.findIndex((each) => each.id === run.id && each.name === end)
  if (turn < 0 || waiting.length === 1) return devices
  return devices.filter((_, index) => index % waiting.length === turn)
}

/** Whether a device has a loudspeaker terminal to take a signal, and neither cord nor run on it. */
function isOpen(reader: JobReader, device: Device): boolean {
  const terminals = reader.find('deviceModel', device.modelId)?.terminals.filter(takesSpeaker) ?? []
  return terminals.length > 0 && terminals.every(({ key }) => !cordsOn(reader, { deviceId: device.id, terminal: key }).length && !runsOn(reader, { deviceId: device.id, terminal: key }).length)
}
