import type { RunFacts } from '../derive/facts.ts'
import { find, jobOf, type JobDocument } from '../model/jobDocument.ts'
import { endLabel, fieldEnd } from '../model/naming.ts'
import { endNames, type EndName } from '../model/run.ts'
import { isStruck } from '../model/struck.ts'
import { formatLength } from '../units.ts'

/** One label to be printed. */
export interface LabelItem {
  readonly runId: string
  readonly end: EndName
  /** Which copy at this end, from 1. */
  readonly copy: number
  /** The identifier: the same letters on the screen, on the cable and in the bars. */
  readonly text: string
  /** Cable and length, or where this end goes: a second line for whoever holds the cable. */
  readonly note: string
  /** Times this end's labels were printed before. */
  readonly printedBefore: number
  readonly cableDiameterMm: number
}

/** How often each end of each run was printed, from prints that stand. Key: run id and end. */
export function printCounts(doc: JobDocument): ReadonlyMap<string, number> {
  const counts = new Map<string, number>()
  for (const print of doc.records.labelPrint.values()) {
    if (isStruck(doc, 'labelPrint', print.id)) continue
    const key = `${print.runId}:${print.end}`
    counts.set(key, (counts.get(key) ?? 0) + 1)
  }
  return counts
}

export interface LabelWish {
  readonly runIds: readonly string[]
  /** Labels for each end; 0: none for that end. Crews put two, 2 and 3 ft back, because one is cut off with the slack. */
  readonly copiesAtRack: number
  readonly copiesAtPlate: number
}

/** The labels for these runs, in the order they were asked for: rack end first, copies together. Dropped runs get none. */
export function labelItems(doc: JobDocument, facts: ReadonlyMap<string, RunFacts>, wish: LabelWish): LabelItem[] {
  const counts = printCounts(doc)
  const unit = jobOf(doc).lengthUnit
  const items: LabelItem[] = []
  for (const runId of wish.runIds) {
    const run = find(doc, 'run', runId)
    if (!run || run.dropped !== null) continue
    const type = find(doc, 'cableType', run.cableTypeId)
    const field = fieldEnd(doc, run)
    const length = facts.get(runId)?.length
    for (const end of endNames) {
      const copies = end === field ? wish.copiesAtPlate : wish.copiesAtRack
      const note = end === field ? [type?.code, length && formatLength(length.totalMm, unit, { as: 'whole' })] : [type?.code, run[end] && endLabel(doc, run[end])]
      for (let copy = 1; copy <= copies; copy++)
        items.push({
          runId,
          end,
          copy,
          text: run.label,
          note: note.filter(Boolean).join(' · '),
          printedBefore: counts.get(`${runId}:${end}`) ?? 0,
          cableDiameterMm: (type?.outerDiameterUm ?? 6000) / 1000,
        })
    }
  }
  return items
}
