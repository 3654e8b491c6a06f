import type { JobDocument } from '../model/jobDocument.ts'
import { plateCode } from '../model/naming.ts'
import type { JobRecord, Kind } from '../model/record.ts'

interface UniqueRule {
  /** A change to one of these fields makes the rule be asked again. */
  readonly fields: readonly string[]
  readonly say: (doc: JobDocument, record: JobRecord, other: JobRecord) => string
}

const nameAndCode = (record: JobRecord) => ('name' in record && 'code' in record ? `${record.name} (${record.code})` : record.id)

/** What two records of a kind may not share. */
export const uniqueFields: Partial<Record<Kind, UniqueRule>> = {
  level: { fields: ['code'], say: (_doc, record, other) => `Code ${codeOf(record)} is taken by ${nameAndCode(other)}. Give each level its own code` },
  room: { fields: ['code'], say: (_doc, record, other) => `Code ${codeOf(record)} is taken by ${nameAndCode(other)}. Give each room its own code, because labels are made of it` },
  rack: { fields: ['code'], say: (_doc, record, other) => `Code ${codeOf(record)} is taken by ${nameAndCode(other)}. Give each rack its own code` },
  device: { fields: ['code'], say: (_doc, record, other) => `Code ${codeOf(record)} is taken by ${nameAndCode(other)}. Its ports are labelled with it` },
  plate: { fields: ['number', 'roomId'], say: (doc, record) => `There is a plate ${record.kind === 'plate' ? plateCode(doc, record) : ''} already` },
  run: { fields: ['label', 'serial'], say: (_doc, record) => `Label ${record.kind === 'run' ? record.label : ''} is on another run already. A label names one cable` },
  cableType: { fields: ['code'], say: (_doc, record) => `There is a cable type ${codeOf(record)} on this job already` },
}

const codeOf = (record: JobRecord) => ('code' in record ? record.code : '')

/** The strings that no other record of the kind may have. Capitals do not tell two labels or codes apart. */
export function uniqueKeyOf(record: JobRecord): string[] {
  switch (record.kind) {
    case 'level':
    case 'room':
    case 'rack':
    case 'cableType':
      return [record.code.toUpperCase()]
    case 'device':
      return record.code ? [record.code] : []
    case 'plate':
      return [`${record.roomId}/${record.number}`]
    case 'run':
      return [record.label.toUpperCase(), `#${record.serial}`]
    default:
      return []
  }
}
