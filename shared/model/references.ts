import type { JobDocument } from './jobDocument.ts'
import { kinds, type JobRecord, type Kind } from './record.ts'
import type { CordEnd, RunEnd } from './run.ts'

export interface Reference {
  readonly kind: Kind
  readonly id: string
  /** The record can do without it: when it goes, the reference is dropped and the record stays. */
  readonly soft?: true
}

const endReference = (end: RunEnd | CordEnd | null): Reference[] => {
  if (!end) return []
  if ('plateId' in end) return [{ kind: 'plate', id: end.plateId }]
  if ('deviceId' in end) return [{ kind: 'device', id: end.deviceId }]
  return [{ kind: 'rack', id: end.rackId }]
}
const one = (kind: Kind, id: string | null): Reference[] => (id ? [{ kind, id }] : [])

/** What a record points at. The database's foreign keys say the same. */
export function referencesOf(record: JobRecord): Reference[] {
  switch (record.kind) {
    case 'job':
    case 'level':
    case 'cableType':
    case 'deviceModel':
    case 'acceptance':
      return []
    case 'room':
      return one('level', record.levelId)
    case 'plate':
    case 'rack':
      return one('room', record.roomId)
    case 'pathway':
      return [...one('level', record.bottomLevelId), ...one('level', record.topLevelId)]
    case 'device':
      return [...one('deviceModel', record.modelId), ...one('plate', record.plateId), ...one('rack', record.rackId), ...one('room', record.roomId)]
    case 'run':
      return [...one('cableType', record.cableTypeId), ...endReference(record.a), ...endReference(record.b), ...record.pathwayIds.map((id) => ({ kind: 'pathway' as const, id, soft: true as const }))]
    case 'cord':
      return [...endReference(record.a), ...endReference(record.b)]
    case 'labelPrint':
    case 'pull':
    case 'termination':
    case 'test':
      return one('run', record.runId)
    case 'strike':
      return one(record.targetKind, record.targetId)
  }
}

/** Everything that cannot stay when these records go: what hangs on them, and what hangs on that. */
export function dependentsOf(doc: JobDocument, gone: readonly Reference[]): JobRecord[] {
  const lost = new Set(gone.map(keyOf))
  const found: JobRecord[] = []
  for (let grew = true; grew; ) {
    grew = false
    for (const kind of kinds)
      for (const record of doc.records[kind].values() as Iterable<JobRecord>) {
        if (lost.has(keyOf(record)) || !referencesOf(record).some((reference) => !reference.soft && lost.has(keyOf(reference)))) continue
        lost.add(keyOf(record))
        found.push(record)
        grew = true
      }
  }
  return found
}

/** One string for a record's place in a job. */
export const keyOf = ({ kind, id }: Reference): string => `${kind}:${id}`
