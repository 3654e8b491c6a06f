import { finite, usable } from '../usable.ts'

/** Longest permanent link and channel of a balanced pair, m (TIA-568, read in vendor pages and install guides). */
export const permanentLinkM = 90
export const channelM = 100

/** Cord attenuation against solid horizontal cable: 24 AWG +20 %, 26 AWG +50 % (TIA-568 premise; formula known). */
export const cordFactor = { '24': 0.2, '26': 0.5 } as const

/**
 * Longest cords in all of a channel with this much horizontal cable, m: C = (102 - H)/(1 + D). The exact value; printed
 * tables round unevenly. Null for a negative or missing length, or a link over 90 m, which is out of rule whatever the cords.
 */
export function longestCordsM(horizontalM: number, cordAwg: keyof typeof cordFactor): number | null {
  if (!usable(horizontalM) || horizontalM < 0 || horizontalM > permanentLinkM + 1e-9) return null
  return finite((102 - horizontalM) / (1 + cordFactor[cordAwg]))
}

/**
 * Insertion loss at a temperature against 20 °C (TIA-568-C.2 6.4.7, quoted in an IEEE list message): unscreened +0.4 %/K to
 * 40 °C and +0.6 %/K to 60 °C, screened +0.2 %/K. Colder than 20 °C gives no bonus; null over 60 °C.
 */
export function temperatureFactor(temperatureC: number, screened: boolean): number | null {
  if (!usable(temperatureC) || temperatureC > 60) return null
  const above = Math.max(0, temperatureC - 20)
  return screened ? 1 + 0.002 * above : 1 + 0.004 * Math.min(above, 20) + 0.006 * Math.max(0, above - 20)
}

/** A length shortened by the temperature's factor, m. Null as for the factor. */
export function deratedLengthM(lengthM: number, temperatureC: number, screened: boolean): number | null {
  const factor = temperatureFactor(temperatureC, screened)
  return factor === null || !usable(lengthM) || lengthM < 0 ? null : lengthM / factor
}
