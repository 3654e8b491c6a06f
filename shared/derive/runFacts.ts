import type { Run } from '../model/run.ts'
import { runLength } from '../routing/runLength.ts'
import type { LengthMakeUp, SpeakerFacts } from './facts.ts'
import type { JobReader } from './jobReader.ts'
import { saidOf, type Said } from './said.ts'
import { speakerFacts } from './speakerFacts.ts'

/** What checks may ask of a run; the findings about it come after. */
export interface BareFacts {
  readonly said: Said
  readonly length: LengthMakeUp | null
  readonly lengthMissing: string | null
  readonly speaker: SpeakerFacts | null
}

/** Stage, length and loudspeaker figures of a run, worked out once. */
export const factsOf = (reader: JobReader, run: Run): BareFacts =>
  reader.remember('bare', run.id, () => {
    // The run is read by its id, so that an edit to it is noticed here too.
    const current = reader.find('run', run.id) ?? run
    const said = saidOf(reader, run.id)
    const { length, missing } = runLength(reader, current, said)
    return { said, length, lengthMissing: missing, speaker: speakerFacts(reader, current, length) }
  })
