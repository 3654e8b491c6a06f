import { usable } from '../usable.ts'

/** Farthest that a label sits from the end of its cable, mm (12 in). From memory, unverified (TIA-606). */
export const labelWithinMm = 300

/** Whether a label sits near enough to the cable's end. Null: a value that is no number, or negative. */
export function isLabelNearEnd(distanceMm: number): boolean | null {
  return usable(distanceMm) && distanceMm >= 0 ? distanceMm <= labelWithinMm : null
}
