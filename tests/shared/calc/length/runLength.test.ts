import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { averagedTotalMm, averagingDefaults } from '../../../../shared/calc/length/averageLength.ts'
import { framingDetour } from '../../../../shared/calc/length/framingDetour.ts'
import { overheadLengthMm } from '../../../../shared/calc/length/overheadLength.ts'
import { storeyLengthMm } from '../../../../shared/calc/length/storeyLength.ts'
import { underfloorLengthMm } from '../../../../shared/calc/length/underfloorLength.ts'
import { framedWallHeightIn, precutStudsIn } from '../../../../shared/calc/length/wallHeight.ts'

const overhead = {
  alongXMm: 7315,
  alongYMm: -4877,
  ceilingHeightMm: 2743,
  boxHeightMm: 406,
  headHeightMm: 1219,
  slackBoxMm: 305,
  slackHeadMm: 3048,
}
const length = fc.integer({ min: 0, max: 100_000 })

describe('a run over the ceiling', () => {
  it('adds way, rise, drop and slack, whichever way it goes', () => {
    expect(overheadLengthMm(overhead)).toBe(7315 + 4877 + (2743 - 406) + (2743 - 1219) + 305 + 3048)
    expect(overheadLengthMm({ ...overhead, alongXMm: -7315, alongYMm: 4877 })).toBe(overheadLengthMm(overhead))
  })

  it('climbs over the plates at both ends', () => {
    expect(overheadLengthMm({ ...overhead, overheadMm: 150 })).toBe(overheadLengthMm(overhead)! + 300)
  })

  it('still has both rises and both slacks between back-to-back boxes', () => {
    expect(overheadLengthMm({ ...overhead, alongXMm: 0, alongYMm: 0 })).toBe(2337 + 1524 + 305 + 3048)
  })

  it('is unknown when an end is above the ceiling', () => {
    expect(overheadLengthMm({ ...overhead, boxHeightMm: 2744 })).toBeNull()
    expect(overheadLengthMm({ ...overhead, slackBoxMm: -1 })).toBeNull()
  })

  it('never gets shorter with more slack or distance', () => {
    fc.assert(
      fc.property(length, length, (more, slack) => {
        const longer = overheadLengthMm({
          ...overhead,
          alongXMm: overhead.alongXMm + more,
          slackBoxMm: overhead.slackBoxMm + slack,
        })
        expect(longer).toBe(overheadLengthMm(overhead)! + more + slack)
      }),
    )
  })
})

describe('other ways', () => {
  const under = {
    alongXMm: 3000,
    alongYMm: 2000,
    boxHeightMm: 400,
    headHeightMm: 1200,
    floorThicknessMm: 300,
    slackBoxMm: 300,
    slackHeadMm: 3000,
  }
  const storey = {
    alongXMm: 3000,
    alongYMm: 0,
    lowerCeilingHeightMm: 2440,
    headHeightMm: 1500,
    floorDepthMm: 300,
    upperBoxHeightMm: 400,
    slackBoxMm: 300,
    slackHeadMm: 3000,
  }

  it('goes down both walls and through the floor twice', () => {
    expect(underfloorLengthMm(under)).toBe(3000 + 2000 + 400 + 1200 + 600 + 300 + 3000)
    expect(underfloorLengthMm({ ...under, boxHeightMm: -1 })).toBeNull()
  })

  it('adds a floor for the next storey, and a wall and a floor for each passed by', () => {
    expect(storeyLengthMm(storey)).toBe(3000 + 940 + 300 + 400 + 3300)
    expect(storeyLengthMm({ ...storey, passedWallHeightsMm: [2700] })).toBe(storeyLengthMm(storey)! + 3000)
    expect(storeyLengthMm({ ...storey, headHeightMm: 2441 })).toBeNull()
  })

  it('is up to 1.414 times the straight line, and never less', () => {
    expect(framingDetour(5, 5)).toBeCloseTo(Math.SQRT2, 12)
    expect(framingDetour(5, 0)).toBe(1)
    expect(framingDetour(0, 0)).toBeNull()
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: -1e6, max: 1e6 }), (x, y) => {
        const detour = framingDetour(x, y)!
        expect(detour).toBeGreaterThanOrEqual(1 - 1e-12)
        expect(detour).toBeLessThanOrEqual(Math.SQRT2 + 1e-12)
      }),
    )
  })
})

describe('a house as a whole', () => {
  it('averages the shortest and longest run (Residential Cabling Guide: 12 runs of 6 to 24 m take 247.2 m)', () => {
    expect(averagedTotalMm({ shortestMm: 6000, longestMm: 24_000, ...averagingDefaults, runs: 12 })).toBe(247_200)
  })

  it('refuses a longest below the shortest and parts of runs', () => {
    expect(averagedTotalMm({ shortestMm: 6000, longestMm: 5000, ...averagingDefaults, runs: 12 })).toBeNull()
    expect(averagedTotalMm({ shortestMm: 6000, longestMm: 7000, ...averagingDefaults, runs: 1.5 })).toBeNull()
  })

  it('gives walls of 97-1/8 and 109-1/8 in from precut studs and three plates', () => {
    expect(framedWallHeightIn(precutStudsIn.eightFoot, 3)).toBe(97.125)
    expect(framedWallHeightIn(precutStudsIn.nineFoot, 3)).toBe(109.125)
    expect(framedWallHeightIn(0, 3)).toBeNull()
    expect(framedWallHeightIn(92.625, 2.5)).toBeNull()
  })
})
