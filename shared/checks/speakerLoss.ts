import { thinnestThatHolds } from '../calc/speaker/gaugeFor.ts'
import { withinLimit } from '../calc/speaker/load.ts'
import { conductorOhmPerKm } from '../derive/speakerFacts.ts'
import { factsOf } from '../derive/runFacts.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { CableType } from '../model/cableType.ts'
import type { Run } from '../model/run.ts'
import { formatConductor, formatNumber } from '../units.ts'
import { defineCheck, lengthText, type Draft } from './define.ts'
import { lossIn, lossText, lossWords } from './lossWords.ts'

/** Gauges that are named when no cable of the job would do. */
const tradeGauges = [18, 16, 14, 12, 10]

export const speakerLoss = defineCheck({
  id: 'speakerLoss',
  title: 'Speaker loss',
  what: 'What a loudspeaker run loses at its length, into the load as the amplifier sees it, both conductors counted',
  tier: 'practice',
  source: 'Ohm’s law with copper at 17.241 ohm mm²/km (wire tables); the limit is the company’s choice, since published rules differ (5 % or 10 % of the load, 0.5 or 1 dB)',
  about: 'run',
  limits: ({ speakerLossConvention: convention, speakerLossCaution, speakerLossStop }) => [
    { severity: 'caution', text: `over ${lossText(speakerLossCaution, convention)}` },
    { severity: 'stop', text: `over ${lossText(speakerLossStop, convention)}` },
  ],
  look: (reader, run) => {
    const { speaker, length } = factsOf(reader, run)
    const type = reader.find('cableType', run.cableTypeId)
    if (!speaker || !length || !type) return []
    const { limits, conductorUnit } = reader.job()
    const convention = limits.speakerLossConvention
    const loss = lossIn(speaker, convention)
    const limit = limits.speakerLossCaution
    if (withinLimit(loss, limit)) return []
    const isStop = !withinLimit(loss, limits.speakerLossStop)
    const size = formatConductor(type, conductorUnit)
    const better = betterCable(reader, run, type, length.totalMm, speaker.loadOhm)
    return [
      {
        severity: isStop ? 'stop' : 'caution',
        aboutName: run.label,
        sentence: `${size} loses ${lossText(loss, convention)} at ${lengthText(reader, length.totalMm)} into ${speaker.loadText}; the limit is ${lossText(isStop ? limits.speakerLossStop : limit, convention)}.`,
        advice: better.advice,
        figure: { value: loss, unit: lossWords[convention].unit, text: `${formatNumber(loss, lossWords[convention].decimals)} ${lossWords[convention].unit}` },
        limit: { value: limit, unit: lossWords[convention].unit, text: `${formatNumber(limit, lossWords[convention].decimals)} ${lossWords[convention].unit}`, setBy: 'job' },
        basis: basisOf(reader, type, length.totalMm, speaker.loopResistanceOhm, speaker.loadOhm, loss),
        figures: [type.code, length.totalMm, speaker.loadOhm.toFixed(3), convention, limit, limits.speakerLossStop, limits.conductorTemperatureC].join('|'),
        remedy: better.remedy,
      } satisfies Draft,
    ]
  },
})

/** The thinnest cable of the job, of the same make-up and fit for the same places, that stays within the limit. */
function betterCable(reader: JobReader, run: Run, type: CableType, lengthMm: number, loadOhm: number): { advice: string; remedy: Draft['remedy'] & object | null } {
  const { limits, conductorUnit } = reader.job()
  const convention = limits.speakerLossConvention
  const offers = reader.all('cableType').filter((each) => each.family === 'speaker' && each.conductors === type.conductors && sameFitness(each, type))
  const sized = offers.flatMap((each) => {
    const conductorOhm = conductorOhmPerKm(each, limits.conductorTemperatureC)
    return conductorOhm === null ? [] : [{ id: each.id, conductorOhmPerKm: conductorOhm }]
  })
  const best = thinnestThatHolds(sized, lengthMm / 1000, loadOhm, limits.speakerLossCaution, convention)
  const chosen = best && offers.find((each) => each.id === best.id)
  if (best && chosen)
    return {
      advice: `${formatConductor(chosen, conductorUnit)} stays under ${lossText(limits.speakerLossCaution, convention)} up to ${lengthText(reader, Math.floor(best.longestM * 1000))}.`,
      remedy: { label: `Change to ${chosen.code}`, intent: { verb: 'run.changeCable', args: { ids: [run.id], cableTypeId: chosen.id } } },
    }
  const gauges = tradeGauges.flatMap((awg) => {
    const conductorOhm = conductorOhmPerKm({ ...type, awg, areaMm2: null, resistanceOhmPerKm: null }, limits.conductorTemperatureC)
    return conductorOhm === null ? [] : [{ id: String(awg), conductorOhmPerKm: conductorOhm }]
  })
  const gauge = thinnestThatHolds(gauges, lengthMm / 1000, loadOhm, limits.speakerLossCaution, convention)
  return { advice: gauge ? `${gauge.id} AWG would do; no cable of that size is on the job.` : 'No usual gauge would do: move the amplifier nearer, or raise the load.', remedy: null }
}

/** A stand-in is made for the same places: indoors or out, in the ground, in a plenum. */
const sameFitness = (a: CableType, b: CableType) => a.wet === b.wet && a.outdoor === b.outdoor && a.buried === b.buried && a.jacketRating.endsWith('P') === b.jacketRating.endsWith('P')

function basisOf(reader: JobReader, type: CableType, lengthMm: number, loopOhm: number, loadOhm: number, loss: number): string {
  const { limits } = reader.job()
  const convention = limits.speakerLossConvention
  const conductorOhm = conductorOhmPerKm(type, limits.conductorTemperatureC)
  const stated = type.resistanceOhmPerKm !== null ? 'as its maker states' : `${type.stranding === 'class5' ? 'class 5' : type.stranding} ${type.material === 'cca' ? 'copper-clad aluminium' : 'copper'}`
  return (
    `Rc = 2 × ${formatNumber(lengthMm / 1000, 1)} m × ${formatNumber(conductorOhm ?? 0, 2)} ohm/km (${stated}, ${limits.conductorTemperatureC} °C) = ${formatNumber(loopOhm, 3)} ohm; Z = ${formatNumber(loadOhm, 2)} ohm; ` +
    `${lossWords[convention].name}: ${lossWords[convention].formula} = ${formatNumber(loss, lossWords[convention].decimals)} ${lossWords[convention].unit}`
  )
}
