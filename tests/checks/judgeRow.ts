import { answerOf } from './answers/registry.ts'
import type { CheckRow } from './checkRow.ts'
import { exceptions } from './exceptions.ts'

export interface Verdict {
  passed: boolean
  got: unknown
  expected: unknown
}

/** Asks the product for a row's value and compares; nothing that answers counts as failed. */
export function judgeRow(row: CheckRow): Verdict {
  const expected = exceptions.get(row.id)?.expected ?? row.expected
  const answer = answerOf(row)
  if (answer === undefined) return { passed: false, got: 'nothing answers this', expected }
  let got: unknown
  try {
    got = answer(row.inputs)
  } catch (error) {
    return { passed: false, got: `an exception: ${String(error)}`, expected }
  }
  return { passed: isSame(got, expected, row.tolerance ?? 0), got, expected }
}

/** Room for the noise of floating point where a row asks for the exact number. */
const noise = 1e-9

/** Numbers within an absolute tolerance, also inside arrays and objects; everything else exactly. */
export function isSame(got: unknown, expected: unknown, tolerance: number): boolean {
  if (typeof got === 'number' && typeof expected === 'number') {
    return Math.abs(got - expected) <= tolerance + noise * Math.max(1, Math.abs(expected))
  }
  if (Array.isArray(got) && Array.isArray(expected)) {
    return got.length === expected.length && expected.every((value, place) => isSame(got[place], value, tolerance))
  }
  if (isRecord(got) && isRecord(expected)) {
    const names = Object.keys(expected)
    return names.length === Object.keys(got).length && names.every((name) => isSame(got[name], expected[name], tolerance))
  }
  return got === expected
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
