import { finite, usable } from '../usable.ts'

/** Voltage of 0 dBu: a milliwatt in 600 ohm. */
export const zeroDbuV = Math.sqrt(0.6)

/** dBu as volts. Null for a value that is no number. */
export const voltsOfDbu = (dbu: number): number | null => (usable(dbu) ? finite(zeroDbuV * 10 ** (dbu / 20)) : null)

/** dB above a volt as dBu: 2.218 more. Null for a value that is no number. */
export const dbuOfDbv = (dbv: number): number | null => (usable(dbv) ? finite(dbv - 20 * Math.log10(zeroDbuV)) : null)

/** Practical line level lengths, m: balanced, and unbalanced at -10 dBV. Common practice, no source. */
export const practicalLineM = { balanced: 300, unbalanced: 8 } as const
