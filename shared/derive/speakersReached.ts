import type { Device, Ratings } from '../model/device.ts'
import type { Run, RunEnd } from '../model/run.ts'
import { cordsOn, farEnd, runsOn, sourceEnd, terminalAt } from './ends.ts'
import { endKey } from './jobIndex.ts'
import type { JobReader } from './jobReader.ts'

/** A loudspeaker that a run feeds. */
export interface ReachedSpeaker {
  readonly device: Device
  readonly ratings: Ratings
  /** No cord is drawn to it; it stands at the plate, so the plate is taken to feed it. */
  readonly assumed: boolean
  /** Runs from the first one on, in order, that lead to it. */
  readonly runs: readonly Run[]
}

/** Every loudspeaker a run feeds: at its far end, through cords, through what passes a signal on, and over hops. */
export function speakersReached(reader: JobReader, run: Run): ReachedSpeaker[] {
  const found: ReachedSpeaker[] = []
  const seen = new Set<string>()
  follow(run[farEnd(sourceEnd(reader, run))], [run])
  return found

  function follow(end: RunEnd | null, runs: readonly Run[]): void {
    if (!end || 'rackId' in end || seen.has(endKey(end))) return
    seen.add(endKey(end))
    if ('plateId' in end) return followPlate(end, runs)
    enterDevice(end.deviceId, end.terminal, runs, false)
  }

  function followPlate(end: { plateId: string; jackId: string | null }, runs: readonly Run[]): void {
    const cords = end.jackId === null ? [] : cordsOn(reader, { plateId: end.plateId, jackId: end.jackId })
    for (const { far } of cords) if ('deviceId' in far) enterDevice(far.deviceId, far.terminal, runs, false)
    if (!cords.length) for (const device of reader.under<Device>(`devices at plate:${end.plateId}`)) enterDevice(device.id, null, runs, true)
  }

  function enterDevice(deviceId: string, key: string | null, runs: readonly Run[], assumed: boolean): void {
    const device = reader.find('device', deviceId)
    const model = reader.find('deviceModel', device?.modelId)
    if (!device || !model || seen.has(`inside ${deviceId}:${key ?? ''}`)) return
    seen.add(`inside ${deviceId}:${key ?? ''}`)
    const terminal = model.terminals.find((each) => (key === null ? each.direction === 'in' && isSpeakerSignal(each.signal) : each.key === key))
    if (!terminal || !isSpeakerSignal(terminal.signal)) return
    if (model.category === 'speaker') found.push({ device, ratings: terminal.ratings, assumed, runs })
    for (const pass of model.passes) if (pass.from === terminal.key) leave({ deviceId, terminal: pass.to }, runs)
  }

  /** On from a terminal that passes the signal on: by cord, or by the run whose near end is there. */
  function leave(at: { deviceId: string; terminal: string }, runs: readonly Run[]): void {
    for (const { far } of cordsOn(reader, at)) {
      if ('deviceId' in far) enterDevice(far.deviceId, far.terminal, runs, false)
      else follow(far, runs)
    }
    for (const { run: next, end } of runsOn(reader, at)) if (!runs.includes(next)) follow(next[farEnd(end)], [...runs, next])
  }
}

export const isSpeakerSignal = (signal: string) => signal === 'speaker' || signal === 'speaker-line'

/** What feeds a run at its source end, when it is an amplifier's channel or leads to one by cord. */
export function channelOf(reader: JobReader, run: Run): ReturnType<typeof terminalAt> {
  const end = run[sourceEnd(reader, run)]
  if (!end || !('deviceId' in end) || end.terminal === null) return undefined
  const at = terminalAt(reader, end.deviceId, end.terminal)
  if (!at) return undefined
  if (at.category !== 'panel') return at
  for (const { far } of cordsOn(reader, { deviceId: end.deviceId, terminal: end.terminal })) {
    const there = 'deviceId' in far ? terminalAt(reader, far.deviceId, far.terminal) : undefined
    if (there) return there
  }
  return undefined
}
