import { describe, expect, it } from 'vitest'
import { crewDays, factoredHours, hoursByLength, labourHours } from '../../../../shared/calc/labour/labourHours.ts'
import { labourFactors, labourUnits } from '../../../../shared/calc/labour/labourUnit.table.ts'

describe('labour', () => {
  it('adds tasks up', () => {
    const lines = [labourUnits.drillAndPull, labourUnits.extraCable, labourUnits.terminateAndTest]
    expect(labourHours(lines.map(({ hours }) => ({ quantity: 20, hoursEach: hours })))).toBeCloseTo(18, 9)
    expect(labourHours([])).toBe(0)
    expect(labourHours([{ quantity: -1, hoursEach: 1 }])).toBeNull()
  })

  it('multiplies by every factor', () => {
    expect(factoredHours(10, labourFactors.upperFloor)).toBe(12.5)
    expect(factoredHours(10, 2, 1.25)).toBe(25)
    expect(factoredHours(10)).toBe(10)
    expect(factoredHours(10, -1)).toBeNull()
  })

  it('counts by length', () => {
    expect(hoursByLength(1800 * 304.8, labourUnits.pullByLength.hours)).toBeCloseTo(14.4, 9)
    expect(hoursByLength(-1, 8)).toBeNull()
  })

  it('takes whole days of a crew', () => {
    expect(crewDays(50, 2)).toBe(4)
    expect(crewDays(48, 2)).toBe(3)
    expect(crewDays(0, 2)).toBe(0)
    expect(crewDays(10, 0)).toBeNull()
    expect(crewDays(10, 1.5)).toBeNull()
  })
})
