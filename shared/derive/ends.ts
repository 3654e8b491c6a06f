import type { Device, Terminal } from '../model/device.ts'
import type { Room } from '../model/place.ts'
import type { Cord, EndName, Run, RunEnd } from '../model/run.ts'
import { endKey } from './jobIndex.ts'
import type { JobReader } from './jobReader.ts'

/** A device, its model's category, and one of its terminals, read so that edits to any of them are noticed. */
export interface TerminalAt {
  readonly device: Device
  readonly category: string
  readonly terminal: Terminal
}

export function terminalAt(reader: JobReader, deviceId: string, key: string | null): TerminalAt | undefined {
  const device = reader.find('device', deviceId)
  const model = reader.find('deviceModel', device?.modelId)
  const terminal = key === null ? undefined : model?.terminals.find((each) => each.key === key)
  return device && model && terminal ? { device, category: model.category, terminal } : undefined
}

/** Runs whose end is exactly here, with which end it is; dropped runs are not there. */
export function runsOn(reader: JobReader, end: RunEnd): { run: Run; end: EndName }[] {
  const key = endKey(end)
  return reader
    .under<Run>(`runs on ${key}`)
    .filter((run) => run.dropped === null)
    .flatMap((run) => (['a', 'b'] as const).filter((name) => run[name] && endKey(run[name]!) === key).map((name) => ({ run, end: name })))
}

/** Cords plugged in exactly here, with their far ends. */
export function cordsOn(reader: JobReader, end: { plateId: string; jackId: string } | { deviceId: string; terminal: string }): { cord: Cord; far: Cord['a'] }[] {
  const key = endKey(end)
  return reader.under<Cord>(`cords on ${key}`).map((cord) => ({ cord, far: endKey(cord.a) === key ? cord.b : cord.a }))
}

/** The rack an end is at, by id: the rack itself or what stands in it. */
export function rackOf(reader: JobReader, end: RunEnd | null): string | undefined {
  if (!end) return undefined
  if ('rackId' in end) return end.rackId
  return 'deviceId' in end ? (reader.find('device', end.deviceId)?.rackId ?? undefined) : undefined
}

/**
 * The end that a signal comes from: at the rack where just one end is; else the terminal that gives out; else end a.
 */
export function sourceEnd(reader: JobReader, run: Run): EndName {
  const rackA = rackOf(reader, run.a) !== undefined
  const rackB = rackOf(reader, run.b) !== undefined
  if (rackA !== rackB) return rackA ? 'a' : 'b'
  const gives = (end: RunEnd | null) => end !== null && 'deviceId' in end && terminalAt(reader, end.deviceId, end.terminal)?.terminal.direction === 'out'
  return gives(run.b) && !gives(run.a) ? 'b' : 'a'
}

export const farEnd = (end: EndName): EndName => (end === 'a' ? 'b' : 'a')

/** The room an end is in, every record on the way to it noted. */
export function endRoom(reader: JobReader, end: RunEnd | null): Room | undefined {
  if (!end) return undefined
  if ('plateId' in end) return reader.find('room', reader.find('plate', end.plateId)?.roomId)
  if ('rackId' in end) return reader.find('room', reader.find('rack', end.rackId)?.roomId)
  const device = reader.find('device', end.deviceId)
  return reader.find('room', reader.find('plate', device?.plateId)?.roomId ?? reader.find('rack', device?.rackId)?.roomId ?? device?.roomId)
}

/** The front of a jack or port that an end has behind it; null for a device's own terminal, a rack, or an open end. */
function frontOf(end: RunEnd): Parameters<typeof cordsOn>[1] | null {
  if ('plateId' in end) return end.jackId === null ? null : { plateId: end.plateId, jackId: end.jackId }
  return 'deviceId' in end && end.terminal !== null ? { deviceId: end.deviceId, terminal: end.terminal } : null
}

/** The device's terminal that an end comes to: itself, or the one beyond a jack's or a panel port's cord. */
export function deviceBeyond(reader: JobReader, end: RunEnd | null): TerminalAt | undefined {
  if (!end || 'rackId' in end) return undefined
  if ('deviceId' in end) {
    const at = terminalAt(reader, end.deviceId, end.terminal)
    if (!at || at.category !== 'panel') return at
  }
  const front = frontOf(end)
  for (const { far } of front ? cordsOn(reader, front) : []) {
    const there = 'deviceId' in far ? terminalAt(reader, far.deviceId, far.terminal) : undefined
    if (there && there.category !== 'panel') return there
  }
  return undefined
}

/** The cords at both ends of a run together, mm; the longest where an end has several. */
export function cordsMmOf(reader: JobReader, run: Run): number {
  const longest = (end: RunEnd | null) => {
    const front = end && frontOf(end)
    return front ? Math.max(0, ...cordsOn(reader, front).map(({ cord }) => cord.lengthMm)) : 0
  }
  return longest(run.a) + longest(run.b)
}
