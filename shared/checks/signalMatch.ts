import { deviceBeyond, terminalAt, type TerminalAt } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { CableFamily } from '../model/cableType.ts'
import type { Signal } from '../model/device.ts'
import type { Connector } from '../model/place.ts'
import type { RunEnd } from '../model/run.ts'
import { defineCheck, type Draft } from './define.ts'
import { endWords } from './endWords.ts'

/** Signals a family of cable is used for (common practice, no source). */
const carries: Record<CableFamily, readonly Signal[]> = {
  speaker: ['speaker', 'speaker-line', 'control', 'power', 'sensor'],
  'twisted-pair': ['ethernet', 'video-link', 'control', 'bus', 'sensor', 'usb', 'line', 'power'],
  coax: ['rf', 'line'],
  line: ['line'],
  control: ['control', 'bus', 'sensor', 'power'],
  fibre: ['fibre', 'video', 'usb'],
  video: ['video'],
  usb: ['usb'],
}

/** Jacks a family of cable is put on. */
const fits: Record<CableFamily, readonly Connector[]> = {
  speaker: ['speaker-pair', 'control', 'power', 'bare'],
  'twisted-pair': ['modular', 'control', 'keypad', 'bare', 'usb'],
  coax: ['coax', 'line', 'bare'],
  line: ['line', 'bare'],
  control: ['control', 'keypad', 'power', 'bare'],
  fibre: ['fibre', 'bare'],
  video: ['hdmi', 'bare'],
  usb: ['usb', 'bare'],
}

export const signalMatch = defineCheck({
  id: 'signalMatch',
  title: 'Signal and direction',
  what: 'That a run joins terminals of one signal, an output to an input, on jacks and ports that take its cable',
  tier: 'practice',
  source: 'What a cable is used for and which jack it fits: common practice, no source',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'wrong signal, jack or direction' }],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (!type) return []
    const stop = (sentence: string, advice: string): Draft => ({ severity: 'stop', aboutName: run.label, sentence, advice, basis: `${type.code} is ${type.family}`, figures: [type.family, sentence].join('|') })
    for (const end of [run.a, run.b]) {
      const other = wrongAt(reader, end, type.family)
      if (other) return [stop(`${type.code} does not belong on ${endWords(reader, end)}, which takes ${other}.`, 'Choose another port, or another cable.')]
    }
    const a = deviceBeyond(reader, run.a)
    const b = deviceBeyond(reader, run.b)
    const wrong = a && b && mismatch(a, b)
    return wrong ? [stop(wrong.sentence, wrong.advice)] : []
  },
})

export const cordMatch = defineCheck({
  id: 'cordMatch',
  title: 'Cords and signals',
  what: 'That a cord between two devices joins terminals of one signal, an output to an input; a panel passes on whatever fits it',
  tier: 'practice',
  source: 'What a terminal gives or takes, as its model states',
  about: 'cord',
  limits: () => [{ severity: 'stop', text: 'wrong signal or direction' }],
  look: (reader, cord) => {
    const [a, b] = [cord.a, cord.b].map((end) => ('deviceId' in end ? terminalAt(reader, end.deviceId, end.terminal) : undefined))
    if (!a || !b || a.category === 'panel' || b.category === 'panel') return []
    const wrong = mismatch(a, b)
    return wrong ? [{ severity: 'stop', aboutName: `${a.device.name} to ${b.device.name}`, sentence: wrong.sentence, advice: wrong.advice, basis: `${a.terminal.name}: ${a.terminal.signal}, ${a.terminal.direction}; ${b.terminal.name}: ${b.terminal.signal}, ${b.terminal.direction}`, figures: wrong.sentence }] : []
  },
})

/** What is wrong with two terminals joined; undefined: nothing. */
function mismatch(a: TerminalAt, b: TerminalAt): { sentence: string; advice: string } | undefined {
  const name = ({ device, terminal }: TerminalAt) => `${device.name}, ${terminal.name.toLowerCase()},`
  if (a.terminal.signal !== b.terminal.signal) return { sentence: `${name(a)} carries ${signalWords[a.terminal.signal]}; ${name(b)} carries ${signalWords[b.terminal.signal]}.`, advice: 'Join terminals of one signal.' }
  if (a.terminal.direction !== b.terminal.direction || a.terminal.direction === 'both') return undefined
  return { sentence: `${name(a)} and ${name(b).slice(0, -1)} both ${a.terminal.direction === 'out' ? 'give out' : 'take in'}.`, advice: 'Join an output to an input.' }
}

const jackWords: Record<Connector, string> = {
  modular: 'twisted pair', coax: 'coax', 'speaker-pair': 'speaker cable', fibre: 'fiber', control: 'control cable', power: 'power cable', keypad: 'keypad cable', line: 'line-level cable', hdmi: 'a video cable', usb: 'a USB cable', bare: 'bare cable',
}

const signalWords: Record<Signal, string> = {
  speaker: 'a loudspeaker signal', 'speaker-line': 'a constant-voltage line', line: 'line level', ethernet: 'network', video: 'video', 'video-link': 'an extender’s link', rf: 'antenna or cable television',
  usb: 'USB', control: 'control', bus: 'a bus', sensor: 'a sensor loop', power: 'power', fibre: 'light in fiber',
}

/** What a jack or terminal takes instead; undefined: it takes this family. */
function wrongAt(reader: JobReader, end: RunEnd | null, family: CableFamily): string | undefined {
  if (!end || 'rackId' in end) return undefined
  if ('plateId' in end) {
    const jack = reader.find('plate', end.plateId)?.jacks.find((each) => each.id === end.jackId)
    return jack && !fits[family].includes(jack.connector) ? jackWords[jack.connector] : undefined
  }
  const at = terminalAt(reader, end.deviceId, end.terminal)
  return at && !carries[family].includes(at.terminal.signal) ? signalWords[at.terminal.signal] : undefined
}
