import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cablesAreaIn2, fillPercent, summedAreaIn2 } from '../../../../shared/calc/pathway/cableArea.ts'
import { cablesInRaceway } from '../../../../shared/calc/pathway/cablesInRaceway.ts'
import { allowedFillIn2, fillLimitShare } from '../../../../shared/calc/pathway/fillLimit.ts'
import { doesCodeLimitFill } from '../../../../shared/calc/pathway/fillRule.ts'
import { type TradeSize } from '../../../../shared/calc/pathway/raceway.table.ts'
import { racewayBore } from '../../../../shared/calc/pathway/racewayBore.ts'
import { sleeveFill } from '../../../../shared/calc/pathway/sleeve.ts'
import { smallestRaceway } from '../../../../shared/calc/pathway/smallestRaceway.ts'

const diameters = [0.2, 0.23, 0.24, 0.27, 0.29, 0.3, 0.35, 0.405]
/** Counts by the 53/31/40 rule, worked out once with a second implementation from NEC Chapter 9 Tables 1 and 4. */
const emt: [TradeSize, number[]][] = [
  ['1/2', [3, 2, 2, 1, 1, 1, 1, 1]],
  ['3/4', [6, 5, 4, 3, 3, 3, 1, 1]],
  ['1', [11, 8, 7, 6, 5, 4, 3, 2]],
  ['1-1/4', [19, 14, 13, 10, 9, 8, 6, 4]],
  ['1-1/2', [25, 19, 18, 14, 12, 11, 8, 6]],
  ['2', [42, 32, 29, 23, 20, 18, 13, 10]],
  ['2-1/2', [74, 56, 51, 40, 35, 33, 24, 18]],
  ['3', [112, 85, 78, 61, 53, 50, 36, 27]],
  ['3-1/2', [146, 111, 102, 80, 69, 65, 47, 35]],
  ['4', [187, 142, 130, 103, 89, 83, 61, 45]],
]
const ent: [TradeSize, number[]][] = [
  ['1/2', [3, 1, 1, 1, 1, 1, 1, 1]],
  ['3/4', [5, 4, 4, 3, 2, 1, 1, 1]],
  ['1', [9, 7, 6, 5, 4, 4, 3, 1]],
  ['1-1/4', [17, 13, 12, 9, 8, 7, 5, 4]],
  ['1-1/2', [24, 18, 17, 13, 11, 10, 8, 6]],
  ['2', [40, 30, 28, 22, 19, 18, 13, 9]],
]

describe('cables in a raceway', () => {
  it.each(emt)('EMT %s takes the counts of the table', (size, counts) => {
    expect(diameters.map((diameter) => cablesInRaceway(racewayBore('EMT', size)!.areaIn2, diameter))).toEqual(counts)
  })

  it.each(ent)('ENT %s takes the counts of the table', (size, counts) => {
    expect(diameters.map((diameter) => cablesInRaceway(racewayBore('ENT', size)!.areaIn2, diameter))).toEqual(counts)
  })

  it('is the largest number within its own share, as counting one by one finds it', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 15, noNaN: true }),
        fc.double({ min: 0.1, max: 1, noNaN: true }),
        (area, diameter) => {
          const each = (Math.PI / 4) * diameter ** 2
          let most = 0
          for (let cables = 1; cables < 1000; cables++)
            if (cables * each <= fillLimitShare(cables)! * area) most = cables
          expect(cablesInRaceway(area, diameter)).toBe(most)
        },
      ),
    )
  })

  it('takes more in a nipple, and nothing that is no size', () => {
    expect(cablesInRaceway(0.864, 0.24, true)).toBe(11)
    expect(cablesInRaceway(0.864, 0)).toBeNull()
    expect(cablesInRaceway(0.01, 0.24)).toBe(0)
  })
})

describe('fill', () => {
  it('is limited to 53, 31 and 40 %, and 60 % in a nipple (NEC Chapter 9 Table 1)', () => {
    expect([1, 2, 3, 100].map((cables) => fillLimitShare(cables))).toEqual([0.53, 0.31, 0.4, 0.4])
    expect(fillLimitShare(1, true)).toBe(0.6)
    expect(fillLimitShare(0)).toBeNull()
    expect(fillLimitShare(1.5)).toBeNull()
    expect(allowedFillIn2(0.864, 3)).toBeCloseTo(0.3456, 9)
    expect(allowedFillIn2(0, 3)).toBeNull()
  })

  it('adds mixed cables up', () => {
    expect(
      cablesAreaIn2([
        { cables: 4, outerDiameterIn: 0.24 },
        { cables: 2, outerDiameterIn: 0.27 },
      ]),
    ).toBeCloseTo(0.2955, 4)
    expect(cablesAreaIn2([])).toBe(0)
    expect(cablesAreaIn2([{ cables: 1.5, outerDiameterIn: 0.2 }])).toBeNull()
    expect(summedAreaIn2([{ cables: 3, areaIn2: 0.0133 }])).toBeCloseTo(0.0399, 9)
    expect(fillPercent(0.1288, 0.304)).toBeCloseTo(42.37, 2)
    expect(fillPercent(0.1, 0)).toBeNull()
  })

  it('finds the smallest trade size', () => {
    expect(smallestRaceway('EMT', { cablesIn2: 0.2955, cables: 6 })).toBe('1')
    expect(smallestRaceway('ENT', { cablesIn2: 5, cables: 60 })).toBeNull()
    expect(smallestRaceway('EMT', { cablesIn2: Number.NaN, cables: 6 })).toBeNull()
  })

  it('binds power by code, communications by design rule, and leaves Class 2 to the local code', () => {
    expect(doesCodeLimitFill('communications')).toBe(false)
    expect(doesCodeLimitFill('coaxial')).toBe(false)
    expect(doesCodeLimitFill('fibre, non-conductive')).toBe(false)
    expect(doesCodeLimitFill('power')).toBe(true)
    expect(doesCodeLimitFill('class 2 or 3')).toBeNull()
  })
})

describe('a sleeve', () => {
  const lots = [{ cables: 10, outerDiameterIn: 0.24 }]

  it('goes by its listing, else by 40 %', () => {
    expect(sleeveFill({ insideDiameterIn: 1.049, listedFillPercent: null }, lots)).toMatchObject({
      limitPercent: 40,
      isOver: true,
      isListed: false,
    })
    expect(sleeveFill({ insideDiameterIn: 1.049, listedFillPercent: 60 }, lots)).toMatchObject({
      limitPercent: 60,
      isOver: false,
      isListed: true,
    })
  })

  it('is nothing without a bore or with a listing over 100 %', () => {
    expect(sleeveFill({ insideDiameterIn: 0, listedFillPercent: null }, lots)).toBeNull()
    expect(sleeveFill({ insideDiameterIn: 1, listedFillPercent: 140 }, lots)).toBeNull()
    expect(sleeveFill({ insideDiameterIn: 1, listedFillPercent: Number.NaN }, lots)).toBeNull()
  })
})
