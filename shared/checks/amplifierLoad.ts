import { lineLoadPercent, parallelOhm, withinLimit } from '../calc/speaker/load.ts'
import { cordsOn, runsOn, sourceEnd } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { ohmText, speakerLoad, type SpeakerLoad } from '../derive/speakerLoad.ts'
import type { Device, DeviceModel, Terminal } from '../model/device.ts'
import type { Run } from '../model/run.ts'
import { formatNumber } from '../units.ts'
import { defineCheck, setBy, type Draft } from './define.ts'

interface Fed {
  readonly run: Run
  readonly load: SpeakerLoad
}

/** The runs a channel feeds: on the terminal itself, and on panel ports its cords go to. */
function fedBy(reader: JobReader, device: Device, terminal: Terminal): Fed[] {
  const at = { deviceId: device.id, terminal: terminal.key }
  const ends = [at, ...cordsOn(reader, at).map(({ far }) => far)]
  return ends.flatMap((end) =>
    runsOn(reader, end).flatMap(({ run, end: name }) => {
      const { load } = sourceEnd(reader, run) === name ? speakerLoad(reader, run) : { load: null }
      return load ? [{ run, load }] : []
    }),
  )
}

const channelsOf = (model: DeviceModel) => model.terminals.filter((terminal) => terminal.direction === 'out' && (terminal.signal === 'speaker' || terminal.signal === 'speaker-line'))

export const amplifierLoad = defineCheck({
  id: 'amplifierLoad',
  title: 'Amplifier load',
  what: 'The load on each channel against the amplifier’s lowest, taps against its power, and speakers without a tap on a line',
  tier: 'practice',
  source: 'Lowest load as the model states; taps within 80 % of the amplifier (commercial-audio article, otherwise common practice)',
  about: 'device',
  limits: ({ lineLoadShare }) => [
    { severity: 'stop', text: 'under the lowest load, or a speaker without a tap' },
    { severity: 'caution', text: `taps over ${lineLoadShare} %` },
  ],
  look: (reader, device) => {
    const model = reader.find('deviceModel', device.modelId)
    if (!model || (model.category !== 'amplifier' && model.category !== 'receiver')) return []
    const channels = channelsOf(model).map((terminal) => ({ terminal, fed: fedBy(reader, device, terminal) }))
    return [...channels.flatMap((channel) => tooLow(device, channel)), ...channels.flatMap((channel) => untapped(device, channel)), ...overTapped(reader, device, model, channels)]
  },
})

interface Channel {
  readonly terminal: Terminal
  readonly fed: readonly Fed[]
}

function tooLow(device: Device, { terminal, fed }: Channel): Draft[] {
  const least = terminal.ratings.minLoadOhm
  const load = parallelOhm(fed.map((each) => each.load.loadOhm))
  if (least === undefined || load === null || withinLimit(least, load)) return []
  return [
    {
      severity: 'stop',
      aboutName: `${device.name}, ${terminal.name}`,
      sentence: `${terminal.name} of ${device.name} sees ${ohmText(load)}; it may see no less than ${ohmText(least)}.`,
      advice: `Take a speaker off (${fed.map((each) => each.run.label).join(', ')}), or join them in series.`,
      figure: { value: load, unit: 'ohm', text: ohmText(load) },
      limit: { value: least, unit: 'ohm', text: ohmText(least), setBy: 'source' },
      basis: `1/Z = ${fed.map((each) => `1/${ohmText(each.load.loadOhm)}`).join(' + ')}`,
      figures: [terminal.key, load.toFixed(3), least].join('|'),
    },
  ]
}

function untapped(device: Device, { terminal, fed }: Channel): Draft[] {
  const speakers = fed.flatMap((each) => each.load.untapped)
  if (!speakers.length) return []
  const names = speakers.map((each) => each.device.name).join(', ')
  return [
    {
      severity: 'stop',
      aboutName: `${device.name}, ${terminal.name}`,
      sentence: `${names} ${speakers.length === 1 ? 'has' : 'have'} no tap chosen: on a constant-voltage line a speaker on its low impedance shorts the line.`,
      advice: 'Choose a tap. A measured line impedance far below V²/P is the clue on site.',
      basis: fed.map(({ run, load }) => `${run.label}: ${load.totalW && load.lineVoltageV !== null ? `V²/P of its taps is ${ohmText(load.lineVoltageV ** 2 / load.totalW)}, ` : ''}with those on low impedance ${ohmText(load.loadOhm)}`).join('; '),
      figures: [terminal.key, names].join('|'),
    },
  ]
}

function overTapped(reader: JobReader, device: Device, model: DeviceModel, channels: readonly Channel[]): Draft[] {
  const { limits } = reader.job()
  const { lineLoadShare } = limits
  const tapsOf = (channel: Channel) => channel.fed.reduce((sum, each) => sum + (each.load.totalW ?? 0), 0)
  const draft = (name: string, taps: number, power: number): Draft[] => {
    const share = lineLoadPercent(taps, power)
    if (share === null || taps === 0 || withinLimit(share, lineLoadShare)) return []
    const decimals = share.toFixed(0) === lineLoadShare.toFixed(0) ? 1 : 0
    const percent = (value: number) => `${formatNumber(value, decimals)} %`
    return [
      {
        severity: 'caution',
        aboutName: name,
        sentence: `Taps of ${formatNumber(taps, taps % 1 ? 1 : 0)} W on ${name} of ${formatNumber(power, 0)} W are ${percent(share)}; the limit is ${percent(lineLoadShare)}.`,
        advice: 'Choose lower taps, or a larger amplifier.',
        figure: { value: share, unit: '%', text: percent(share) },
        limit: { value: lineLoadShare, unit: '%', text: percent(lineLoadShare), setBy: setBy(limits, 'lineLoadShare') },
        basis: `sum of taps ${formatNumber(taps, 1)} W / ${formatNumber(power, 0)} W`,
        figures: [name, taps, power, lineLoadShare].join('|'),
      },
    ]
  }
  if (model.sharedPowerW !== null) return draft(device.name, channels.reduce((sum, channel) => sum + tapsOf(channel), 0), model.sharedPowerW)
  return channels.flatMap((channel) => (channel.terminal.ratings.powerW === undefined ? [] : draft(`${device.name}, ${channel.terminal.name}`, tapsOf(channel), channel.terminal.ratings.powerW)))
}
