import { exactLineVoltage, lineLoadOhm, parallelOhm, seriesOhm } from '../calc/speaker/load.ts'
import type { CableType } from '../model/cableType.ts'
import type { Run } from '../model/run.ts'
import { formatNumber } from '../units.ts'
import { feedOf } from './feedOf.ts'
import type { JobReader } from './jobReader.ts'
import { speakersReached, type ReachedSpeaker } from './speakersReached.ts'

export interface LoadedSpeaker extends ReachedSpeaker {
  /** Its impedance as the line sees it, ohm. */
  readonly ohm: number
}

/** The load that a run's speakers make, as the amplifier sees it. */
export interface SpeakerLoad {
  /** Lowest of the cable's pairs, ohm. */
  readonly loadOhm: number
  /** How it came about: "two 8 ohm speakers in parallel, 4 ohm". */
  readonly text: string
  /** Null: low impedance. */
  readonly lineVoltageV: number | null
  /** What the taps add up to on this line, W; null: low impedance. */
  readonly totalW: number | null
  /** The speakers on each pair of conductors. A constant-voltage line is one pair. */
  readonly pairs: readonly (readonly LoadedSpeaker[])[]
  /** On a constant-voltage line, those without a tap: left on their low impedance they short the line. */
  readonly untapped: readonly ReachedSpeaker[]
  /** Some speaker is there by its place only: no cord is drawn. */
  readonly assumed: boolean
}

/** A load; or what is missing for it, in a few words; or neither, where no speaker is reached. */
export interface LoadAnswer {
  readonly load: SpeakerLoad | null
  readonly missing: string | null
}

/** Pairs of conductors: a cable of four carries two channels. */
export const pairsOf = (type: CableType): number => Math.max(1, Math.floor(type.conductors / 2))

/** What a run's speakers come to; nothing for a cable that is not for loudspeakers. */
export const speakerLoad = (reader: JobReader, run: Run): LoadAnswer =>
  reader.remember('load', run.id, () => {
    const current = reader.find('run', run.id) ?? run
    const type = reader.find('cableType', current.cableTypeId)
    const speakers = type?.family === 'speaker' ? speakersReached(reader, current) : []
    if (!type || !speakers.length) return { load: null, missing: null }
    const line = speakers.filter((speaker) => speaker.isLine || speaker.device.tapW !== null)
    const voltage = feedOf(reader, current)?.terminal.ratings.lineVoltageV ?? line.find((speaker) => speaker.ratings.lineVoltageV !== undefined)?.ratings.lineVoltageV
    if (voltage !== undefined) return constantVoltage(exactLineVoltage(voltage), speakers)
    return line.length ? { load: null, missing: `the line voltage of ${line[0]!.device.name}` } : lowImpedance(current, type, speakers)
  })

const nominal = (speaker: ReachedSpeaker) => speaker.device.loadOhm ?? speaker.ratings.loadOhm ?? null
const isAssumed = (speakers: readonly ReachedSpeaker[]) => speakers.some((speaker) => speaker.assumed)

/** Speakers on taps. A tap is rated for a voltage: on another it takes more or less, its impedance stays. */
function constantVoltage(lineVoltageV: number, speakers: readonly ReachedSpeaker[]): LoadAnswer {
  const tapped = speakers.flatMap((speaker) => {
    const ohm = speaker.device.tapW === null ? null : lineLoadOhm(exactLineVoltage(speaker.ratings.lineVoltageV ?? lineVoltageV), speaker.device.tapW)
    return ohm === null ? [] : [{ ...speaker, ohm }]
  })
  const untapped = speakers.filter((speaker) => speaker.device.tapW === null)
  const shorts = untapped.flatMap((speaker) => nominal(speaker) ?? [])
  const loadOhm = parallelOhm([...tapped.map((each) => each.ohm), ...shorts])
  if (loadOhm === null) return { load: null, missing: `a tap on ${untapped.map((each) => each.device.name).join(', ')}` }
  const totalW = tapped.reduce((sum, { ohm }) => sum + lineVoltageV ** 2 / ohm, 0)
  const rounded = Math.round(totalW * 100) / 100
  const text = `${countWord(tapped.length)} ${tapped.length === 1 ? 'tap' : 'taps'}, ${formatNumber(rounded, rounded % 1 ? 1 : 0)} W on ${formatNumber(lineVoltageV, lineVoltageV % 1 ? 1 : 0)} V`
  return { load: { loadOhm, text, lineVoltageV, totalW: rounded, pairs: [tapped], untapped, assumed: isAssumed(speakers) }, missing: null }
}

function lowImpedance(run: Run, type: CableType, speakers: readonly ReachedSpeaker[]): LoadAnswer {
  const unknown = speakers.find((speaker) => nominal(speaker) === null)
  if (unknown) return { load: null, missing: `the load of ${unknown.device.name}` }
  const pairs = dealt(type, speakers.map((speaker) => ({ ...speaker, ohm: nominal(speaker)! })))
  const join = run.loadJoin === 'series' ? seriesOhm : parallelOhm
  let worst: { ohm: number; loads: readonly number[] } | null = null
  for (const pair of pairs) {
    const loads = pair.map((speaker) => speaker.ohm)
    const ohm = join(loads)
    if (ohm !== null && (!worst || ohm < worst.ohm)) worst = { ohm, loads }
  }
  if (!worst) return { load: null, missing: null }
  return { load: { loadOhm: worst.ohm, text: wordsOf(worst.loads, worst.ohm, run.loadJoin), lineVoltageV: null, totalW: null, pairs, untapped: [], assumed: isAssumed(speakers) }, missing: null }
}

/** Speakers on the cable's pairs: by side where the run parts at a control, else in turn, left and right. */
function dealt(type: CableType, speakers: readonly LoadedSpeaker[]): LoadedSpeaker[][] {
  const count = Math.min(pairsOf(type), speakers.length)
  const pairs: LoadedSpeaker[][] = Array.from({ length: count }, () => [])
  speakers.forEach((speaker, index) => pairs[(speaker.side ?? index) % count]!.push(speaker))
  return pairs.filter((pair) => pair.length > 0)
}

/** "8 ohm", "two 8 ohm speakers in parallel, 4 ohm", "8 ohm and 6 ohm in series, 14 ohm". */
function wordsOf(loads: readonly number[], ohm: number, join: Run['loadJoin']): string {
  if (loads.length === 1) return ohmText(ohm)
  const alike = loads.every((load) => load === loads[0])
  const what = alike ? `${countWord(loads.length)} ${ohmText(loads[0]!)} speakers` : loads.map(ohmText).join(' and ')
  return `${what} in ${join}, ${ohmText(ohm)}`
}

/** Ohms with as many decimals as they need, two at most. */
export const ohmText = (value: number): string => `${formatNumber(value, [0, 1, 2].find((places) => Math.abs(value - Number(value.toFixed(places))) < 0.005) ?? 2)} ohm`

const words = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve']
/** A small count in a word, a larger one in figures. */
export const countWord = (count: number): string => words[count] ?? formatNumber(count, 0)
