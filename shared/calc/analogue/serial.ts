import { finite, usable } from '../usable.ts'
import { serialLimits } from './serial.table.ts'

/**
 * Longest line at a rate, m, by a rate-times-length rule: the rule used is always shown. Null unless both are
 * something.
 */
export const longestAtRateM = (bitMetresPerSecond: number, bitsPerSecond: number): number | null =>
  usable(bitMetresPerSecond, bitsPerSecond) && bitMetresPerSecond > 0 && bitsPerSecond > 0
    ? finite(bitMetresPerSecond / bitsPerSecond)
    : null

/** Impedance of several unit loads on a bus, ohm: 12 kilohm shared. Null unless the count is whole and at least 1. */
export const unitLoadsOhm = (count: number, unitLoadOhm: number = serialLimits.unitLoadOhm): number | null =>
  Number.isSafeInteger(count) && count >= 1 && usable(unitLoadOhm) && unitLoadOhm > 0
    ? finite(unitLoadOhm / count)
    : null

export interface DmxFrame {
  readonly slots: number
  readonly slotUs: number
  readonly breakUs: number
  /** Mark after the break. */
  readonly markUs: number
}

/** Fullest and quickest frame. */
export const fullDmxFrame: DmxFrame = {
  slots: serialLimits.dmxMostSlots,
  slotUs: serialLimits.dmxSlotUs,
  breakUs: serialLimits.dmxLeastBreakUs,
  markUs: serialLimits.dmxLeastMarkUs,
}

/**
 * Frames per second: the start code takes a slot too. Null for slots outside 0 to 512, a slot of no time or a negative
 * one.
 */
export function dmxRefreshHz({ slots, slotUs, breakUs, markUs }: DmxFrame = fullDmxFrame): number | null {
  if (!Number.isSafeInteger(slots) || slots < 0 || slots > serialLimits.dmxMostSlots) return null
  if (!usable(slotUs, breakUs, markUs) || slotUs <= 0 || breakUs < 0 || markUs < 0) return null
  return finite(1e6 / ((slots + 1) * slotUs + breakUs + markUs))
}
