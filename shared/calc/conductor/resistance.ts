import { finite, usable } from '../usable.ts'
import { awgAreaMm2 } from './awg.ts'
import { iecMaximumOhmPerKm, smallBunchedOhmPerKm } from './iec60228.table.ts'

/** Resistivity of annealed copper at 20 °C, ohm mm2/km: 100 % IACS (copper wire tables, known, not re-read). */
export const copperOhmMm2PerKm = 17.241

/**
 * Resistivity of copper-clad aluminium at 20 °C, ohm mm2/km, by share of copper (ASTM B566, from memory, unverified).
 */
export const copperCladOhmMm2PerKm = { '10 %': 27.43, '15 %': 26.76 } as const

/** Copper-clad aluminium of the 10 % class, the worse of the two, against copper: 1.59, just two gauges. */
export const copperCladFactor = copperCladOhmMm2PerKm['10 %'] / copperOhmMm2PerKm

/** How much more than copper two public pages say copper-clad aluminium has, percent; the other says 40 to 64. */
export const copperCladPenaltyPercent = [55, 60] as const

/** Temperature coefficient of copper at 20 °C, per kelvin (NEC gives 0.00323 at 75 °C, which is the same). */
export const copperPerKelvin20 = 0.00393

/**
 * Stranded against solid: loudspeaker cable in a published dB table is 1.03 to 1.04 times solid (pro-audio table T2,
 * public copy); seven-strand values of NEC chapter 9 table 8 are 1.02 to 1.024 times.
 */
export const strandedFactor = 1.03

/**
 * Seven concentric strands against solid: the lay makes each strand about 2 % longer (NEC chapter 9 table 8, public
 * copy).
 */
export const sevenStrandFactor = 1.02

/**
 * Resistance of copper of an area, ohm/km at 20 °C: resistivity over area. Null unless the area is more than nothing.
 */
export const areaResistanceOhmPerKm = (areaMm2: number, resistivity = copperOhmMm2PerKm): number | null =>
  usable(areaMm2, resistivity) && areaMm2 > 0 && resistivity > 0 ? finite(resistivity / areaMm2) : null

/** Resistance of a solid copper conductor of a gauge, ohm/km at 20 °C. Null outside the gauges. */
export function awgResistanceOhmPerKm(awg: number): number | null {
  const area = awgAreaMm2(awg)
  return area === null ? null : areaResistanceOhmPerKm(area)
}

/**
 * A solid conductor's resistance made that of a stranded one, in the same unit. Null unless the factor is 1 or more.
 */
export const strandedResistance = (solid: number, factor = sevenStrandFactor): number | null =>
  usable(solid, factor) && solid >= 0 && factor >= 1 ? finite(solid * factor) : null

/** How many times one figure another of the same unit is. Null unless the other is more than nothing. */
export const timesAsMuch = (value: number, reference: number): number | null =>
  usable(value, reference) && reference > 0 ? finite(value / reference) : null

/**
 * A resistance at 20 °C taken to another temperature, -60 to 250 °C: R20 (1 + a (T - 20)). Null outside, or for a
 * negative resistance or result.
 */
export function resistanceAt(
  resistance20: number,
  temperatureC: number,
  perKelvin = copperPerKelvin20,
): number | null {
  if (!usable(resistance20, temperatureC, perKelvin) || resistance20 < 0) return null
  if (temperatureC < -60 || temperatureC > 250) return null
  const factor = 1 + perKelvin * (temperatureC - 20)
  return factor > 0 ? finite(resistance20 * factor) : null
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
 * Resistance of one conductor of a cable, ohm/km at a temperature. Stated by the maker, else the listed maximum of a
 * class 5 metric size, else resistivity over area, with the factor for stranding. Null: no size is known.
 */
export function conductorResistanceOhmPerKm(conductor: Conductor, temperatureC: number): number | null {
  const { awg, areaMm2, stranding, material, statedOhmPerKm } = conductor
  if (statedOhmPerKm !== null) return resistanceAt(statedOhmPerKm, temperatureC)
  const listed =
    areaMm2 !== null && stranding === 'class5'
      ? (iecMaximumOhmPerKm(areaMm2, 'class 5/6') ?? smallBunchedOhmPerKm(areaMm2))
      : null
  const solid =
    areaMm2 !== null ? areaResistanceOhmPerKm(areaMm2) : awg !== null ? awgResistanceOhmPerKm(awg) : null
  const at20 = listed ?? (solid === null ? null : solid * (stranding === 'solid' ? 1 : strandedFactor))
  return at20 === null ? null : resistanceAt(at20 * (material === 'cca' ? copperCladFactor : 1), temperatureC)
}
