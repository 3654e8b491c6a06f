import { AppError } from '../errors.ts'
import type { Job } from './job.ts'
import { kinds, type JobRecord, type Kind, type RecordOf } from './record.ts'

export type Records = { readonly [K in Kind]: ReadonlyMap<string, RecordOf<K>> }

/**
 * One job, whole and immutable. `version` counts the commands the server has accepted.
 * Records are kept by kind, and a change replaces only the maps of the kinds it touches, so whoever derives
 * something can see by identity what is still the same.
 */
export interface JobDocument {
  readonly id: string
  readonly version: number
  readonly records: Records
}

/** A document holding these records. */
export function buildDocument(id: string, version: number, records: Iterable<JobRecord>): JobDocument {
  const byKind = Object.fromEntries(kinds.map((kind) => [kind, new Map<string, JobRecord>()])) as Record<Kind, Map<string, JobRecord>>
  for (const record of records) byKind[record.kind].set(record.id, record)
  return { id, version, records: byKind as unknown as Records }
}

/** Every record, parents before children. */
export function* allRecords(doc: JobDocument): Generator<JobRecord> {
  for (const kind of kinds) yield* doc.records[kind].values()
}

/** All records of a kind, in the order they were added. */
export const recordsOf = <K extends Kind>(doc: JobDocument, kind: K): RecordOf<K>[] => [...(doc.records[kind] as ReadonlyMap<string, RecordOf<K>>).values()]

/** A record, or undefined. */
export const find = <K extends Kind>(doc: JobDocument, kind: K, id: string | null | undefined): RecordOf<K> | undefined =>
  id ? (doc.records[kind] as ReadonlyMap<string, RecordOf<K>>).get(id) : undefined

const kindWords: Partial<Record<Kind, string>> = { cableType: 'cable type', deviceModel: 'device model', labelPrint: 'label print' }
/** The word a person uses for a kind. */
export const kindWord = (kind: Kind): string => kindWords[kind] ?? kind

/** A record that must exist. Throws AppError not_found with a sentence. */
export function need<K extends Kind>(doc: JobDocument, kind: K, id: string): RecordOf<K> {
  const record = find(doc, kind, id)
  if (!record) throw new AppError('not_found', `That ${kindWord(kind)} is no longer on the job`, { kind, id })
  return record
}

/** The job's own record: its name, units, limits, slack and label pattern. */
export const jobOf = (doc: JobDocument): Job => need(doc, 'job', doc.id)
