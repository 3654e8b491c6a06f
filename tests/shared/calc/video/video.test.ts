import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  formatClockMhz,
  fullClassReachM,
  fullReachClockMhz,
  reducedClassReachM,
  straightRunM,
} from '../../../../shared/calc/video/linkReach.ts'
import { type VideoFormat, videoTimings } from '../../../../shared/calc/video/timing.table.ts'
import { usbLengthM } from '../../../../shared/calc/video/usb.table.ts'
import { delayLengthM } from '../../../../shared/calc/video/usbLength.ts'
import { advisedCategories, videoCableGbps } from '../../../../shared/calc/video/videoCable.table.ts'
import { cableCategoryFor, passiveLengthM } from '../../../../shared/calc/video/videoCable.ts'
import {
  bitsPerPixel,
  characterRateMhz,
  type Chroma,
  chromas,
  fixedRateGbps,
  fixedRateLinks,
  linkGbps,
  linkPayloadGbps,
  mostTmdsGbps,
  pixelClockMhz,
  tmdsGbps,
} from '../../../../shared/calc/video/videoRate.ts'

const clockOf = (format: VideoFormat, perSecond: number) =>
  pixelClockMhz(videoTimings[format].hTotal, videoTimings[format].vTotal, perSecond) ?? Number.NaN

describe('rates', () => {
  // CTA-861 totals; clock MHz, character rate MHz, TMDS and fixed-rate Gb/s, least cable (a published rate sheet).
  const rows: [VideoFormat, number, Chroma, number, number, number, number, number, string | null][] = [
    ['720p60', 60, '4:4:4', 8, 74.25, 74.25, 2.228, 2.005, 'Standard'],
    ['1080p60', 60, '4:4:4', 8, 148.5, 148.5, 4.455, 4.01, 'High Speed'],
    ['1080p60', 60, '4:4:4', 12, 148.5, 222.75, 6.683, 6.014, 'High Speed'],
    ['2160p30', 30, '4:4:4', 8, 297, 297, 8.91, 8.019, 'High Speed'],
    ['2160p60', 60, '4:2:0', 8, 594, 297, 8.91, 8.019, 'High Speed'],
    ['2160p60', 60, '4:2:0', 10, 594, 371.25, 11.137, 10.024, 'Premium High Speed'],
    ['2160p60', 60, '4:2:2', 10, 594, 594, 17.82, 16.038, 'Premium High Speed'],
    ['2160p60', 60, '4:4:4', 8, 594, 594, 17.82, 16.038, 'Premium High Speed'],
    ['2160p60', 60, '4:4:4', 10, 594, 742.5, 22.275, 20.047, 'Ultra High Speed'],
    ['2160p120', 120, '4:2:0', 10, 1188, 742.5, 22.275, 20.047, 'Ultra High Speed'],
    ['2160p120', 120, '4:4:4', 8, 1188, 1188, 35.64, 32.076, 'Ultra High Speed'],
    ['2160p120', 120, '4:4:4', 10, 1188, 1485, 44.55, 40.095, 'Ultra High Speed'],
    ['4320p60', 60, '4:2:0', 10, 2376, 1485, 44.55, 40.095, 'Ultra High Speed'],
    ['4320p60', 60, '4:4:4', 10, 2376, 2970, 89.1, 80.19, null],
  ]
  it.each(rows)('%s at %i, %s, %i bit', (format, perSecond, chroma, bits, clock, character, tmds, fixed, cable) => {
    const pixelClock = clockOf(format, perSecond)
    expect(pixelClock).toBeCloseTo(clock, 6)
    expect(characterRateMhz(pixelClock, chroma, bits)).toBeCloseTo(character, 6)
    const gbps = tmdsGbps(pixelClock, chroma, bits) ?? Number.NaN
    expect(Math.abs(gbps - tmds)).toBeLessThanOrEqual(0.0006)
    const fixedGbps = fixedRateGbps(pixelClock, chroma, bits) ?? Number.NaN
    expect(Math.abs(fixedGbps - fixed)).toBeLessThanOrEqual(0.0006)
    expect(cableCategoryFor(gbps <= mostTmdsGbps ? gbps : fixedGbps)).toBe(cable)
  })

  it('puts 59.94 frames a second in the class of 60', () => {
    const slower = clockOf('2160p60', 60 / 1.001)
    expect(slower).toBeCloseTo(593.407, 3)
    expect(cableCategoryFor(tmdsGbps(slower, '4:4:4', 8) ?? 0)).toBe('Premium High Speed')
  })

  it('carries 4:2:2 of any depth to 12 bit as 8-bit 4:4:4, and half as much at 4:2:0', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 3000, noNaN: true }), fc.constantFrom(8, 10, 12), (clock, bits) => {
        expect(tmdsGbps(clock, '4:2:2', bits)).toBe(tmdsGbps(clock, '4:4:4', 8))
        expect((tmdsGbps(clock, '4:2:0', bits) ?? 0) * 2).toBeCloseTo(tmdsGbps(clock, '4:4:4', bits) ?? -1, 9)
        expect((fixedRateGbps(clock, '4:4:4', bits) ?? 0) / (tmdsGbps(clock, '4:4:4', bits) ?? 1)).toBeCloseTo(0.9, 9)
      }),
    )
    expect(bitsPerPixel('4:2:2', 16)).toBeNull()
    expect(chromas.map((chroma) => bitsPerPixel(chroma, 9))).toEqual([null, null, null])
  })

  it('has links of 9 to 48 Gb/s, of which 16/18 is carried', () => {
    expect(fixedRateLinks.map(([lanes, rate]) => linkGbps(lanes, rate))).toEqual([9, 18, 24, 32, 40, 48])
    expect(linkPayloadGbps(4, 12)).toBeCloseTo(42.67, 2)
    expect(linkGbps(2.5, 3)).toBeNull()
  })

  it('has the clocks that devices are set to', () => {
    expect(formatClockMhz['1080p60']).toBeCloseTo(clockOf('1080p60', 60), 9)
    expect(formatClockMhz['2160p30']).toBeCloseTo(clockOf('2160p30', 30), 9)
    expect(formatClockMhz['2160p60']).toBeCloseTo(clockOf('2160p60', 60), 9)
    expect(formatClockMhz['2160p60-420']).toBe(characterRateMhz(clockOf('2160p60', 60), '4:2:0', 8))
    expect(formatClockMhz['4320p60']).toBeCloseTo(clockOf('4320p60', 60), 9)
    expect(clockOf('1080p50', 50)).toBeCloseTo(148.5, 9)
    expect(clockOf('2160p24', 24)).toBeCloseTo(297, 9)
    expect(clockOf('2160p50', 50)).toBeCloseTo(594, 9)
  })
})

