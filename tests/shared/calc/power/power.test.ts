import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { areaOfDiameterMm2 } from '../../../../shared/calc/conductor/awg.ts'
import { areaResistanceOhmPerKm, awgResistanceOhmPerKm } from '../../../../shared/calc/conductor/resistance.ts'
import { class2MostA, class2MostV, isClass2Voltage } from '../../../../shared/calc/power/class2.ts'
import { constantPowerSupply } from '../../../../shared/calc/power/constantPower.ts'
import { longestAtPercentM } from '../../../../shared/calc/power/longestAtPercent.ts'
import { dropsAlongV, evenlySpreadDropV } from '../../../../shared/calc/power/spreadLoad.ts'
import {
  dropByKFactorV,
  dropPercent,
  longestAtDropM,
  longestAtLegDropM,
  voltageDropV,
} from '../../../../shared/calc/power/voltageDrop.ts'

const solid = (awg: number) => awgResistanceOhmPerKm(awg) ?? Number.NaN
const feet = (metres: number | null) => (metres ?? Number.NaN) / 0.3048

describe('published distances, decoded', () => {
  // F-P1: 24 VAC, 10 %, 22 to 10 AWG, feet (camera-housing manual, 1997). The current is VA/24 whatever arrives.
  it.each([
    [10, [178, 283, 451, 716, 1142, 1811, 2880]],
    [20, [89, 141, 225, 358, 571, 905, 1440]],
    [50, [35, 56, 90, 143, 228, 362, 576]],
    [80, [22, 35, 56, 89, 142, 226, 360]],
    [100, [17, 28, 45, 71, 114, 181, 288]],
    [200, [8, 14, 22, 35, 57, 90, 144]],
  ])('F-P1: %i VA at 24 VAC', (powerW, printed) => {
    ;[22, 20, 18, 16, 14, 12, 10].forEach((awg, place) => {
      const length = feet(longestAtPercentM(10, { sourceV: 24, powerW, kind: 'constant current' }, solid(awg)))
      // To 0.4 %, or to the foot that the table cuts off.
      expect(Math.abs(length - (printed[place] ?? 0))).toBeLessThanOrEqual(Math.max(1, 0.004 * length))
    })
  })

  // F-P2: 24 VAC, 5 W, wire diameter in mm, metres (later camera manuals). The current is P over what is left.
  it.each([[0.8, 148.9], [1, 232.66], [1.25, 363.53], [2, 930.63]])('F-P2: 5 W through %f mm wire', (mm, printed) => {
    const ohmPerKm = areaResistanceOhmPerKm(areaOfDiameterMm2(mm) ?? Number.NaN, 17.5) ?? Number.NaN
    const length = longestAtPercentM(10, { sourceV: 24, powerW: 5, kind: 'constant power' }, ohmPerKm) ?? Number.NaN
    expect(Math.abs(length / printed - 1)).toBeLessThan(0.001)
    const older = longestAtPercentM(10, { sourceV: 24, powerW: 5, kind: 'constant current' }, ohmPerKm) ?? Number.NaN
    expect(length / older).toBeCloseTo(0.9, 9)
  })

  // F-P3: 12 VDC, 10 %, 14, 16, 18 and 22 AWG, feet (alarm-panel sheet), rounded as printed.
  it.each([
    [0.05, [4750, 3000, 1880, 750]],
    [0.1, [2375, 1500, 940, 370]],
    [0.2, [1190, 750, 470, 180]],
    [0.3, [790, 500, 310, 120]],
    [0.4, [595, 375, 235, 90]],
  ])('F-P3: %f A at 12 VDC', (amps, printed) => {
    ;[14, 16, 18, 22].forEach((awg, place) => {
      const length = feet(longestAtDropM(1.2, solid(awg), amps))
      expect(Math.abs(length - (printed[place] ?? 0))).toBeLessThanOrEqual(Math.max(6, 0.012 * length))
    })
  })

  // Resistances are inferred from the chart itself: they test convention and scaling only.
  it('F-P4: 1.25 V at 15 mA (fire-panel bus chart)', () => {
    expect(Math.abs(feet(longestAtDropM(1.25, 16.5 / 0.3048, 0.015)) / 2524 - 1)).toBeLessThan(0.001)
    expect(Math.abs(feet(longestAtDropM(1.25, 6.5 / 0.3048, 0.015)) / 6410 - 1)).toBeLessThan(0.001)
  })

  it('F-P5: 0.5 V in one leg, 9.5 A, 2 AWG: 335 ft (base-radio manual), twice what a whole drop allows', () => {
    const length = feet(longestAtLegDropM(0.5, solid(2), 9.5))
    expect(Math.abs(length - 335)).toBeLessThanOrEqual(5)
    expect(feet(longestAtDropM(0.5, solid(2), 9.5))).toBeCloseTo(length / 2, 6)
  })
})

