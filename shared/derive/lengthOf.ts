import type { Run } from '../model/run.ts'
import { runLength } from '../routing/runLength.ts'
import type { LengthMakeUp } from './facts.ts'
import type { JobReader } from './jobReader.ts'
import { saidOf, type Said } from './said.ts'

export interface LengthFacts {
  readonly said: Said
  readonly length: LengthMakeUp | null
  readonly lengthMissing: string | null
}

/** What was said of a run and how long it is, worked out once. It rests on no other run, so that runs may rest on it. */
export const lengthOf = (reader: JobReader, run: Run): LengthFacts =>
  reader.remember('length', run.id, () => {
    const said = saidOf(reader, run.id)
    // The run is read by its id, so that an edit to it is noticed here too.
    const { length, missing } = runLength(reader, reader.find('run', run.id) ?? run, said)
    return { said, length, lengthMissing: missing }
  })
