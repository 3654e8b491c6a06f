import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { labelSheets } from '../../../../shared/calc/labelStock/sheet.table.ts'
import { isOnPaper, labelOrigin, labelPlace, sheetClosure } from '../../../../shared/calc/labelStock/sheetGeometry.ts'
import { capitalHeightMm, characterHeightMm, pointsForCapital } from '../../../../shared/calc/labelStock/textHeight.ts'
import {
  circumferenceMm, readablePrintMm, wrapLargestDiameterMm, wrapLeastLengthMm, wrapUsualLengthMm,
} from '../../../../shared/calc/labelStock/wrapLabel.ts'

const sheet = labelSheets['a4-65']

describe('label sheets', () => {
  it.each(Object.entries(labelSheets))('%s closes on its paper', (_, stock) => {
    expect(sheetClosure(stock)!.widthMm).toBeCloseTo(stock.widthMm, 2)
    expect(sheetClosure(stock)!.heightMm).toBeCloseTo(stock.heightMm, 2)
    expect(isOnPaper(stock)).toBe(true)
  })

  it('that do not close are found out', () => {
    expect(isOnPaper({ ...sheet, topMm: 6, gapYMm: 2 })).toBe(false)
    expect(sheetClosure({ ...sheet, columns: 0 })).toBeNull()
    expect(sheetClosure({ ...sheet, gapXMm: -1 })).toBeNull()
  })

  it('place a label by row and column', () => {
    expect(labelOrigin(sheet, 12, 4)!.xMm).toBeCloseTo(167.15, 9)
    expect(labelOrigin(sheet, 12, 4)!.yMm).toBeCloseTo(265.1, 9)
    expect(labelOrigin(sheet, 13, 0)).toBeNull()
    expect(labelOrigin(sheet, 0, -1)).toBeNull()
  })

  it('go on to the next sheet, begin at a free label and shift by the printer’s error', () => {
    expect(labelPlace(sheet, 0, { startAt: 1 })).toMatchObject({ sheet: 0, row: 0, column: 0, xMm: 4.75, yMm: 10.7 })
    expect(labelPlace(sheet, 0, { startAt: 7 })).toMatchObject({ sheet: 0, row: 1, column: 1 })
    expect(labelPlace(sheet, 60, { startAt: 7 })).toMatchObject({ sheet: 1, row: 0, column: 1 })
    expect(labelPlace(sheet, 0, { startAt: 1, offsetXMm: 0.5, offsetYMm: -0.25 })).toMatchObject({
      xMm: 5.25,
      yMm: 10.45,
    })
    expect(labelPlace(sheet, 0, { startAt: 66 })).toBeNull()
    expect(labelPlace(sheet, -1, { startAt: 1 })).toBeNull()
  })

  it('never put two labels of a print in one place, nor one off the paper', () => {
    const places = Array.from({ length: 130 }, (_, ordinal) => labelPlace(sheet, ordinal, { startAt: 3 })!)
    expect(new Set(places.map(({ sheet: on, row, column }) => `${on}/${row}/${column}`)).size).toBe(130)
    for (const { xMm, yMm } of places) {
      expect(xMm + sheet.labelWidthMm).toBeLessThanOrEqual(sheet.widthMm)
      expect(yMm + sheet.labelHeightMm).toBeLessThanOrEqual(sheet.heightMm)
    }
  })
})

describe('wrap labels', () => {
  it('go once round and cover their print', () => {
    expect(circumferenceMm(5)).toBeCloseTo(15.708, 3)
    expect(wrapLeastLengthMm(6.1, 9.5, 3)).toBeCloseTo(31.664, 3)
    expect(wrapUsualLengthMm(6.1)!.fromMm).toBeCloseTo(47.91, 2)
    expect(wrapUsualLengthMm(6.1)!.toMm).toBeCloseTo(57.49, 2)
    expect(readablePrintMm(6.1)).toBeCloseTo(9.58, 2)
  })

  it('serve to 7.7 mm when 1-1/3 in long with 3/8 in of print', () => {
    expect(wrapLargestDiameterMm((4 / 3) * 25.4, 0.375 * 25.4)).toBeCloseTo(7.75, 2)
    expect(wrapLargestDiameterMm(9, 9.5)).toBeNull()
  })

  it('fit exactly the cable that they are long enough for', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 40, noNaN: true }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        (diameter, print) => {
          expect(wrapLargestDiameterMm(wrapLeastLengthMm(diameter, print, 0)!, print)).toBeCloseTo(diameter, 6)
        },
      ),
    )
  })
})

describe('text', () => {
  it('of 16 minutes is 2.3 mm at 0.5 m and 2.8 mm at 0.6 m (NUREG-0700)', () => {
    expect(characterHeightMm(500, 16)).toBeCloseTo(2.327, 3)
    expect(characterHeightMm(600, 16)).toBeCloseTo(2.793, 3)
    expect(characterHeightMm(0, 16)).toBeNull()
    expect(characterHeightMm(500, 10_800)).toBeNull()
  })

  it('of ten points has capitals of 2.5 mm, and back again', () => {
    expect(capitalHeightMm(10)).toBeCloseTo(2.469, 3)
    expect(pointsForCapital(2.469)).toBe(10)
    expect(pointsForCapital(2.5)).toBe(10.5)
    expect(pointsForCapital(0)).toBeNull()
  })
})
