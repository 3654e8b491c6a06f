import { finite, usable } from '../usable.ts'

/**
 * Loss of a splitter without losses of its own, dB: 10 log N. Null unless the ways are a whole number of at least 1.
 */
export const idealSplitDb = (ways: number): number | null =>
  Number.isSafeInteger(ways) && ways >= 1 ? 10 * Math.log10(ways) : null

/**
 * Level after losses one after another, dB of any reference; an amplifier's gain is a loss below nothing. Null for a
 * value that is no number.
 */
export const levelAfter = (level: number, lossesDb: readonly number[]): number | null =>
  usable(level, ...lossesDb) ? finite(lossesDb.reduce((left, loss) => left - loss, level)) : null
