import type { CatalogDeviceModel } from '../../../../shared/api/catalog.ts'
import type { Step } from '../../../../shared/commands/index.ts'
import { find, jobOf, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Plate } from '../../../../shared/model/place.ts'
import { copyOfModel } from './jobCopies.ts'
import type { Planned } from './planPlate.ts'
import { ceilingOf, placeAt, snapHeight, type RoomPoint } from './roomPoint.ts'

/** A device of the catalogue where somebody clicked: at the plate there, else in the room. Takes the job's own copy of its model along. */
export function planDevice(doc: JobDocument, entry: CatalogDeviceModel, point: RoomPoint, plate: Plate | null, newId: () => string): Planned {
  const copy = copyOfModel(doc, entry, newId)
  const id = newId()
  const room = find(doc, 'room', point.roomId)!
  const ceilingMm = ceilingOf(doc, room)
  const place = plate
    ? { plateId: plate.id }
    : { roomId: room.id, at: placeAt(doc, point, 'ceiling').at, heightMm: Math.min(30_000, snapHeight(point.up * ceilingMm, ceilingMm, jobOf(doc).lengthUnit)) }
  const step: Step = { verb: 'device.add', args: { id, modelId: copy.id, name: entry.description.name, ...place } }
  return { intent: { verb: 'batch', args: { label: `Add ${entry.description.name} in ${room.name}`, steps: [...copy.steps, step] } }, plateId: '', runIds: [], caution: null }
}

/** Lowest run of free units of this height, from the top of the rack down, as panels are usually stacked; null: the rack is full. */
export function freeUnit(doc: JobDocument, rackId: string, heightUnits: number): number | null {
  const rack = find(doc, 'rack', rackId)
  if (!rack) return null
  const taken = new Set<number>()
  for (const device of recordsOf(doc, 'device')) {
    if (device.rackId !== rackId || device.unit === null) continue
    const units = Math.max(1, find(doc, 'deviceModel', device.modelId)?.rackUnits ?? 1)
    for (let unit = device.unit; unit < device.unit + units; unit++) taken.add(unit)
  }
  for (let unit = rack.units - heightUnits + 1; unit >= 1; unit--) if (Array.from({ length: heightUnits }, (_, index) => unit + index).every((each) => !taken.has(each))) return unit
  return null
}

const codeLetters: Partial<Record<string, string>> = { 'speaker-pair': 'SP', modular: 'PP', coax: 'CX', fibre: 'FB', control: 'KB', power: 'SH', line: 'LL', hdmi: 'HD', usb: 'US' }

/** The next free code for a device in a rack: PP3 after PP2; by its jacks for a panel, by its kind otherwise. */
export function nextCode(doc: JobDocument, entry: Pick<CatalogDeviceModel, 'description'>): string {
  const { category, terminals } = entry.description
  const letters = category === 'panel' ? (codeLetters[terminals[0]?.connector ?? ''] ?? 'PN') : category === 'amplifier' ? 'AMP' : category === 'switch' ? 'SW' : category === 'receiver' ? 'RCV' : 'D'
  const taken = new Set(recordsOf(doc, 'device').flatMap((device) => (device.code ? [device.code] : [])))
  for (let number = 1; ; number++) if (!taken.has(`${letters}${number}`)) return `${letters}${number}`
}

/** A device of the catalogue in a rack, at the highest free place: one command. Null where the rack is full. */
export function planRackDevice(doc: JobDocument, entry: CatalogDeviceModel, rackId: string, newId: () => string, count = 1): Planned | null {
  const copy = copyOfModel(doc, entry, newId)
  const steps: Step[] = [...copy.steps]
  let known = doc
  let first = ''
  for (let index = 0; index < count; index++) {
    const unit = freeUnit(known, rackId, Math.max(1, entry.description.rackUnits))
    if (unit === null) return index ? { intent: { verb: 'batch', args: { label: `Add ${entry.description.name}`, steps } }, plateId: '', runIds: [], caution: `The rack took ${index} of ${count}` } : null
    const code = nextCode(known, entry)
    const id = newId()
    first ||= id
    const base = entry.description.name.replace(/,.*$/, '')
    const args = { id, modelId: copy.id, name: `${base} ${code.replace(/^\D+/, '')}`, code, rackId, unit }
    steps.push({ verb: 'device.add', args })
    known = withDevice(known, { ...args, rackUnits: entry.description.rackUnits })
  }
  return { intent: { verb: 'batch', args: { label: `Add ${entry.description.name}`, steps } }, plateId: first, runIds: [], caution: null }
}

/** The job as it will be with one more device, as far as finding the next free place and code goes. */
function withDevice(doc: JobDocument, added: { id: string; modelId: string; name: string; code: string; rackId: string; unit: number; rackUnits: number }): JobDocument {
  const { rackUnits, ...device } = added
  const models = new Map(doc.records.deviceModel)
  if (!models.has(device.modelId)) models.set(device.modelId, { kind: 'deviceModel', id: device.modelId, catalogId: null, catalogVersion: null, name: 'x', category: 'other', rackUnits, terminals: [], passes: [], sharedPowerW: null })
  const devices = new Map(doc.records.device)
  devices.set(device.id, { kind: 'device', plateId: null, roomId: null, at: null, heightMm: null, suppliedBy: 'us', loadOhm: null, tapW: null, videoFormat: null, zones: {}, ...device })
  return { ...doc, records: { ...doc.records, deviceModel: models, device: devices } }
}
