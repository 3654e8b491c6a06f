import { factsOf } from '../derive/runFacts.ts'
import { defineCheck, type Draft } from './define.ts'

export const runEnds = defineCheck({
  id: 'runEnds',
  title: 'Ends and length',
  what: 'That a run has two ends, and that the drawing says enough for a length',
  tier: 'practice',
  source: 'A cable has two ends; a length needs both places: common practice, no source',
  about: 'run',
  limits: () => [
    { severity: 'caution', text: 'an end missing' },
    { severity: 'note', text: 'no length' },
  ],
  look: (reader, run) => {
    const missing = (['a', 'b'] as const).filter((end) => run[end] === null)
    const draft = (severity: Draft['severity'], sentence: string, advice: string): Draft => ({ severity, aboutName: run.label, sentence, advice, basis: sentence, figures: missing.join('|') || sentence })
    if (missing.length) return [draft('caution', missing.length === 2 ? 'This run has no end yet.' : `This run has no end ${missing[0]} yet.`, 'Say where it ends: a plate, a port or a device.')]
    const { lengthMissing } = factsOf(reader, run)
    return lengthMissing === null ? [] : [draft('note', `${lengthMissing}.`, 'Place it on the level, or state the length.')]
  },
})
