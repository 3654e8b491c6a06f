import { finite, usable } from '../usable.ts'
import { twistedPairLimits } from './twistedPair.table.ts'

/** Longest permanent link and channel of a balanced pair, m. */
export const { permanentLinkM, channelM } = twistedPairLimits

/** Cord attenuation against solid horizontal cable: 24 AWG +20 %, 26 AWG +50 % (TIA-568 premise; formula known). */
export const cordFactor = { '24': 0.2, '26': 0.5 } as const
export type CordAwg = keyof typeof cordFactor

/** Cords at the cross-connect that the work-area table sets aside, m (TIA-568, from memory, unverified). */
export const crossConnectCordsM: Readonly<Record<CordAwg, number>> = { '24': 5, '26': 3.5 }

/**
 * Longest cords in all of a channel with this much horizontal cable, m: C = (102 - H)/(1 + D), D how much more a cord
 * loses than horizontal cable. The exact value; printed tables round unevenly. Null for a negative or missing figure,
 * or a link over 90 m, which is out of rule whatever the cords.
 */
export function cordsForFactorM(horizontalM: number, factor: number): number | null {
  if (!usable(horizontalM, factor) || factor < 0) return null
  if (horizontalM < 0 || horizontalM > permanentLinkM + 1e-9) return null
  return finite((102 - horizontalM) / (1 + factor))
}

/** The same for cords of a gauge: stranded 24 AWG or 26 AWG. */
export const longestCordsM = (horizontalM: number, cordAwg: CordAwg): number | null =>
  cordsForFactorM(horizontalM, cordFactor[cordAwg])

/**
 * Longest cord at the work area, m: all cords less those at the cross-connect, and at most 22 m. Null as for the cords,
 * or where the cross-connect leaves nothing.
 */
export function workAreaCordM(horizontalM: number, factor: number, crossConnectM: number): number | null {
  const cords = cordsForFactorM(horizontalM, factor)
  if (cords === null || !usable(crossConnectM) || crossConnectM < 0 || crossConnectM > cords) return null
  return Math.min(cords - crossConnectM, twistedPairLimits.workAreaCordM)
}
