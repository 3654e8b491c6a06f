import fc from 'fast-check'
import { expect } from 'vitest'

/** Numbers that nobody measures, and some that somebody does, so that not every call ends at its guard. */
const absurdNumber = fc.oneof(
  fc.constantFrom(
    Number.NaN,
    Infinity,
    -Infinity,
    -1,
    -0,
    0,
    1,
    2,
    3,
    10,
    0.5,
    1e-320,
    1e-9,
    1e9,
    1e308,
    Number.MAX_SAFE_INTEGER,
  ),
  fc.double({ noNaN: true, noDefaultInfinity: true, min: 0, max: 1000 }),
  fc.integer({ min: 0, max: 200 }),
)

/** Every number anywhere in a result. */
function numbersIn(result: unknown): number[] {
  if (typeof result === 'number') return [result]
  return typeof result === 'object' && result !== null ? Object.values(result).flatMap(numbersIn) : []
}

/** A calculation that is given a number each time it asks for one. */
export type Calculation = (draw: () => number) => unknown

/** Asks a calculation 300 times with such numbers: null or plain ones, never NaN, Infinity, nothing or an exception. */
export function expectPlainAnswers(calculation: Calculation) {
  fc.assert(
    fc.property(fc.array(absurdNumber, { minLength: 12, maxLength: 12 }), (drawn) => {
      let at = 0
      const result = calculation(() => drawn[at++ % drawn.length] ?? 0)
      expect(result).not.toBeUndefined()
      expect(numbersIn(result).filter((value) => !Number.isFinite(value))).toEqual([])
    }),
    { numRuns: 300 },
  )
}
