import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bs2051Channel, bs2051Count, isBs2051Position } from '../../../../shared/calc/layout/bs2051.ts'
import {
  bs2051Channels,
  bs2051HomeNames,
  type Bs2051Layout,
  bs2051Systems,
} from '../../../../shared/calc/layout/bs2051.table.ts'
import {
  isBs775Azimuth,
  isBs775Height,
  pictureAngleDeg,
  surroundAzimuthsDeg,
} from '../../../../shared/calc/layout/bs775.ts'
import { amplifierChannels, channelCount } from '../../../../shared/calc/layout/channelCount.ts'
import { azimuthOfDeg, polarPosition } from '../../../../shared/calc/layout/polarPosition.ts'
import { speakerElevationDeg, speakerHeightM } from '../../../../shared/calc/layout/speakerHeight.ts'

describe('positions in plan', () => {
  it('count azimuth to the left', () => {
    expect(polarPosition(3, 90)!.x).toBeCloseTo(-3, 12)
    expect(polarPosition(2, 0)).toEqual({ x: 0, y: 2 })
    expect(polarPosition(-1, 0)).toBeNull()
    expect(azimuthOfDeg(0, 0)).toBeNull()
  })

  it('give their azimuth back', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.5, max: 20, noNaN: true }),
        fc.integer({ min: -179, max: 179 }),
        (distance, azimuth) => {
          const { x, y } = polarPosition(distance, azimuth)!
          expect(azimuthOfDeg(x, y)).toBeCloseTo(azimuth, 6)
          expect(Math.hypot(x, y)).toBeCloseTo(distance, 9)
        },
      ),
    )
  })
})

describe('ITU-R BS.775', () => {
  it('has C at 0, L and R at 30, surrounds at 100 to 120', () => {
    expect(isBs775Azimuth('C', 0)).toBe(true)
    expect(isBs775Azimuth('L', 30)).toBe(true)
    expect(isBs775Azimuth('L', -30)).toBe(false)
    expect(isBs775Azimuth('R', -30)).toBe(true)
    expect([99, 100, 120, 121].map((azimuth) => isBs775Azimuth('LS', azimuth))).toEqual([false, true, true, false])
    expect(isBs775Azimuth('RS', -110)).toBe(true)
    expect(isBs775Azimuth('L', 33, 5)).toBe(true)
    expect(isBs775Azimuth('L', Number.NaN)).toBeNull()
  })

  it('has the front at 1.2 m and surrounds at least there, tilted up to 15 degrees', () => {
    expect(isBs775Height('C', 1.2, 0)).toBe(true)
    expect(isBs775Height('C', 1.3, 0)).toBe(false)
    expect(isBs775Height('LS', 1.8, 15)).toBe(true)
    expect(isBs775Height('LS', 1.8, 16)).toBe(false)
    expect(isBs775Height('LS', 1.1, 0)).toBe(false)
  })

  it('spreads more surrounds evenly over 60 to 150 degrees', () => {
    expect(surroundAzimuthsDeg(2)).toEqual([110, -110])
    expect(surroundAzimuthsDeg(4)).toEqual([60, 150, -60, -150])
    expect(surroundAzimuthsDeg(6)).toEqual([60, 105, 150, -60, -105, -150])
    expect(surroundAzimuthsDeg(3)).toBeNull()
  })

  it('sees the picture at 33 degrees from 3 heights and 48 from 2', () => {
    expect(pictureAngleDeg(3)).toBeCloseTo(33, 0)
    expect(pictureAngleDeg(2)).toBeCloseTo(48, 0)
    expect(pictureAngleDeg(0)).toBeNull()
  })
})

