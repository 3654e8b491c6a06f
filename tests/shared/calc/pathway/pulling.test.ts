import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isPullWithinCode, isPullWithinTelecom } from '../../../../shared/calc/pathway/bends.ts'
import { typicalDiameters } from '../../../../shared/calc/pathway/cableDiameter.table.ts'
import { jamRatio, mayJam } from '../../../../shared/calc/pathway/jam.ts'
import { boreForPlugIn, doesPlugPass, hdmiPlugIn, racewayForPlug } from '../../../../shared/calc/pathway/plugPass.ts'
import { anglePullBoxIn, straightPullBoxIn } from '../../../../shared/calc/pathway/pullBox.ts'
import { racewayBendRadiusIn } from '../../../../shared/calc/pathway/racewayBend.ts'
import { reducedChart, reducedChartDiametersMm } from '../../../../shared/calc/pathway/reducedChart.table.ts'
import { countForLongPull, reducedCount, reducedSize } from '../../../../shared/calc/pathway/reducedCount.ts'

describe('the reduced telecom chart (MIL-HDBK-1012/3)', () => {
  it('is whole, and never allows more of a thicker cable', () => {
    expect(reducedChart.size).toBe(10)
    for (const [size, counts] of reducedChart) {
      expect(counts).toHaveLength(reducedChartDiametersMm.length)
      const printed = counts.filter((count) => count !== null)
      expect(printed, size).toEqual(printed.toSorted((a, b) => b - a))
    }
  })

  it('gives 3, 6, 15 and 20 cables of 6.1 mm in 3/4, 1, 1-1/2 and 2', () => {
    expect((['3/4', '1', '1-1/2', '2'] as const).map((size) => reducedCount(size, 6.1))).toEqual([3, 6, 15, 20])
  })

  it('takes the thicker column between two, and says nothing beyond', () => {
    expect(reducedCount('1', 6.2)).toBe(3)
    expect(reducedCount('1', 3)).toBe(8)
    expect(reducedCount('1', 18)).toBeNull()
    expect(reducedCount('4', 6.1)).toBeNull()
    expect(reducedCount('3/8', 6.1)).toBeNull()
    expect(reducedCount('1', -1)).toBeNull()
  })

  it('finds the smallest size', () => {
    expect(reducedSize(6, 6.1)).toBe('1')
    expect(reducedSize(7, 6.1)).toBe('1-1/4')
    expect(reducedSize(500, 6.1)).toBeNull()
  })

  it('takes 15 % off a pull worth 50 to 100 ft, each right angle 30 ft', () => {
    expect(countForLongPull(20, 10_000, [])).toBe(20)
    expect(countForLongPull(20, 10_000, [90])).toBe(17)
    expect(countForLongPull(20, 20_000, [])).toBe(17)
    expect(countForLongPull(20, 20_000, [90, 90])).toBeNull()
  })
})

describe('jam ratio', () => {
  it('warns of three cables from 2.8 to 3.2 only', () => {
    expect(jamRatio(0.824, 0.24)).toBeCloseTo(3.433, 3)
    expect(mayJam(2.8, 1, 3)).toBe(true)
    expect(mayJam(3.2, 1, 3)).toBe(true)
    expect(mayJam(3.21, 1, 3)).toBe(false)
    expect(mayJam(3, 1, 2)).toBe(false)
    expect(mayJam(3, 1, 4)).toBe(false)
    expect(mayJam(3, 0, 3)).toBeNull()
  })
})

describe('a pull', () => {
  it('has at most 360 degrees by code, 180 and 100 ft by telecom practice', () => {
    expect(isPullWithinCode([90, 90, 90, 90])).toBe(true)
    expect(isPullWithinCode([90, 90, 90, 90, 1])).toBe(false)
    expect(isPullWithinTelecom([90, 90], 30_480)).toBe(true)
    expect(isPullWithinTelecom([90, 90, 1], 1000)).toBe(false)
    expect(isPullWithinTelecom([], 30_785)).toBe(false)
    expect(isPullWithinTelecom([-90], 100)).toBeNull()
  })

  it('that telecom practice allows, code allows as well', () => {
    const bends = fc.array(fc.integer({ min: 0, max: 120 }), { maxLength: 6 })
    fc.assert(fc.property(bends, (turns) => !isPullWithinTelecom(turns, 1000) || isPullWithinCode(turns) === true))
  })

  it('needs a box of 24 in straight and 21 in at an angle for 3 in (NEC 314.28 example)', () => {
    expect(straightPullBoxIn(3)).toBe(24)
    expect(anglePullBoxIn(3, [3])).toBe(21)
    expect(anglePullBoxIn(3, [])).toBe(18)
    expect(straightPullBoxIn(0)).toBeNull()
    expect(anglePullBoxIn(3, [-1])).toBeNull()
  })

  it('bends with six diameters up to 2 in and ten above', () => {
    expect(racewayBendRadiusIn(2)).toBe(12)
    expect(racewayBendRadiusIn(2.067)).toBeCloseTo(20.67, 9)
    expect(racewayBendRadiusIn(-1)).toBeNull()
  })
})

describe('a plug', () => {
  it('of HDMI passes 1-1/4 EMT and not 1, as its jacket would', () => {
    expect(boreForPlugIn(hdmiPlugIn)).toBeCloseTo(1.202, 3)
    expect(racewayForPlug('EMT', hdmiPlugIn)).toBe('1-1/4')
    expect(doesPlugPass(hdmiPlugIn, 1.049)).toBe(false)
    expect(doesPlugPass(hdmiPlugIn, 1.61)).toBe(true)
  })

  it('is nothing without a size', () => {
    expect(doesPlugPass({ widthIn: 0, heightIn: 1 }, 1)).toBeNull()
    expect(racewayForPlug('ENT', { widthIn: 9, heightIn: 9 })).toBeNull()
  })
})

describe('typical diameters', () => {
  it('agree in inches and millimetres', () => {
    for (const { cable, outerDiameterIn, outerDiameterMm } of typicalDiameters) {
      expect(Math.abs(outerDiameterIn * 25.4 - outerDiameterMm), cable).toBeLessThan(0.06)
    }
  })
})
