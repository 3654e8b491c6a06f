import { factsOf } from '../derive/runFacts.ts'
import { defineCheck, lengthsApart, type Draft } from './define.ts'

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
    const draft = (severity: Draft['severity'], limitMm: number, say: (total: string, limit: string) => Pick<Draft, 'sentence' | 'basis'> & { advice: string }): Draft => {
      const [total, limit] = lengthsApart(reader, length.totalMm, limitMm)
      return {
        ...say(total, limit), severity, aboutName: run.label, figures: [length.totalMm, limitMm].join('|'),
        figure: { value: length.totalMm, unit: 'mm', text: total }, limit: { value: limitMm, unit: 'mm', text: limit, setBy: 'source' },
      }
    }
    if (length.totalMm > putUpMm)
      return [draft('caution', putUpMm, (total, limit) => ({ sentence: `This run is ${total}, and ${type.code} is sold in ${limit} at most.`, advice: 'Find a longer put-up, a shorter way, or a place for equipment between.', basis: `${length.basis} length ${total}; longest put-up ${limit}` }))]
    if (length.basis !== 'stated' || !length.drawn) return []
    const wayMm = length.drawn.riseMm + length.drawn.alongMm + length.drawn.dropMm
    if (length.totalMm >= leastShare * wayMm) return []
    return [draft('note', wayMm, (total, way) => ({ sentence: `${total} is stated, and the drawn way is ${way} without slack.`, advice: 'Look at the stated length, or at where the ends are drawn.', basis: `rise + along + drop = ${way}` }))]
  },
})
