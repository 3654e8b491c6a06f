import { finite, usable } from '../usable.ts'

/** Most bends between two pull points, degrees, and the longest pull, mm. */
export const pullLimits = {
  /** Source: NEC 3xx.26 of each raceway article. */
  code: { bendsDeg: 360 },
  /** Source: TIA-569 and BICSI, as quoted on a BICSI forum and elsewhere: two right angles and 30 m (100 ft). */
  telecom: { bendsDeg: 180, lengthMm: 30_480 },
} as const

/** Sum of bends, degrees. Null: a bend that is no number or negative. */
export function bendsTotalDeg(bendsDeg: readonly number[]): number | null {
  if (!usable(...bendsDeg) || bendsDeg.some((bend) => bend < 0)) return null
  return finite(bendsDeg.reduce((sum, bend) => sum + bend, 0))
}

/** Whether a pull stays within 360 degrees of bends. Null as above. Source: NEC 3xx.26. */
export function isPullWithinCode(bendsDeg: readonly number[]): boolean | null {
  const total = bendsTotalDeg(bendsDeg)
  return total === null ? null : total <= pullLimits.code.bendsDeg
}

/** Whether a pull stays within 180 degrees and 30.48 m. Null as above, or a negative length. Source: TIA-569, BICSI. */
export function isPullWithinTelecom(bendsDeg: readonly number[], lengthMm: number): boolean | null {
  const total = bendsTotalDeg(bendsDeg)
  if (total === null || !usable(lengthMm) || lengthMm < 0) return null
  return total <= pullLimits.telecom.bendsDeg && lengthMm <= pullLimits.telecom.lengthMm + 1e-6
}
