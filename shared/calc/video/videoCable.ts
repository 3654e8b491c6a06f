import { withinLimit } from '../speaker/load.ts'
import { usable } from '../usable.ts'
import { passiveLengthsM, videoCableCategories, type VideoCableCategory, videoCableGbps } from './videoCable.table.ts'

/** Least category whose test covers a rate; 18.0 Gb/s itself is still Premium. Null where none does, or for no rate. */
export const cableCategoryFor = (gbps: number): VideoCableCategory | null =>
  usable(gbps) && gbps > 0
    ? (videoCableCategories.find((category) => withinLimit(gbps, videoCableGbps[category])) ?? null)
    : null

/** Longest passive copper to plan for at a rate, m. Null past the last rate, or for no rate. */
export const passiveLengthM = (gbps: number): number | null =>
  usable(gbps) && gbps > 0 ? (passiveLengthsM.find(([most]) => withinLimit(gbps, most))?.[1] ?? null) : null
