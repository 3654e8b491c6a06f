import { labelFor, labelsFor, type LabelFacts } from '../labels/pattern.ts'
import { find, jobOf, type JobDocument } from '../model/jobDocument.ts'
import { fieldEnd, plateOfEnd, rackIdOfEnd, roomOfEnd } from '../model/naming.ts'
import type { Run } from '../model/run.ts'
import { isStruck } from '../model/struck.ts'
import { apply, noChange, updates, type Change } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'

/** The next serial number: one more than any run has, so that none is used again while its run stands. */
export function nextSerial(doc: JobDocument): number {
  let highest = 0
  for (const run of doc.records.run.values()) highest = Math.max(highest, run.serial)
  return highest + 1
}

/** What a label can be made of, for one run as it stands. */
export function labelFacts(doc: JobDocument, run: Run): LabelFacts {
  const end = run[fieldEnd(doc, run)]
  const plate = plateOfEnd(doc, end)
  const room = roomOfEnd(doc, end)
  const device = end && 'deviceId' in end ? find(doc, 'device', end.deviceId) : undefined
  const rackId = rackIdOfEnd(doc, end)
  const type = find(doc, 'cableType', run.cableTypeId)
  return {
    level: find(doc, 'level', room?.levelId)?.code ?? '',
    room: room?.code ?? 'X',
    plate: plate ? String(plate.number) : (device?.code ?? find(doc, 'rack', rackId)?.code ?? '0'),
    kind: type?.labelKind ?? 'X',
    cable: type?.code ?? '',
    serial: run.serial,
  }
}

/** Labels in use, in capitals, except those of the runs left out. */
export function labelsTaken(doc: JobDocument, except: ReadonlySet<string> = new Set()): Set<string> {
  const taken = new Set<string>()
  for (const run of doc.records.run.values()) if (!except.has(run.id)) taken.add(run.label.toUpperCase())
  for (const print of doc.records.labelPrint.values()) if (!except.has(print.runId)) taken.add(print.text.toUpperCase())
  return taken
}

/** The label that the job's pattern gives this run. */
export function assignLabel(doc: JobDocument, run: Run, taken: ReadonlySet<string>): string {
  return labelFor(jobOf(doc).labelPattern, labelFacts(doc, run), (label) => taken.has(label.toUpperCase()))
}

/** Whether a run's label was printed: from then on it is frozen. */
export function isPrinted(doc: JobDocument, runId: string): boolean {
  for (const print of doc.records.labelPrint.values()) if (print.runId === runId && !isStruck(doc, 'labelPrint', print.id)) return true
  return false
}

/** Ids of all runs whose label was printed. */
export function printedRuns(doc: JobDocument): Set<string> {
  const printed = new Set<string>()
  for (const print of doc.records.labelPrint.values()) if (!isStruck(doc, 'labelPrint', print.id)) printed.add(print.runId)
  return printed
}

/**
 * A change, and with it new labels for those runs among `runIds` that were never printed. Printed labels stay, whatever
 * the room is called now.
 */
export function withLabels(doc: JobDocument, change: Change, runIds: (after: JobDocument) => Iterable<string>): Change {
  const after = apply(doc, change)
  const printed = printedRuns(after)
  const free = [...runIds(after)].filter((id) => !printed.has(id))
  if (!free.length) return change
  const taken = labelsTaken(after, new Set(free))
  const relabelled: Change[] = []
  for (const id of free) {
    const run = find(after, 'run', id)
    if (!run) continue
    const label = keepsLabel(after, run, taken) ? run.label : assignLabel(after, run, taken)
    taken.add(label.toUpperCase())
    relabelled.push(label === run.label ? noChange : updates<'run'>(run, { label }))
  }
  return compose([change, ...relabelled])
}

/** A label that the pattern could have given stays: nobody is renumbered without need. */
function keepsLabel(doc: JobDocument, run: Run, taken: ReadonlySet<string>): boolean {
  if (taken.has(run.label.toUpperCase())) return false
  let tries = 0
  for (const label of labelsFor(jobOf(doc).labelPattern, labelFacts(doc, run))) {
    if (label === run.label) return true
    if (++tries === 200) return false
  }
  return false
}

/** Ids of the runs that end in a room. */
export const runsInRoom = (doc: JobDocument, roomId: string): string[] =>
  [...doc.records.run.values()].filter((run) => roomOfEnd(doc, run.a)?.id === roomId || roomOfEnd(doc, run.b)?.id === roomId).map((run) => run.id)

/** Ids of the runs that end at a plate. */
export const runsAtPlate = (doc: JobDocument, plateId: string): string[] =>
  [...doc.records.run.values()].filter((run) => plateOfEnd(doc, run.a)?.id === plateId || plateOfEnd(doc, run.b)?.id === plateId).map((run) => run.id)
