import { AppError } from '../errors.ts'
import { kindWord, type JobDocument, type Records } from '../model/jobDocument.ts'
import { recordSchemas, type JobRecord, type Kind, type RecordOf } from '../model/record.ts'
import { same } from './same.ts'

export type FieldChange = readonly [before: unknown, after: unknown]

export interface Update {
  readonly kind: Kind
  readonly id: string
  readonly fields: Readonly<Record<string, FieldChange>>
}

/** What a command did, field by field. Plain JSON: it is stored, sent, and turned around. */
export interface Change {
  readonly added: readonly JobRecord[]
  readonly removed: readonly JobRecord[]
  readonly updated: readonly Update[]
}

export const noChange: Change = { added: [], removed: [], updated: [] }
export const adds = (...added: JobRecord[]): Change => ({ ...noChange, added })
export const removes = (...removed: JobRecord[]): Change => ({ ...noChange, removed })

/** The change that gives a record these values; fields that have them already are left out. */
export function updates<K extends Kind>(record: RecordOf<K>, next: Partial<RecordOf<K>>): Change {
  const fields: Record<string, FieldChange> = {}
  for (const [field, after] of Object.entries(next)) {
    const before = (record as Record<string, unknown>)[field]
    if (after !== undefined && !same(before, after)) fields[field] = [before, after]
  }
  return Object.keys(fields).length ? { ...noChange, updated: [{ kind: record.kind, id: record.id, fields }] } : noChange
}

export const isEmpty = (change: Change): boolean => !change.added.length && !change.removed.length && !change.updated.length

/** The change that undoes this one. Its own reverse is the change itself. */
export const reverse = (change: Change): Change => ({
  added: change.removed,
  removed: change.added,
  updated: change.updated.map(({ kind, id, fields }) => ({
    kind,
    id,
    fields: Object.fromEntries(Object.entries(fields).map(([field, [before, after]]) => [field, [after, before] as const])),
  })),
})

/**
 * Applies a change, and refuses it when the job no longer looks the way the change expects.
 * Copies only the maps of the kinds it touches. Throws AppError conflict, or a ZodError when a record is malformed.
 */
export function apply(doc: JobDocument, change: Change): JobDocument {
  const records: Record<Kind, ReadonlyMap<string, JobRecord>> = { ...(doc.records as Record<Kind, ReadonlyMap<string, JobRecord>>) }
  const own = new Set<Kind>()
  const mapOf = (kind: Kind): Map<string, JobRecord> => {
    if (!own.has(kind)) {
      records[kind] = new Map(records[kind])
      own.add(kind)
    }
    return records[kind] as Map<string, JobRecord>
  }
  for (const record of change.removed) {
    if (!same(records[record.kind].get(record.id), record)) throw movedOn(record.kind, record.id)
    mapOf(record.kind).delete(record.id)
  }
  for (const record of change.added) {
    if (records[record.kind].has(record.id)) throw new AppError('conflict', `That ${kindWord(record.kind)} is already on the job`, { kind: record.kind, id: record.id })
    mapOf(record.kind).set(record.id, recordSchemas[record.kind].parse(record))
  }
  for (const { kind, id, fields } of change.updated) {
    const record = records[kind].get(id)
    if (!record) throw new AppError('conflict', `That ${kindWord(kind)} is no longer on the job`, { kind, id })
    const next: Record<string, unknown> = { ...record }
    for (const [field, [before, after]] of Object.entries(fields)) {
      if (!same(next[field], before)) throw movedOn(kind, id, field)
      next[field] = after
    }
    mapOf(kind).set(id, recordSchemas[kind].parse(next))
  }
  return { ...doc, records: records as Records }
}

const movedOn = (kind: Kind, id: string, field?: string) =>
  new AppError('conflict', `Somebody has changed ${field ? `the ${fieldWord(field)} of that ${kindWord(kind)}` : `that ${kindWord(kind)}`} since`, { kind, id, field })

/** A field's name as a person says it: slackAMm becomes "slack a". */
export const fieldWord = (field: string): string =>
  field.replace(/(Mm|Id|Ids|Um)$/, '').replace(/([A-Z])/g, ' $1').toLowerCase().trim()
