import { finite, usable } from '../usable.ts'
import { awgAreaMm2 } from './awg.ts'

/** Resistivity of annealed copper at 20 °C, ohm mm2/km: 100 % IACS (copper wire tables, known, not re-read). */
export const copperOhmMm2PerKm = 17.241

/** Copper-clad aluminium of the 10 % class against copper: 0.02743 ohm mm2/m (ASTM B566, from memory, unverified). */
export const copperCladFactor = 27.43 / copperOhmMm2PerKm

/** Temperature coefficient of copper at 20 °C, per kelvin (NEC chapter 9 table 8 gives 0.00323 at 75 °C, which is the same). */
export const copperPerKelvin20 = 0.00393

/**
 * Stranded against solid: loudspeaker cable in a published dB table is 1.03 to 1.04 times solid (pro-audio table T2,
 * public copy); seven-strand values of NEC chapter 9 table 8 are 1.02 to 1.024 times.
 */
export const strandedFactor = 1.03

/** IEC 60228 maxima at 20 °C for plain copper, ohm/km by mm2 (public extracts agree). */
export const iec60228: Readonly<Record<'class 1/2' | 'class 5/6', Readonly<Record<string, number>>>> = {
  'class 1/2': { '0.5': 36, '0.75': 24.5, '1': 18.1, '1.5': 12.1, '2.5': 7.41, '4': 4.61, '6': 3.08, '10': 1.83 },
  'class 5/6': { '0.5': 39, '0.75': 26, '1': 19.5, '1.5': 13.3, '2.5': 7.98, '4': 4.95, '6': 3.3, '10': 1.91 },
}

/** Resistance of copper of an area, ohm/km at 20 °C: resistivity over area. Null unless the area is more than nothing. */
export const areaResistanceOhmPerKm = (areaMm2: number, resistivity = copperOhmMm2PerKm): number | null =>
  usable(areaMm2, resistivity) && areaMm2 > 0 && resistivity > 0 ? finite(resistivity / areaMm2) : null

/** Resistance of a solid copper conductor of a gauge, ohm/km at 20 °C. Null outside the gauges. */
export function awgResistanceOhmPerKm(awg: number): number | null {
  const area = awgAreaMm2(awg)
  return area === null ? null : areaResistanceOhmPerKm(area)
}

/** A resistance at 20 °C taken to another temperature, -60 to 250 °C: R20 (1 + a (T - 20)). Null outside, or when it is not positive. */
export function resistanceAt(resistance20: number, temperatureC: number, perKelvin = copperPerKelvin20): number | null {
  if (!usable(resistance20, temperatureC, perKelvin) || resistance20 < 0 || temperatureC < -60 || temperatureC > 250) return null
  return finite(resistance20 * (1 + perKelvin * (temperatureC - 20)))
}

export interface Conductor {
  readonly awg: number | null
  readonly areaMm2: number | null
  readonly stranding: 'solid' | 'stranded' | 'class5'
  readonly material: 'copper' | 'cca'
  /** As its maker states it, at 20 °C; it goes before everything else. */
  readonly statedOhmPerKm: number | null
}

/**
 * Resistance of one conductor of a cable, ohm/km at a temperature. Stated by the maker, else the IEC 60228 maximum of a
 * class 5 metric size, else resistivity over area, with the factor for stranding. Null: no size is known.
 */
export function conductorResistanceOhmPerKm({ awg, areaMm2, stranding, material, statedOhmPerKm }: Conductor, temperatureC: number): number | null {
  if (statedOhmPerKm !== null) return resistanceAt(statedOhmPerKm, temperatureC)
  const listed = areaMm2 !== null && stranding === 'class5' ? iec60228['class 5/6'][String(areaMm2)] : undefined
  const solid = areaMm2 !== null ? areaResistanceOhmPerKm(areaMm2) : awg !== null ? awgResistanceOhmPerKm(awg) : null
  const at20 = listed ?? (solid === null ? null : solid * (stranding === 'solid' ? 1 : strandedFactor))
  return at20 === null ? null : resistanceAt(at20 * (material === 'cca' ? copperCladFactor : 1), temperatureC)
}
