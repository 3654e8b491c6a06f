import { checkedKinds, type CheckedKind } from '../checks/define.ts'
import { severities, type Finding, type Severity } from '../checks/finding.ts'
import { findAbout } from '../checks/registry.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import { fieldEnd } from '../model/naming.ts'
import type { Kind } from '../model/record.ts'
import type { Run } from '../model/run.ts'
import { Cells } from './cells.ts'
import { endRoom } from './ends.ts'
import type { Progress, RunFacts } from './facts.ts'
import { mergeFindings, sortedFindings } from './findingOrder.ts'
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

type FindingsByRecord = ReadonlyMap<string, readonly Finding[]>

/** What is remembered between two documents of one line of edits. */
interface Memory {
  readonly index: JobIndex
  readonly cells: Cells
  /** The derivation that this memory is true of. */
  owner: Derived | undefined
  about: FindingsByRecord
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
  const memory: Memory = kept && kept.owner === previous ? kept : { index: new JobIndex(), cells: new Cells(), owner: undefined, about: new Map() }
  const before = memory.owner
  // Until it is done the memory is nobody's: should a derivation fail half-way, the next one begins anew.
  memory.owner = undefined
  const reached = advance(memory, before?.doc, doc)
  const derived = gather(doc, readJob(doc, memory.index, memory.cells), memory, before, reached)
  memory.owner = derived
  memories.set(derived, memory)
  return derived
}

/** Records whose findings, and runs whose facts, are to be worked out. */
interface Reached {
  readonly checked: Readonly<Record<CheckedKind, Set<string>>>
  readonly facts: Set<string>
}

const isChecked = (kind: string): kind is CheckedKind => (checkedKinds as readonly string[]).includes(kind)

/** Takes what is new in the document into the index and forgets what was made of the old. */
function advance({ index, cells }: Memory, before: JobDocument | undefined, doc: JobDocument): Reached {
  const reached: Reached = { checked: { run: new Set(), cord: new Set(), device: new Set(), room: new Set() }, facts: new Set() }
  for (const difference of differences(before, doc)) {
    const { kind, id } = (difference.after ?? difference.before)!
    if (isChecked(kind)) reached.checked[kind].add(id)
    if (kind === 'run') reached.facts.add(id)
    index.take(doc, difference, (source) =>
      cells.touch(source, (cell) => {
        if (cell.group === 'facts') reached.facts.add(cell.id)
        for (const each of checkedKinds) if (cell.group === foundGroup[each]) reached.checked[each].add(cell.id)
      }),
    )
  }
  return reached
}

/** Names under which findings are remembered, by the kind they are about. */
const foundGroup: Readonly<Record<CheckedKind, string>> = { run: 'found run', cord: 'found cord', device: 'found device', room: 'found room' }

const found = (reader: JobReader, kind: CheckedKind, id: string): readonly Finding[] =>
  reader.remember(foundGroup[kind], id, () => {
    const record = reader.find(kind, id)
    return record ? findAbout(reader, record) : []
  })

function gather(doc: JobDocument, reader: JobReader, memory: Memory, before: Derived | undefined, reached: Reached): Derived {
  const { about, findings } = gatherFindings(reader, memory.about, before?.findings ?? [], reached)
  memory.about = about
  const runs = gatherFacts(doc, reader, before, reached)
  const progress = runs === before?.runs ? progressOf(before) : tally(runs.values())
  const derived: Derived = {
    doc,
    runs,
    findings,
    findingsAbout: (kind, id) => about.get(`${kind}:${id}`) ?? [],
    counts: findings === before?.findings ? before.counts : countOpen(findings),
    progress: progress.whole,
    progressOfRoom: (id) => progress.rooms.get(id) ?? noProgress,
    progressOfLevel: (id) => progress.levels.get(id) ?? noProgress,
  }
  tallies.set(derived, progress)
  return derived
}

const tallies = new WeakMap<Derived, ReturnType<typeof tally>>()
const progressOf = (derived: Derived) => tallies.get(derived) ?? tally(derived.runs.values())

/** Findings with those about reached records worked out anew; the very same lists where nothing came of it. */
function gatherFindings(reader: JobReader, before: FindingsByRecord, listed: readonly Finding[], { checked }: Reached): { about: FindingsByRecord; findings: readonly Finding[] } {
  const about = new Map(before)
  const fresh: Finding[] = []
  const gone = new Set<Finding>()
  for (const kind of checkedKinds)
    for (const id of checked[kind]) {
      const key = `${kind}:${id}`
      const now = found(reader, kind, id)
      for (const finding of before.get(key) ?? []) gone.add(finding)
      fresh.push(...now)
      if (now.length) about.set(key, now)
      else about.delete(key)
    }
  if (!gone.size && !fresh.length) return { about: before, findings: listed }
  return { about, findings: mergeFindings(gone.size ? listed.filter((finding) => !gone.has(finding)) : listed, sortedFindings(fresh)) }
}

/** Facts of every run, in the document's order; the very same map where no run was reached. */
function gatherFacts(doc: JobDocument, reader: JobReader, before: Derived | undefined, { facts }: Reached): ReadonlyMap<string, RunFacts> {
  if (before && !facts.size && doc.records.run === before.doc.records.run) return before.runs
  const runs = new Map<string, RunFacts>()
  for (const run of doc.records.run.values()) {
    const known = facts.has(run.id) ? undefined : before?.runs.get(run.id)
    runs.set(run.id, known ?? reader.remember('facts', run.id, () => runFacts(reader, run)))
  }
  return runs
}

function runFacts(reader: JobReader, run: Run): RunFacts {
  reader.find('run', run.id)
  const { said, length, lengthMissing, speaker } = factsOf(reader, run)
  const room = noteRoom(reader, run)
  const findings = sortedFindings(found(reader, 'run', run.id))
  return { run, stage: said.stage, ends: said.ends, printed: said.printed, dropped: run.dropped, roomId: room?.id ?? null, levelId: room?.levelId ?? null, length, lengthMissing, speaker, findings }
}

/** The room at a run's field end; what decides which end that is, is noted. */
function noteRoom(reader: JobReader, run: Run) {
  for (const end of [run.a, run.b]) if (end && 'deviceId' in end) reader.find('device', end.deviceId)
  return endRoom(reader, run[fieldEnd(reader.doc, run)])
}

function countOpen(findings: readonly Finding[]): Record<Severity, number> {
  const counts = Object.fromEntries(severities.map((severity) => [severity, 0])) as Record<Severity, number>
  for (const finding of findings) if (!finding.accepted) counts[finding.severity]++
  return counts
}
