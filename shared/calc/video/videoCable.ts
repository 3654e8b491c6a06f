import { withinLimit } from '../speaker/load.ts'
import { usable } from '../usable.ts'
import { advisedCategories, passiveLengthsM, type VideoCableCategory, videoCableGbps } from './videoCable.table.ts'

/**
 * Least category whose test covers a rate; 18.0 Gb/s itself is still Premium. Null past 48, or for no rate: what is
 * above is known from memory only, and is never advised.
 */
export const cableCategoryFor = (gbps: number): VideoCableCategory | null =>
  usable(gbps) && gbps > 0
    ? (advisedCategories.find((category) => withinLimit(gbps, videoCableGbps[category])) ?? null)
    : null

/** Longest passive copper to plan for at a rate, m. Null past the last rate, or for no rate. */
export const passiveLengthM = (gbps: number): number | null =>
  usable(gbps) && gbps > 0 ? (passiveLengthsM.find(([most]) => withinLimit(gbps, most))?.[1] ?? null) : null