describe('ITU-R BS.2051', () => {
  const layouts = Object.keys(bs2051Channels) as Bs2051Layout[]

  it('has the loudspeakers and LFE channels of each system', () => {
    const counts = Object.values(bs2051Systems).map((layout) => Object.values(bs2051Count(layout)))
    expect(counts).toEqual([[2, 0], [5, 1], [7, 1], [9, 1], [10, 1], [10, 2], [13, 1], [22, 2], [7, 1], [11, 1]])
  })

  it.each(layouts)('%s has as many loudspeakers in each layer as its name says, all named once', (layout) => {
    const [upper, middle, bottom] = layout.split('+').map(Number)
    const channels = bs2051Channels[layout].filter(({ isLfe }) => !isLfe)
    const of = (layers: string[]) => channels.filter(({ name }) => layers.includes(name.replace(/[+-].*/, ''))).length
    expect([of(['U', 'UH', 'T']), of(['M']), of(['B'])]).toEqual([upper, middle, bottom])
    expect(new Set(bs2051Channels[layout].map(({ name }) => name)).size).toBe(bs2051Channels[layout].length)
  })

  it.each(layouts)('%s is the same to the left and right', (layout) => {
    for (const { name, azimuthDeg: [from, to], elevationDeg } of bs2051Channels[layout]) {
      if (!/^[A-Z]+\+/.test(name) || from <= 0 || from === 180) continue
      const mirror = bs2051Channel(layout, name.replace('+', '-'))!
      expect(mirror.azimuthDeg).toEqual([-to, -from])
      expect(mirror.elevationDeg).toEqual(elevationDeg)
    }
  })

  it.each(layouts)('%s has each numbered channel’s own azimuth in its range', (layout) => {
    for (const { name, azimuthDeg: [from, to] } of bs2051Channels[layout]) {
      const own = /[+-]\d+$/.exec(name)
      if (own === null || name.startsWith('T')) continue
      expect(Number(own[0]) >= from && Number(own[0]) <= to, name).toBe(true)
    }
  })

  it('judges a place by azimuth and elevation', () => {
    const at = (azimuthDeg: number, elevationDeg: number) => ({ azimuthDeg, elevationDeg })
    expect(isBs2051Position('4+7+0', 'M+135', at(119, 0))).toBe(false)
    expect(isBs2051Position('4+5+0', 'U-110', at(-130, 35))).toBe(true)
    expect(isBs2051Position('4+5+0', 'U-110', at(130, 35))).toBe(false)
    expect(isBs2051Position('4+5+0', 'M+110', at(110, 10))).toBe(false)
    expect(isBs2051Position('0+5+0', 'M+110', at(110, 10))).toBe(true)
    expect(isBs2051Position('9+10+3', 'M+180', at(-180, 0))).toBe(true)
    expect(isBs2051Position('9+10+3', 'T+000', at(77, 90))).toBe(true)
    expect(isBs2051Position('0+5+0', 'U+030', at(30, 30))).toBeNull()
    expect(isBs2051Position('0+5+0', 'M+030', at(Number.NaN, 0))).toBeNull()
    expect(isBs2051Position('0+5+0', 'M+030', at(34, 0), 5)).toBe(true)
  })

  it('knows which home formats are its own', () => {
    expect(bs2051HomeNames['7.1.4']).toEqual({ layout: '4+7+0', isExact: true })
    expect(bs2051HomeNames['5.1.2']?.isExact).toBe(false)
  })
})

describe('channels', () => {
  it('are ear level and overhead for the amplifier, subwoofers on their own', () => {
    expect(channelCount('7.1')).toEqual({ amplifierChannels: 7, subwoofers: 1, outputs: 8 })
    expect(channelCount('7.2.4')).toEqual({ amplifierChannels: 11, subwoofers: 2, outputs: 13 })
    expect(channelCount('7.1', true)?.amplifierChannels).toBe(8)
    expect(['7', '', '7.1.4.2', 'a.b', '7.-1'].map((format) => channelCount(format))).toEqual([
      null,
      null,
      null,
      null,
      null,
    ])
  })

  it('add two for each stereo zone', () => {
    expect(amplifierChannels(['7.1.4'], 6)).toBe(23)
    expect(amplifierChannels([], 0)).toBe(0)
    expect(amplifierChannels(['x'], 1)).toBeNull()
    expect(amplifierChannels([], 1.5)).toBeNull()
  })
})

describe('heights', () => {
  it('follow the elevation and give it back', () => {
    expect(speakerHeightM(2, 45)).toBeCloseTo(3.2, 9)
    expect(speakerElevationDeg(2.4, 0)).toBe(90)
    expect(speakerElevationDeg(1.2, 0)).toBeNull()
    expect(speakerHeightM(2, 90)).toBeNull()
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        fc.integer({ min: -80, max: 80 }),
        (distance, elevation) => {
          expect(speakerElevationDeg(speakerHeightM(distance, elevation)!, distance)).toBeCloseTo(elevation, 6)
        },
      ),
    )
  })
})
