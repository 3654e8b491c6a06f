import type { JobDocument, Records } from '../../shared/model/jobDocument.ts'
import { fieldKinds, kinds, recordSchemas, type JobRecord, type Kind } from '../../shared/model/record.ts'

/** The job with one record replaced, added or (undefined) taken away, whatever it leaves behind. */
export function put(doc: JobDocument, kind: Kind, id: string, record: JobRecord | undefined): JobDocument {
  const map = new Map(doc.records[kind] as ReadonlyMap<string, JobRecord>)
  if (record) map.set(id, record)
  else map.delete(id)
  return { ...doc, records: { ...doc.records, [kind]: map } as Records }
}

/** A record with one field changed, and the name of what was changed. */
export interface FieldEdit {
  readonly name: string
  readonly record: JobRecord
}

/**
 * Every field of every record of a job, changed in several ways: to what other records of its kind have there, to
 * nothing, to every choice of an enumeration, to more and less. Only what the record's own schema allows; and what people
 * said in the field is left alone, as it never changes.
 */
export function* everyFieldEdit(doc: JobDocument): Generator<FieldEdit> {
  for (const kind of kinds.filter((each) => !fieldKinds.has(each)))
    for (const record of doc.records[kind].values() as Iterable<JobRecord>)
      for (const field of Object.keys(recordSchemas[kind].shape)) {
        if (field === 'kind' || field === 'id') continue
        const own = (record as Record<string, unknown>)[field]
        const seen = new Set([JSON.stringify(own)])
        for (const value of [...othersOf(doc, kind, field), ...variantsOf(own), ...choicesOf(kind, field)]) {
          const text = JSON.stringify(value)
          if (seen.has(text)) continue
          seen.add(text)
          const parsed = recordSchemas[kind].safeParse({ ...record, [field]: value })
          if (parsed.success) yield { name: `${kind} ${record.id} ${field} ${text?.slice(0, 60)}`, record: parsed.data as JobRecord }
        }
      }
}

const othersOf = (doc: JobDocument, kind: Kind, field: string): unknown[] => [...(doc.records[kind].values() as Iterable<JobRecord>)].map((record) => (record as unknown as Record<string, unknown>)[field])

function variantsOf(value: unknown): unknown[] {
  if (typeof value === 'number') return [null, value + 1, value * 3, 0]
  if (typeof value === 'boolean') return [!value]
  if (typeof value === 'string') return [null, `${value}X`]
  if (Array.isArray(value)) return [null, value.slice(1), [...value].reverse(), value.map((each) => (isObject(each) ? changedOne(each) : each))]
  if (isObject(value)) return [null, ...Object.keys(value).flatMap((key) => variantsOf(value[key]).map((variant) => ({ ...value, [key]: variant })))]
  return [1, 'X']
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value)

/** An object with its ratings or its first number changed: a terminal of another load, a corner moved. */
function changedOne(value: Record<string, unknown>): Record<string, unknown> {
  if (isObject(value['ratings'])) return { ...value, ratings: Object.fromEntries(Object.entries(value['ratings']).map(([key, rating]) => [key, typeof rating === 'number' ? rating * 2 : rating])) }
  const key = Object.keys(value).find((each) => typeof value[each] === 'number')
  return key === undefined ? value : { ...value, [key]: (value[key] as number) + 500 }
}

function choicesOf(kind: Kind, field: string): unknown[] {
  const schema = (recordSchemas[kind].shape as Record<string, unknown>)[field] as { options?: unknown; unwrap?: () => { options?: unknown } }
  const options = schema.options ?? schema.unwrap?.().options
  return Array.isArray(options) && options.every((each) => typeof each === 'string') ? options : []
}
