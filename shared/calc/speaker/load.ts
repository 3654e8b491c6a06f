import { finite, usable } from '../usable.ts'

const positive = (values: readonly number[]) => values.length > 0 && values.every((value) => usable(value) && value > 0)

/** Impedance of loads in parallel, ohm: 1/sum(1/Z). Null for none, or one that is not more than nothing. */
export const parallelOhm = (loads: readonly number[]): number | null =>
  positive(loads) ? finite(1 / loads.reduce((sum, load) => sum + 1 / load, 0)) : null

/** Impedance of loads in series, ohm. Null as in parallel. */
export const seriesOhm = (loads: readonly number[]): number | null =>
  positive(loads) ? finite(loads.reduce((sum, load) => sum + load, 0)) : null

/**
 * Impedance that a constant-voltage line sees of a load in watts, ohm: V²/P. 70.7 V is the square root of 5000. Null
 * unless both are more than nothing.
 */
export const lineLoadOhm = (lineVoltageV: number, powerW: number): number | null =>
  positive([lineVoltageV, powerW]) ? finite(lineVoltageV ** 2 / powerW) : null

/** The exact line voltage of a nominal 70.7 V line: sqrt(5000), so that 1 W is 5000 ohm (EIA). Others are as named. */
export const exactLineVoltage = (nominalV: number): number =>
  Math.abs(nominalV - 70.7) < 0.15 ? Math.sqrt(5000) : nominalV

/**
 * What taps add up to against what an amplifier gives, percent. Null unless both are numbers and the amplifier gives
 * something. Common practice, printed in a commercial-audio article: stay at 80 % or under; the boundary itself passes.
 */
export const lineLoadPercent = (tapsW: number, amplifierW: number): number | null =>
  usable(tapsW, amplifierW) && tapsW >= 0 && amplifierW > 0 ? finite((100 * tapsW) / amplifierW) : null

/** Whether a share is within its limit, the exact boundary included: arithmetic's last digit does not decide. */
export const withinLimit = (value: number, limit: number): boolean =>
  value <= limit + 1e-9 * Math.max(1, Math.abs(limit))
