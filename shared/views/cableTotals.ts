import type { RunFacts } from '../derive/facts.ts'
import type { CableType } from '../model/cableType.ts'
import { recordsOf, type JobDocument } from '../model/jobDocument.ts'

/** How much of one cable a job takes. Dropped runs are left out. */
export interface CableTotal {
  readonly type: CableType
  readonly runs: number
  readonly lengthMm: number
  /** Runs whose length is not known, and so not in the sum. */
  readonly unknown: number
  readonly pulledRuns: number
  readonly pulledMm: number
}

/** Cable by type, the most runs first. Types without a run are left out. */
export function cableTotals(doc: JobDocument, facts: ReadonlyMap<string, RunFacts>): CableTotal[] {
  const totals = new Map<string, { runs: number; lengthMm: number; unknown: number; pulledRuns: number; pulledMm: number }>()
  for (const { run, length, stage } of facts.values()) {
    if (run.dropped !== null) continue
    const total = totals.get(run.cableTypeId) ?? { runs: 0, lengthMm: 0, unknown: 0, pulledRuns: 0, pulledMm: 0 }
    total.runs++
    if (length) total.lengthMm += length.totalMm
    else total.unknown++
    if (stage !== 'planned') {
      total.pulledRuns++
      total.pulledMm += length?.totalMm ?? 0
    }
    totals.set(run.cableTypeId, total)
  }
  return recordsOf(doc, 'cableType')
    .flatMap((type) => {
      const total = totals.get(type.id)
      return total ? [{ type, ...total }] : []
    })
    .sort((a, b) => b.runs - a.runs || a.type.code.localeCompare(b.type.code))
}
