import type { JobRecord } from '../model/record.ts'
import { keyOf } from '../model/references.ts'
import type { Change, FieldChange, Update } from './change.ts'
import { same } from './same.ts'

/**
 * One change that does what several do one after the other, so that a command of many steps is undone in one.
 * A record added and then removed vanishes; a field set twice keeps its first before and its last after.
 */
export function compose(changes: readonly Change[]): Change {
  const added = new Map<string, JobRecord>()
  const removed = new Map<string, JobRecord>()
  const updated = new Map<string, Update>()
  for (const change of changes) {
    for (const record of change.removed) {
      const key = keyOf(record)
      if (added.delete(key)) continue
      removed.set(key, asItWas(record, updated.get(key)))
      updated.delete(key)
    }
    for (const record of change.added) {
      const key = keyOf(record)
      const before = removed.get(key)
      if (!before) added.set(key, record)
      else {
        removed.delete(key)
        const difference = differenceOf(before, record)
        if (difference) updated.set(key, difference)
      }
    }
    for (const update of change.updated) {
      const key = keyOf(update)
      const fresh = added.get(key)
      if (fresh) added.set(key, { ...fresh, ...afterOf(update) } as JobRecord)
      else mergeUpdate(updated, key, update)
    }
  }
  return { added: [...added.values()], removed: [...removed.values()], updated: [...updated.values()] }
}

const afterOf = (update: Update) => Object.fromEntries(Object.entries(update.fields).map(([field, [, after]]) => [field, after]))

const asItWas = (record: JobRecord, update: Update | undefined): JobRecord =>
  update ? ({ ...record, ...Object.fromEntries(Object.entries(update.fields).map(([field, [before]]) => [field, before])) } as JobRecord) : record

function differenceOf(before: JobRecord, after: JobRecord): Update | undefined {
  const fields: Record<string, FieldChange> = {}
  for (const [field, value] of Object.entries(after)) {
    const old = (before as Record<string, unknown>)[field]
    if (!same(old, value)) fields[field] = [old, value]
  }
  return Object.keys(fields).length ? { kind: after.kind, id: after.id, fields } : undefined
}

function mergeUpdate(updated: Map<string, Update>, key: string, update: Update) {
  const fields = new Map<string, FieldChange>(Object.entries(updated.get(key)?.fields ?? {}))
  for (const [field, [before, after]] of Object.entries(update.fields)) {
    const known = fields.get(field)
    const start = known ? known[0] : before
    if (same(start, after)) fields.delete(field)
    else fields.set(field, [start, after])
  }
  if (fields.size) updated.set(key, { kind: update.kind, id: update.id, fields: Object.fromEntries(fields) })
  else updated.delete(key)
}
