import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  feetToMm,
  formatConductor,
  formatLength,
  formatLengthFigure,
  formatNumber,
  inchesToMm,
  metresPerFoot,
  metresToMm,
  mmPerFoot,
  mmToFeet,
  mmToInches,
  mmToMetres,
  parseLength,
  parsePositiveInt,
} from '../../shared/units.ts'

const mmOf = (text: string, unit: 'ft' | 'm' = 'ft') => {
  const read = parseLength(text, unit)
  return read.ok ? read.mm : read.message
}

describe('conversion', () => {
  it('takes the foot as exactly 0.3048 m', () => {
    expect(metresPerFoot).toBe(0.3048)
    expect(mmPerFoot).toBe(304.8)
    expect(feetToMm(1000)).toBe(304_800)
    expect(inchesToMm(97.125)).toBe(2467)
    expect(metresToMm(2.4384)).toBe(2438)
    expect([mmToFeet(304.8), mmToInches(25.4), mmToMetres(1000)]).toEqual([1, 1, 1])
  })
})

describe('formatLength', () => {
  it('shows whole feet or metres in a list', () => {
    expect(formatLength(26_822, 'ft', { as: 'whole' })).toBe('88 ft')
    expect(formatLength(26_822, 'm', { as: 'whole' })).toBe('27 m')
  })

  it('shows feet, inches and the simplest fraction when exact', () => {
    expect(formatLength(2896, 'ft', { as: 'exact' })).toBe('9 ft 6 in')
    expect(formatLength(2908, 'ft', { as: 'exact' })).toBe('9 ft 6 1/2 in')
    expect(formatLength(305, 'ft', { as: 'exact' })).toBe('1 ft')
    expect(formatLength(13, 'ft', { as: 'exact' })).toBe('1/2 in')
    expect(formatLength(0, 'ft', { as: 'exact' })).toBe('0 ft')
    expect(formatLength(26_822, 'm', { as: 'exact' })).toBe('26.822 m')
    expect(formatLength(300, 'm', { as: 'exact' })).toBe('0.3 m')
  })

  it('carries, and never shows 12 inches', () => {
    expect(formatLength(3047.9, 'ft', { as: 'exact' })).toBe('10 ft')
    expect(formatLength(3048, 'ft', { as: 'exact' })).toBe('10 ft')
    fc.assert(
      fc.property(fc.double({ min: 0, max: 3e6, noNaN: true }), (mm) => {
        expect(formatLength(mm, 'ft', { as: 'exact' })).not.toMatch(/(^| )(1[2-9]|[2-9]\d)( \d+\/\d+)? in/)
      }),
    )
  })

  it('keeps a minus sign only when something is left of it', () => {
    expect(formatLength(-2896, 'ft', { as: 'exact' })).toBe('-9 ft 6 in')
    expect(formatLength(-0.2, 'm', { as: 'exact' })).toBe('0 m')
  })

  it('says so when there is no length', () => {
    expect(formatLength(Number.NaN, 'ft', { as: 'whole' })).toBe('no length')
    expect(formatLength(Infinity, 'm', { as: 'exact' })).toBe('no length')
  })

  it('gives the bare figure for a column', () => {
    expect(formatLengthFigure(26_822, 'ft')).toBe('88')
    expect(formatLengthFigure(26_822, 'm')).toBe('26.8')
  })
})

