import { finite, usable } from '../usable.ts'

export type MarkUnit = 'ft' | 'm'
const mmPerMark: Record<MarkUnit, number> = { ft: 304.8, m: 1000 }

/** The number a five-digit length counter wraps at. */
export const fiveDigitCounter = 100_000

/**
 * Cable between two length marks, in marks: the difference without its sign, as counters rise or fall. `counter` is the
 * number at which the counter begins again, for a jacket whose marks roll over; the shorter way round is taken.
 * Null: a mark that is no number, negative, or not below the counter.
 * Source: sequential jacket marks, cablingfiberoptic.blogspot.com 2011/03.
 */
export function markDifference(start: number, end: number, counter: number | null): number | null {
  if (!usable(start, end) || start < 0 || end < 0) return null
  const apart = Math.abs(start - end)
  if (counter === null) return apart
  if (!usable(counter) || counter <= 0 || start >= counter || end >= counter) return null
  return Math.min(apart, counter - apart)
}

export interface PulledMarks {
  start: number
  end: number
  /** What one mark counts on this spool. */
  unit: MarkUnit
  counter: number | null
}

/** Pulled length from the marks at the two ends, mm, not rounded. Null as for the difference. */
export function pulledLengthMm({ start, end, unit, counter }: PulledMarks): number | null {
  const marks = markDifference(start, end, counter)
  return marks === null ? null : finite(marks * mmPerMark[unit])
}

/** Marks stand every foot or two, so that a pulled length is good to two marks: 2 ft, or 2 m on a metre reel, mm. */
export const markToleranceMm = (unit: MarkUnit): number => 2 * mmPerMark[unit]
