import type { SpaceClass } from '../../model/place.ts'
import { finite, usable } from '../usable.ts'

/** How far unlisted outside-plant cable may come in from its point of entrance, mm (50 ft). Source: NEC 800.48. */
export const unlistedEntranceMm = 15_240

export interface UnlistedEntrance {
  /** Counted from the point of entrance. */
  lengthMm: number
  /** Ends in an enclosure or a listed protector (a grounding block for coaxial cable). */
  isTerminated: boolean
  space: SpaceClass
}

/**
 * Whether unlisted outside-plant cable may come in so far: not more than 50 ft from the point of entrance, terminated
 * in an enclosure or listed protector, and not in riser or plenum spaces. A primary protector belongs as near the
 * entry as practicable, so the whole 50 ft may not be available. Null: a value that is no number, or negative. Source:
 * NEC 800.48.
 */
export function mayEnterUnlisted({ lengthMm, isTerminated, space }: UnlistedEntrance): boolean | null {
  if (!usable(lengthMm) || lengthMm < 0) return null
  return lengthMm <= unlistedEntranceMm + 1e-6 && isTerminated && space !== 'riser' && space !== 'plenum'
}

/**
 * Length that counts when the cable comes in through a bonded rigid or intermediate metal conduit, mm: the point of
 * entrance moves to the conduit's end. EMT and PVC do not move it. Null: a value that is no number or negative, or a
 * conduit longer than the path. Source: ecmweb.com on NEC 800.2 and 800.48.
 */
export function entranceLengthMm(pathInsideMm: number, inBondedConduitMm: number): number | null {
  if (!usable(pathInsideMm, inBondedConduitMm) || inBondedConduitMm < 0 || pathInsideMm < inBondedConduitMm) return null
  return finite(pathInsideMm - inBondedConduitMm)
}
