import { factsOf } from '../derive/runFacts.ts'
import { defineCheck } from './define.ts'

export const testResult = defineCheck({
  id: 'testResult',
  title: 'Last test',
  what: 'That the last test of a run that still stands was passed; a failed run stays terminated, and is not tested',
  tier: 'practice',
  source: 'The test records of this job',
  about: 'run',
  limits: () => [{ severity: 'caution', text: 'last test failed' }],
  look: (reader, run) => {
    const { lastTest } = factsOf(reader, run).said
    if (lastTest?.result !== 'fail') return []
    return [
      {
        severity: 'caution',
        aboutName: run.label,
        sentence: `The last ${lastTest.testKind} test failed${lastTest.reading ? `: ${lastTest.reading}` : ''}.`,
        advice: 'Put it right and test again: the next test that passes clears this.',
        basis: `${lastTest.testKind}, ${lastTest.result}${lastTest.reading ? `, ${lastTest.reading}` : ''}, ${lastTest.at.slice(0, 10)}`,
        figures: lastTest.id,
      },
    ]
  },
})
