import type { LabelPrint, Pull, Termination, Test } from '../model/fieldRecord.ts'
import { isStruck } from '../model/struck.ts'
import type { EndName } from '../model/run.ts'
import type { Stage } from './facts.ts'
import type { JobReader } from './jobReader.ts'

/** What people said of a run and what still stands of it. */
export interface Said {
  readonly stage: Stage
  readonly ends: Readonly<Record<EndName, boolean>>
  readonly printed: boolean
  readonly lastPull: Pull | null
  /** The last pull that has both marks: the one a length can be made of. */
  readonly markedPull: Pull | null
  readonly lastTest: Test | null
}

/**
 * The stage of a run follows from its records. "Pulled" is never "tested": a run is tested when both ends are on and its
 * last standing test passed; a rough test of a bare cable moves nothing.
 */
export function saidOf(reader: JobReader, runId: string): Said {
  const standing = reader
    .under<LabelPrint | Pull | Termination | Test>(`said of run:${runId}`)
    .filter((record) => !isStruck(reader.doc, record.kind, record.id))
  const ends = { a: false, b: false }
  let lastPull: Pull | null = null
  let markedPull: Pull | null = null
  let lastTest: Test | null = null
  let printed = false
  for (const record of standing) {
    if (record.kind === 'labelPrint') printed = true
    else if (record.kind === 'termination') ends[record.end] = true
    else if (record.kind === 'test') lastTest = record
    else {
      lastPull = record
      if (record.markA !== null && record.markB !== null) markedPull = record
    }
  }
  return { stage: stageOf(ends, lastPull, lastTest), ends, printed, lastPull, markedPull, lastTest }
}

function stageOf(ends: Record<EndName, boolean>, pull: Pull | null, test: Test | null): Stage {
  if (ends.a && ends.b) return test?.result === 'pass' ? 'tested' : 'terminated'
  if (ends.a || ends.b) return 'one end on'
  return pull ? 'pulled' : 'planned'
}
