import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  attenuationBetween,
  attenuationByRoot,
  coaxDbPer100M,
  coaxLossDb,
  dbPer100MOf,
} from '../../../../shared/calc/coax/attenuation.ts'
import { coaxAtTenMhz, coaxAttenuation, coaxKinds } from '../../../../shared/calc/coax/attenuation.table.ts'
import { impliedDbPer100M, longestAtBudgetM, longestPastSplitM } from '../../../../shared/calc/coax/budgetLength.ts'
import { dbmOfDbmv, dbmvOfMillivolts, dbuvOfDbmv } from '../../../../shared/calc/coax/level.ts'
import { sdiBudgetDb, sdiMbps } from '../../../../shared/calc/coax/sdi.table.ts'
import { idealSplitDb, levelAfter } from '../../../../shared/calc/coax/splitter.ts'
import { splitterLossDb } from '../../../../shared/calc/coax/splitter.table.ts'

const per100Ft = (db: number | null) => (db ?? Number.NaN) * 0.3048

describe('attenuation', () => {
  // RG-6, dB per 100 m as printed beside the dB per 100 ft.
  it.each([
    [5, 1.9], [55, 5.2], [211, 10], [270, 11.2], [400, 13.6], [550, 16.1], [750, 18.5], [870, 20.1], [1000, 21.5],
    [1450, 25.9], [1800, 28.8], [2150, 31.4], [3000, 37],
  ])('is at %i MHz that of the table in metres', (mhz, printed) =>
    expect(Math.abs((coaxDbPer100M('RG-6', mhz) ?? 0) - printed)).toBeLessThanOrEqual(0.06),
  )

  // Antenna-maker page, typical series 6, and a public table of series 6 broadband cable: dB per 100 ft.
  it.each([[211, 3], [950, 6.4], [2150, 9.7], [270, 3.24], [1000, 6.54]])(
    'agrees at %i MHz with published %f to 0.2 dB',
    (mhz, published) => expect(Math.abs(per100Ft(coaxDbPer100M('RG-6', mhz)) - published)).toBeLessThanOrEqual(0.2),
  )

  it('has for interpolated rows what lies between their neighbours in the table', () => {
    coaxAttenuation.forEach(({ mhz, dbPer100Ft, standing }, place) => {
      const [low, high] = [coaxAttenuation[place - 1], coaxAttenuation[place + 1]]
      if (standing !== 'interpolated' || !low || !high) return
      for (const kind of coaxKinds) {
        const point = (row: typeof low) => ({ mhz: row.mhz, attenuation: row.dbPer100Ft[kind] })
        const between = attenuationBetween(point(low), point(high), mhz) ?? Number.NaN
        // The rows were interpolated in a table with more points than this one keeps.
        expect(Math.abs(between - dbPer100Ft[kind])).toBeLessThanOrEqual(0.04)
      }
    })
  })

  it('rises with frequency and falls with thickness, and has no answer outside the table', () => {
    fc.assert(
      fc.property(fc.double({ min: 5, max: 2990, noNaN: true }), (mhz) => {
        for (const kind of coaxKinds) {
          expect(coaxDbPer100M(kind, mhz + 10)).toBeGreaterThan(coaxDbPer100M(kind, mhz) ?? Infinity)
        }
        expect(coaxDbPer100M('RG-11', mhz)).toBeLessThan(coaxDbPer100M('RG-6', mhz) ?? 0)
        expect(coaxDbPer100M('RG-6', mhz)).toBeLessThan(coaxDbPer100M('RG-59', mhz) ?? 0)
      }),
    )
    expect(coaxDbPer100M('RG-6', 4.9)).toBeNull()
    expect(coaxDbPer100M('RG-6', 3000)).not.toBeNull()
    expect(coaxDbPer100M('RG-6', 3001)).toBeNull()
  })

  it('follows the root of frequency to 5 % above 200 MHz', () => {
    expect(Math.abs((attenuationByRoot(6.4, 950, 211) ?? 0) / 3 - 1)).toBeLessThan(0.05)
    expect(attenuationByRoot(6.4, 950, 950)).toBe(6.4)
    expect(attenuationBetween({ mhz: 100, attenuation: 1 }, { mhz: 100, attenuation: 2 }, 100)).toBeNull()
    expect(attenuationBetween({ mhz: 100, attenuation: 1 }, { mhz: 400, attenuation: 2 }, 225)).toBeCloseTo(1.5, 9)
  })

  it('is loss over length', () => {
    expect(coaxLossDb(dbPer100MOf(5.6) ?? 0, 50 * 0.3048)).toBeCloseTo(2.8, 9)
    expect(coaxLossDb(-1, 5)).toBeNull()
  })
})

