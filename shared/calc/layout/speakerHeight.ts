import { finite, usable } from '../usable.ts'

/** Height of a seated ear that elevations are taken from, m. Source: ITU-R BS.775-3 (1.2 m); 1.0 to 1.2 m is usual. */
export const earHeightM = 1.2

/**
 * Height at which a loudspeaker stands at an elevation, m: ear + distance x tan(elevation), distance in plan.
 * Null: a value that is no number, a negative distance, or an elevation outside -90 to 90 degrees. Geometry.
 */
export function speakerHeightM(distanceM: number, elevationDeg: number, earM: number = earHeightM): number | null {
  if (!usable(distanceM, elevationDeg, earM) || distanceM < 0 || Math.abs(elevationDeg) >= 90) return null
  return finite(earM + distanceM * Math.tan((elevationDeg * Math.PI) / 180))
}

/**
 * Elevation of a loudspeaker seen from the ear, degrees: atan((height - ear) / distance). Straight overhead is 90.
 * Null as above.
 */
export function speakerElevationDeg(heightM: number, distanceM: number, earM: number = earHeightM): number | null {
  if (!usable(heightM, distanceM, earM) || distanceM < 0 || (distanceM === 0 && heightM === earM)) return null
  return (Math.atan2(heightM - earM, distanceM) * 180) / Math.PI
}
