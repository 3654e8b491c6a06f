import { AppError } from '../errors.ts'
import { find, kindWord, type JobDocument } from '../model/jobDocument.ts'
import { keyOf } from '../model/references.ts'
import { fieldWord, type Change } from './change.ts'
import { same } from './same.ts'

/** One field that somebody else wrote, with the value it then got. */
export interface ForeignWrite {
  readonly byId: string
  readonly version: number
  readonly value: unknown
}

/** What others wrote since a version, by record (`kind:id`) and field. */
export type ForeignWrites = ReadonlyMap<string, ReadonlyMap<string, ForeignWrite>>

export interface LoggedChange {
  readonly version: number
  readonly actorId: string
  readonly change: Change
}

/** Gathers what others than `actorId` wrote in these log entries. The last write of a field counts. */
export function foreignWrites(entries: Iterable<LoggedChange>, actorId: string): ForeignWrites {
  const writes = new Map<string, Map<string, ForeignWrite>>()
  for (const { version, actorId: byId, change } of entries) {
    if (byId === actorId) continue
    for (const update of change.updated) {
      const fields = writes.get(keyOf(update)) ?? new Map<string, ForeignWrite>()
      for (const [field, [, value]] of Object.entries(update.fields)) fields.set(field, { byId, version, value })
      writes.set(keyOf(update), fields)
    }
  }
  return writes
}

export interface ConflictDetails {
  readonly kind: string
  readonly id: string
  readonly field: string
  readonly mine: unknown
  readonly theirs: unknown
  readonly byId: string
  readonly version: number
}

/**
 * Refuses a change that would overwrite what somebody else wrote after its author last looked. Both values and who
 * wrote the other go with the refusal, so that a person can decide. Throws AppError conflict.
 */
export function assertNoConflict(doc: JobDocument, change: Change, foreign: ForeignWrites): void {
  if (!foreign.size) return
  for (const update of change.updated)
    for (const [field, [, mine]] of Object.entries(update.fields)) {
      const theirs = foreign.get(keyOf(update))?.get(field)
      if (theirs && !same(mine, theirs.value)) throw conflict(doc, { kind: update.kind, id: update.id, field, mine, theirs: theirs.value, byId: theirs.byId, version: theirs.version })
    }
  for (const record of change.removed) {
    const [field, theirs] = foreign.get(keyOf(record))?.entries().next().value ?? []
    if (field && theirs) throw conflict(doc, { kind: record.kind, id: record.id, field, mine: null, theirs: theirs.value, byId: theirs.byId, version: theirs.version })
  }
}

function conflict(doc: JobDocument, details: ConflictDetails): AppError {
  const record = find(doc, details.kind as 'run', details.id) as { label?: string; name?: string; code?: string } | undefined
  const name = record?.label ?? record?.name ?? record?.code ?? 'it'
  return new AppError('conflict', `Somebody changed the ${fieldWord(details.field)} of ${kindWord(details.kind as 'run')} ${name} while you worked`, details)
}
