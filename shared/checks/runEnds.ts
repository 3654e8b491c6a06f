import { lengthOf } from '../derive/lengthOf.ts'
import { strayChases } from '../routing/runLength.ts'
import { defineCheck, type Draft } from './define.ts'

export const runEnds = defineCheck({
  id: 'runEnds',
  title: 'Ends and length',
  what: 'That a run has two ends, that the drawing says enough for a length, and that the chases it is told to take lead there',
  tier: 'practice',
  source: 'A cable has two ends; a length needs both places: common practice, no source',
  about: 'run',
  limits: () => [
    { severity: 'caution', text: 'an end missing' },
    { severity: 'note', text: 'no length, or chases that do not lead there' },
  ],
  look: (reader, run) => {
    const missing = (['a', 'b'] as const).filter((end) => run[end] === null)
    const draft = (severity: Draft['severity'], sentence: string, advice: string): Draft => ({ severity, aboutName: run.label, sentence, advice, basis: sentence, figures: missing.join('|') || sentence })
    if (missing.length) return [draft('caution', missing.length === 2 ? 'This run has no end yet.' : `This run has no end ${missing[0]} yet.`, 'Say where it ends: a plate, a port or a device.')]
    const { lengthMissing } = lengthOf(reader, run)
    if (lengthMissing !== null) return [draft('note', `${lengthMissing}.`, 'Place it on the level, or state the length.')]
    const stray = strayChases(reader, run)
    return stray === null ? [] : [draft('note', stray, 'Choose chases that lead from end to end, or none: then the nearest is taken.')]
  },
})
