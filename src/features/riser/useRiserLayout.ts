import { computed, type ComputedRef } from 'vue'
import type { Derived } from '../../../shared/derive/deriveJob.ts'
import { find, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import type { Kind } from '../../../shared/model/record.ts'
import { same } from '../../../shared/sync/same.ts'
import { formatLength } from '../../../shared/units.ts'
import { keepSame } from './layout/keepSame.ts'
import { layoutRiser } from './layout/layoutRiser.ts'
import type { RiserLayout, RunMark } from './layout/riserLayout.ts'
import type { TagMode } from './riserStore.ts'

const kindsDrawn: readonly Kind[] = ['level', 'room', 'plate', 'rack', 'pathway', 'cableType', 'deviceModel', 'device']

/** The drawing of the job, made anew only when something drawn has changed: a pull or a test moves nothing. */
export function useRiserLayout(doc: ComputedRef<JobDocument>, derived: ComputedRef<Derived>, tagMode: () => TagMode, apart: () => boolean): ComputedRef<RiserLayout> {
  let last: { doc: JobDocument; marks: ReadonlyMap<string, RunMark>; apart: boolean; layout: RiserLayout } | undefined
  return computed(() => {
    const now = doc.value
    const marks = marksOf(now, derived.value, tagMode())
    const isApart = apart()
    if (last && last.apart === isApart && drawsAlike(last.doc, now) && sameMarks(last.marks, marks)) return last.layout
    const layout = keepSame(last?.layout, layoutRiser(now, { mark: (id) => marks.get(id), apart: isApart }))
    last = { doc: now, marks, apart: isApart, layout }
    return layout
  })
}

/** Whether two documents give one drawing. Of a run only its ends, its cable and whether it is dropped are drawn, beside its tag. */
function drawsAlike(before: JobDocument, now: JobDocument): boolean {
  if (!kindsDrawn.every((kind) => before.records[kind] === now.records[kind])) return false
  const [then, runs] = [before.records.run, now.records.run]
  if (then === runs) return true
  if (then.size !== runs.size) return false
  for (const [id, run] of runs) {
    const old = then.get(id)
    if (!old || (old !== run && (old.cableTypeId !== run.cableTypeId || (old.dropped === null) !== (run.dropped === null) || !same(old.a, run.a) || !same(old.b, run.b)))) return false
  }
  return true
}

/** What each run's tag says, with its worst finding that nobody has accepted. */
export function marksOf(doc: JobDocument, derived: Derived, mode: TagMode): Map<string, RunMark> {
  const { lengthUnit } = jobOf(doc)
  const marks = new Map<string, RunMark>()
  for (const facts of derived.runs.values()) {
    const { run } = facts
    const text =
      mode === 'label' ? run.label
      : mode === 'cable' ? (find(doc, 'cableType', run.cableTypeId)?.code ?? '?')
      : facts.length ? formatLength(facts.length.totalMm, lengthUnit, { as: 'whole' }) : 'no length'
    marks.set(run.id, { text, severity: facts.findings.find((finding) => !finding.accepted)?.severity ?? null })
  }
  return marks
}

function sameMarks(a: ReadonlyMap<string, RunMark>, b: ReadonlyMap<string, RunMark>): boolean {
  if (a.size !== b.size) return false
  for (const [id, mark] of b) {
    const other = a.get(id)
    if (!other || other.text !== mark.text || other.severity !== mark.severity) return false
  }
  return true
}
