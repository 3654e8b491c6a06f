import { find, type JobDocument } from './jobDocument.ts'
import type { Device, Terminal } from './device.ts'
import type { Plate, Room } from './place.ts'
import type { CordEnd, EndName, Run, RunEnd } from './run.ts'

/** A plate's code: its room's code and its number (PAT1). */
export const plateCode = (doc: JobDocument, plate: Plate): string => `${find(doc, 'room', plate.roomId)?.code ?? '?'}${plate.number}`

/** A terminal of a device, or undefined. */
export const terminalOf = (doc: JobDocument, device: Device, key: string | null): Terminal | undefined =>
  key === null ? undefined : find(doc, 'deviceModel', device.modelId)?.terminals.find((terminal) => terminal.key === key)

/** A port as it is written on the panel: code of the device and position (SP1-12); the terminal's name where there is no code. */
export function portLabel(doc: JobDocument, device: Device, key: string): string {
  const terminal = terminalOf(doc, device, key)
  if (!terminal) return `${device.code ?? device.name} ${key}`
  return isPanel(doc, device) ? `${device.code ?? device.name}-${String(terminal.position).padStart(2, '0')}` : `${device.name}, ${terminal.name}`
}

/** Whether a device is a panel: its terminals have a back for the run and a front for the cord. */
export const isPanel = (doc: JobDocument, device: Device): boolean => find(doc, 'deviceModel', device.modelId)?.category === 'panel'

/** An end in words: plate and jack position, port, device or rack. */
export function endLabel(doc: JobDocument, end: RunEnd | CordEnd | null): string {
  if (!end) return 'no end yet'
  if ('plateId' in end) {
    const plate = find(doc, 'plate', end.plateId)
    if (!plate) return 'a plate that is gone'
    const jack = plate.jacks.find((each) => each.id === end.jackId)
    return jack ? `${plateCode(doc, plate)} jack ${jack.position}` : plateCode(doc, plate)
  }
  if ('deviceId' in end) {
    const device = find(doc, 'device', end.deviceId)
    if (!device) return 'a device that is gone'
    return end.terminal ? portLabel(doc, device, end.terminal) : device.name
  }
  return find(doc, 'rack', end.rackId)?.name ?? 'a rack that is gone'
}

/** The room a device stands in, by its plate, its rack or itself. */
export function roomOfDevice(doc: JobDocument, device: Device): Room | undefined {
  const plate = find(doc, 'plate', device.plateId)
  const rack = find(doc, 'rack', device.rackId)
  return find(doc, 'room', plate?.roomId ?? rack?.roomId ?? device.roomId)
}

/** The room an end is in. */
export function roomOfEnd(doc: JobDocument, end: RunEnd | CordEnd | null): Room | undefined {
  if (!end) return undefined
  if ('plateId' in end) return find(doc, 'room', find(doc, 'plate', end.plateId)?.roomId)
  if ('rackId' in end) return find(doc, 'room', find(doc, 'rack', end.rackId)?.roomId)
  const device = find(doc, 'device', end.deviceId)
  return device && roomOfDevice(doc, device)
}

/** The plate an end is at: its own, or the one its device sits on. */
export function plateOfEnd(doc: JobDocument, end: RunEnd | CordEnd | null): Plate | undefined {
  if (!end || 'rackId' in end) return undefined
  if ('plateId' in end) return find(doc, 'plate', end.plateId)
  return find(doc, 'plate', find(doc, 'device', end.deviceId)?.plateId)
}

/** Whether an end is at a rack: the rack itself, or something in it. */
export function rackIdOfEnd(doc: JobDocument, end: RunEnd | CordEnd | null): string | undefined {
  if (!end) return undefined
  if ('rackId' in end) return end.rackId
  return 'deviceId' in end ? (find(doc, 'device', end.deviceId)?.rackId ?? undefined) : undefined
}

/**
 * The end out in the building, which names the run: the one that is not at a rack; where neither or both are, end b.
 */
export function fieldEnd(doc: JobDocument, run: Run): EndName {
  const aAtRack = rackIdOfEnd(doc, run.a) !== undefined
  const bAtRack = rackIdOfEnd(doc, run.b) !== undefined
  if (bAtRack && !aAtRack && run.a) return 'a'
  return run.b || !run.a ? 'b' : 'a'
}