describe('cable', () => {
  it('takes each category at its very limit, and the next one just past it', () => {
    advisedCategories.forEach((category, place) => {
      expect(cableCategoryFor(videoCableGbps[category])).toBe(category)
      expect(cableCategoryFor(videoCableGbps[category] + 0.001)).toBe(advisedCategories[place + 1] ?? null)
    })
    expect(cableCategoryFor(0)).toBeNull()
  })

  it('plans a shorter passive cable for a higher rate', () => {
    expect([4.455, 10.2, 18, 48, 48.1].map(passiveLengthM)).toEqual([10, 7.5, 5, 3, null])
  })
})

describe('links over twisted pair', () => {
  it('goes 100 m up to 225 MHz itself, then 70 on 5e and 6', () => {
    expect(fullClassReachM(fullReachClockMhz, '6')).toBe(100)
    expect(fullClassReachM(222.75, '5e')).toBe(100)
    expect(fullClassReachM(225.01, '6')).toBe(70)
    expect(fullClassReachM(297, '5e')).toBe(70)
    expect(fullClassReachM(297, '6A')).toBe(100)
    expect(straightRunM(297, '7')).toBe(100)
  })

  it('says that a full-class link cannot carry what is past 10.2 Gb/s, however short', () => {
    expect(fullClassReachM(340, '6A')).toBe(100)
    expect(fullClassReachM(594, '6A')).toBeNull()
    expect(straightRunM(594, '6')).toBe(70)
    expect(fullClassReachM(Number.NaN, '6')).toBeNull()
    expect(straightRunM(0, '6')).toBeNull()
    expect(reducedClassReachM['4K']).toBeLessThan(reducedClassReachM['1080p'])
  })
})

describe('USB', () => {
  it('has 5 m of 26 ns, and less at each later rate', () => {
    expect(delayLengthM()).toBeCloseTo(usbLengthM['2.0'], 9)
    const lengths = [usbLengthM['2.0'], usbLengthM['3.2 Gen 1'], usbLengthM['3.2 Gen 2'], usbLengthM.USB4]
    expect(lengths).toEqual([...lengths].sort((a, b) => b - a))
    expect(delayLengthM(-1)).toBeNull()
  })
})
