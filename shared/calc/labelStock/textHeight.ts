import { finite, usable } from '../usable.ts'

/** Angles that a character should subtend, minutes of arc. Least: NUREG-0700 rev. 3. Better: from memory. */
export const readingAngles = { leastArcmin: 16, betterArcmin: 20 } as const

/** Width 3:5 to 1:1 of the height, stroke a sixth of it on light ground. Source: DOD-HDBK-791. */
export const characterShape = { narrowestWidth: 0.6, widestWidth: 1, stroke: 1 / 6 } as const

/** Share of the point size that a capital of a usual sans face takes up. Common practice, no source. */
export const capitalShare = 0.7
const mmPerPoint = 25.4 / 72

/**
 * Character height to be read at a distance, mm: 2 x distance x tan(angle / 2). Null: a value that is no number, not
 * above nothing, or an angle of 180 degrees and more. Source: NUREG-0700 rev. 3 for 16 minutes (2.8 mm at 0.6 m).
 */
export function characterHeightMm(distanceMm: number, angleArcmin: number): number | null {
  if (!usable(distanceMm, angleArcmin) || distanceMm <= 0 || angleArcmin <= 0 || angleArcmin >= 180 * 60) return null
  return finite(2 * distanceMm * Math.tan(((angleArcmin / 60) * Math.PI) / 360))
}

/** Height of capitals in a point size, mm: about 0.7 x points x 0.3528. Null: no number, or not above nothing. */
export function capitalHeightMm(points: number): number | null {
  return usable(points) && points > 0 ? finite(capitalShare * points * mmPerPoint) : null
}

/** Point size whose capitals are so high, rounded up to half a point. Null as above. */
export function pointsForCapital(heightMm: number): number | null {
  return usable(heightMm) && heightMm > 0
    ? finite(Math.ceil((2 * heightMm) / (capitalShare * mmPerPoint) - 1e-9) / 2)
    : null
}
