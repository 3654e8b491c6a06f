import { cordsOn, terminalAt } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { CableFamily } from '../model/cableType.ts'
import type { Signal, Terminal } from '../model/device.ts'
import type { Connector } from '../model/place.ts'
import type { EndName, Run, RunEnd } from '../model/run.ts'
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
  what: 'That a run joins terminals of one signal, an output to an input, on jacks that take its cable',
  tier: 'practice',
  source: 'What a cable is used for and which jack it fits: common practice, no source',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'wrong signal, jack or direction' }],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (!type) return []
    const stop = (sentence: string, advice: string): Draft => ({ severity: 'stop', aboutName: run.label, sentence, advice, basis: `${type.code} is ${type.family}`, figures: [type.family, sentence].join('|') })
    for (const end of [run.a, run.b]) {
      const wrong = wrongAt(reader, end, type.family)
      if (wrong) return [stop(`${type.code} does not belong on ${endWords(reader, end)}, which takes ${wrong}.`, 'Choose another port, or another cable.')]
    }
    const a = beyond(reader, run, 'a')
    const b = beyond(reader, run, 'b')
    if (!a || !b) return []
    if (a.terminal.signal !== b.terminal.signal) return [stop(`${a.name} is ${a.terminal.signal}, ${b.name} is ${b.terminal.signal}.`, 'Join terminals of one signal.')]
    if (a.terminal.direction === b.terminal.direction && a.terminal.direction !== 'both')
      return [stop(`${a.name} and ${b.name} both ${a.terminal.direction === 'out' ? 'give out' : 'take in'}.`, 'Join an output to an input.')]
    return []
  },
})

/** What a jack or terminal takes instead; undefined: it takes this family. */
function wrongAt(reader: JobReader, end: RunEnd | null, family: CableFamily): string | undefined {
  if (!end || 'rackId' in end) return undefined
  if ('plateId' in end) {
    const jack = reader.find('plate', end.plateId)?.jacks.find((each) => each.id === end.jackId)
    return jack && !fits[family].includes(jack.connector) ? `a ${jack.connector} cable` : undefined
  }
  const at = terminalAt(reader, end.deviceId, end.terminal)
  return at && !carries[family].includes(at.terminal.signal) ? at.terminal.signal : undefined
}

/** The device's terminal that an end comes to: itself, or the one beyond a jack's or panel's cord. */
function beyond(reader: JobReader, run: Run, name: EndName): { terminal: Terminal; name: string } | undefined {
  const end = run[name]
  if (!end || 'rackId' in end) return undefined
  if ('deviceId' in end) {
    const at = terminalAt(reader, end.deviceId, end.terminal)
    if (!at) return undefined
    if (at.category !== 'panel') return { terminal: at.terminal, name: at.device.name }
  }
  const front = 'plateId' in end ? (end.jackId === null ? null : { plateId: end.plateId, jackId: end.jackId }) : end.terminal === null ? null : { deviceId: end.deviceId, terminal: end.terminal }
  for (const { far } of front ? cordsOn(reader, front) : []) {
    const there = 'deviceId' in far ? terminalAt(reader, far.deviceId, far.terminal) : undefined
    if (there && there.category !== 'panel') return { terminal: there.terminal, name: there.device.name }
  }
  return undefined
}
