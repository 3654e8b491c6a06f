import { usable } from '../usable.ts'
import { markToleranceMm, pulledLengthMm, type PulledMarks } from './jacketMarks.ts'

export type MarkDoubt = 'same mark' | 'longer than the put-up' | 'shorter than the way' | 'much longer than the way'

/** What is known of a run and its spool when marks are typed in. */
export interface MarkContext {
  /** Length make-up of the run without its slack; the cable cannot be shorter. Null: not known. */
  leastMm: number | null
  /** Estimated length with slack. Null: not known. */
  estimateMm: number | null
  /** What the spool held when new. Null: not known. */
  putUpMm: number | null
}

/**
 * What is odd about two length marks, or an empty list. Nothing here forbids the entry: the person at the wall knows
 * more. Above twice the estimate and 15 m more than it, a length is "much longer" (common practice, no source). Null:
 * marks that give no length.
 */
export function markDoubts(marks: PulledMarks, { leastMm, estimateMm, putUpMm }: MarkContext): MarkDoubt[] | null {
  const pulled = pulledLengthMm(marks)
  if (pulled === null) return null
  const tolerance = markToleranceMm(marks.unit)
  const doubts: MarkDoubt[] = []
  if (pulled === 0) doubts.push('same mark')
  if (putUpMm !== null && usable(putUpMm) && pulled > putUpMm + tolerance) doubts.push('longer than the put-up')
  if (leastMm !== null && usable(leastMm) && pulled > 0 && pulled < leastMm - tolerance)
    doubts.push('shorter than the way')
  if (estimateMm !== null && usable(estimateMm) && pulled > 2 * estimateMm && pulled > estimateMm + 15_000) {
    doubts.push('much longer than the way')
  }
  return doubts
}
