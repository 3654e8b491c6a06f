import { finite, usable } from '../usable.ts'

// ASTM B258 (known, not re-read): gauge 36 is 0.005 in, gauge 0000 is 0.46 in, and 39 equal steps lie between.
const ratio = 92
const steps = 39
const mmAtGauge36 = 0.127

/** Thinnest and thickest gauge that the formula is used for: 4/0 is -3. */
const inRange = (awg: number) => usable(awg) && awg >= -3 && awg <= 50

/**
 * Diameter of a solid conductor of an American wire gauge, mm; 1/0 to 4/0 are 0 to -3, fractions are allowed. Null
 * outside -3 to 50.
 */
export const awgDiameterMm = (awg: number): number | null =>
  inRange(awg) ? mmAtGauge36 * ratio ** ((36 - awg) / steps) : null

/** The same in inches. */
export const awgDiameterIn = (awg: number): number | null =>
  inRange(awg) ? 0.005 * ratio ** ((36 - awg) / steps) : null

/** Area of a round solid conductor, mm2, from its diameter in mm. Null unless it is more than nothing. */
export const areaOfDiameterMm2 = (diameterMm: number): number | null =>
  usable(diameterMm) && diameterMm > 0 ? finite((Math.PI / 4) * diameterMm ** 2) : null

/** Area of a solid conductor, mm2. Null as for the diameter. */
export function awgAreaMm2(awg: number): number | null {
  const diameter = awgDiameterMm(awg)
  return diameter === null ? null : areaOfDiameterMm2(diameter)
}

/** Area in circular mils: the square of the diameter in thousandths of an inch. */
export function awgAreaCmil(awg: number): number | null {
  const diameter = awgDiameterIn(awg)
  return diameter === null ? null : (1000 * diameter) ** 2
}

/** The gauge, with fractions, that has this area in mm2. Null unless the area is more than nothing. */
export function awgOfAreaMm2(areaMm2: number): number | null {
  if (!usable(areaMm2) || areaMm2 <= 0) return null
  const diameter = Math.sqrt((4 * areaMm2) / Math.PI)
  return finite(36 - (steps * Math.log(diameter / mmAtGauge36)) / Math.log(ratio))
}

/** The gauge of several conductors in parallel: areas add, gauges never do. Null for none, or one out of range. */
export function awgInParallel(gauges: readonly number[]): number | null {
  let area = 0
  for (const gauge of gauges) {
    const each = awgAreaMm2(gauge)
    if (each === null) return null
    area += each
  }
  return awgOfAreaMm2(area)
}

/**
 * The gauge of a whole number of equal conductors in parallel: two 18s are a 15. Null for none, or a gauge out of
 * range.
 */
export function awgOfCount(awg: number, count: number): number | null {
  const each = awgAreaMm2(awg)
  return each === null || !Number.isSafeInteger(count) || count < 1 ? null : awgOfAreaMm2(each * count)
}
