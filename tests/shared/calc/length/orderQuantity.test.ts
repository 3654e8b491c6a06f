import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { boxesByRuns, boxesByTotal } from '../../../../shared/calc/length/boxCount.ts'
import { isWithinLink } from '../../../../shared/calc/length/linkLimit.ts'
import {
  orderLengthMm,
  outsidePlantLengthMm,
  roundUpToStepMm,
  usualWaste,
} from '../../../../shared/calc/length/orderQuantity.ts'
import { bicsiSlack, residentialSlack } from '../../../../shared/calc/length/slack.table.ts'
import { storedSlackMm } from '../../../../shared/calc/length/storedSlack.ts'

const foot = 304.8

describe('what is ordered', () => {
  it('adds waste and rounds up to whole steps', () => {
    expect(orderLengthMm(63.6667 * foot, usualWaste.residential, foot)! / foot).toBeCloseTo(67, 9)
    expect(orderLengthMm(0, 0.05, foot)).toBe(0)
  })

  it('does not round a whole number up for the noise of floating point', () => {
    expect(orderLengthMm(100, 0.1, 1)).toBe(110)
    expect(roundUpToStepMm(5 * foot, foot)! / foot).toBeCloseTo(5, 9)
  })

  it('refuses negative waste and steps of nothing', () => {
    expect(orderLengthMm(100, -0.1, 1)).toBeNull()
    expect(orderLengthMm(100, 0.1, 0)).toBeNull()
    expect(roundUpToStepMm(-1, 5)).toBeNull()
  })

  it('adds 10 % and 3 m at each end outside (MIL-HDBK-1012/3)', () => {
    expect(outsidePlantLengthMm(120_000, 6000, usualWaste.outsidePlant)).toBeCloseTo(138_600, 6)
  })

  it('is never less than what is needed and never a step too much', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1e6 }), fc.integer({ min: 1, max: 5000 }), (length, step) => {
        const ordered = roundUpToStepMm(length, step)!
        expect(ordered).toBeGreaterThanOrEqual(length)
        expect(ordered - length).toBeLessThan(step)
      }),
    )
  })
})

describe('boxes', () => {
  it('are three for nine runs of 210 ft, though total footage says two', () => {
    expect(boxesByRuns(1000, 210, 9)).toBe(3)
    expect(boxesByTotal(1000, 210, 9)).toBe(2)
  })

  it('cannot be counted when one run is longer than a box', () => {
    expect(boxesByRuns(250, 262, 1)).toBeNull()
  })

  it('are never fewer by runs than by total', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1000 }), fc.integer({ min: 0, max: 200 }), (run, runs) => {
        expect(boxesByRuns(1000, run, runs)!).toBeGreaterThanOrEqual(boxesByTotal(1000, run, runs)!)
      }),
    )
  })
})

describe('slack', () => {
  it('is 3.3 m for twisted pair and 4 m for fibre, both ends together (BICSI TDMM 1996)', () => {
    expect(storedSlackMm('twisted pair')).toBe(3300)
    expect(storedSlackMm('optical fibre')).toBe(4000)
    expect(bicsiSlack['twisted pair'].atOutletMm).toBe(300)
    expect(residentialSlack.atHeadMm + residentialSlack.atOutletMm).toBe(1100)
  })

  it('counts against the 90 m of the permanent link', () => {
    expect(isWithinLink(86_000, 4000)).toBe(true)
    expect(isWithinLink(86_000, 4001)).toBe(false)
    expect(isWithinLink(90_001, 0)).toBe(false)
    expect(isWithinLink(-1, 0)).toBeNull()
  })
})
