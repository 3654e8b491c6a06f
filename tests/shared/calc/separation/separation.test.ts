import { describe, expect, it } from 'vitest'
import {
  circuitFactor,
  equivalentCircuits,
  separationEn2000Mm,
  separationEn50174Mm,
} from '../../../../shared/calc/separation/en50174.ts'
import { containments, segregationClasses } from '../../../../shared/calc/separation/en50174.table.ts'
import { isClearOfPower, powerWirings } from '../../../../shared/calc/separation/necSeparation.ts'
import { mayShareEnclosure } from '../../../../shared/calc/separation/sharedEnclosure.ts'
import { separationTia569In } from '../../../../shared/calc/separation/tia569.ts'
import { tia569Conditions } from '../../../../shared/calc/separation/tia569.table.ts'

describe('NEC 800.133', () => {
  it('keeps 2 in from single conductors only', () => {
    const clear = powerWirings.filter((power) => isClearOfPower({ power, gapMm: 0, hasNonconductor: false }))
    expect(clear).toEqual(powerWirings.filter((power) => power !== 'single conductors'))
    const open = { power: 'single conductors' as const, gapMm: 50.8, hasNonconductor: false }
    expect(isClearOfPower(open)).toBe(true)
    expect(isClearOfPower({ ...open, gapMm: 50.7 })).toBe(false)
    expect(isClearOfPower({ ...open, gapMm: 0, hasNonconductor: true })).toBe(true)
    expect(isClearOfPower({ ...open, gapMm: 0, isDataInRaceway: true })).toBe(true)
    expect(isClearOfPower({ ...open, gapMm: -1 })).toBeNull()
  })

  it('shares no box without a divider, but for the feed of the equipment', () => {
    expect(mayShareEnclosure('none')).toBe(false)
    expect(mayShareEnclosure('permanent barrier')).toBe(true)
    expect(mayShareEnclosure('listed divider')).toBe(true)
    expect(mayShareEnclosure('none', true)).toBe(true)
  })
})

describe('EN 50174-2', () => {
  it('has the factor of each band at both its ends (Swedish trade handbook 2017 p. 528)', () => {
    const ends = [1, 3, 4, 6, 7, 9, 10, 12, 13, 15, 16, 30, 31, 45, 46, 60, 61, 75, 76]
    expect(ends.map((circuits) => circuitFactor(circuits))).toEqual(
      [0.2, 0.2, 0.4, 0.4, 0.6, 0.6, 0.8, 0.8, 1, 1, 2, 2, 3, 3, 4, 4, 5, 5, 6],
    )
  })

  it('multiplies: 450 for class b on a ladder over 75 circuits, where the handbook slips to 400', () => {
    expect(separationEn50174Mm('b', 'open metal', 80)).toBe(450)
    expect(separationEn50174Mm('a', 'none', 15)).toBe(300)
    expect(separationEn50174Mm('d', 'none', 1)).toBe(2)
  })

  it('asks none inside solid metal, and less the better the cable or containment', () => {
    for (const segregation of segregationClasses) {
      const row = containments.map((containment) => separationEn50174Mm(segregation, containment, 15)!)
      expect(row).toEqual(row.toSorted((a, b) => b - a))
      expect(row.at(-1)).toBe(0)
    }
  })

  it('counts three-phase and heavy circuits as several', () => {
    expect(equivalentCircuits(1, 16)).toBe(1)
    expect(equivalentCircuits(3, 20)).toBe(3)
    expect(equivalentCircuits(3, 32)).toBe(6)
    expect(equivalentCircuits(1, 0)).toBeNull()
    expect(separationEn50174Mm('b', 'none', 0)).toBe(0)
    expect(separationEn50174Mm('b', 'none', -1)).toBeNull()
    expect(separationEn50174Mm('b', 'none', 1.5)).toBeNull()
  })

  it('has the table of its 2000 edition', () => {
    const dividers = ['none', 'aluminium', 'steel'] as const
    expect(dividers.map((divider) => separationEn2000Mm('unscreened', 'unscreened', divider))).toEqual([200, 100, 50])
    expect(dividers.map((divider) => separationEn2000Mm('unscreened', 'screened', divider))).toEqual([50, 20, 5])
    expect(dividers.map((divider) => separationEn2000Mm('screened', 'unscreened', divider))).toEqual([30, 10, 2])
    expect(dividers.map((divider) => separationEn2000Mm('screened', 'screened', divider))).toEqual([0, 0, 0])
  })
})

describe('EIA/TIA-569 (1990)', () => {
  it('has its table, with 2 and 5 kVA in the middle band', () => {
    const rows = tia569Conditions.map((condition) =>
      [1.9, 2, 5, 5.1].map((load) => separationTia569In(condition, load)),
    )
    expect(rows).toEqual([
      [5, 12, 12, 24],
      [2.5, 6, 6, 12],
      [null, 6, 6, 12],
      [40, 40, 40, 40],
      [12, 12, 12, 12],
    ])
    expect(separationTia569In('open-open', -1)).toBeNull()
  })
})
