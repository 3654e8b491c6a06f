import { withinLimit } from '../calc/speaker/load.ts'
import { formatClockMhz, fullClassReachM } from '../calc/video/linkReach.ts'
import { cordsMmOf, deviceBeyond, type TerminalAt } from '../derive/ends.ts'
import type { JobReader } from '../derive/jobReader.ts'
import { lengthOf } from '../derive/lengthOf.ts'
import type { Category } from '../model/cableType.ts'
import type { RunEnd } from '../model/run.ts'
import { formatNumber } from '../units.ts'
import { defineCheck, lengthsApart, lengthText } from './define.ts'

export const videoReach = defineCheck({
  id: 'videoReach',
  title: 'Video link reach',
  what: 'Video over a twisted-pair run and its cords, by the format carried, the kind of link and the category of the cable',
  tier: 'practice',
  source: 'Reach as the device’s model states; else 100 m to 225 MHz of character rate and 70 or 100 m above by category (projector and matrix manuals, public copies)',
  about: 'run',
  limits: () => [
    { severity: 'stop', text: 'over the reach of the link' },
    { severity: 'note', text: 'reach not known' },
  ],
  look: (reader, run) => {
    const type = reader.find('cableType', run.cableTypeId)
    if (type?.family !== 'twisted-pair' || type.category === null) return []
    const link = linkTerminal(reader, run.a) ?? linkTerminal(reader, run.b)
    const { length } = lengthOf(reader, run)
    if (!link || !length) return []
    const reach = reachOf(link, type.category)
    const { videoFormat: format, name } = link.device
    const basis = { aboutName: run.label, figures: [length.totalMm, cordsMmOf(reader, run), type.category, format ?? '', reach.metres ?? 'none', link.terminal.ratings.linkClass ?? ''].join('|') }
    if (reach.metres === null && reach.isUnknown)
      return [{ ...basis, severity: 'note', sentence: `How far ${name} reaches on category ${type.category} is not known.`, advice: 'Give the model its reach, or the device the format it carries.', basis: reach.why }]
    if (reach.metres === null)
      return [{ ...basis, severity: 'stop', sentence: `${name} cannot carry ${format ?? 'its picture'} over category ${type.category}.`, advice: 'Use a higher category, a lower format, active optical cable, or another link.', basis: reach.why }]
    const reachMm = reach.metres * 1000
    // A reach is that of the whole link, cords and all.
    const cordsMm = cordsMmOf(reader, run)
    const linkMm = length.totalMm + cordsMm
    if (withinLimit(linkMm, reachMm)) return []
    const [ownText, reachText] = lengthsApart(reader, linkMm, reachMm)
    return [
      {
        ...basis,
        severity: 'stop',
        sentence: `${name} reaches ${reachText} on category ${type.category}${format ? ` with ${format}` : ''}; this run is ${ownText}${cordsMm ? ' with its cords' : ''}.`,
        advice: 'Use a higher category, a lower format, active optical cable, or a link that reaches further.',
        figure: { value: linkMm, unit: 'mm', text: ownText },
        limit: { value: reachMm, unit: 'mm', text: reachText, setBy: 'source' },
        basis: `${reach.why}: ${formatNumber(reach.metres, 0)} m; ${length.basis} length ${lengthText(reader, length.totalMm)}, cords ${lengthText(reader, cordsMm)}`,
      },
    ]
  },
})

/** A video link's terminal at a run's end, directly or by a cord. */
function linkTerminal(reader: JobReader, end: RunEnd | null): TerminalAt | undefined {
  const at = deviceBeyond(reader, end)
  return at?.terminal.signal === 'video-link' ? at : undefined
}

/** Metres a link goes, null where it cannot or where nothing says, and why. */
interface Reach {
  readonly metres: number | null
  readonly isUnknown: boolean
  readonly why: string
}

/**
 * What the model states goes before what the format's character rate allows of a full-class link. A link that compresses
 * or that carries 10 Gb/s goes as far as its maker says whatever the format. A model that states a reach for some
 * categories does not go on the others.
 */
function reachOf({ device, terminal }: TerminalAt, category: Category): Reach {
  const { linkClass, reachM } = terminal.ratings
  const stated = reachM?.[category] ?? null
  const rate = device.videoFormat === null ? null : formatClockMhz[device.videoFormat]
  if (stated === null && reachM && Object.keys(reachM).length) return { metres: null, isUnknown: false, why: `Its model states a reach for category ${Object.keys(reachM).join(', ')} only` }
  if (linkClass === 'uncompressed-10g' || linkClass === 'compressed-1g' || rate === null) return { metres: stated, isUnknown: stated === null, why: stated === null ? 'Neither the model states a reach nor the device a format' : 'as its model states' }
  const byRate = fullClassReachM(rate, category)
  if (byRate === null) return { metres: null, isUnknown: false, why: `Character rate ${formatNumber(rate, 1)} MHz is over what a full-class link carries without compression` }
  return { metres: stated === null ? byRate : Math.min(stated, byRate), isUnknown: false, why: `${stated === null ? '' : 'the lesser of what its model states and of '}character rate ${formatNumber(rate, 1)} MHz` }
}
