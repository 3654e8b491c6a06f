import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { memberKinds, sawnDepthsIn } from '../../../../shared/calc/framing/framing.table.ts'
import { isJoistHoleClear, largestJoistHoleIn } from '../../../../shared/calc/framing/joistHole.ts'
import { isInMiddleThird, largestJoistNotch } from '../../../../shared/calc/framing/joistNotch.ts'
import { needsNailPlate, needsPlateAlong } from '../../../../shared/calc/framing/nailPlate.ts'
import { deepestStudNotchIn, largestStudHoleIn } from '../../../../shared/calc/framing/studHole.ts'

describe('studs (IRC R602.6)', () => {
  it('take a hole of 40 % when bearing, 60 % when not', () => {
    expect(largestStudHoleIn({ depthIn: 3.5, isBearing: true })).toBeCloseTo(1.4, 9)
    expect(largestStudHoleIn({ depthIn: 5.5, isBearing: true })).toBeCloseTo(2.2, 9)
    expect(largestStudHoleIn({ depthIn: 3.5, isBearing: false })).toBeCloseTo(2.1, 9)
    expect(largestStudHoleIn({ depthIn: 5.5, isBearing: false })).toBeCloseTo(3.3, 9)
  })

  it('keep 5/8 in at each edge', () => {
    expect(largestStudHoleIn({ depthIn: 2.5, isBearing: false })).toBeCloseTo(1.25, 9)
    expect(largestStudHoleIn({ depthIn: 1.25, isBearing: false })).toBeNull()
    fc.assert(
      fc.property(fc.double({ min: 1.3, max: 12, noNaN: true }), fc.boolean(), (depthIn, isBearing) => {
        expect((depthIn - largestStudHoleIn({ depthIn, isBearing })!) / 2).toBeGreaterThanOrEqual(0.625 - 1e-9)
      }),
    )
  })

  it('take a notch of 25 % when bearing, 40 % when not', () => {
    expect(deepestStudNotchIn({ depthIn: 3.5, isBearing: true })).toBe(0.875)
    expect(deepestStudNotchIn({ depthIn: 3.5, isBearing: false })).toBeCloseTo(1.4, 9)
  })
})

describe('joists (IRC R502.8.1)', () => {
  it('take a third of their depth, but keep 2 in: 1.5 in in a 2x6, where lists print 1-13/16', () => {
    const holes = Object.values(sawnDepthsIn).map((depth) => largestJoistHoleIn(depth))
    expect(holes).toEqual([null, 1.5, expect.closeTo(2.4167, 4), expect.closeTo(3.0833, 4), 3.75])
  })

  it('take a notch of a sixth, a quarter at the end, a third long, none in the middle third', () => {
    expect(largestJoistNotch(9.25)!.depthIn).toBeCloseTo(1.5417, 4)
    expect(largestJoistNotch(9.25, true)!.depthIn).toBeCloseTo(2.3125, 4)
    expect(largestJoistNotch(9.25)!.lengthIn).toBeCloseTo(3.0833, 4)
    expect(isInMiddleThird(1500, 3000)).toBe(true)
    expect(isInMiddleThird(1000, 3000)).toBe(false)
    expect(isInMiddleThird(4000, 3000)).toBeNull()
  })

  it('keep 2 in between holes', () => {
    expect(isJoistHoleClear(2)).toBe(true)
    expect(isJoistHoleClear(1.9)).toBe(false)
    expect(isJoistHoleClear(-1)).toBeNull()
  })
})

describe('engineered members', () => {
  it.each(memberKinds.filter((member) => member !== 'sawn'))('get no number: %s goes by its maker', (member) => {
    expect(largestJoistHoleIn(11.875, member)).toBeNull()
    expect(largestJoistNotch(11.875, false, member)).toBeNull()
    expect(largestStudHoleIn({ member, depthIn: 5.5, isBearing: false })).toBeNull()
    expect(deepestStudNotchIn({ member, depthIn: 5.5, isBearing: false })).toBeNull()
  })
})

describe('nail plates (NEC 300.4)', () => {
  it('are not needed for 1 in centred in a 2x4, and are for 1-1/8 in', () => {
    expect(needsNailPlate(3.5, 1)).toBe(false)
    expect(needsNailPlate(3.5, 1.125)).toBe(true)
  })

  it('are needed sooner for a hole off centre', () => {
    expect(needsNailPlate(3.5, 0.75, 0.25)).toBe(true)
    expect(needsNailPlate(3.5, 0.75, -0.125)).toBe(false)
  })

  it('cannot be judged for a hole wider than the stud', () => {
    expect(needsNailPlate(3.5, 4)).toBeNull()
    expect(needsNailPlate(3.5, 0)).toBeNull()
  })

  it('protect a cable along a stud nearer than 1-1/4 in to its face', () => {
    expect(needsPlateAlong(1.25)).toBe(false)
    expect(needsPlateAlong(1.2)).toBe(true)
    expect(needsPlateAlong(-1)).toBeNull()
  })
})
