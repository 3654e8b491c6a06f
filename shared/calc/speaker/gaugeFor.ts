import { lineLoss, longestLineM, loopResistanceOhm, type LossConvention } from './lineLoss.ts'
import { withinLimit } from './load.ts'

export interface GaugeOffer {
  readonly id: string
  readonly conductorOhmPerKm: number
}

export interface GaugeAdvice {
  readonly id: string
  readonly loss: number
  /** How far this one goes within the limit, metres. */
  readonly longestM: number
}

/**
 * The thinnest on offer that keeps a line within its limit: of those that do, the one with the most resistance. Null
 * when none does.
 */
export function thinnestThatHolds(
  offers: readonly GaugeOffer[],
  lengthM: number,
  loadOhm: number,
  limit: number,
  convention: LossConvention,
): GaugeAdvice | null {
  let best: (GaugeAdvice & { ohm: number }) | null = null
  for (const { id, conductorOhmPerKm } of offers) {
    const loop = loopResistanceOhm(lengthM, conductorOhmPerKm)
    const loss = loop === null ? null : lineLoss(loop, loadOhm)
    const longestM = longestLineM(limit, convention, loadOhm, conductorOhmPerKm)
    if (loss === null || longestM === null || !withinLimit(loss[convention], limit)) continue
    if (!best || conductorOhmPerKm > best.ohm) best = { id, loss: loss[convention], longestM, ohm: conductorOhmPerKm }
  }
  return best && { id: best.id, loss: best.loss, longestM: best.longestM }
}
