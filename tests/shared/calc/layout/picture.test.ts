import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { highestCommon, sharedFormat } from '../../../../shared/calc/layout/sharedFormat.ts'
import {
  isTopWithin,
  pictureWidth,
  topAngleDeg,
  viewingAngleDeg,
  viewingDistance,
} from '../../../../shared/calc/layout/viewingDistance.ts'

describe('viewing', () => {
  it('is 1.63 diagonals at 30 degrees and 2.17 widths at 26', () => {
    expect(viewingDistance(1, 30)).toBeCloseTo(1.6264, 4)
    expect(viewingDistance(1, 26)! / pictureWidth(1)!).toBeCloseTo(2.166, 3)
    expect(pictureWidth(100)).toBeCloseTo(87.158, 3)
    expect(viewingDistance(100, 180)).toBeNull()
    expect(viewingDistance(0, 30)).toBeNull()
  })

  it('gives the angle back', () => {
    fc.assert(
      fc.property(fc.integer({ min: 20, max: 200 }), fc.integer({ min: 5, max: 120 }), (diagonal, angle) => {
        expect(viewingAngleDeg(diagonal, viewingDistance(diagonal, angle)!)).toBeCloseTo(angle, 6)
      }),
    )
  })

  it('looks up at most 15 degrees to the top at home', () => {
    expect(topAngleDeg(1.1, 2, 3)).toBeCloseTo(16.7, 1)
    expect(isTopWithin(1.1, 2, 3)).toBe(false)
    expect(isTopWithin(1.1, 2, 3, 35)).toBe(true)
    expect(isTopWithin(1.1, 2, 0)).toBeNull()
  })
})

describe('a shared source', () => {
  const order = ['720p60', '1080p60', '2160p30', '2160p60']

  it('runs at the least that any display stops at', () => {
    expect(sharedFormat(['2160p60', '1080p60'], order)).toBe('1080p60')
    expect(sharedFormat([], order)).toBeNull()
    expect(sharedFormat(['4320p60'], order)).toBeNull()
  })

  it('takes the highest that every list has, or must not be shared', () => {
    expect(highestCommon([order, ['720p60', '2160p30']], order)).toBe('2160p30')
    expect(highestCommon([['720p60'], ['1080p60']], order)).toBeNull()
    expect(highestCommon([], order)).toBeNull()
  })
})
