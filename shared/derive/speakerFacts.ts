import { conductorResistanceOhmPerKm } from '../calc/conductor/resistance.ts'
import { lineLoss, loopResistanceOhm } from '../calc/speaker/lineLoss.ts'
import { exactLineVoltage, lineLoadOhm, parallelOhm, seriesOhm } from '../calc/speaker/load.ts'
import type { CableType } from '../model/cableType.ts'
import type { Run } from '../model/run.ts'
import { formatNumber } from '../units.ts'
import type { LengthMakeUp, SpeakerFacts } from './facts.ts'
import type { JobReader } from './jobReader.ts'
import { speakersReached, type ReachedSpeaker } from './speakersReached.ts'

export interface SpeakerLoad {
  readonly loadOhm: number
  readonly text: string
  readonly lineVoltageV: number | null
  readonly totalW: number | null
  readonly speakers: readonly ReachedSpeaker[]
  /** On a constant-voltage line, those without a tap: left on their low impedance they short the line. */
  readonly untapped: readonly ReachedSpeaker[]
}

/** Pairs of conductors: a cable of four carries two channels. */
export const pairsOf = (type: CableType): number => Math.max(1, Math.floor(type.conductors / 2))

const ohms = (value: number) => `${formatNumber(value, Number.isInteger(Math.round(value * 100) / 100) ? 0 : 1)} ohm`
const nominal = (speaker: ReachedSpeaker) => speaker.device.loadOhm ?? speaker.ratings.loadOhm ?? null

/** The load that a run's speakers make, as the amplifier sees it; null where it feeds none or a load is not known. */
export function speakerLoad(reader: JobReader, run: Run, type: CableType): SpeakerLoad | null {
  const speakers = speakersReached(reader, run)
  if (!speakers.length) return null
  const voltage = speakers.find((speaker) => speaker.ratings.lineVoltageV !== undefined)?.ratings.lineVoltageV
  return voltage === undefined ? lowImpedance(run, type, speakers) : constantVoltage(exactLineVoltage(voltage), speakers)
}

function constantVoltage(lineVoltageV: number, speakers: readonly ReachedSpeaker[]): SpeakerLoad | null {
  const untapped = speakers.filter((speaker) => speaker.device.tapW === null)
  const totalW = speakers.reduce((sum, speaker) => sum + (speaker.device.tapW ?? 0), 0)
  const tapped = totalW > 0 ? lineLoadOhm(lineVoltageV, totalW) : null
  const shorts = untapped.map((speaker) => nominal(speaker) ?? 8)
  const loadOhm = parallelOhm([...(tapped === null ? [] : [tapped]), ...shorts])
  return loadOhm === null ? null : { loadOhm, text: `${speakers.length} taps, ${formatNumber(totalW, totalW % 1 ? 1 : 0)} W on ${formatNumber(lineVoltageV, 1)} V`, lineVoltageV, totalW, speakers, untapped }
}

/** Speakers are dealt to the cable's pairs in turn; the lowest load of a pair is the one that counts. */
function lowImpedance(run: Run, type: CableType, speakers: readonly ReachedSpeaker[]): SpeakerLoad | null {
  const pairs = pairsOf(type)
  const perPair: number[][] = Array.from({ length: Math.min(pairs, speakers.length) }, () => [])
  for (const [index, speaker] of speakers.entries()) {
    const load = nominal(speaker)
    if (load === null) return null
    perPair[index % perPair.length]!.push(load)
  }
  const join = run.loadJoin === 'series' ? seriesOhm : parallelOhm
  let worst: { ohm: number; loads: readonly number[] } | null = null
  for (const loads of perPair) {
    const ohm = join(loads)
    if (ohm === null) return null
    if (!worst || ohm < worst.ohm) worst = { ohm, loads }
  }
  if (!worst) return null
  const text = worst.loads.length === 1 ? ohms(worst.ohm) : `${worst.loads.map((load) => ohms(load)).join(' and ')} in ${run.loadJoin}, ${ohms(worst.ohm)}`
  return { loadOhm: worst.ohm, text, lineVoltageV: null, totalW: null, speakers, untapped: [] }
}

/** Resistance of one conductor of a type at the job's temperature, ohm/km; null: its size is not known. */
export const conductorOhmPerKm = (type: CableType, temperatureC: number): number | null =>
  conductorResistanceOhmPerKm({ awg: type.awg, areaMm2: type.areaMm2, stranding: type.stranding, material: type.material, statedOhmPerKm: type.resistanceOhmPerKm }, temperatureC)

/** What a loudspeaker run loses at its length. Null where it feeds no speaker, or length or conductor is not known. */
export function speakerFacts(reader: JobReader, run: Run, length: LengthMakeUp | null): SpeakerFacts | null {
  const type = reader.find('cableType', run.cableTypeId)
  if (!type || type.family !== 'speaker') return null
  const load = speakerLoad(reader, run, type)
  const ohmPerKm = conductorOhmPerKm(type, reader.job().limits.conductorTemperatureC)
  if (!load || !length || ohmPerKm === null) return null
  const loop = loopResistanceOhm(length.totalMm / 1000, ohmPerKm)
  const loss = loop === null ? null : lineLoss(loop, load.loadOhm)
  if (loop === null || loss === null) return null
  return {
    loadOhm: load.loadOhm, loadText: load.text, lineVoltageV: load.lineVoltageV, loopResistanceOhm: loop,
    lossDb: loss.decibel, impedancePercent: loss.impedance, voltagePercent: loss.voltage, powerPercent: loss.power,
  }
}
