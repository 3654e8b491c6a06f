import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bendRadiusMm } from '../../../../shared/calc/support/bendRadius.ts'
import { newtonsOfPoundsForce } from '../../../../shared/calc/support/poundsForce.ts'
import { pullTensions } from '../../../../shared/calc/support/pullTension.table.ts'
import { isSpanShortEnough, supportsBetween } from '../../../../shared/calc/support/supports.ts'

describe('bend radius', () => {
  it('is 4 diameters for four-pair, 10 and 20 for fibre at rest and under load (TIA-568.0-D)', () => {
    expect(bendRadiusMm('four-pair', 6.1)).toBeCloseTo(24.4, 9)
    expect(bendRadiusMm('fibre at rest', 4.8)).toBeCloseTo(48, 9)
    expect(bendRadiusMm('fibre under load', 4.8)).toBeCloseTo(96, 9)
    expect(bendRadiusMm('bonding backbone', 10)).toBe(80)
    expect(bendRadiusMm('coaxial', 0)).toBeNull()
  })
})

describe('pull tension', () => {
  it('is 25 and 50 lbf, rounded down to 110 N and to 222 N', () => {
    for (const { mostN, poundsForce } of Object.values(pullTensions)) {
      expect(Math.abs(newtonsOfPoundsForce(poundsForce)! - mostN)).toBeLessThan(1.5)
    }
    expect(newtonsOfPoundsForce(25)).toBeCloseTo(111.2055, 4)
  })
})

describe('supports', () => {
  it('stand between the ends', () => {
    expect(supportsBetween(60, 5)).toBe(11)
    expect(supportsBetween(61, 5)).toBe(12)
    expect(supportsBetween(5, 5)).toBe(0)
    expect(supportsBetween(0, 5)).toBe(0)
    expect(supportsBetween(60, 0)).toBeNull()
  })

  it('leave no span longer than the spacing', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 200_000 }), fc.integer({ min: 100, max: 2000 }), (length, spacing) => {
        expect(length / (supportsBetween(length, spacing)! + 1)).toBeLessThanOrEqual(spacing + 1e-6)
      }),
    )
  })

  it('are at most 5 ft apart (TIA-569-C 9.7)', () => {
    expect(isSpanShortEnough(1524)).toBe(true)
    expect(isSpanShortEnough(5 * 304.8)).toBe(true)
    expect(isSpanShortEnough(1525)).toBe(false)
    expect(isSpanShortEnough(-1)).toBeNull()
  })
})
