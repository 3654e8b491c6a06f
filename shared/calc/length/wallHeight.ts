import { finite, usable } from '../usable.ts'

/** Thickness of a dressed 2x plate, in. */
export const plateThicknessIn = 1.5

/** Precut studs and the ceiling they give with three plates, in. From memory, unverified. */
export const precutStudsIn = { eightFoot: 92.625, nineFoot: 104.625 } as const

/**
 * Height of a framed wall, in: stud and its plates of 1-1/2 in. Null: a value that is no number, a stud of nothing, or
 * a count of plates that is no whole number. Derived.
 */
export function framedWallHeightIn(studIn: number, plates: number): number | null {
  if (!usable(studIn, plates) || studIn <= 0 || plates < 0 || !Number.isSafeInteger(plates)) return null
  return finite(studIn + plates * plateThicknessIn)
}
