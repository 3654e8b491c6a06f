import { find, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { endLabel, plateCode } from '../../../shared/model/naming.ts'
import type { Point } from '../../../shared/model/fields.ts'
import type { RunEnd } from '../../../shared/model/run.ts'
import { fieldWord } from '../../../shared/sync/change.ts'
import { formatLength } from '../../../shared/units.ts'

/** A field's value as a person reads it: names for ids, lengths in the job's unit, an end by its label. */
export function fieldText(doc: JobDocument, field: string, value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing'
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'number') return field.endsWith('Mm') ? formatLength(value, jobOf(doc).lengthUnit, { as: 'exact' }) : String(value)
  if (typeof value === 'string') return field.endsWith('Id') ? nameOfId(doc, value) : value
  if (field === 'a' || field === 'b') return endLabel(doc, value as RunEnd)
  if (Array.isArray(value)) return listText(doc, field, value)
  if (isPoint(value)) return `${fieldText(doc, 'xMm', value.xMm)} east, ${fieldText(doc, 'yMm', value.yMm)} south`
  return Object.entries(value).map(([key, each]) => `${fieldWord(key)} ${fieldText(doc, key, each)}`).join(', ') || 'nothing'
}

function listText(doc: JobDocument, field: string, values: readonly unknown[]): string {
  if (!values.length) return 'none'
  if (field === 'outline') return `${values.length} corners`
  if (values.every((each) => typeof each === 'string')) return values.map((each) => (field.endsWith('Ids') ? nameOfId(doc, each) : each)).join(', ')
  return `${values.length} ${fieldWord(field)}`
}

const isPoint = (value: object): value is Point => 'xMm' in value && 'yMm' in value

const named = ['cableType', 'deviceModel', 'room', 'level', 'rack', 'pathway', 'device', 'run'] as const

function nameOfId(doc: JobDocument, id: string): string {
  const plate = find(doc, 'plate', id)
  if (plate) return plateCode(doc, plate)
  for (const kind of named) {
    const record = find(doc, kind, id) as { readonly name?: string; readonly code?: string | null; readonly label?: string } | undefined
    if (record) return record.label ?? (kind === 'cableType' ? record.code : record.name) ?? id
  }
  return 'something that is gone'
}
