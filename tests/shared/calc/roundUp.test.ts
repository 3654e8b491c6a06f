import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ceilOf, floorOf } from '../../../shared/calc/roundUp.ts'
import { finite, usable } from '../../../shared/calc/usable.ts'

describe('rounding that forgives the noise of floating point', () => {
  it('keeps what should be whole', () => {
    expect(100 * 1.1).toBeGreaterThan(110)
    expect(ceilOf(100 * 1.1)).toBe(110)
    expect(floorOf(0.3 / 0.1)).toBe(3)
    expect(Object.is(ceilOf(-0), 0)).toBe(true)
  })

  it('is plain rounding otherwise', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e6, max: 1e6 }), fc.double({ min: 0.01, max: 0.99, noNaN: true }), (whole, part) => {
        expect(ceilOf(whole + part)).toBe(whole + 1)
        expect(floorOf(whole + part)).toBe(whole)
      }),
    )
  })
})

describe('usable numbers', () => {
  it('are all finite', () => {
    expect(usable(1, 0, -5)).toBe(true)
    expect(usable()).toBe(true)
    expect(usable(1, Number.NaN)).toBe(false)
    expect(usable(Infinity)).toBe(false)
    expect([finite(2), finite(Number.NaN), finite(-Infinity)]).toEqual([2, null, null])
  })
})
