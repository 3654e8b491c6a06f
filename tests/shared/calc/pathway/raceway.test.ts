import { describe, expect, it } from 'vitest'
import {
  entAlternativeAreasIn2,
  racewayKinds,
  racewayTable,
  tradeSizes,
} from '../../../../shared/calc/pathway/raceway.table.ts'
import { boreAreaIn2, racewayBore, smallestBore } from '../../../../shared/calc/pathway/racewayBore.ts'

describe('raceway table (NEC Chapter 9 Table 4)', () => {
  it.each(racewayKinds)('%s: each area is that of its diameter, and sizes rise', (kind) => {
    const rows = [...racewayTable[kind]]
    for (const [size, { areaIn2, diameterIn }] of rows)
      expect(Math.abs(boreAreaIn2(diameterIn)! - areaIn2), size).toBeLessThan(0.003)
    const order = rows.map(([size]) => tradeSizes.indexOf(size))
    expect(order).toEqual(order.toSorted((a, b) => a - b))
    const areas = rows.map(([, { areaIn2 }]) => areaIn2)
    expect(areas).toEqual(areas.toSorted((a, b) => a - b))
  })

  it('has the sizes that each kind is made in', () => {
    expect(Object.fromEntries(racewayKinds.map((kind) => [kind, racewayTable[kind].size]))).toEqual({
      EMT: 10, ENT: 6, PVC40: 10, PVC80: 10, FMC: 11, 'LFNC-B': 7, 'LFNC-A': 7, LFMC: 11,
    })
    expect(racewayBore('ENT', '3')).toBeNull()
    expect(racewayBore('FMC', '3-1/2')).toEqual({ areaIn2: 9.621, diameterIn: 3.5 })
  })

  it('judges ENT by the smaller of the two remembered sets', () => {
    for (const [size, area] of entAlternativeAreasIn2) expect(racewayBore('ENT', size)!.areaIn2).toBeLessThan(area)
  })

  it('finds the smallest bore', () => {
    expect(smallestBore('EMT', 1)).toBe('1')
    expect(smallestBore('EMT', 5)).toBeNull()
    expect(smallestBore('EMT', Number.NaN)).toBeNull()
    expect(boreAreaIn2(0)).toBeNull()
  })
})
