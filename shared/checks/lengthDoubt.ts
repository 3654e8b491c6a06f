import { factsOf } from '../derive/runFacts.ts'
import { defineCheck, lengthText, type Draft } from './define.ts'

/** A stated length under this share of the way itself is doubted. */
const leastShare = 0.5

export const lengthDoubt = defineCheck({
  id: 'lengthDoubt',
  title: 'Run length',
  what: 'Whether a run can be cut in one piece from what its cable is sold in, and whether a stated length can be true',
  tier: 'practice',
  source: 'A run is one piece, without a splice (trade practice); a stated length of less than half the drawn way is doubted (common practice, no source)',
  about: 'run',
  limits: () => [
    { severity: 'caution', text: 'longer than any put-up' },
    { severity: 'note', text: 'stated at less than half the way' },
  ],
  look: (reader, run) => {
    const { length } = factsOf(reader, run)
    const type = reader.find('cableType', run.cableTypeId)
    // What was pulled is held against its own marks.
    if (!length || !type || length.basis === 'pulled') return []
    const putUpMm = Math.max(...type.putUps.map((each) => each.lengthMm))
    const total = lengthText(reader, length.totalMm)
    const draft = (rest: Pick<Draft, 'severity' | 'sentence' | 'advice' | 'basis'>, limitMm: number): Draft => ({
      ...rest,
      advice: rest.advice ?? '',
      aboutName: run.label,
      figure: { value: length.totalMm, unit: 'mm', text: total },
      limit: { value: limitMm, unit: 'mm', text: lengthText(reader, limitMm), setBy: 'source' },
      figures: [length.totalMm, limitMm].join('|'),
    })
    if (length.totalMm > putUpMm)
      return [draft({ severity: 'caution', sentence: `This run is ${total}, and ${type.code} is sold in ${lengthText(reader, putUpMm)} at most.`, advice: 'Find a longer put-up, a shorter way, or a place for equipment between.', basis: `${length.basis} length ${total}; longest put-up ${lengthText(reader, putUpMm)}` }, putUpMm)]
    if (length.basis !== 'stated' || !length.drawn) return []
    const wayMm = length.drawn.riseMm + length.drawn.alongMm + length.drawn.dropMm
    if (length.totalMm >= leastShare * wayMm) return []
    return [draft({ severity: 'note', sentence: `${total} is stated, and the drawn way is ${lengthText(reader, wayMm)} without slack.`, advice: 'Look at the stated length, or at where the ends are drawn.', basis: `rise + along + drop = ${lengthText(reader, wayMm)}` }, wayMm)]
  },
})
