import type { Run } from '../model/run.ts'
import type { SpeakerFacts } from './facts.ts'
import type { JobReader } from './jobReader.ts'
import { lengthOf, type LengthFacts } from './lengthOf.ts'
import { speakerFacts } from './speakerFacts.ts'

/** What checks may ask of a run; the findings about it come after. */
export interface BareFacts extends LengthFacts {
  readonly speaker: SpeakerFacts | null
}

/** Stage, length and loudspeaker figures of a run, worked out once. */
export const factsOf = (reader: JobReader, run: Run): BareFacts =>
  reader.remember('bare', run.id, () => ({ ...lengthOf(reader, run), speaker: speakerFacts(reader, reader.find('run', run.id) ?? run) }))
