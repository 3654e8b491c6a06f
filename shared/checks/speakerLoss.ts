import { thinnestThatHolds, type GaugeOffer } from '../calc/speaker/gaugeFor.ts'
import { ratioForLoss } from '../calc/speaker/lineLoss.ts'
import { ownShare } from '../calc/speaker/lineTree.ts'
import { withinLimit } from '../calc/speaker/load.ts'
import type { LengthMakeUp, SpeakerFacts } from '../derive/facts.ts'
import { factsOf } from '../derive/runFacts.ts'
import { conductorOhmPerKm } from '../derive/speakerFacts.ts'
import { speakerLoad } from '../derive/speakerLoad.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { CableType } from '../model/cableType.ts'
import type { Run } from '../model/run.ts'
import { formatConductor, formatNumber } from '../units.ts'
import { defineCheck, lengthText, reachText, setBy, type Draft } from './define.ts'
import { decimalsApart, lossIn, lossText, lossWords } from './lossWords.ts'

/** Gauges that are named when no cable of the job would do. */
const tradeGauges = [18, 16, 14, 12, 10]

export const speakerLoss = defineCheck({
  id: 'speakerLoss',
  title: 'Speaker loss',
  what: 'What a loudspeaker run loses at its length, to the speaker that gets least: both conductors counted, legs after it included',
  tier: 'practice',
  source: 'Ohm’s law with copper at 17.241 ohm mm²/km (wire tables); the limit is the company’s choice, since published rules differ (5 % or 10 % of the load, 0.5 or 1 dB)',
  about: 'run',
  limits: ({ speakerLossConvention: convention, speakerLossCaution, speakerLossStop }) => [
    { severity: 'caution', text: `over ${lossText(speakerLossCaution, convention)}` },
    { severity: 'stop', text: `over ${lossText(speakerLossStop, convention)}` },
    { severity: 'note', text: 'a load or a size not known' },
  ],
  look: (reader, run) => {
    const { speaker, length } = factsOf(reader, run)
    const type = reader.find('cableType', run.cableTypeId)
    if (!length || type?.family !== 'speaker') return []
    if (!speaker) return unknown(reader, run, type)
    const { limits } = reader.job()
    const loss = lossIn(speaker.withLegs ?? speaker, limits.speakerLossConvention)
    if (withinLimit(loss, limits.speakerLossCaution)) return []
    return [overLimit(reader, { run, type, length, speaker, loss })]
  },
})

interface Case {
  readonly run: Run
  readonly type: CableType
  readonly length: LengthMakeUp
  readonly speaker: SpeakerFacts
  /** At the speaker that gets least. */
  readonly loss: number
}

function overLimit(reader: JobReader, { run, type, length, speaker, loss }: Case): Draft {
  const { limits, conductorUnit } = reader.job()
  const { speakerLossConvention: convention, speakerLossCaution: caution, speakerLossStop: stop } = limits
  const isStop = !withinLimit(loss, stop)
  const limit = isStop ? stop : caution
  const { unit } = lossWords[convention]
  const decimals = decimalsApart(loss, limit, convention)
  const better = betterCable(reader, run, type, length.totalMm, speaker)
  const own = lossText(lossIn(speaker, convention), convention, decimals)
  const total = speaker.withLegs ? `, ${lossText(loss, convention, decimals)} with the legs after it` : ''
  return {
    severity: isStop ? 'stop' : 'caution',
    aboutName: run.label,
    sentence: `${formatConductor(type, conductorUnit)} loses ${own} at ${lengthText(reader, length.totalMm)} into ${speaker.loadText}${total}; the limit is ${lossText(limit, convention)}.`,
    advice: better.advice,
    figure: { value: loss, unit, text: `${formatNumber(loss, decimals)} ${unit}` },
    limit: { value: limit, unit, text: `${formatNumber(limit, decimals)} ${unit}`, setBy: setBy(limits, isStop ? 'speakerLossStop' : 'speakerLossCaution') },
    basis: basisOf(reader, { run, type, length, speaker, loss }),
    figures: [type.code, length.totalMm, speaker.loadOhm.toFixed(3), loss.toFixed(3), convention, caution, stop, limits.conductorTemperatureC].join('|'),
    remedy: better.remedy,
  }
}

