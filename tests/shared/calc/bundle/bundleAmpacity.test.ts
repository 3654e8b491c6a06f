import { describe, expect, it } from 'vitest'
import {
  ambientFactor,
  bundleAmpacityA,
  halfLoadedAmpacityA,
  isBundleExempt,
  largestBundle,
} from '../../../../shared/calc/bundle/bundleAmpacity.ts'
import {
  bundleAmpacityTable,
  bundleColumns,
  bundleGauges,
  cableRatingsC,
} from '../../../../shared/calc/bundle/bundleAmpacity.table.ts'

describe('ampacity of powered bundles (NEC 2020 Table 725.144, from memory)', () => {
  it('falls with the bundle and rises with the rating', () => {
    for (const awg of bundleGauges) {
      for (const rating of cableRatingsC) {
        const row = bundleAmpacityTable[awg][rating].filter((ampacity) => ampacity !== null)
        expect(row).toEqual(row.toSorted((a, b) => b - a))
      }
      bundleColumns.forEach((_, column) => {
        const byRating = cableRatingsC.map((rating) => bundleAmpacityTable[awg][rating][column] ?? 0)
        expect(byRating).toEqual(byRating.toSorted((a, b) => a - b))
      })
    }
  })

  it('takes the column of the bundle at both its ends', () => {
    expect([1, 7, 8, 19, 20, 37, 38, 61, 62, 91, 92, 192].map((cables) => bundleAmpacityA(24, cables, 60))).toEqual(
      [1.19, 1.19, 0.81, 0.81, 0.63, 0.63, 0.55, 0.55, 0.46, 0.46, 0.4, 0.4],
    )
    expect(bundleAmpacityA(24, 193, 60)).toBeNull()
    expect(bundleAmpacityA(26, 100, 60)).toBeNull()
    expect(bundleAmpacityA(24, 0, 60)).toBeNull()
  })

  it('gives the published bundle limits at 45 degrees and 90 W: 37, 61, 91 and 192', () => {
    const at45 = { ambientC: 45, currentA: 0.433 }
    expect(largestBundle({ awg: 24, ratingC: 60, ...at45 })).toBe(37)
    expect(largestBundle({ awg: 23, ratingC: 60, ...at45 })).toBe(61)
    expect(largestBundle({ awg: 24, ratingC: 75, ...at45 })).toBe(91)
    expect(largestBundle({ awg: 23, ratingC: 75, ...at45 })).toBe(192)
  })

  it('corrects for ambient temperature, and stops at the rating', () => {
    expect(ambientFactor(60, 30)).toBe(1)
    expect(ambientFactor(75, 45)).toBeCloseTo(0.8165, 4)
    expect(ambientFactor(60, 60)).toBe(0)
    expect(ambientFactor(60, 61)).toBeNull()
    expect(ambientFactor(30, 20)).toBeNull()
    expect(largestBundle({ awg: 24, ratingC: 60, ambientC: 60, currentA: 0.3 })).toBe(0)
  })

  it('is not asked up to 0.3 A in 24 AWG or thicker', () => {
    expect(isBundleExempt(0.3, 24)).toBe(true)
    expect(isBundleExempt(0.31, 24)).toBe(false)
    expect(isBundleExempt(0.3, 26)).toBe(false)
    expect(isBundleExempt(-1, 24)).toBeNull()
  })

  it('is 1.4 times as much with half the conductors loaded', () => {
    expect(halfLoadedAmpacityA(0.63)).toBeCloseTo(0.882, 9)
    expect(halfLoadedAmpacityA(-0.1)).toBeNull()
  })
})
