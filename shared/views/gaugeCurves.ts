import { lineLoss, loopResistanceOhm, ratioForLoss } from '../calc/speaker/lineLoss.ts'
import { ownShare, totalRatio } from '../calc/speaker/lineTree.ts'
import { lossIn, lossWords } from '../checks/lossWords.ts'
import type { Derived } from '../derive/deriveJob.ts'
import { conductorOhmPerKm } from '../derive/speakerFacts.ts'
import type { CableType } from '../model/cableType.ts'
import { find, jobOf, recordsOf, type JobDocument } from '../model/jobDocument.ts'
import type { LossConvention } from '../model/limits.ts'
import { formatConductor } from '../units.ts'

export interface GaugeCurve {
  /** The conductor size by the job's setting: "14 AWG". */
  readonly name: string
  readonly isOwn: boolean
  /** A cable of the job with this conductor; null: a usual gauge that the job has no cable of. */
  readonly cableTypeId: string | null
  readonly ohmPerKm: number
  /** Loss at evenly spaced lengths from nothing to `longestMm`, in the convention's unit. */
  readonly points: readonly { readonly lengthMm: number; readonly loss: number }[]
  /** How far it goes within the caution and within the stop, mm; 0 where what comes after loses more by itself. */
  readonly cautionMm: number
  readonly stopMm: number
}

export interface GaugeCurves {
  readonly convention: LossConvention
  readonly unit: string
  readonly caution: number
  readonly stop: number
  readonly longestMm: number
  readonly curves: readonly GaugeCurve[]
  /** Where this run stands. */
  readonly own: { readonly lengthMm: number; readonly loss: number }
}

/** Gauges that are shown whether or not the job has a cable of them. */
const usualGauges = [18, 16, 14, 12]
const steps = 24

/**
 * Loss of a loudspeaker run against length, for its own cable, the job's other speaker cables of as many conductors, and
 * the usual gauges; one curve a size, thickest first, legs after the run included. Null: the run has no loss to show.
 */
export function gaugeCurves({ doc, runs }: Pick<Derived, 'doc' | 'runs'>, runId: string): GaugeCurves | null {
  const facts = runs.get(runId)
  const type = find(doc, 'cableType', facts?.run.cableTypeId)
  if (!facts?.speaker || !facts.length || !type) return null
  const { behindOhm, onwardFactor } = facts.speaker
  const node = { behindOhm, worstFactor: onwardFactor }
  const { speakerLossConvention: convention, speakerLossCaution: caution, speakerLossStop: stop } = jobOf(doc).limits
  const own = { lengthMm: facts.length.totalMm, loss: lossIn(facts.speaker.withLegs ?? facts.speaker, convention) }
  const longestMm = Math.ceil(own.lengthMm * 1.5)
  const lossAt = (lengthMm: number, ohmPerKm: number) => {
    const loop = loopResistanceOhm(lengthMm / 1000, ohmPerKm)
    const ratio = loop === null ? null : totalRatio(loop, node)
    return ratio === null ? null : (lineLoss(ratio, 1)?.[convention] ?? null)
  }
  const reachMm = (limit: number, ohmPerKm: number) => {
    const ratio = ratioForLoss(limit, convention)
    const share = ratio === null ? null : ownShare(ratio, onwardFactor)
    return share === null || share <= 0 ? 0 : Math.floor((share * behindOhm * 1_000_000) / (2 * ohmPerKm))
  }
  const curves = offers(doc, type).map((offer): GaugeCurve => ({
    ...offer,
    points: Array.from({ length: steps + 1 }, (_, i) => (longestMm * i) / steps).flatMap((lengthMm) => {
      const loss = lossAt(lengthMm, offer.ohmPerKm)
      return loss === null ? [] : [{ lengthMm, loss }]
    }),
    cautionMm: reachMm(caution, offer.ohmPerKm),
    stopMm: reachMm(stop, offer.ohmPerKm),
  }))
  return { convention, unit: lossWords[convention].unit, caution, stop, longestMm, curves, own }
}

type Offer = Pick<GaugeCurve, 'name' | 'isOwn' | 'cableTypeId' | 'ohmPerKm'>

/** One offer a size: the run's own cable before another of the job, that before a bare gauge. */
function offers(doc: JobDocument, type: CableType): Offer[] {
  const { limits, conductorUnit } = jobOf(doc)
  const onJob = recordsOf(doc, 'cableType').filter((each) => each.id !== type.id && each.family === 'speaker' && each.conductors === type.conductors)
  const usual = usualGauges.map((awg): CableType => ({ ...type, awg, areaMm2: null, resistanceOhmPerKm: null }))
  const bySize = new Map<string, Offer>()
  for (const [index, each] of [type, ...onJob, ...usual].entries()) {
    const name = formatConductor(each, conductorUnit)
    const ohmPerKm = conductorOhmPerKm(each, limits.conductorTemperatureC)
    if (ohmPerKm === null || ohmPerKm <= 0 || bySize.has(name)) continue
    bySize.set(name, { name, isOwn: index === 0, cableTypeId: index <= onJob.length ? each.id : null, ohmPerKm })
  }
  return [...bySize.values()].sort((a, b) => a.ohmPerKm - b.ohmPerKm)
}
