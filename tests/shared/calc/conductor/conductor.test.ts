import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  awgAreaCmil,
  awgAreaMm2,
  awgDiameterIn,
  awgDiameterMm,
  awgInParallel,
  awgOfAreaMm2,
  awgOfCount,
} from '../../../../shared/calc/conductor/awg.ts'
import { iec60228, iecMaximumOhmPerKm, smallBunchedOhmPerKm } from '../../../../shared/calc/conductor/iec60228.table.ts'
import { kFactorOhmCmilPerFt, mm2OfCmil, resistivityOfKFactor } from '../../../../shared/calc/conductor/kFactor.ts'
import { necFinishes, necOhmPerKm75, necTable8 } from '../../../../shared/calc/conductor/necTable8.table.ts'
import {
  areaResistanceOhmPerKm,
  awgResistanceOhmPerKm,
  conductorResistanceOhmPerKm,
  copperCladFactor,
  copperOhmMm2PerKm,
  copperPerKelvin20,
  resistanceAt,
} from '../../../../shared/calc/conductor/resistance.ts'
import { coefficientAt, factorTo20, resistanceFrom75 } from '../../../../shared/calc/conductor/temperature.ts'

const ohmPerKft = (ohmPerKm: number | null) => (ohmPerKm ?? Number.NaN) * 0.3048

describe('American wire gauge', () => {
  // Copper wire tables: gauge, diameter mm, area mm2, circular mils, ohm/kft and ohm/km of solid copper at 20 and 50 °C.
  it.each([
    [6, 4.1154, 13.3018, 26251, 0.3951, 1.296, 1.449],
    [8, 3.2636, 8.3656, 16510, 0.6282, 2.061, 2.304],
    [10, 2.5882, 5.2612, 10383, 0.9988, 3.277, 3.663],
    [12, 2.0525, 3.3088, 6530, 1.588, 5.211, 5.825],
    [14, 1.6277, 2.0809, 4107, 2.525, 8.285, 9.262],
    [16, 1.2908, 1.3087, 2583, 4.015, 13.17, 14.73],
    [18, 1.0237, 0.823, 1624, 6.385, 20.95, 23.42],
    [20, 0.8118, 0.5176, 1022, 10.15, 33.31, 37.24],
    [22, 0.6438, 0.3255, 642, 16.14, 52.96, 59.21],
    [23, 0.5733, 0.2582, 509, 20.36, 66.78, 74.66],
    [24, 0.5106, 0.2047, 404, 25.67, 84.21, 94.14],
    [26, 0.4049, 0.1288, 254, 40.81, 133.9, 149.7],
  ])('reproduces the table of gauge %i', (awg, mm, mm2, cmil, perKft, perKm, perKm50) => {
    expect(awgDiameterMm(awg)).toBeCloseTo(mm, 4)
    expect(awgAreaMm2(awg)).toBeCloseTo(mm2, 3)
    expect(Math.abs((awgAreaCmil(awg) ?? 0) - cmil)).toBeLessThanOrEqual(1)
    expect(ohmPerKft(awgResistanceOhmPerKm(awg)) / perKft).toBeCloseTo(1, 3)
    const at20 = awgResistanceOhmPerKm(awg) ?? Number.NaN
    expect(at20 / perKm).toBeCloseTo(1, 3)
    expect((resistanceAt(at20, 50) ?? 0) / perKm50).toBeCloseTo(1, 3)
  })

  it('has its two anchors, and 1/0 to 4/0 below nothing', () => {
    expect(awgDiameterIn(36)).toBeCloseTo(0.005, 12)
    expect(awgDiameterIn(-3)).toBeCloseTo(0.46, 9)
    expect(awgDiameterIn(-4)).toBeNull()
    expect(awgDiameterMm(51)).toBeNull()
  })

  it('adds areas, never gauges (audio-training article: two 18 are 15, two 14 are 11)', () => {
    expect(awgOfCount(18, 2)).toBeCloseTo(15, 1)
    expect(awgOfCount(14, 2)).toBeCloseTo(11, 1)
    expect(awgOfCount(18, 2)).toBeCloseTo(18 - 2.989, 2)
    expect(awgInParallel([18, 18])).toBeCloseTo(awgOfCount(18, 2) ?? 0, 12)
    expect(awgInParallel([12, 14])).not.toBeCloseTo(13, 0)
    expect(awgInParallel([])).toBeNull()
    expect(awgOfCount(18, 1.5)).toBeNull()
    expect(awgOfCount(18, 0)).toBeNull()
  })

  it('goes to an area and back, and falls as the gauge rises', () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 49, noNaN: true }), (awg) => {
        expect(awgOfAreaMm2(awgAreaMm2(awg) ?? 0)).toBeCloseTo(awg, 9)
        expect(awgAreaMm2(awg + 1)).toBeLessThan(awgAreaMm2(awg) ?? 0)
        expect(awgResistanceOhmPerKm(awg + 1)).toBeGreaterThan(awgResistanceOhmPerKm(awg) ?? Infinity)
      }),
    )
  })
})