describe('10 % and 3 % lengths of solid copper at 20 °C, feet, computed twice', () => {
  it.each([
    [22, 372, 112, 9, 19],
    [20, 591, 177, 15, 30],
    [18, 940, 282, 23, 47],
    [16, 1494, 448, 37, 75],
    [14, 2376, 713, 59, 119],
    [12, 3778, 1133, 94, 189],
  ])('%i AWG', (awg, tenPercent, threePercent, atFour, at24) => {
    const length = (percent: number, volts: number, amps: number) =>
      feet(longestAtDropM((percent / 100) * volts, solid(awg), amps))
    expect(Math.abs(length(10, 12, 0.1) - tenPercent)).toBeLessThanOrEqual(0.6)
    expect(Math.abs(length(3, 12, 0.1) - threePercent)).toBeLessThanOrEqual(0.6)
    expect(Math.abs(length(10, 12, 4) - atFour)).toBeLessThanOrEqual(0.6)
    expect(Math.abs(length(10, 24, 4) - at24)).toBeLessThanOrEqual(0.6)
  })
})

describe('drop', () => {
  it('is 2.095 V of 5 A over 10 m of 18 AWG, not the 3 V that a page claims', () => {
    expect(voltageDropV(10, 20.95, 5)).toBeCloseTo(2.095, 6)
  })

  it('is the same by the American K at the temperature of the K', () => {
    expect(dropByKFactorV(12.9, 30.48, 2, 1620)).toBeCloseTo(3.185, 3)
    expect(dropByKFactorV(10.371, 30.48, 2, 1624.3)).toBeCloseTo(voltageDropV(30.48, solid(18), 2) ?? 0, 3)
    expect(dropByKFactorV(12.9, 30.48, 2, 0)).toBeNull()
  })

  it('uses up just the budget at the longest length', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 50, noNaN: true }),
        fc.double({ min: 1, max: 200, noNaN: true }),
        fc.double({ min: 0.01, max: 10, noNaN: true }),
        (volts, ohmPerKm, amps) => {
          const length = longestAtDropM(volts, ohmPerKm, amps) ?? Number.NaN
          expect((voltageDropV(length, ohmPerKm, amps) ?? 0) / volts).toBeCloseTo(1, 9)
        },
      ),
    )
  })

  it('leaves a load of constant power just its share at the longest length', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 49 }), fc.integer({ min: 1, max: 200 }), (percent, watts) => {
        const lengthM = longestAtPercentM(percent, { sourceV: 24, powerW: watts, kind: 'constant power' }, 20.95) ?? 0
        const supply = constantPowerSupply(24, (2 * lengthM * 20.95) / 1000, watts)
        expect(dropPercent(24 - (supply?.loadV ?? 0), 24)).toBeCloseTo(percent, 6)
      }),
    )
  })
})

describe('loads along a line', () => {
  it('takes half the drop where the load lies evenly (LED strip: 0.416 V)', () => {
    expect(evenlySpreadDropV(5, 33.3, 2.5)).toBeCloseTo(0.416, 3)
  })

  it('carries in each stretch all that is beyond it', () => {
    const drops = dropsAlongV([{ lengthM: 10, currentA: 1 }, { lengthM: 10, currentA: 0.5 }], 50)
    expect(drops).toEqual([expect.closeTo(1.5, 9), expect.closeTo(2, 9)])
    expect(dropsAlongV([], 50)).toBeNull()
    expect(dropsAlongV([{ lengthM: 1, currentA: -1 }], 50)).toBeNull()
  })

  it('tends to the evenly spread drop for many equal loads', () => {
    const many = Array.from({ length: 1000 }, () => ({ lengthM: 0.005, currentA: 0.0025 }))
    expect(dropsAlongV(many, 33.3)?.at(-1)).toBeCloseTo(evenlySpreadDropV(5, 33.3, 2.5) ?? 0, 2)
  })
})

describe('class 2', () => {
  it.each([[12, 5], [20, 5], [24, 4.1667], [30, 3.3333], [48, 2.0833], [60, 1.6667]])(
    '%i V gives %f A',
    (volts, amps) => expect(class2MostA(volts)).toBeCloseTo(amps, 4),
  )

  it('ends at 60 VDC and 30 VAC, at 30 and 15 in the wet, the limits included', () => {
    expect(class2MostA(60.1)).toBeNull()
    expect(isClass2Voltage(30, { current: 'AC', wet: false })).toBe(true)
    expect(isClass2Voltage(30.1, { current: 'AC', wet: false })).toBe(false)
    expect(isClass2Voltage(60, { current: 'DC', wet: false })).toBe(true)
    expect(isClass2Voltage(24, { current: 'AC', wet: true })).toBe(false)
    expect(class2MostV({ current: 'DC', wet: true })).toBe(30)
    expect(isClass2Voltage(0, { current: 'DC', wet: false })).toBeNull()
  })
})
