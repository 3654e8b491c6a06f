import type { JobDocument } from '../model/jobDocument.ts'
import { fieldKinds, kinds, type JobRecord, type Kind } from '../model/record.ts'
import type { CordEnd, RunEnd } from '../model/run.ts'
import { Source } from './cells.ts'

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

const nothing: readonly JobRecord[] = []

/** What answers one question, and who asked it. Most answers are one record or none, so a map is made for the second only. */
class Answer extends Source {
  private only: JobRecord | undefined
  private many: Map<string, JobRecord> | undefined
  private inOrder: readonly JobRecord[] | undefined

  /** Takes a record in, in the place it has already or at the end. */
  put(record: JobRecord): void {
    this.inOrder = undefined
    if (!this.many && (this.only === undefined || this.only.id === record.id)) this.only = record
    else (this.many ??= new Map(this.only && [[this.only.id, this.only]])).set(record.id, record)
  }
  remove(id: string): void {
    this.inOrder = undefined
    if (this.many) this.many.delete(id)
    else if (this.only?.id === id) this.only = undefined
  }
  get list(): readonly JobRecord[] {
    return (this.inOrder ??= this.many ? settled([...this.many.values()]) : this.only ? [this.only] : nothing)
  }
}

/** Records by their place and by the questions they answer, kept up to date edit by edit, each with who read it. */
export class JobIndex {
  private readonly places = new Map<Kind, Map<string, Source>>()
  private readonly wholes = new Map<Kind, Source>()
  private readonly answers = new Map<string, Answer>()

  /** Takes a difference in and tells everything that it touched. */
  take(doc: JobDocument, { before, after }: Difference, touch: (source: Source) => void): void {
    const { kind, id } = (after ?? before)!
    const place = this.places.get(kind)?.get(id)
    if (place) touch(place)
    const whole = this.wholes.get(kind)
    if (whole) touch(whole)
    const keys = after ? indexKeysOf(doc, after) : []
    // Where it stays, it is replaced in its place: what people said keeps its order.
    if (before) for (const key of indexKeysOf(doc, before)) if (!keys.includes(key)) touch(this.changed(key, kind, (answer) => answer.remove(id)))
    if (after) for (const key of keys) touch(this.changed(key, kind, (answer) => answer.put(after)))
  }

  /** A strike is not an answer itself: it touches the answers that hold what it strikes. */
  private changed(key: string, kind: Kind, change: (answer: Answer) => void): Answer {
    const answer = this.answer(key)
    if (kind !== 'strike') change(answer)
    return answer
  }

  private answer(key: string): Answer {
    let answer = this.answers.get(key)
    if (!answer) this.answers.set(key, (answer = new Answer()))
    return answer
  }

  /** Where a record is or would be. */
  place(kind: Kind, id: string): Source {
    let places = this.places.get(kind)
    if (!places) this.places.set(kind, (places = new Map<string, Source>()))
    let place = places.get(id)
    if (!place) places.set(id, (place = new Source()))
    return place
  }

  /** All records of a kind, as a whole. */
  whole(kind: Kind): Source {
    let whole = this.wholes.get(kind)
    if (!whole) this.wholes.set(kind, (whole = new Source()))
    return whole
  }

  /**
   * The records that answer a question. What people said comes in the order they said it; everything else in an order
   * that does not depend on how the job came to be as it is.
   */
  ask<R extends JobRecord>(key: string, note: (source: Source) => void): readonly R[] {
    const answer = this.answer(key)
    note(answer)
    return answer.list as readonly R[]
  }
}

const settled = (records: JobRecord[]): readonly JobRecord[] => (records.length < 2 || fieldKinds.has(records[0]!.kind) ? records : records.sort(settledOrder))
const settledOrder = (a: JobRecord, b: JobRecord): number => (a.kind === 'run' && b.kind === 'run' ? a.serial - b.serial : 0) || (a.id < b.id ? -1 : 1)
