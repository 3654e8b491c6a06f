import { checkedKinds } from '../checks/define.ts'
import { severities, type Finding, type Severity } from '../checks/finding.ts'
import { findAbout } from '../checks/registry.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import { fieldEnd, roomOfEnd } from '../model/naming.ts'
import type { JobRecord, Kind } from '../model/record.ts'
import type { Run } from '../model/run.ts'
import { Cells } from './cells.ts'
import type { Progress, RunFacts } from './facts.ts'
import { differences, JobIndex } from './jobIndex.ts'
import { readJob, type JobReader } from './jobReader.ts'
import { factsOf } from './runFacts.ts'
import { noProgress, tally } from './progress.ts'

/** Everything that follows from a job. It stays true of its own document, whatever is derived from it later. */
export interface Derived {
  readonly doc: JobDocument
  readonly runs: ReadonlyMap<string, RunFacts>
  /** Worst first, then by name; accepted ones included. */
  readonly findings: readonly Finding[]
  readonly findingsAbout: (kind: Kind, id: string) => readonly Finding[]
  /** Findings that stand, by severity. */
  readonly counts: Readonly<Record<Severity, number>>
  readonly progress: Progress
  readonly progressOfRoom: (roomId: string) => Progress
  readonly progressOfLevel: (levelId: string) => Progress
}

/** What is remembered between two documents of one line of edits. */
interface Memory {
  readonly index: JobIndex
  readonly cells: Cells
  /** The derivation that this memory is true of. */
  owner: Derived | undefined
}
const memories = new WeakMap<Derived, Memory>()

/**
 * Everything that follows from a job. Given what followed before, only what the edit reached is worked out anew; the
 * answer is the same as without it.
 */
export function deriveJob(doc: JobDocument, previous?: Derived): Derived {
  if (previous?.doc === doc) return previous
  const kept = previous && memories.get(previous)
  // A memory that has gone on along another line of edits is of no use here.
  const memory: Memory = kept && kept.owner === previous ? kept : { index: new JobIndex(), cells: new Cells(), owner: undefined }
  advance(memory, memory.owner?.doc, doc)
  const derived = gather(doc, readJob(doc, memory.index, memory.cells))
  memory.owner = derived
  memories.set(derived, memory)
  return derived
}

function advance({ index, cells }: Memory, before: JobDocument | undefined, doc: JobDocument) {
  const touched = new Set<string>()
  for (const difference of differences(before, doc)) index.take(doc, difference, (key) => touched.add(key))
  if (before) for (const key of touched) cells.touch(key, () => undefined)
}

function gather(doc: JobDocument, reader: JobReader): Derived {
  const about = new Map<string, readonly Finding[]>()
  for (const kind of checkedKinds)
    for (const record of doc.records[kind].values() as Iterable<JobRecord>) {
      const found = reader.remember(`found ${kind}:${record.id}`, () => findAbout(reader, current(reader, record)))
      if (found.length) about.set(`${kind}:${record.id}`, found)
    }
  const runs = new Map<string, RunFacts>()
  for (const run of doc.records.run.values()) runs.set(run.id, reader.remember(`facts run:${run.id}`, () => runFacts(reader, run, about.get(`run:${run.id}`) ?? [])))
  const findings = sorted([...about.values()].flat())
  const progress = tally(runs.values())
  return {
    doc,
    runs,
    findings,
    findingsAbout: (kind, id) => about.get(`${kind}:${id}`) ?? [],
    counts: countOpen(findings),
    progress: progress.whole,
    progressOfRoom: (id) => progress.rooms.get(id) ?? noProgress,
    progressOfLevel: (id) => progress.levels.get(id) ?? noProgress,
  }
}

/** The record read through the reader, so that an edit to it is noticed. */
const current = (reader: JobReader, record: JobRecord): JobRecord => (reader.find(record.kind, record.id) as JobRecord | undefined) ?? record

function runFacts(reader: JobReader, run: Run, findings: readonly Finding[]): RunFacts {
  reader.find('run', run.id)
  // The findings are a result of their own: noting it makes these facts follow when they change.
  reader.remember(`found run:${run.id}`, () => findings)
  const { said, length, lengthMissing, speaker } = factsOf(reader, run)
  const room = noteRoom(reader, run)
  return { run, stage: said.stage, ends: said.ends, printed: said.printed, dropped: run.dropped, roomId: room?.id ?? null, levelId: room?.levelId ?? null, length, lengthMissing, speaker, findings: sorted(findings) }
}

/** The room at a run's field end; every record on the way to it is noted. */
function noteRoom(reader: JobReader, run: Run) {
  for (const end of [run.a, run.b]) {
    if (!end) continue
    if ('plateId' in end) reader.find('room', reader.find('plate', end.plateId)?.roomId)
    else if ('rackId' in end) reader.find('rack', end.rackId)
    else {
      const device = reader.find('device', end.deviceId)
      reader.find('plate', device?.plateId)
      reader.find('rack', device?.rackId)
      reader.find('room', device?.roomId)
    }
  }
  const room = roomOfEnd(reader.doc, run[fieldEnd(reader.doc, run)])
  return reader.find('room', room?.id)
}

const rank = (severity: Severity) => severities.indexOf(severity)
const byName = new Intl.Collator('en', { numeric: true })
const sorted = (findings: readonly Finding[]): Finding[] => [...findings].sort((a, b) => rank(a.severity) - rank(b.severity) || byName.compare(a.aboutName, b.aboutName) || a.check.localeCompare(b.check))

function countOpen(findings: readonly Finding[]): Record<Severity, number> {
  const counts = { stop: 0, caution: 0, note: 0 }
  for (const finding of findings) if (!finding.accepted) counts[finding.severity]++
  return counts
}
