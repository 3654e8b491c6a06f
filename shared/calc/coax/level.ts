import { finite, usable } from '../usable.ts'

/** Millivolts as dBmV: 20 log mV. Null unless the voltage is more than nothing. */
export const dbmvOfMillivolts = (millivolts: number): number | null =>
  usable(millivolts) && millivolts > 0 ? finite(20 * Math.log10(millivolts)) : null

/** dBmV as dB above a microvolt: 60 more. Null for a value that is no number. */
export const dbuvOfDbmv = (dbmv: number): number | null => (usable(dbmv) ? finite(dbmv + 60) : null)

/**
 * dBmV as dBm: the power of that voltage in an impedance, 48.75 less in 75 ohm. Null unless the impedance is something.
 */
export const dbmOfDbmv = (dbmv: number, impedanceOhm = 75): number | null =>
  usable(dbmv, impedanceOhm) && impedanceOhm > 0 ? finite(dbmv + 10 * Math.log10(1e-3 / impedanceOhm)) : null
