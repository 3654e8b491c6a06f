import { floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'

/**
 * Share of an amplifier that taps may add up to: a commercial-audio article, else common practice; others take 0.91 or
 * 1.
 */
export const usualLoadShare = 0.8

export interface Taps {
  readonly tapW: number
  readonly count: number
}

/** What taps add up to, watts. Null for a negative tap, or a count that is not whole. */
export function tapsTotalW(taps: readonly Taps[]): number | null {
  const isPossible = ({ tapW, count }: Taps) => usable(tapW) && tapW >= 0 && Number.isSafeInteger(count) && count >= 0
  if (!taps.every(isPossible)) return null
  return finite(taps.reduce((sum, { tapW, count }) => sum + tapW * count, 0))
}

/**
 * Most watts of taps on an amplifier: a share of what it gives. Null for a negative power or a share outside 0 to 1.
 */
export const mostTapsW = (amplifierW: number, share: number = usualLoadShare): number | null =>
  usable(amplifierW, share) && amplifierW >= 0 && share > 0 && share <= 1 ? finite(share * amplifierW) : null

/** How many equal taps that is; ten of 8 W on 100 W still pass at 0.8. Null as above, or for a tap of nothing. */
export function mostTapsOf(amplifierW: number, tapW: number, share: number = usualLoadShare): number | null {
  const most = mostTapsW(amplifierW, share)
  return most === null || !usable(tapW) || tapW <= 0 || finite(most / tapW) === null ? null : floorOf(most / tapW)
}

/**
 * What a transformer tap takes on a line of another voltage, watts: P (V2/V1)². A 10 W tap for 70.7 V takes 20 W on
 * 100 V. Null unless the voltages are more than nothing.
 */
export const tapAtVoltageW = (tapW: number, tapVoltageV: number, lineVoltageV: number): number | null =>
  usable(tapW, tapVoltageV, lineVoltageV) && tapW >= 0 && tapVoltageV > 0 && lineVoltageV > 0
    ? finite(tapW * (lineVoltageV / tapVoltageV) ** 2)
    : null

/** Current that a load takes from a constant-voltage line, ampere: P/V. Null for a negative power or no voltage. */
export const lineCurrentA = (powerW: number, lineVoltageV: number): number | null =>
  usable(powerW, lineVoltageV) && powerW >= 0 && lineVoltageV > 0 ? finite(powerW / lineVoltageV) : null

/**
 * Where equal taps at equal spacing may be taken as one load, as a share of the line's length: (N + 1)/(2 N), towards a
 * half for many. A quick estimate; the ladder is exact. Null unless the count is whole and at least 1.
 */
export const lumpedShare = (count: number): number | null =>
  Number.isSafeInteger(count) && count >= 1 ? (count + 1) / (2 * count) : null
