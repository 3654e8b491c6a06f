import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fibreDbPerKm, fibreKinds, modalBandwidthMhzKm } from '../../../../shared/calc/fibre/fibre.table.ts'
import { fibreLinkLossDb, lossSumDb } from '../../../../shared/calc/fibre/linkLoss.ts'
import {
  fibreReachM,
  fibreReachTable,
  opticalKinds,
  sxReachByBandwidthM,
} from '../../../../shared/calc/fibre/reach.table.ts'

describe('reach', () => {
  it.each([
    ['1000BASE-SX', [275, 550, 550, 550, 550, null]],
    ['1000BASE-LX', [550, 550, 550, 550, 550, 5000]],
    ['10GBASE-SR', [33, 82, 300, 400, 400, null]],
    ['10GBASE-LR', [null, null, null, null, null, 10000]],
    ['10GBASE-LRM', [220, 220, 220, 220, 220, null]],
    ['25GBASE-SR', [null, null, 70, 100, 100, null]],
    ['40GBASE-SR4', [null, null, 100, 150, 150, null]],
    ['100GBASE-SR10', [null, null, 100, 150, 150, null]],
    ['100GBASE-SR4', [null, null, 70, 100, 100, null]],
  ] as const)('of %s from OM1 to OS2 (IEEE 802.3)', (kind, metres) => {
    expect(fibreKinds.map((fibre) => fibreReachM(kind, fibre))).toEqual(metres)
  })

  it('never shrinks from one multimode fibre to the next better', () => {
    for (const kind of opticalKinds) {
      const metres = (['OM1', 'OM2', 'OM3', 'OM4', 'OM5'] as const).map((fibre) => fibreReachTable[kind][fibre] ?? 0)
      expect(metres).toEqual([...metres].sort((a, b) => a - b))
    }
  })

  it('has for 200 MHz km what OM1 has', () => {
    expect(sxReachByBandwidthM[modalBandwidthMhzKm.OM1.overfilled]).toBe(fibreReachM('1000BASE-SX', 'OM1'))
  })
})

describe('loss', () => {
  it('is 4.65 dB by one standard and 5.55 by another for the same 842 m (test-set manual)', () => {
    const cable = 0.842 * 3.5
    expect(lossSumDb([cable, 0.3, 0.45, 0.45, 0.2, 0.3])).toBeCloseTo(4.65, 2)
    expect(lossSumDb([cable, 0.75, 0.45, 0.45, 0.2, 0.75])).toBeCloseTo(5.55, 2)
  })

  it('takes 0.75 dB a pair and 0.3 a splice unless told', () => {
    const link = { lengthKm: 0.15, dbPerKm: fibreDbPerKm.OM1.short, matedPairs: 4, splices: 1 }
    expect(fibreLinkLossDb(link)).toBeCloseTo(3.825, 9)
    expect(fibreLinkLossDb({ ...link, matedPairDb: 0.5 })).toBeCloseTo(2.825, 9)
    expect(fibreLinkLossDb({ ...link, matedPairs: 1.5 })).toBeNull()
    expect(fibreLinkLossDb({ ...link, lengthKm: -1 })).toBeNull()
    expect(lossSumDb([1, -1])).toBeNull()
    expect(lossSumDb([])).toBe(0)
  })

  it('grows with length and joints', () => {
    fc.assert(
      fc.property(fc.nat(10), fc.nat(20), fc.nat(20), (lengthKm, matedPairs, splices) => {
        const loss = fibreLinkLossDb({ lengthKm, dbPerKm: 3, matedPairs, splices }) ?? Infinity
        expect(fibreLinkLossDb({ lengthKm: lengthKm + 1, dbPerKm: 3, matedPairs, splices })).toBeGreaterThan(loss)
        expect(fibreLinkLossDb({ lengthKm, dbPerKm: 3, matedPairs: matedPairs + 1, splices })).toBeGreaterThan(loss)
      }),
    )
  })
})
