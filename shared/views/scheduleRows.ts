import { severities, type Severity } from '../checks/finding.ts'
import type { RunFacts, Stage } from '../derive/facts.ts'
import type { CableFamily, JacketColour } from '../model/cableType.ts'
import type { Pull } from '../model/fieldRecord.ts'
import { find, type JobDocument } from '../model/jobDocument.ts'
import { endLabel, fieldEnd, plateCode, plateOfEnd, roomOfEnd } from '../model/naming.ts'
import type { Run } from '../model/run.ts'
import { isStruck } from '../model/struck.ts'

/** A run as a row of the schedule. Lengths in mm; null where there is nothing to say. */
export interface ScheduleRow {
  readonly runId: string
  readonly label: string
  readonly serial: number
  readonly stage: Stage
  readonly dropped: string | null
  readonly cableTypeId: string
  readonly cable: string
  readonly family: CableFamily | null
  readonly jacket: JacketColour | null
  readonly levelId: string | null
  readonly level: string
  readonly roomId: string | null
  readonly room: string
  readonly roomCode: string
  readonly plateId: string | null
  readonly plate: string
  /** What the run is for: its purpose, else the plate's name. */
  readonly device: string
  /** The end away from the field end, as written on the panel. */
  readonly rackPort: string
  readonly bundle: string
  readonly spool: string
  readonly riseMm: number | null
  readonly alongMm: number | null
  readonly dropMm: number | null
  readonly slackMm: number | null
  readonly lengthMm: number | null
  readonly basis: 'drawn' | 'stated' | 'pulled' | null
  readonly pulledMm: number | null
  readonly lossDb: number | null
  readonly printed: boolean
  /** Worst open finding; null: none. */
  readonly severity: Severity | null
  readonly findings: number
}

/** The last pull of each run that still stands. */
export function lastPulls(doc: JobDocument): ReadonlyMap<string, Pull> {
  const pulls = new Map<string, Pull>()
  for (const pull of doc.records.pull.values()) if (!isStruck(doc, 'pull', pull.id)) pulls.set(pull.runId, pull)
  return pulls
}

/** One row, from a run's facts. */
export function scheduleRow(doc: JobDocument, facts: RunFacts, pull: Pull | undefined): ScheduleRow {
  const { run, length } = facts
  const type = find(doc, 'cableType', run.cableTypeId)
  const field = fieldEnd(doc, run)
  const near = run[field]
  const room = roomOfEnd(doc, near)
  const plate = plateOfEnd(doc, near)
  const open = facts.findings.filter((finding) => !finding.accepted)
  return {
    runId: run.id,
    label: run.label,
    serial: run.serial,
    stage: facts.stage,
    dropped: run.dropped,
    cableTypeId: run.cableTypeId,
    cable: type?.code ?? '',
    family: type?.family ?? null,
    jacket: type?.jacketColour ?? null,
    levelId: room?.levelId ?? null,
    level: find(doc, 'level', room?.levelId)?.name ?? '',
    roomId: room?.id ?? null,
    room: room?.name ?? 'No room yet',
    roomCode: room?.code ?? '',
    plateId: plate?.id ?? null,
    plate: plate ? plateCode(doc, plate) : endLabel(doc, near),
    device: purposeOf(run, plate?.name),
    rackPort: endLabel(doc, run[field === 'a' ? 'b' : 'a']),
    bundle: run.bundle ?? '',
    spool: pull?.spool ?? '',
    riseMm: length?.drawn?.riseMm ?? null,
    alongMm: length?.drawn?.alongMm ?? null,
    dropMm: length?.drawn?.dropMm ?? null,
    slackMm: length?.drawn ? length.drawn.slackAMm + length.drawn.slackBMm : null,
    lengthMm: length?.totalMm ?? null,
    basis: length?.basis ?? null,
    pulledMm: length?.basis === 'pulled' ? length.totalMm : null,
    lossDb: facts.speaker?.lossDb ?? null,
    printed: facts.printed,
    severity: severities.find((severity) => open.some((finding) => finding.severity === severity)) ?? null,
    findings: open.length,
  }
}

const purposeOf = (run: Run, plateName: string | undefined) => run.purpose || plateName || ''

/** The records whose names a row is made of, beside its facts. */
function namedBy(doc: JobDocument, { run }: RunFacts, pull: Pull | undefined): readonly unknown[] {
  const ends = [run.a, run.b].flatMap((end) => {
    const device = end && 'deviceId' in end ? find(doc, 'device', end.deviceId) : undefined
    const plate = plateOfEnd(doc, end)
    const room = roomOfEnd(doc, end)
    return [device, find(doc, 'deviceModel', device?.modelId), end && 'rackId' in end ? find(doc, 'rack', end.rackId) : undefined, plate, find(doc, 'room', plate?.roomId), room, find(doc, 'level', room?.levelId)]
  })
  return [find(doc, 'cableType', run.cableTypeId), pull, ...ends]
}

/** Rows remembered by the facts they were made of, so that an edit makes only its own rows anew. */
const remembered = new WeakMap<RunFacts, { maps: readonly unknown[]; named: readonly unknown[]; row: ScheduleRow }>()
const namingKinds = ['level', 'room', 'plate', 'rack', 'device', 'deviceModel', 'cableType', 'pull', 'strike'] as const
const sameAll = (a: readonly unknown[], b: readonly unknown[]) => a === b || a.every((each, index) => each === b[index])

/**
 * Every run as a row, in label order: letters first, then numbers by value (MED2 before MED10).
 * A row is made anew when its facts are, or when a record it names has changed.
 */
export function scheduleRows(doc: JobDocument, facts: ReadonlyMap<string, RunFacts>): ScheduleRow[] {
  const pulls = lastPulls(doc)
  const maps = namingKinds.map((kind) => doc.records[kind])
  const rows: ScheduleRow[] = []
  for (const each of facts.values()) {
    const before = remembered.get(each)
    // Where no map of a naming kind has changed nothing has; else the very records tell.
    if (before && sameAll(before.maps, maps)) rows.push(before.row)
    else {
      const pull = pulls.get(each.run.id)
      const named = namedBy(doc, each, pull)
      const row = before && sameAll(before.named, named) ? before.row : scheduleRow(doc, each, pull)
      remembered.set(each, { maps, named, row })
      rows.push(row)
    }
  }
  return rows.sort((a, b) => compareLabels(a.label, b.label))
}

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' })
/** Order of labels as a person reads them. */
export const compareLabels = (a: string, b: string): number => collator.compare(a, b)
