import { finite, usable } from '../usable.ts'

export interface PlanPosition {
  /** To the right of the listener, in the unit of the distance. */
  x: number
  /** In front of the listener. */
  y: number
}

const radians = (degrees: number) => (degrees * Math.PI) / 180

/**
 * Place of a loudspeaker in plan from its distance and azimuth, positive to the left: x = -r sin a, y = r cos a.
 * Null: a value that is no number, or a negative distance. Source: the azimuth convention of ITU-R BS.2051.
 */
export function polarPosition(distance: number, azimuthDeg: number): PlanPosition | null {
  if (!usable(distance, azimuthDeg) || distance < 0) return null
  const x = finite(-distance * Math.sin(radians(azimuthDeg)) + 0)
  const y = finite(distance * Math.cos(radians(azimuthDeg)) + 0)
  return x === null || y === null ? null : { x, y }
}

/**
 * Azimuth of a place seen from the listener, degrees, positive to the left, -180 to 180. Null: no number, or no
 * distance.
 */
export function azimuthOfDeg(x: number, y: number): number | null {
  return usable(x, y) && (x !== 0 || y !== 0) ? (Math.atan2(-x, y) * 180) / Math.PI + 0 : null
}
