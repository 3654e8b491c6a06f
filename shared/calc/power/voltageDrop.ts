import { mm2OfCmil, resistivityOfKFactor } from '../conductor/kFactor.ts'
import { areaResistanceOhmPerKm } from '../conductor/resistance.ts'
import { loopResistanceOhm } from '../speaker/lineLoss.ts'
import { finite, usable } from '../usable.ts'

/**
 * Voltage that a line takes, out and back: 2 r L I. One-way length in metres, one conductor's resistance in ohm/km,
 * current in ampere. Null for a negative figure.
 */
export function voltageDropV(lengthM: number, conductorOhmPerKm: number, currentA: number): number | null {
  const loopOhm = loopResistanceOhm(lengthM, conductorOhmPerKm)
  return loopOhm === null || !usable(currentA) || currentA < 0 ? null : finite(loopOhm * currentA)
}

/** A drop as a share of what the source gives, percent. Null unless the source gives something. */
export const dropPercent = (dropV: number, sourceV: number): number | null =>
  usable(dropV, sourceV) && dropV >= 0 && sourceV > 0 ? finite((100 * dropV) / sourceV) : null

/**
 * The drop by the American formula, V: 2 K L I over circular mils, K in ohm circular mil per foot (10.37 at 20 °C,
 * about 12.9 at 75 °C). Null for a negative figure or no area.
 */
export function dropByKFactorV(
  kOhmCmilPerFt: number,
  lengthM: number,
  currentA: number,
  areaCmil: number,
): number | null {
  const [resistivity, areaMm2] = [resistivityOfKFactor(kOhmCmilPerFt), mm2OfCmil(areaCmil)]
  if (resistivity === null || areaMm2 === null) return null
  const ohmPerKm = areaResistanceOhmPerKm(areaMm2, resistivity)
  return ohmPerKm === null ? null : voltageDropV(lengthM, ohmPerKm, currentA)
}

/** Longest one-way line at a drop and current, m: V/(2 r I). Null for a negative drop, or no resistance or current. */
export const longestAtDropM = (dropV: number, conductorOhmPerKm: number, currentA: number): number | null =>
  usable(dropV, conductorOhmPerKm, currentA) && dropV >= 0 && conductorOhmPerKm > 0 && currentA > 0
    ? finite((dropV * 1000) / (2 * conductorOhmPerKm * currentA))
    : null

/**
 * Longest line where the drop is budgeted in one leg alone, m: V/(r I), as a radio manual prints (public copy). Twice
 * the run that the whole drop allows: never to be mixed with it. Null as above.
 */
export const longestAtLegDropM = (legDropV: number, conductorOhmPerKm: number, currentA: number): number | null =>
  longestAtDropM(2 * legDropV, conductorOhmPerKm, currentA)
