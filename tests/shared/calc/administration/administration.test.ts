import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { administrationClass } from '../../../../shared/calc/administration/administrationClass.ts'
import { fieldColours } from '../../../../shared/calc/administration/fieldColour.table.ts'
import { isLabelNearEnd } from '../../../../shared/calc/administration/labelPlace.ts'
import { isLinkIdentifier, readLinkIdentifier } from '../../../../shared/calc/administration/linkIdentifier.ts'
import { cablesForGrade } from '../../../../shared/calc/administration/residentialGrade.ts'
import { outletsForWall } from '../../../../shared/calc/administration/wallOutlets.ts'
import { symbolColours } from '../../../../shared/calc/symbol/symbolColour.table.ts'
import { symbolExtentMm } from '../../../../shared/calc/symbol/symbolExtent.ts'

const foot = 304.8

describe('link identifiers (TIA-606)', () => {
  it('read as floor and space, panel and port', () => {
    expect(readLinkIdentifier('1A-A47')).toEqual({ floor: 1, space: 'A', panel: 'A', port: 47 })
    expect(readLinkIdentifier('12BC-AA0123')).toEqual({ floor: 12, space: 'BC', panel: 'AA', port: 123 })
  })

  it.each(['', 'A-A47', '1A A47', '1a-a47', '1A-A4', '1A-A47 ', '123A-A47', '1A-AAA47', '1A-A12345'])(
    'refuse %j',
    (text) => {
      expect(isLinkIdentifier(text)).toBe(false)
      expect(readLinkIdentifier(text)).toBeNull()
    },
  )
})

describe('administration class', () => {
  it('rises with spaces, buildings and sites', () => {
    expect(administrationClass({ telecomSpaces: 1, buildings: 1, sites: 1 })).toBe(1)
    expect(administrationClass({ telecomSpaces: 3, buildings: 1, sites: 1 })).toBe(2)
    expect(administrationClass({ telecomSpaces: 3, buildings: 2, sites: 1 })).toBe(3)
    expect(administrationClass({ telecomSpaces: 3, buildings: 2, sites: 2 })).toBe(4)
    expect(administrationClass({ telecomSpaces: 0, buildings: 1, sites: 1 })).toBeNull()
  })
})

describe('colours', () => {
  it('differ for each termination field', () => {
    expect(new Set(Object.values(fieldColours)).size).toBe(9)
    expect(fieldColours.horizontal).toBe('blue')
  })

  it('are known for three symbol categories', () => {
    expect(symbolColours).toEqual({ 'audio video': 'orange', communications: 'green', 'safety and security': 'pink' })
  })
})

describe('labels and symbols', () => {
  it('sit within 300 mm of the end', () => {
    expect(isLabelNearEnd(300)).toBe(true)
    expect(isLabelNearEnd(301)).toBe(false)
    expect(isLabelNearEnd(-1)).toBeNull()
  })

  it('cover 1 ft when 1/4 in is plotted at 1:48', () => {
    expect(symbolExtentMm(6.35, 48)).toBeCloseTo(304.8, 9)
    expect(symbolExtentMm(6.35, 0)).toBeNull()
  })
})

describe('residential grades (TIA-570-B)', () => {
  it('give one or two of each per location', () => {
    expect(cablesForGrade(1, 1)).toEqual({ twistedPair: 1, coaxial: 1, optionalFibre: 1 })
    expect(cablesForGrade(2, 7)).toEqual({ twistedPair: 14, coaxial: 14, optionalFibre: 14 })
    expect(cablesForGrade(2, -1)).toBeNull()
  })

  it('want outlets by wall: none under 12 ft, then one each 50 ft', () => {
    expect([11.9, 12, 49, 50, 51, 100, 101].map((feet) => outletsForWall(feet * foot))).toEqual([0, 1, 1, 1, 2, 2, 3])
    expect(outletsForWall(-1)).toBeNull()
  })

  it('leave no point more than 25 ft from an outlet', () => {
    fc.assert(
      fc.property(fc.integer({ min: 3658, max: 500_000 }), (wallMm) => {
        expect(wallMm / outletsForWall(wallMm)! / 2).toBeLessThanOrEqual(7620 + 1e-6)
      }),
    )
  })
})
