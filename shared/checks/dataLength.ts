import { withinLimit } from '../calc/speaker/load.ts'
import { cordsMmOf, deviceBeyond } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import type { Limits } from '../model/limits.ts'
import { factsOf } from '../derive/runFacts.ts'
import type { Run } from '../model/run.ts'
import { formatLength } from '../units.ts'
import { defineCheck, lengthsApart, lengthText, setBy, type Draft } from './define.ts'

export const dataLength = defineCheck({
  id: 'dataLength',
  title: 'Data run length',
  what: 'A twisted-pair run as a permanent link, slack included, and with its cords as a channel',
  tier: 'standard',
  source: 'TIA-568: permanent link 90 m, channel 100 m (read in vendor pages and install guides, not in the standard itself)',
  about: 'run',
  limits: ({ dataLinkCautionMm, dataLinkMm, dataChannelMm }, unit) => [
    { severity: 'caution', text: `over ${formatLength(dataLinkCautionMm, unit, { as: 'whole' })}` },
    { severity: 'stop', text: `over ${formatLength(dataLinkMm, unit, { as: 'whole' })}, with cords ${formatLength(dataChannelMm, unit, { as: 'whole' })}` },
  ],
  look: (reader, run) => {
    const { length } = factsOf(reader, run)
    const type = reader.find('cableType', run.cableTypeId)
    if (!length || type?.family !== 'twisted-pair' || !mayCarryData(reader, run)) return []
    const { limits } = reader.job()
    const cordsMm = cordsMmOf(reader, run)
    const draft = (severity: Draft['severity'], what: string, valueMm: number, key: keyof Limits & `data${string}`): Draft => {
      const [value, limit] = lengthsApart(reader, valueMm, limits[key])
      return {
        severity,
        aboutName: run.label,
        sentence: `${what} is ${value}; the limit is ${limit}.`,
        advice: severity === 'stop' ? 'Move the far end nearer, put a switch between, or use fiber.' : 'Check the route before it is pulled: slack and detours count.',
        figure: { value: valueMm, unit: 'mm', text: value },
        limit: { value: limits[key], unit: 'mm', text: limit, setBy: setBy(limits, key) },
        basis: `${length.basis} length ${lengthText(reader, length.totalMm)}, slack included${cordsMm ? `; cords ${lengthText(reader, cordsMm)}` : ''}`,
        figures: [length.totalMm, cordsMm, limits[key]].join('|'),
      }
    }
    if (!withinLimit(length.totalMm, limits.dataLinkMm)) return [draft('stop', 'The run', length.totalMm, 'dataLinkMm')]
    if (!withinLimit(length.totalMm + cordsMm, limits.dataChannelMm)) return [draft('stop', 'The run with its cords', length.totalMm + cordsMm, 'dataChannelMm')]
    if (!withinLimit(length.totalMm, limits.dataLinkCautionMm)) return [draft('caution', 'The run', length.totalMm, 'dataLinkCautionMm')]
    return []
  },
})

/**
 * Twisted pair is also laid for keypads, sensors and shades, which no data limit holds for, and for video links, whose
 * own reach is checked: where a device says so, it is believed.
 */
const mayCarryData = (reader: JobReader, run: Run) =>
  (['a', 'b'] as const).every((end) => {
    const signal = deviceBeyond(reader, run[end])?.terminal.signal
    return signal === undefined || signal === 'ethernet'
  })
