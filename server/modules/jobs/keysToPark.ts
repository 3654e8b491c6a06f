import { find, type JobDocument } from '../../../shared/model/jobDocument.ts'
import type { JobRecord, Kind } from '../../../shared/model/record.ts'
import type { Change, Update } from '../../../shared/sync/change.ts'
import { uniqueFields, uniqueKeyOf } from '../../../shared/sync/unique.ts'

/** Records of one kind that give up a key somebody else takes in the same change, and the columns of that key. */
export interface Parked {
  readonly ids: ReadonlySet<string>
  readonly columns: readonly string[]
  readonly isText: (column: string) => boolean
}

/** The columns that hold a kind's key, and whether they hold text. The room of a plate stays: its number is enough. */
const keyColumns: Partial<Record<Kind, Readonly<Record<string, 'text' | 'number'>>>> = {
  level: { code: 'text' },
  room: { code: 'text' },
  rack: { code: 'text' },
  device: { code: 'text' },
  cableType: { code: 'text' },
  plate: { number: 'number' },
  run: { label: 'text', serial: 'number' },
}

/**
 * A unique key is checked row by row, so two rooms cannot swap codes in the database as they can in a document. Those
 * that give a key away take an impossible one first.
 */
export function keysToPark(after: JobDocument, change: Change): ReadonlyMap<Kind, Parked> {
  const givers = new Map<string, JobRecord>()
  const takers: JobRecord[] = []
  for (const record of change.removed) for (const key of uniqueKeyOf(record)) givers.set(`${record.kind} ${key}`, record)
  for (const update of change.updated) {
    if (!uniqueFields[update.kind]?.fields.some((field) => field in update.fields)) continue
    const now = find(after, update.kind, update.id)! as JobRecord
    for (const key of uniqueKeyOf(recordBefore(now, update))) givers.set(`${update.kind} ${key}`, now)
    takers.push(now)
  }
  if (!givers.size) return new Map()
  const ids = new Map<Kind, Set<string>>()
  for (const taker of [...takers, ...change.added])
    for (const key of uniqueKeyOf(taker)) {
      const giver = givers.get(`${taker.kind} ${key}`)
      if (!giver || giver.id === taker.id) continue
      ids.set(taker.kind, (ids.get(taker.kind) ?? new Set()).add(giver.id))
    }
  return new Map([...ids].map(([kind, set]) => {
    const columns = keyColumns[kind]!
    return [kind, { ids: set, columns: Object.keys(columns), isText: (column) => columns[column] === 'text' }]
  }))
}

/** A record as it was before an update. */
export const recordBefore = (now: JobRecord, { fields }: Update): JobRecord =>
  ({ ...now, ...Object.fromEntries(Object.entries(fields).map(([field, [before]]) => [field, before])) }) as JobRecord