describe('NEC chapter 9 table 8', () => {
  it.each(Object.entries(necTable8.uncoated).map(([awg, row]) => [Number(awg), row] as const))(
    'has for %i AWG what copper has at 75 °C, to 1 %',
    (awg, { solid, stranded }) => {
      const hot = ohmPerKft(resistanceAt(awgResistanceOhmPerKm(awg) ?? Number.NaN, 75))
      if (solid !== null) expect(Math.abs(solid / hot - 1)).toBeLessThan(0.01)
      expect(stranded / hot).toBeGreaterThan(1.015)
      expect(stranded / hot).toBeLessThan(1.03)
    },
  )

  it('has tinned copper 2 to 7 % higher, gauge by gauge', () => {
    for (const [awg, { stranded }] of Object.entries(necTable8.coated)) {
      const plain = necTable8.uncoated[Number(awg)]?.stranded ?? Number.NaN
      expect(stranded / plain).toBeGreaterThan(1.02)
      expect(stranded / plain).toBeLessThan(1.07)
    }
    expect(necFinishes).toHaveLength(2)
  })

  it('answers in ohm/km, and null where it has no entry', () => {
    expect(ohmPerKft(necOhmPerKm75(18, 'uncoated', 'stranded'))).toBeCloseTo(7.95, 9)
    expect(ohmPerKft(necOhmPerKm75(14, 'coated', 'solid'))).toBeCloseTo(3.19, 9)
    expect(necOhmPerKm75(6, 'uncoated', 'solid')).toBeNull()
    expect(necOhmPerKm75(17, 'coated', 'stranded')).toBeNull()
  })
})

describe('IEC 60228 and DIN VDE 0295', () => {
  // mm2, class 5 over resistivity by area, gauge by area, gauge by class 5 resistance.
  it.each([
    [0.5, 1.131, 20.1, 20.7],
    [0.75, 1.131, 18.4, 18.9],
    [1, 1.131, 17.2, 17.7],
    [1.5, 1.157, 15.4, 16],
    [2.5, 1.157, 13.2, 13.8],
    [4, 1.148, 11.2, 11.8],
    [6, 1.148, 9.4, 10],
    [10, 1.108, 7.2, 7.7],
  ])('puts %f mm2 against its gauge by area and by resistance', (mm2, ratio, byArea, byResistance) => {
    const flexible = iecMaximumOhmPerKm(mm2, 'class 5/6') ?? Number.NaN
    expect(flexible / (areaResistanceOhmPerKm(mm2) ?? 1)).toBeCloseTo(ratio, 2)
    expect(awgOfAreaMm2(mm2)).toBeCloseTo(byArea, 1)
    expect(Math.abs((awgOfAreaMm2(copperOhmMm2PerKm / flexible) ?? 0) - byResistance)).toBeLessThanOrEqual(0.06)
    expect(iecMaximumOhmPerKm(mm2, 'class 1/2')).toBeLessThan(flexible)
  })

  it('has the same sizes in both classes, and null for others', () => {
    expect(Object.keys(iec60228['class 1/2'])).toEqual(Object.keys(iec60228['class 5/6']))
    expect(iecMaximumOhmPerKm(3, 'class 5/6')).toBeNull()
    expect(smallBunchedOhmPerKm(0.22)).toBe(96)
    expect(smallBunchedOhmPerKm(0.34)).toBe(53)
    expect(smallBunchedOhmPerKm(0.5)).toBeNull()
  })
})

