import { withinLimit } from '../calc/speaker/load.ts'
import { formatClockMhz, fullClassReachM } from '../calc/video/linkReach.ts'
import { cordsOn, terminalAt, type TerminalAt } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { factsOf } from '../derive/runFacts.ts'
import type { Category } from '../model/cableType.ts'
import type { RunEnd } from '../model/run.ts'
import { formatNumber } from '../units.ts'
import { defineCheck, lengthText } from './define.ts'

export const videoReach = defineCheck({
  id: 'videoReach',
  title: 'Video link reach',
  what: 'Video over a twisted-pair run, by the format carried, the kind of link and the category of the cable',
  tier: 'practice',
  source: 'Reach as the device’s model states; else 100 m to 225 MHz of character rate and 70 or 100 m above by category (projector and matrix manuals, public copies)',
  about: 'run',
  limits: () => [{ severity: 'stop', text: 'over the reach of the link' }],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (type?.family !== 'twisted-pair' || type.category === null) return []
    const link = linkTerminal(reader, run.a) ?? linkTerminal(reader, run.b)
    const { length } = factsOf(reader, run)
    if (!link || !length) return []
    const reach = reachOf(link, type.category)
    if (reach !== null && withinLimit(length.totalMm, reach.metres * 1000)) return []
    const format = link.device.videoFormat
    return [
      {
        severity: 'stop',
        aboutName: run.label,
        sentence: reach === null ? `${link.device.name} cannot carry ${format ?? 'its picture'} over category ${type.category}.` : `${link.device.name} reaches ${lengthText(reader, reach.metres * 1000)} on category ${type.category}${format ? ` with ${format}` : ''}; this run is ${lengthText(reader, length.totalMm)}.`,
        advice: 'Use a higher category, a lower format, active optical cable, or a link that reaches further.',
        figure: { value: length.totalMm, unit: 'mm', text: lengthText(reader, length.totalMm) },
        limit: reach && { value: reach.metres * 1000, unit: 'mm', text: lengthText(reader, reach.metres * 1000), setBy: 'source' },
        basis: reach === null ? 'No reach is known for this category and format' : `${reach.why}: ${formatNumber(reach.metres, 0)} m`,
        figures: [length.totalMm, type.category, format ?? '', reach?.metres ?? 'none', link.terminal.ratings.linkClass ?? ''].join('|'),
      },
    ]
  },
})

/** A video link's terminal at a run's end, directly or by a cord. */
function linkTerminal(reader: JobReader, end: RunEnd | null): TerminalAt | undefined {
  if (!end || 'rackId' in end) return undefined
  if ('deviceId' in end) {
    const at = terminalAt(reader, end.deviceId, end.terminal)
    if (at?.terminal.signal === 'video-link') return at
  }
  const jack = 'plateId' in end ? (end.jackId === null ? null : { plateId: end.plateId, jackId: end.jackId }) : end.terminal === null ? null : { deviceId: end.deviceId, terminal: end.terminal }
  if (!jack) return undefined
  for (const { far } of cordsOn(reader, jack)) {
    const at = 'deviceId' in far ? terminalAt(reader, far.deviceId, far.terminal) : undefined
    if (at?.terminal.signal === 'video-link') return at
  }
  return undefined
}

function reachOf({ device, terminal }: TerminalAt, category: Category): { metres: number; why: string } | null {
  const format = device.videoFormat
  const stated = terminal.ratings.reachM?.[category]
  const byClock = format === null ? null : fullClassReachM(formatClockMhz[format], category)
  // A link without compression goes no further than its clock allows, whatever the model says of the best case.
  if (terminal.ratings.linkClass === 'uncompressed-10g' || terminal.ratings.linkClass === 'compressed-1g') return stated === undefined ? null : { metres: stated, why: 'as its model states' }
  if (stated !== undefined && byClock !== null) return { metres: Math.min(stated, byClock), why: 'the lesser of model and character rate' }
  if (stated !== undefined) return { metres: stated, why: 'as its model states' }
  return byClock === null ? null : { metres: byClock, why: `character rate ${formatNumber(formatClockMhz[format!], 1)} MHz` }
}