describe('levels', () => {
  it('falls by each loss, and rises by an amplifier', () => {
    expect(levelAfter(10, [3.5, 6.1, 0.5])).toBeCloseTo(-0.1, 9)
    expect(levelAfter(0, [-15, 7])).toBe(8)
    expect(levelAfter(0, [])).toBe(0)
  })

  it('is 0 dBmV, 60 dBuV and -48.75 dBm for a millivolt in 75 ohm', () => {
    expect(dbmvOfMillivolts(1)).toBe(0)
    expect(dbmvOfMillivolts(1.41)).toBeCloseTo(3, 1)
    expect(dbuvOfDbmv(0)).toBe(60)
    expect(dbmOfDbmv(0)).toBeCloseTo(-48.75, 2)
    expect(dbmOfDbmv(0, 50)).toBeCloseTo(-46.99, 2)
    expect(dbmvOfMillivolts(0)).toBeNull()
  })

  it('parts ideally by less than real splitters do', () => {
    for (const [ways, name] of [[2, '2-way'], [4, '4-way'], [8, '8-way']] as const) {
      expect(splitterLossDb[name][0]).toBeGreaterThan(idealSplitDb(ways) ?? Infinity)
    }
    expect(idealSplitDb(1)).toBe(0)
    expect(idealSplitDb(2.5)).toBeNull()
  })
})

describe('budgets', () => {
  it('reaches what a conference manual prints: 348 and 542 m past a splitter', () => {
    const split = { budgetDb: 20, splitDb: 8.5, nearM: 50, nearDbPer100M: coaxAtTenMhz['RG-59'].dbPer100M }
    const printed = [[coaxAtTenMhz['RG-59'].dbPer100M, 348], [coaxAtTenMhz['RG-11'].dbPer100M, 542]] as const
    for (const [dbPer100M, metres] of printed) {
      expect(Math.abs((longestPastSplitM({ ...split, dbPer100M }) ?? 0) - metres)).toBeLessThan(1)
    }
    expect(longestPastSplitM({ ...split, budgetDb: 10, dbPer100M: 2 })).toBeNull()
  })

  it('goes 606, 741 and 1000 m on 20 dB without one', () => {
    expect(coaxKinds.map((kind) => Math.floor(longestAtBudgetM(20, coaxAtTenMhz[kind].dbPer100M) ?? 0))).toEqual([
      606, 740, 1000,
    ])
  })

  it('implies for 78 m of 3G what the root makes of HD at 113 m', () => {
    const [hd, threeG] = [impliedDbPer100M(sdiBudgetDb.upToThreeG, 113), impliedDbPer100M(sdiBudgetDb.upToThreeG, 78)]
    expect(per100Ft(hd)).toBeCloseTo(5.39, 2)
    expect(per100Ft(threeG)).toBeCloseTo(7.82, 2)
    expect((threeG ?? 0) / (attenuationByRoot(hd ?? 0, sdiMbps.HD / 2, sdiMbps['3G'] / 2) ?? 1)).toBeCloseTo(1, 1)
  })
})