describe('temperature', () => {
  it('is 21.6 % at 75 °C, and the coefficient of 20 °C is that of 75 °C', () => {
    expect(resistanceAt(1, 75)).toBeCloseTo(1.21615, 9)
    expect(coefficientAt(copperPerKelvin20, 75)).toBeCloseTo(0.00323, 5)
  })

  it('goes to 75 °C and back by either coefficient', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1000, noNaN: true }), fc.integer({ min: -40, max: 100 }), (r20, celsius) => {
        const r75 = resistanceAt(r20, 75) ?? Number.NaN
        const exact = coefficientAt(copperPerKelvin20, 75) ?? Number.NaN
        expect((resistanceFrom75(r75, celsius, exact) ?? 0) / (resistanceAt(r20, celsius) ?? 1)).toBeCloseTo(1, 9)
        expect((resistanceFrom75(r75, celsius) ?? 0) / (resistanceAt(r20, celsius) ?? 1)).toBeCloseTo(1, 2)
      }),
    )
  })

  it('takes the rounded coefficient for the IEC factor: 0.820 at 75 °C', () => {
    expect(factorTo20(75)).toBeCloseTo(0.82, 3)
    expect(factorTo20(75, copperPerKelvin20)).toBeCloseTo(0.8223, 4)
    expect(factorTo20(20)).toBe(1)
  })

  it('has no answer outside -60 to 250 °C', () => {
    expect(resistanceAt(1, 251)).toBeNull()
    expect(resistanceFrom75(1, -61)).toBeNull()
    expect(coefficientAt(0.004, 300)).toBeNull()
    expect(factorTo20(-100)).toBeNull()
  })
})

describe('one conductor of a cable', () => {
  const plain = { awg: 16, areaMm2: null, stranding: 'solid', material: 'copper', statedOhmPerKm: null } as const

  it('believes its maker, then a listed metric size, then its area', () => {
    expect(conductorResistanceOhmPerKm({ ...plain, statedOhmPerKm: 12 }, 20)).toBe(12)
    expect(conductorResistanceOhmPerKm({ ...plain, areaMm2: 2.5, stranding: 'class5' }, 20)).toBe(7.98)
    expect(conductorResistanceOhmPerKm({ ...plain, areaMm2: 0.22, stranding: 'class5' }, 20)).toBe(96)
    expect(conductorResistanceOhmPerKm({ ...plain, areaMm2: 2.5 }, 20)).toBeCloseTo(6.8964, 4)
    expect(conductorResistanceOhmPerKm(plain, 20)).toBeCloseTo(13.17, 2)
    expect(conductorResistanceOhmPerKm({ ...plain, awg: null }, 20)).toBeNull()
  })

  it('makes 14 AWG of copper-clad aluminium a 16 of copper', () => {
    const clad = conductorResistanceOhmPerKm({ ...plain, awg: 14, material: 'cca' }, 20) ?? Number.NaN
    expect(clad / (awgResistanceOhmPerKm(16) ?? 1)).toBeCloseTo(1, 2)
    expect(copperCladFactor).toBeCloseTo(1.59, 2)
  })
})

describe('the K of American formulas', () => {
  it('is 10.371 at 20 °C, about 12.6 of that copper at 75 °C, and goes back', () => {
    expect(kFactorOhmCmilPerFt(copperOhmMm2PerKm)).toBeCloseTo(10.371, 3)
    expect(resistivityOfKFactor(kFactorOhmCmilPerFt(17.5) ?? 0)).toBeCloseTo(17.5, 9)
    expect(mm2OfCmil(1000 ** 2)).toBeCloseTo((Math.PI / 4) * 25.4 ** 2, 9)
    expect(mm2OfCmil(0)).toBeNull()
  })
})
