import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fiveDigitCounter, markDifference, pulledLengthMm } from '../../../../shared/calc/length/jacketMarks.ts'
import { markDoubts } from '../../../../shared/calc/length/markPlausibility.ts'
import { readMark } from '../../../../shared/calc/length/remainingMark.ts'

describe('jacket marks', () => {
  it('give the same length whichever way they run', () => {
    expect(markDifference(874, 731, null)).toBe(143)
    expect(markDifference(731, 874, null)).toBe(143)
  })

  it('go the short way round a counter that rolled over', () => {
    expect(markDifference(99_950, 120, fiveDigitCounter)).toBe(170)
    expect(markDifference(120, 99_950, fiveDigitCounter)).toBe(170)
    expect(markDifference(100_000, 5, fiveDigitCounter)).toBeNull()
  })

  it('count metres on a metre reel', () => {
    expect(pulledLengthMm({ start: 212, end: 187, unit: 'm', counter: null })).toBe(25_000)
    expect(pulledLengthMm({ start: 212, end: 187, unit: 'ft', counter: null })).toBe(7620)
  })

  it('are never more than half a counter apart', () => {
    const mark = fc.integer({ min: 0, max: fiveDigitCounter - 1 })
    fc.assert(fc.property(mark, mark, (a, b) => markDifference(a, b, fiveDigitCounter)! <= fiveDigitCounter / 2))
  })

  it('cannot be negative', () => {
    expect(markDifference(-1, 5, null)).toBeNull()
    expect(markDifference(Number.NaN, 5, null)).toBeNull()
  })
})

describe('doubts about marks', () => {
  const run = { leastMm: 20_000, estimateMm: 25_000, putUpMm: 304_800 }
  const marks = (feet: number) => ({ start: 900, end: 900 - feet, unit: 'ft' as const, counter: null })

  it('are none for a length that fits', () => {
    expect(markDoubts(marks(80), run)).toEqual([])
  })

  it('name what is odd', () => {
    expect(markDoubts(marks(0), run)).toEqual(['same mark'])
    expect(markDoubts(marks(60), run)).toEqual(['shorter than the way'])
    expect(markDoubts(marks(400), run)).toEqual(['much longer than the way'])
    expect(markDoubts({ start: 0, end: 1100, unit: 'ft', counter: null }, run)).toEqual([
      'longer than the put-up',
      'much longer than the way',
    ])
  })

  it('allow for marks that stand every two feet', () => {
    expect(markDoubts(marks(64), run)).toEqual([])
  })

  it('do without what is not known', () => {
    expect(markDoubts(marks(400), { leastMm: null, estimateMm: null, putUpMm: null })).toEqual([])
    expect(markDoubts({ start: -1, end: 0, unit: 'ft', counter: null }, run)).toBeNull()
  })
})

describe('a printed mark', () => {
  it('reads as number and unit', () => {
    expect(readMark('000750 FT', 'm')).toEqual({ value: 750, unit: 'ft' })
    expect(readMark('0212m', 'ft')).toEqual({ value: 212, unit: 'm' })
    expect(readMark(' 750 ', 'ft')).toEqual({ value: 750, unit: 'ft' })
  })

  it('is nothing when it is no length', () => {
    expect(readMark('SN 4711', 'ft')).toBeNull()
    expect(readMark('750 KG', 'ft')).toBeNull()
    expect(readMark('', 'ft')).toBeNull()
  })
})
