import { finite, usable } from '../usable.ts'

export type LossConvention = 'impedance' | 'decibel' | 'voltage' | 'power'

/** One cable, four figures that are all called loss: which one is meant is always said. */
export interface LineLoss {
  /** Level lost at the loudspeaker, dB: 20 log (1 + Rc/Z), from an ideal voltage source. */
  readonly decibel: number
  /** Loop resistance as a share of the load, percent: the "5 % rule". */
  readonly impedance: number
  /** Share of the amplifier's output spent in the cable, percent: Rc/(Rc + Z), the voltage drop. */
  readonly voltage: number
  /** Power missing at the loudspeaker, percent: 1 - (Z/(Z + Rc))². */
  readonly power: number
}

const lossOf = (ratio: number): LineLoss => ({
  decibel: 20 * Math.log10(1 + ratio),
  impedance: 100 * ratio,
  voltage: (100 * ratio) / (1 + ratio),
  power: 100 * (1 - (1 / (1 + ratio)) ** 2),
})

/**
 * Loop resistance of a line, ohm: out and back, 2 r L, over the conductors in parallel per leg. Length in metres,
 * resistance of one conductor in ohm/km. Null for negative or missing input.
 */
export function loopResistanceOhm(lengthM: number, conductorOhmPerKm: number, conductorsPerLeg = 1): number | null {
  if (!usable(lengthM, conductorOhmPerKm, conductorsPerLeg)) return null
  if (lengthM < 0 || conductorOhmPerKm < 0 || conductorsPerLeg < 1) return null
  return finite((2 * lengthM * conductorOhmPerKm) / 1000 / conductorsPerLeg)
}

/**
 * What a line of this loop resistance loses into a load, by all four conventions. Null unless the load is more than
 * nothing.
 */
export function lineLoss(loopOhm: number, loadOhm: number): LineLoss | null {
  if (!usable(loopOhm, loadOhm) || loopOhm < 0 || loadOhm <= 0) return null
  const loss = lossOf(loopOhm / loadOhm)
  return usable(loss.decibel, loss.impedance, loss.voltage, loss.power) ? loss : null
}

/**
 * The loop resistance, as a share of the load, that loses exactly this much; the limit is in the convention's unit.
 * Null when no line can.
 */
export function ratioForLoss(limit: number, convention: LossConvention): number | null {
  if (!usable(limit) || limit < 0) return null
  switch (convention) {
    case 'impedance':
      return limit / 100
    case 'decibel':
      return finite(10 ** (limit / 20) - 1)
    case 'voltage':
      return limit < 100 ? finite(limit / (100 - limit)) : null
    case 'power':
      return limit < 100 ? finite(1 / Math.sqrt(1 - limit / 100) - 1) : null
  }
}

/** A loss by one convention said by another. Null as for the ratio. */
export function convertLoss(loss: number, from: LossConvention, to: LossConvention): number | null {
  const ratio = ratioForLoss(loss, from)
  return ratio === null ? null : finite(lossOf(ratio)[to])
}

/**
 * How many times longer a line may be where its limit is raised, both in dB: doubling the dB more than doubles the
 * length. Null where either is negative or the first is nothing.
 */
export function timesLonger(fromDb: number, toDb: number): number | null {
  const [from, to] = [ratioForLoss(fromDb, 'decibel'), ratioForLoss(toDb, 'decibel')]
  return from === null || to === null || from <= 0 ? null : finite(to / from)
}

/**
 * Longest one-way line that stays within a limit, metres: L = x Z / (2 r). Null for impossible input or a conductor
 * without resistance.
 */
export function longestLineM(
  limit: number,
  convention: LossConvention,
  loadOhm: number,
  conductorOhmPerKm: number,
): number | null {
  const ratio = ratioForLoss(limit, convention)
  if (ratio === null || !usable(loadOhm, conductorOhmPerKm) || loadOhm <= 0 || conductorOhmPerKm <= 0) return null
  return finite((ratio * loadOhm * 1000) / (2 * conductorOhmPerKm))
}
