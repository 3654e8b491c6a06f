import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { code128Modules } from '../../../shared/labels/code128.ts'
import { checkLine, dotMm, drawLabel, moduleWidthMm, quietModules } from '../../../shared/labels/drawLabel.ts'
import type { LabelItem } from '../../../shared/labels/labelItems.ts'
import { layoutLabels } from '../../../shared/labels/layoutLabels.ts'
import { labelChoices, labelStocks, stockFor, thickestCableMm, wrapOverlapMm } from '../../../shared/labels/stocks.ts'

const item = (over: Partial<LabelItem> = {}): LabelItem => ({ runId: 'r', end: 'b', copy: 1, text: 'PAT1-S1', note: '16/2 · 88 ft', printedBefore: 0, cableDiameterMm: 6.9, ...over })
const placing = { choice: 'letter-30' as const, startAt: 1, offsetXMm: 0, offsetYMm: 0 }

describe('label stocks', () => {
  it.each(labelStocks)('$id lies within its sheet', ({ sheet }) => {
    expect(sheet.leftMm + (sheet.columns - 1) * sheet.pitchXMm + sheet.labelWidthMm).toBeLessThanOrEqual(sheet.pageWidthMm - sheet.leftMm + 0.01)
    expect(sheet.topMm + (sheet.rows - 1) * sheet.pitchYMm + sheet.labelHeightMm).toBeLessThanOrEqual(sheet.pageHeightMm - sheet.topMm + 0.01)
  })
  it('leaves a tail that goes once round the cable and over its own print', () => {
    for (const stock of labelStocks.filter((each) => each.wraps)) {
      const around = Math.PI * thickestCableMm(stock)
      expect(stock.printHeightMm + around + wrapOverlapMm).toBeCloseTo(stock.sheet.labelHeightMm, 6)
    }
  })
  it('takes the smallest wrap label that the cable allows, and says when none does', () => {
    expect([4, 6.9, 8.5, 12, 16].map((mm) => stockFor('wrap-letter', mm)).map(({ stock, fits }) => `${stock.id} ${fits}`)).toEqual([
      'wrap-letter-s true', 'wrap-letter-s true', 'wrap-letter-m true', 'wrap-letter-l true', 'wrap-letter-l false',
    ])
  })
})

describe('layoutLabels', () => {
  it('puts each label at its true place and goes on with the next sheet', () => {
    const pages = layoutLabels(Array.from({ length: 31 }, () => item()), placing)
    expect(pages.map((page) => page.labels.length)).toEqual([30, 1])
    expect(pages[0]!.labels[4]).toMatchObject({ xMm: 4.7625 + 69.85, yMm: 12.7 + 25.4 })
  })
  it('begins where a used sheet still has labels, moved by what the printer sets off', () => {
    const [page] = layoutLabels([item()], { ...placing, startAt: 5, offsetXMm: 0.5, offsetYMm: -0.25 })
    expect(page!.labels[0]).toMatchObject({ xMm: 4.7625 + 69.85 + 0.5, yMm: 12.7 + 25.4 - 0.25 })
  })
  it('loses no label and doubles none, for any number and start', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 200 }), fc.integer({ min: 1, max: 80 }), fc.constantFrom(...labelChoices.map((choice) => choice.id)), (count, startAt, choice) => {
        const items = Array.from({ length: count }, (_, i) => item({ runId: `r${i}`, cableDiameterMm: 3 + (i % 12) }))
        const placed = layoutLabels(items, { ...placing, choice, startAt }).flatMap((page) => page.labels.map((label) => label.item.runId))
        expect([...placed].sort()).toEqual(items.map((each) => each.runId).sort())
      }),
    )
  })
})

describe('drawLabel', () => {
  const stock = stockFor('letter-30', 6).stock
  const placed = { item: item(), xMm: 4.7625, yMm: 12.7, fits: true }
  it('stands every bar on whole printer dots with ten clear modules at each side', () => {
    const bars = drawLabel(stock, placed, code128Modules).find((shape) => shape.shape === 'bars')!
    if (bars.shape !== 'bars') throw new Error('no bars')
    const dots = bars.xMm / dotMm
    expect(Math.abs(dots - Math.round(dots))).toBeLessThan(1e-6)
    expect(Math.abs(bars.moduleMm / dotMm - Math.round(bars.moduleMm / dotMm))).toBeLessThan(1e-9)
    const symbol = code128Modules('PAT1-S1').length * bars.moduleMm
    expect(bars.xMm - placed.xMm).toBeGreaterThanOrEqual(quietModules * bars.moduleMm - 0.31)
    expect(placed.xMm + stock.sheet.labelWidthMm - (bars.xMm + symbol)).toBeGreaterThanOrEqual(quietModules * bars.moduleMm - 0.31)
  })
  it('leaves the bars out rather than print some that do not scan', () => {
    expect(moduleWidthMm(code128Modules('A'.repeat(24)).length, 38)).toBeNull()
    const narrow = stockFor('a4-65', 6).stock
    const shapes = drawLabel(narrow, { ...placed, item: item({ text: 'ABCDEFGHIJKLMNOPQRSTUVWX' }) }, code128Modules)
    expect(shapes.some((shape) => shape.shape === 'bars')).toBe(false)
    expect(shapes.some((shape) => shape.shape === 'text' && shape.text === 'ABCDEFGHIJKLMNOPQRSTUVWX')).toBe(true)
  })
  it('marks a reprint', () => {
    const shapes = drawLabel(stock, { ...placed, item: item({ printedBefore: 1 }) }, code128Modules)
    expect(shapes.some((shape) => shape.shape === 'text' && shape.text === 'r2')).toBe(true)
  })
  it('has a check line of exactly two inches', () => {
    const line = checkLine(stock).find((shape) => shape.shape === 'line')!
    expect(line.shape === 'line' && line.x2Mm - line.x1Mm).toBeCloseTo(50.8, 9)
  })
})
