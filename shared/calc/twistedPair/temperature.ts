import { usable } from '../usable.ts'

/**
 * Insertion loss at a temperature against 20 °C (TIA-568-C.2 6.4.7, quoted in an IEEE list message): unscreened
 * +0.4 %/K to 40 °C and +0.6 %/K to 60 °C, screened +0.2 %/K. Colder than 20 °C gives no bonus; null over 60 °C.
 */
export function temperatureFactor(temperatureC: number, screened: boolean): number | null {
  if (!usable(temperatureC) || temperatureC > 60) return null
  const above = Math.max(0, temperatureC - 20)
  return screened ? 1 + 0.002 * above : 1 + 0.004 * Math.min(above, 20) + 0.006 * Math.max(0, above - 20)
}

/** A length shortened by the temperature's factor, m: length over factor. Null as for the factor. */
export function deratedLengthM(lengthM: number, temperatureC: number, screened: boolean): number | null {
  const factor = temperatureFactor(temperatureC, screened)
  return factor === null || !usable(lengthM) || lengthM < 0 ? null : lengthM / factor
}

/**
 * A length shortened by so much per kelvin, m: length times (2 - factor). The wording of ISO and EN (from memory,
 * unverified), 0.5 m shorter at 40 °C than the division above and 3 m at 60 °C; never mixed with it. Null as above.
 */
export function deratedLinearM(lengthM: number, temperatureC: number, screened: boolean): number | null {
  const factor = temperatureFactor(temperatureC, screened)
  return factor === null || !usable(lengthM) || lengthM < 0 ? null : lengthM * (2 - factor)
}

export interface Stretch {
  readonly lengthM: number
  readonly temperatureC: number
}

/**
 * Mean temperature of a run through warm and cool places, °C, weighted by length (common practice, no source). Null for
 * a negative length or no length at all.
 */
export function meanTemperatureC(stretches: readonly Stretch[]): number | null {
  let [lengthM, sum] = [0, 0]
  for (const stretch of stretches) {
    if (!usable(stretch.lengthM, stretch.temperatureC) || stretch.lengthM < 0) return null
    lengthM += stretch.lengthM
    sum += stretch.lengthM * stretch.temperatureC
  }
  return lengthM > 0 && usable(lengthM, sum) ? sum / lengthM : null
}
