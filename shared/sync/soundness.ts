import { AppError } from '../errors.ts'
import { find, jobOf, kindWord, type JobDocument } from '../model/jobDocument.ts'
import { plateCode, terminalOf } from '../model/naming.ts'
import { fieldKinds, kinds, type JobRecord, type Kind } from '../model/record.ts'
import { keyOf, referencesOf } from '../model/references.ts'
import type { CordEnd, RunEnd } from '../model/run.ts'
import type { Change } from './change.ts'
import { uniqueFields, uniqueKeyOf } from './unique.ts'

/** What must hold after any change, whoever made it and by whatever verb. Looks only at what the change reached. */
export function assertSound(after: JobDocument, change: Change): void {
  for (const { kind } of [...change.removed, ...change.updated])
    if (fieldKinds.has(kind)) throw new AppError('refused', `A ${kindWord(kind)} is a record of what happened: it is struck out, never ${change.removed.length ? 'removed' : 'changed'}`)
  const job = jobOf(after)
  const written = [...change.added, ...change.updated.map(({ kind, id }) => find(after, kind, id)!)]
  for (const record of written) {
    assertReferences(after, record)
    assertPlace(after, record)
    if (record.kind === 'job' && record.id !== job.id) throw new AppError('refused', 'A job has one record of its own')
  }
  if (change.removed.length) assertNothingDangles(after, change)
  const reached = new Set(change.updated.filter((update) => touchesFace(update.kind, update.fields)).map(keyOf))
  if (reached.size) assertEndsStillFit(after, reached)
  assertUnique(after, change, written)
}

function assertReferences(doc: JobDocument, record: JobRecord) {
  for (const { kind, id } of referencesOf(record))
    if (!find(doc, kind, id)) throw new AppError('refused', `${nameOf(doc, record)} would have no ${kindWord(kind)}`, { kind: record.kind, id: record.id })
}

function assertNothingDangles(doc: JobDocument, change: Change) {
  const gone = new Set(change.removed.map(keyOf))
  for (const kind of kinds)
    for (const record of doc.records[kind].values() as Iterable<JobRecord>)
      if (referencesOf(record).some((reference) => gone.has(keyOf(reference)) && !find(doc, reference.kind, reference.id)))
        throw new AppError('refused', `${nameOf(doc, record)} still needs what would be removed`, { kind: record.kind, id: record.id })
}

/** A change that may take a jack or a terminal away from under a run or cord. */
const touchesFace = (kind: Kind, fields: object) =>
  (kind === 'plate' && 'jacks' in fields) || (kind === 'deviceModel' && 'terminals' in fields) || (kind === 'device' && 'modelId' in fields)

function assertEndsStillFit(doc: JobDocument, reached: ReadonlySet<string>) {
  const affected = (end: RunEnd | CordEnd | null) => {
    if (!end || 'rackId' in end) return false
    if ('plateId' in end) return reached.has(`plate:${end.plateId}`)
    const device = find(doc, 'device', end.deviceId)
    return reached.has(`device:${end.deviceId}`) || (device !== undefined && reached.has(`deviceModel:${device.modelId}`))
  }
  for (const record of [...doc.records.run.values(), ...doc.records.cord.values()])
    if (affected(record.a) || affected(record.b)) assertPlace(doc, record)
}

/** Rules of one record that its schema cannot see. */
function assertPlace(doc: JobDocument, record: JobRecord) {
  if (record.kind === 'run' || record.kind === 'cord') for (const end of [record.a, record.b]) assertEnd(doc, record, end)
  if (record.kind === 'device') {
    const places = [record.plateId, record.rackId, record.roomId].filter((id) => id !== null).length
    if (places !== 1) throw new AppError('refused', `${record.name} must stand in one place: at a plate, in a rack or in a room`)
    if (record.rackId && record.unit === null) throw new AppError('refused', `Say which rack unit ${record.name} starts at`)
  }
  if (record.kind === 'plate') {
    const wall = record.wall !== null
    if (wall && record.wall! >= (find(doc, 'room', record.roomId)?.outline.length ?? 0)) throw new AppError('refused', `${plateCode(doc, record)} is on a wall that the room does not have`)
    const ids = new Set(record.jacks.map((jack) => jack.id))
    const positions = new Set(record.jacks.map((jack) => jack.position))
    if (ids.size < record.jacks.length || positions.size < record.jacks.length) throw new AppError('refused', `${plateCode(doc, record)} has two jacks in one position`)
  }
  if (record.kind === 'pathway' && record.bottomLevelId === record.topLevelId) throw new AppError('refused', `${record.name} must join two different levels`)
}

function assertEnd(doc: JobDocument, record: JobRecord, end: RunEnd | CordEnd | null) {
  if (!end) return
  if ('plateId' in end && end.jackId !== null && !find(doc, 'plate', end.plateId)?.jacks.some((jack) => jack.id === end.jackId))
    throw new AppError('refused', `${nameOf(doc, record)} would end at a jack that the plate does not have`)
  if ('deviceId' in end && end.terminal !== null && !terminalOf(doc, find(doc, 'device', end.deviceId)!, end.terminal))
    throw new AppError('refused', `${nameOf(doc, record)} would end at a terminal that the device does not have`)
}

function assertUnique(doc: JobDocument, change: Change, written: readonly JobRecord[]) {
  const touched = new Map(change.updated.map((update) => [keyOf(update), update.fields]))
  const holders = new Map<Kind, ReadonlyMap<string, readonly JobRecord[]>>()
  for (const record of written) {
    const rule = uniqueFields[record.kind]
    if (!rule) continue
    const fields = touched.get(keyOf(record))
    if (fields && !rule.fields.some((field) => field in fields)) continue
    const held = holders.get(record.kind) ?? holdersOf(doc, record.kind)
    holders.set(record.kind, held)
    for (const key of uniqueKeyOf(record)) {
      const other = held.get(key)?.find((each) => each.id !== record.id)
      if (other) throw new AppError('refused', rule.say(doc, record, other), { kind: record.kind, id: record.id, other: other.id })
    }
  }
}

/** Who has which unique key, read once for a whole change: a change of thousands must not look at each pair. */
function holdersOf(doc: JobDocument, kind: Kind): ReadonlyMap<string, readonly JobRecord[]> {
  const holders = new Map<string, JobRecord[]>()
  for (const record of doc.records[kind].values() as Iterable<JobRecord>)
    for (const key of uniqueKeyOf(record)) {
      const known = holders.get(key)
      if (known) known.push(record)
      else holders.set(key, [record])
    }
  return holders
}

/** What a person calls a record. */
export function nameOf(doc: JobDocument, record: JobRecord): string {
  if (record.kind === 'run') return `Run ${record.label}`
  if (record.kind === 'plate') return plateCode(doc, record)
  if ('name' in record) return record.name
  if ('runId' in record) return `The ${kindWord(record.kind)} of ${find(doc, 'run', record.runId)?.label ?? 'a run'}`
  return `A ${kindWord(record.kind)}`
}
