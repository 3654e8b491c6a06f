import type { JobDocument } from '../model/jobDocument.ts'
import { fieldKinds, kinds, type JobRecord } from '../model/record.ts'
import type { CordEnd, RunEnd } from '../model/run.ts'

/** Where an end is, as a key: every run or cord there is found under it. */
export function endKey(end: RunEnd | CordEnd): string {
  if ('plateId' in end) return `plate:${end.plateId}:${end.jackId ?? ''}`
  if ('deviceId' in end) return `device:${end.deviceId}:${end.terminal ?? ''}`
  return `rack:${end.rackId}`
}
const ownerKey = (end: RunEnd | CordEnd): string => ('plateId' in end ? `plate:${end.plateId}` : 'deviceId' in end ? `device:${end.deviceId}` : `rack:${end.rackId}`)

/** The questions that are asked of a job without knowing an id, and the records that answer each. */
export function indexKeysOf(doc: JobDocument, record: JobRecord): string[] {
  switch (record.kind) {
    case 'plate':
      return [`plates in ${record.roomId}`]
    case 'rack':
      return [`racks in ${record.roomId}`]
    case 'room':
      return [`rooms on ${record.levelId}`]
    case 'device':
      return [record.plateId ? `devices at plate:${record.plateId}` : record.rackId ? `devices at rack:${record.rackId}` : `devices at room:${record.roomId}`]
    case 'run':
    case 'cord':
      return [record.a, record.b].flatMap((end) => (end ? [`${record.kind}s on ${endKey(end)}`, `${record.kind}s at ${ownerKey(end)}`] : [])).concat(record.kind === 'run' ? [`label ${record.label.toUpperCase()}`] : [])
    case 'labelPrint':
    case 'pull':
    case 'termination':
    case 'test':
      return [`said of run:${record.runId}`]
    case 'acceptance':
      return [`accepted ${record.check} ${record.aboutKind}:${record.aboutId}`]
    case 'strike': {
      const target = doc.records[record.targetKind].get(record.targetId)
      return target ? indexKeysOf(doc, target) : []
    }
    default:
      return []
  }
}

export interface Difference {
  readonly before: JobRecord | undefined
  readonly after: JobRecord | undefined
}

/** Records that differ between two documents; kinds whose map is the same are not looked at. */
export function* differences(before: JobDocument | undefined, after: JobDocument): Generator<Difference> {
  for (const kind of kinds) {
    const now = after.records[kind] as ReadonlyMap<string, JobRecord>
    const then = before?.records[kind] as ReadonlyMap<string, JobRecord> | undefined
    if (now === then) continue
    for (const [id, record] of now) {
      const old = then?.get(id)
      if (old !== record) yield { before: old, after: record }
    }
    if (then) for (const [id, record] of then) if (!now.has(id)) yield { before: record, after: undefined }
  }
}

/** Records by the questions they answer, kept up to date edit by edit. */
export class JobIndex {
  private readonly found = new Map<string, Map<string, JobRecord>>()

  /** Takes a difference in and tells every key that it touched. */
  take(doc: JobDocument, { before, after }: Difference, touch: (key: string) => void): void {
    if (before) {
      touch(`${before.kind}:${before.id}`)
      for (const key of indexKeysOf(doc, before)) {
        if (before.kind !== 'strike') this.found.get(key)?.delete(before.id)
        touch(key)
      }
    }
    if (after) {
      touch(`${after.kind}:${after.id}`)
      for (const key of indexKeysOf(doc, after)) {
        if (after.kind !== 'strike') {
          let at = this.found.get(key)
          if (!at) this.found.set(key, (at = new Map()))
          at.set(after.id, after)
        }
        touch(key)
      }
    }
    touch(`all ${(after ?? before)!.kind}`)
  }

  /**
   * The records that answer a question. What people said comes in the order they said it; everything else in an order
   * that does not depend on how the job came to be as it is.
   */
  get<R extends JobRecord>(key: string): R[] {
    const at = this.found.get(key)
    if (!at || at.size === 0) return []
    const records = [...at.values()] as R[]
    return records.length === 1 || fieldKinds.has(records[0]!.kind) ? records : records.sort(settledOrder)
  }
}


const settledOrder = (a: JobRecord, b: JobRecord): number => (a.kind === 'run' && b.kind === 'run' ? a.serial - b.serial : a.id < b.id ? -1 : 1)