/** Nothing is worked out without a load or a size: said once, not guessed. */
function unknown(reader: JobReader, run: Run, type: CableType): Draft[] {
  const { load, missing } = speakerLoad(reader, run)
  const what = missing ?? (load && !load.untapped.length && conductorOhmPerKm(type, reader.job().limits.conductorTemperatureC) === null ? `the conductor size of ${type.code}` : null)
  if (what === null) return []
  return [{ severity: 'note', aboutName: run.label, sentence: `The loss of this run is not worked out: ${what} is not known.`, advice: 'Give the model, the device or the cable type that figure.', basis: 'Rc = 2 r L; Rc/Z needs both r and Z', figures: what }]
}

/** The thinnest cable of the job, of the same make-up and fit for the same places, that stays within the limit. */
function betterCable(reader: JobReader, run: Run, type: CableType, lengthMm: number, speaker: SpeakerFacts): { advice: string; remedy: Draft['remedy'] & object | null } {
  const { limits, conductorUnit } = reader.job()
  const { speakerLossConvention: convention, speakerLossCaution: caution, conductorTemperatureC } = limits
  // What the legs after this run lose is not its to lose: its own share of the limit is less by that.
  const share = ownShare(ratioForLoss(caution, convention) ?? 0, speaker.onwardFactor) ?? 0
  if (share <= 0) return { advice: 'The legs after this run lose more than that by themselves: begin with those.', remedy: null }
  const choose = (offers: readonly GaugeOffer[]) => thinnestThatHolds(offers, lengthMm / 1000, speaker.behindOhm, 100 * share, 'impedance')
  const upTo = (metres: number) => `stays under ${lossText(caution, convention)} up to ${reachText(reader, metres * 1000)}`
  const offers = reader.all('cableType').filter((each) => each.family === 'speaker' && each.conductors === type.conductors && sameFitness(each, type))
  const best = choose(offers.flatMap((each) => offerOf(each.id, conductorOhmPerKm(each, conductorTemperatureC))))
  const chosen = best && offers.find((each) => each.id === best.id)
  if (best && chosen)
    return { advice: `${formatConductor(chosen, conductorUnit)} ${upTo(best.longestM)}.`, remedy: { label: `Change to ${chosen.code}`, intent: { verb: 'run.changeCable', args: { ids: [run.id], cableTypeId: chosen.id } } } }
  const gauge = choose(tradeGauges.flatMap((awg) => offerOf(String(awg), conductorOhmPerKm({ ...type, awg, areaMm2: null, resistanceOhmPerKm: null }, conductorTemperatureC))))
  return { advice: gauge ? `${formatConductor({ awg: Number(gauge.id), areaMm2: null }, conductorUnit)} ${upTo(gauge.longestM)}; no cable of that size is on the job.` : 'No usual gauge would do: move the amplifier nearer, or raise the load.', remedy: null }
}

const offerOf = (id: string, conductorOhm: number | null): GaugeOffer[] => (conductorOhm === null ? [] : [{ id, conductorOhmPerKm: conductorOhm }])

/** A stand-in is made for the same places: indoors or out, in the ground, in a plenum. */
const sameFitness = (a: CableType, b: CableType) => a.wet === b.wet && a.outdoor === b.outdoor && a.buried === b.buried && a.jacketRating.endsWith('P') === b.jacketRating.endsWith('P')

function basisOf(reader: JobReader, { type, length, speaker, loss }: Case): string {
  const { limits } = reader.job()
  const convention = limits.speakerLossConvention
  const conductorOhm = conductorOhmPerKm(type, limits.conductorTemperatureC)
  const stated = type.resistanceOhmPerKm !== null ? 'as its maker states' : `${type.stranding === 'class5' ? 'class 5' : type.stranding} ${type.material === 'cca' ? 'copper-clad aluminium' : 'copper'}`
  const own = lossText(lossIn(speaker, convention), convention)
  const total = speaker.withLegs ? `; with the legs after it (${formatNumber(20 * Math.log10(speaker.onwardFactor), 2)} dB), worked back from the far ends: ${lossText(loss, convention)}` : ''
  return [
    `Rc = 2 × ${formatNumber(length.totalMm / 1000, 1)} m (${length.basis}) × ${formatNumber(conductorOhm ?? 0, 2)} ohm/km (${stated}, ${limits.conductorTemperatureC} °C) = ${formatNumber(speaker.loopResistanceOhm, 3)} ohm`,
    `Z = ${formatNumber(speaker.loadOhm, 2)} ohm${speaker.assumed ? ' (no cord drawn: the speaker at the plate is taken to be on it)' : ''}`,
    `${lossWords[convention].name}: ${lossWords[convention].formula} = ${own}${total}`,
    ...(speaker.uncounted.length ? [`left out, no length: ${speaker.uncounted.join(', ')}`] : []),
  ].join('; ')
}
