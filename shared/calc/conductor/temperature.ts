import { finite, usable } from '../usable.ts'

const coldestC = -60
const hottestC = 250
const inRange = (temperatureC: number) => temperatureC >= coldestC && temperatureC <= hottestC

/** Temperature coefficients at 75 °C, per kelvin. Source: NEC chapter 9 table 8 note, public copy. */
export const necPerKelvin75 = { copper: 0.00323, aluminium: 0.0033 } as const

/**
 * Coefficient behind the IEC 60228 correction table, per kelvin: rounded, so its factor at 75 °C is 0.820 and not
 * 0.822.
 */
export const iecPerKelvin20 = 0.004

/**
 * A resistance at 75 °C taken to another temperature, -60 to 250 °C: R75 (1 + a75 (T - 75)). Source: NEC chapter 9
 * table 8 note. Null outside the range, for a negative resistance, or where nothing positive is left.
 */
export function resistanceFrom75(
  resistance75: number,
  temperatureC: number,
  perKelvin75: number = necPerKelvin75.copper,
): number | null {
  if (!usable(resistance75, temperatureC, perKelvin75) || resistance75 < 0 || !inRange(temperatureC)) return null
  const factor = 1 + perKelvin75 * (temperatureC - 75)
  return factor > 0 ? finite(resistance75 * factor) : null
}

/**
 * A coefficient stated at 20 °C referred to another temperature, per kelvin: a20/(1 + a20 (T - 20)), which makes
 * 0.00393 at 20 °C the 0.00323 at 75 °C. Null for a coefficient below nothing or a temperature outside -60 to 250 °C.
 */
export function coefficientAt(perKelvin20: number, referenceC: number): number | null {
  if (!usable(perKelvin20, referenceC) || perKelvin20 < 0 || !inRange(referenceC)) return null
  const factor = 1 + perKelvin20 * (referenceC - 20)
  return factor > 0 ? finite(perKelvin20 / factor) : null
}

/**
 * Factor that takes a resistance measured at a temperature back to 20 °C: Kt = 1/(1 + 0.004 (T - 20)). Source: IEC
 * 60228 extract, which uses the rounded coefficient. Null outside -60 to 250 °C.
 */
export function factorTo20(temperatureC: number, perKelvin: number = iecPerKelvin20): number | null {
  if (!usable(temperatureC, perKelvin) || perKelvin < 0 || !inRange(temperatureC)) return null
  const factor = 1 + perKelvin * (temperatureC - 20)
  return factor > 0 ? finite(1 / factor) : null
}
