import { markDoubts, type MarkDoubt } from '../calc/length/markPlausibility.ts'
import { fiveDigitCounter } from '../calc/length/jacketMarks.ts'
import { factsOf } from '../derive/runFacts.ts'
import { defineCheck, lengthText } from './define.ts'

const words: Record<MarkDoubt, string> = {
  'same mark': 'Both jacket marks are the same',
  'longer than the put-up': 'The jacket marks give more cable than its spool holds',
  'shorter than the way': 'The jacket marks give less cable than the way is long',
  'much longer than the way': 'The jacket marks give far more cable than the way is long',
}

export const pulledLength = defineCheck({
  id: 'pulledLength',
  title: 'Jacket marks',
  what: 'Whether the length from two jacket marks can be true, against the drawing and the spool',
  tier: 'practice',
  source: 'Marks are good to two marks; over twice the drawn length and 15 m more is doubted (common practice, no source)',
  about: 'run',
  limits: () => [
    { severity: 'caution', text: 'marks that cannot be true' },
    { severity: 'note', text: 'far from the drawing' },
  ],
  look: (reader, run) => {
    const { said, length } = factsOf(reader, run)
    const pull = said.markedPull
    const type = reader.find('cableType', run.cableTypeId)
    if (!pull || !type) return []
    const drawn = length?.drawn ?? null
    const putUpMm = Math.max(...type.putUps.map((each) => each.lengthMm))
    const doubts = markDoubts(
      { start: pull.markA!, end: pull.markB!, unit: pull.markUnit, counter: fiveDigitCounter },
      { leastMm: drawn && drawn.totalMm - drawn.slackAMm - drawn.slackBMm, estimateMm: drawn?.totalMm ?? null, putUpMm },
    )
    const [worst] = doubts ?? []
    if (!worst) return []
    return [
      {
        severity: worst === 'same mark' || worst === 'longer than the put-up' ? 'caution' : 'note',
        aboutName: run.label,
        sentence: `${words[worst]}: ${pull.markA} and ${pull.markB} ${pull.markUnit}${drawn ? `; ${lengthText(reader, drawn.totalMm)} is drawn` : ''}.`,
        advice: 'Read the marks again, or strike the pull out and record it anew.',
        basis: `length = |${pull.markB} - ${pull.markA}| ${pull.markUnit}, the counter rolling over at 100,000; longest put-up of ${type.code} ${lengthText(reader, putUpMm)}`,
        figures: [pull.id, drawn?.totalMm ?? ''].join('|'),
      },
    ]
  },
})
