import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fitBarcode } from '../../../../shared/calc/barcode/barcodeFit.ts'
import { code128Widths } from '../../../../shared/calc/barcode/code128.table.ts'
import { code128Check } from '../../../../shared/calc/barcode/code128Check.ts'
import { encodeCode128 } from '../../../../shared/calc/barcode/code128Encode.ts'
import { code128Pattern } from '../../../../shared/calc/barcode/code128Pattern.ts'
import { barHeightMm, code128Modules, code128WidthMm } from '../../../../shared/calc/barcode/code128Size.ts'

/** Reads a symbol's modules back by its patterns alone: an independent way round. */
function decode(modules: string): string {
  const patterns = new Map(code128Widths.slice(0, 106).map((_, value) => [code128Pattern(value), value]))
  const values = Array.from({ length: (modules.length - 13) / 11 }, (_, place) =>
    patterns.get(modules.slice(place * 11, place * 11 + 11))!,
  )
  let set = 'ABC'[values[0]! - 103]!
  let out = ''
  for (let place = 1; place < values.length - 1; place++) {
    const value = values[place]!
    const read = (from: string, code: number) =>
      from === 'A' && code >= 64 ? String.fromCharCode(code - 64) : String.fromCharCode(code + 32)
    if (set === 'C') {
      if (value < 100) out += String(value).padStart(2, '0')
      else set = value === 100 ? 'B' : 'A'
    } else if (value === 98) out += read(set === 'A' ? 'B' : 'A', values[++place]!)
    else if (value === 99) set = 'C'
    else if (value === 100 && set === 'A') set = 'B'
    else if (value === 101 && set === 'B') set = 'A'
    else out += read(set, value)
  }
  return out
}

describe('Code 128 patterns (ISO/IEC 15417)', () => {
  it('are 107, all different, 11 modules wide and the stop 13, bars even', () => {
    expect(code128Widths).toHaveLength(107)
    expect(new Set(code128Widths).size).toBe(107)
    code128Widths.forEach((widths, value) => {
      const modules = code128Pattern(value)!
      expect(modules).toHaveLength(value === 106 ? 13 : 11)
      if (value < 106) expect([...modules].filter((module) => module === '1').length % 2).toBe(0)
      expect(widths).toMatch(/^[1-4]+$/)
    })
  })

  it('do not exist outside 0 to 106', () => {
    expect([-1, 107, 1.5, Number.NaN].map(code128Pattern)).toEqual([null, null, null, null])
  })
})

describe('check value', () => {
  it.each([
    [103, [48, 42, 42, 17, 18, 19, 35], 54, 'PJJ123C'],
    [103, [40, 41, 99, 34, 56, 78], 67, 'HI345678'],
    [103, [33, 34, 35, 36, 37, 38], 42, 'ABCDEF'],
    [104, [65, 66, 67, 68, 69, 70], 97, 'abcdef'],
    [105, [34, 56, 78], 73, '345678'],
  ])('from %i and %j is %i (published: %s)', (start, values, check) => {
    expect(code128Check(start, values)).toBe(check)
  })

  it('needs a start and values that exist', () => {
    expect(code128Check(102, [1])).toBeNull()
    expect(code128Check(104, [103])).toBeNull()
    expect(code128Check(104, [1.5])).toBeNull()
  })
})

describe('encoding', () => {
  it('reads back as it was written, whatever ASCII text', () => {
    fc.assert(
      fc.property(
        fc.string({
          unit: fc.integer({ min: 0, max: 127 }).map((code) => String.fromCharCode(code)),
          minLength: 1,
          maxLength: 24,
        }),
        (text) => {
          const symbol = encodeCode128(text)!
          expect(decode(symbol.modules)).toBe(text)
          expect(symbol.check).toBe(code128Check(symbol.start, symbol.values))
          expect(symbol.modules).toHaveLength(code128Modules(symbol.values.length)!)
        },
      ),
    )
  })

  it('packs digits in pairs where that is shorter', () => {
    expect(encodeCode128('00123456')).toMatchObject({ start: 105, values: [0, 12, 34, 56] })
    expect(encodeCode128('PAT1-S1')!.values).toHaveLength(7)
    expect(encodeCode128('CAT6-0123')!.values).toHaveLength(8)
    expect(encodeCode128('12')!.values).toEqual([12])
  })

  it('shifts for one odd character rather than switching twice', () => {
    expect(encodeCode128('ab\u0001cd')).toMatchObject({ start: 104, values: [65, 66, 98, 65, 67, 68] })
  })

  it('refuses nothing, too much and what is not ASCII', () => {
    expect(encodeCode128('')).toBeNull()
    expect(encodeCode128('é')).toBeNull()
    expect(encodeCode128('x'.repeat(129))).toBeNull()
  })
})

describe('size', () => {
  it('is (11 n + 35) modules and ten quiet ones at each end', () => {
    expect(code128Modules(4)).toBe(79)
    expect(code128WidthMm(6, 0.19)).toBeCloseTo(22.99, 9)
    expect(code128Modules(-1)).toBeNull()
    expect(code128WidthMm(6, 0)).toBeNull()
  })

  it('asks bars of 5 mm or 15 % of the width', () => {
    expect(barHeightMm(20)).toBe(5)
    expect(barHeightMm(60)).toBe(9)
    expect(barHeightMm(0)).toBeNull()
  })

  it('fits whole printer dots into the room, and says when it does not', () => {
    expect(fitBarcode({ characters: 7, roomMm: 40, dotsPerInch: 300 })).toMatchObject({
      dotsPerModule: 3,
      moduleMm: 0.254,
    })
    expect(fitBarcode({ characters: 7, roomMm: 25, dotsPerInch: 300 })).toBeNull()
    expect(fitBarcode({ characters: 7, roomMm: 25, dotsPerInch: 300, leastModuleMm: 0.16 })).toMatchObject({
      dotsPerModule: 2,
    })
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 24 }),
        fc.integer({ min: 5, max: 200 }),
        fc.constantFrom(203, 300, 600),
        (characters, roomMm, dotsPerInch) => {
          const fit = fitBarcode({ characters, roomMm, dotsPerInch })
          if (fit !== null) {
            expect(fit.widthMm).toBeLessThanOrEqual(roomMm + 1e-6)
            expect(fit.widthMm).toBeCloseTo(code128WidthMm(characters, fit.moduleMm)!, 9)
          }
        },
      ),
    )
  })
})
