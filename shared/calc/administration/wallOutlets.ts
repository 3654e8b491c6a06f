import { ceilOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'

/** Walls at least this long want an outlet, mm (12 ft). */
export const outletWallMm = 3657.6
/** No point of the floor line is farther from an outlet in its wall, mm (25 ft). */
export const outletReachMm = 7620

/**
 * Outlets for one unbroken straight wall: none under 12 ft, else ceil(length / 50 ft). Null: no number, or negative.
 * Source: TIA-570-A/-B outlet placement (cabling-design.com tips 29Jun20011).
 */
export function outletsForWall(wallMm: number): number | null {
  if (!usable(wallMm) || wallMm < 0) return null
  return wallMm < outletWallMm - 1e-6 ? 0 : finite(Math.max(1, ceilOf(wallMm / (2 * outletReachMm))))
}
