import { ceilOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'
import { workdayHours } from './labourUnit.table.ts'

export interface LabourLine {
  quantity: number
  hoursEach: number
}

/** Hours of a list of tasks: the sum of quantity x unit. Null: a value that is no number, or negative. Derived. */
export function labourHours(lines: readonly LabourLine[]): number | null {
  if (!lines.every(({ quantity, hoursEach }) => usable(quantity, hoursEach) && quantity >= 0 && hoursEach >= 0))
    return null
  return finite(lines.reduce((sum, { quantity, hoursEach }) => sum + quantity * hoursEach, 0))
}

/** Hours under harder conditions: hours x every factor. Null: a value that is no number, or negative. Derived. */
export function factoredHours(hours: number, ...factors: readonly number[]): number | null {
  if (!usable(hours, ...factors) || hours < 0 || factors.some((factor) => factor < 0)) return null
  return finite(factors.reduce((product, factor) => product * factor, hours))
}

/** Hours by length of cable: length / 1000 ft x unit. Null: a value that is no number, or negative. Derived. */
export function hoursByLength(lengthMm: number, hoursPerThousandFeet: number): number | null {
  if (!usable(lengthMm, hoursPerThousandFeet) || lengthMm < 0 || hoursPerThousandFeet < 0) return null
  return finite((lengthMm / 304_800) * hoursPerThousandFeet)
}

/**
 * Whole days for a crew: ceil(hours / (crew x 8)). Null: no number, negative hours, or a crew that is no whole number.
 */
export function crewDays(hours: number, crew: number, hoursADay: number = workdayHours): number | null {
  if (!usable(hours, hoursADay) || hours < 0 || hoursADay <= 0 || !Number.isSafeInteger(crew) || crew < 1) return null
  return finite(ceilOf(hours / (crew * hoursADay)))
}