describe('parseLength', () => {
  it('reads what people type', () => {
    expect(mmOf('88 ft')).toBe(26_822)
    expect(mmOf('88')).toBe(26_822)
    expect(mmOf("88'")).toBe(26_822)
    expect(mmOf('9 ft 6 in')).toBe(2896)
    expect(mmOf('10\'-2"')).toBe(3099)
    expect(mmOf('10’ – 2”')).toBe(3099)
    expect(mmOf("9' 6 1/2")).toBe(2908)
    expect(mmOf('9 feet 6½ inches')).toBe(2908)
    expect(mmOf('9ft6in')).toBe(2896)
    expect(mmOf('9 ft, 6 in')).toBe(2896)
    expect(mmOf("5''")).toBe(127)
    expect(mmOf('6 1/2')).toBe(1981)
    expect(mmOf('1/2 in')).toBe(13)
    expect(mmOf('27 m')).toBe(27_000)
    expect(mmOf('27m')).toBe(27_000)
    expect(mmOf('26.8', 'm')).toBe(26_800)
    expect(mmOf('.5 m')).toBe(500)
    expect(mmOf('300 mm')).toBe(300)
    expect(mmOf('30 cm', 'm')).toBe(300)
    expect(mmOf('  12 Feet ')).toBe(3658)
    expect(mmOf('0')).toBe(0)
  })

  it('takes a comma as the decimal sign, and as grouping where nothing else can be meant', () => {
    expect(mmOf('26,8', 'm')).toBe(26_800)
    expect(mmOf('9,5 ft')).toBe(2896)
    expect(mmOf('0,305 m')).toBe(305)
    expect(mmOf('1,000 ft')).toBe(304_800)
    expect(mmOf('1,234.5 m')).toBe(1_234_500)
    expect(mmOf('26,822 m')).toMatch(/two ways: write 26822 or 26\.822/)
  })

  it.each([
    ['', /Nothing was typed.*88 ft/],
    ['wall', /"wall" was not understood.*9 ft 6 in/],
    ['12 yards', /"yards" is not a unit of length/],
    ['9 ft 14 in', /12 inches in a foot/],
    ['9.5 ft 6 in', /cannot both be meant/],
    ['-4 ft', /negative/],
    ['1/0 in', /divides by zero/],
    ['1.2.3', /"1\.2\.3" is not a number/],
    ['0,123,456', /is not a number/],
    ['9 ft 6 in 3', /was not understood/],
    ['3 m 20', /was not understood/],
    ['9 6', /not a unit of length/],
    ['9'.repeat(400), /too long/],
    ['NaN', /was not understood/],
    ['1e3', /"e3" is not a unit/],
  ])('refuses %j with a sentence and an example', (text, message) => {
    const read = parseLength(text, 'ft')
    expect(read.ok ? read.mm : read.message).toMatch(message)
    if (!read.ok) expect(read.message).toContain('such as')
  })

  it('takes a sign where a position is meant', () => {
    expect(parseLength('-4 ft', 'ft', { signed: true })).toEqual({ ok: true, mm: -1219 })
    expect(parseLength('−0', 'ft', { signed: true })).toEqual({ ok: true, mm: 0 })
  })

  it('reads back 20,000 sixteenths of an inch as they were written', () => {
    const wrong: string[] = []
    for (let sixteenths = 0; sixteenths < 20_000; sixteenths++) {
      const mm = Math.round((sixteenths * 25.4) / 16)
      const text = formatLength(mm, 'ft', { as: 'exact' })
      if (mmOf(text) !== mm) wrong.push(text)
    }
    expect(wrong).toEqual([])
  })

  it('reads back every millimetre in metres, and within one in feet', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 3_000_000 }), (mm) => {
        expect(mmOf(formatLength(mm, 'm', { as: 'exact' }), 'm')).toBe(mm)
        expect(Math.abs(Number(mmOf(formatLength(mm, 'ft', { as: 'exact' }))) - mm)).toBeLessThanOrEqual(1)
      }),
    )
  })

  it('never throws and never gives a fraction of a millimetre', () => {
    const alphabet = [..."0123456789.,/' \"-ftinmc½"]
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom(...alphabet), maxLength: 12 }),
        fc.constantFrom('ft', 'm'),
        (text, unit) => {
          const read = parseLength(text, unit)
          expect(read.ok ? Number.isSafeInteger(read.mm) && read.mm >= 0 : read.message.length > 20).toBe(true)
        },
      ),
      { numRuns: 2000 },
    )
  })
})

describe('formatNumber', () => {
  it('groups thousands and keeps the decimals asked for', () => {
    expect(formatNumber(1234567.891, 2)).toBe('1,234,567.89')
    expect(formatNumber(0.5, 0)).toBe('1')
    expect(formatNumber(-0.001, 1)).toBe('0.0')
    expect(formatNumber(12, -3)).toBe('12')
    expect(formatNumber(Number.NaN, 1)).toBe('not known')
    expect(formatNumber(Infinity, 1)).toBe('not known')
  })
})

describe('parsePositiveInt', () => {
  it('takes whole numbers from one up', () => {
    expect(parsePositiveInt(' 12 ')).toEqual({ ok: true, value: 12 })
    expect(parsePositiveInt('1,000')).toEqual({ ok: true, value: 1000 })
  })

  it.each(['', '0', '-3', '2.5', 'six', '1,00', '9'.repeat(30)])('refuses %j', (text) => {
    const read = parsePositiveInt(text)
    expect(read.ok ? read.value : read.message).toMatch(/number/)
  })

  it('knows the most that is allowed', () => {
    expect(parsePositiveInt('61', 60)).toEqual({ ok: false, message: 'The number can be at most 60.' })
  })
})

describe('formatConductor', () => {
  it('shows gauges as gauges and areas as areas', () => {
    expect(formatConductor({ awg: 16, areaMm2: null }, 'awg')).toBe('16 AWG')
    expect(formatConductor({ awg: -3, areaMm2: null }, 'awg')).toBe('4/0 AWG')
    expect(formatConductor({ awg: 0, areaMm2: null }, 'awg')).toBe('1/0 AWG')
    expect(formatConductor({ awg: null, areaMm2: 2.5 }, 'mm2')).toBe('2.5 mm²')
  })

  it('converts by the definition of the gauge (ASTM B258: 16 AWG is 1.31 mm², 10 AWG 5.26 mm²)', () => {
    expect(formatConductor({ awg: 16, areaMm2: null }, 'mm2')).toBe('1.31 mm²')
    expect(formatConductor({ awg: 10, areaMm2: null }, 'mm2')).toBe('5.26 mm²')
    expect(formatConductor({ awg: null, areaMm2: 2.5 }, 'awg')).toBe('about 13 AWG')
  })

  it('says so when nothing is known', () => {
    expect(formatConductor({ awg: null, areaMm2: null }, 'awg')).toBe('size not known')
    expect(formatConductor({ awg: null, areaMm2: 0 }, 'mm2')).toBe('size not known')
    expect(formatConductor({ awg: Number.NaN, areaMm2: null }, 'awg')).toBe('size not known')
  })
})
