import { finite, usable } from '../usable.ts'

/** Width of a picture by its shape; 16:9 is what displays are. */
const widescreen = 16 / 9

/** Angles that a picture's width is judged by, degrees. 40 degrees is a common "immersive" figure, from memory. */
export const viewingAngles = { least: 26, usual: 30, cinema: 36, immersive: 40 } as const

/**
 * Highest angle from the eye to the top of a picture, degrees. Source: acousticfrontiers (home); a cinema guide page
 * (limit).
 */
export const topAngles = { homeDeg: 15, cinemaDeg: 35 } as const

/**
 * Width of a picture from its diagonal, in the same unit: 0.8716 x diagonal for 16:9. Null: no number, or not above
 * nothing. Geometry.
 */
export function pictureWidth(diagonal: number, aspect = widescreen): number | null {
  if (!usable(diagonal, aspect) || diagonal <= 0 || aspect <= 0) return null
  return finite((diagonal * aspect) / Math.hypot(aspect, 1))
}

/**
 * Distance at which a picture is as wide as an angle, in the diagonal's unit: width / (2 tan(angle / 2)). Null: a
 * value that is no number, not above nothing, or an angle of 180 degrees and more. Geometry; 30 degrees is published
 * as 1.63 diagonals and 26 degrees as 2.2 widths. A page with "diagonal / 0.6" gives 1.667, which is 29 degrees.
 */
export function viewingDistance(diagonal: number, angleDeg: number, aspect = widescreen): number | null {
  const width = pictureWidth(diagonal, aspect)
  if (width === null || !usable(angleDeg) || angleDeg <= 0 || angleDeg >= 180) return null
  return finite(width / (2 * Math.tan((angleDeg * Math.PI) / 360)))
}

/**
 * Angle that a picture's width takes up at a distance, degrees. Null: a value that is no number, or not above nothing.
 */
export function viewingAngleDeg(diagonal: number, distance: number, aspect = widescreen): number | null {
  const width = pictureWidth(diagonal, aspect)
  return width === null || !usable(distance) || distance <= 0
    ? null
    : (2 * Math.atan(width / 2 / distance) * 180) / Math.PI
}

/**
 * Angle from the eye up to the top of a picture, degrees, all in one unit. Null: no number, or a distance of nothing.
 */
export function topAngleDeg(eyeHeight: number, topHeight: number, distance: number): number | null {
  if (!usable(eyeHeight, topHeight, distance) || distance <= 0) return null
  return (Math.atan((topHeight - eyeHeight) / distance) * 180) / Math.PI
}

/** Whether the top of a picture is within a home's 15 degrees, or another limit. Null as above. */
export function isTopWithin(
  eyeHeight: number,
  topHeight: number,
  distance: number,
  limitDeg: number = topAngles.homeDeg,
): boolean | null {
  const angle = topAngleDeg(eyeHeight, topHeight, distance)
  return angle === null || !usable(limitDeg) ? null : angle <= limitDeg + 1e-9
}
