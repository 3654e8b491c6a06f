import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  bestFitDecreasing,
  firstFitDecreasing,
  firstFitGuarantee,
} from '../../../../shared/calc/spool/firstFitDecreasing.ts'
import { leastSpools } from '../../../../shared/calc/spool/leastSpools.ts'
import { packSpools } from '../../../../shared/calc/spool/packSpools.ts'
import { isTooLong } from '../../../../shared/calc/spool/isTooLong.ts'
import { fewestSpools, spoolsByMartelloToth, spoolsByTotal } from '../../../../shared/calc/spool/spoolBounds.ts'

interface PublishedInstance {
  inputs: { instance?: string; capacity: number; items: number[] }
}
const rows = JSON.parse(readFileSync('fixtures/checks/cabling.json', 'utf8')) as PublishedInstance[]
const sum = (lengths: readonly number[]) => lengths.reduce((total, length) => total + length, 0)
const sorted = (lengths: readonly number[]) => lengths.toSorted((a, b) => a - b)

/** Fewest bins by trying every assignment: slow, and independent of the search. */
function byTryingAll(lengths: readonly number[], capacity: number): number {
  let best = lengths.length
  const rooms: number[] = []
  const place = (at: number): void => {
    if (rooms.length >= best) return
    const length = lengths[at]
    if (length === undefined) {
      best = rooms.length
      return
    }
    rooms.forEach((room, spool) => {
      if (room < length) return
      rooms[spool] = room - length
      place(at + 1)
      rooms[spool] = room
    })
    rooms.push(capacity - length)
    place(at + 1)
    rooms.pop()
  }
  place(0)
  return best
}

const few = fc.array(fc.integer({ min: 1, max: 30 }), { maxLength: 9 })
const many = fc.array(fc.integer({ min: 1, max: 100 }), { maxLength: 60 })

describe('fewest equal spools', () => {
  it('is what trying every assignment finds', () => {
    fc.assert(
      fc.property(few, (lengths) => {
        const found = leastSpools(lengths, 30)!
        expect(found.isProved).toBe(true)
        expect(found.spools).toHaveLength(byTryingAll(lengths, 30))
      }),
      { numRuns: 300 },
    )
  })

  it('cuts every piece once and no spool beyond its length', () => {
    fc.assert(
      fc.property(many, (lengths) => {
        const { spools, fewest } = leastSpools(lengths, 100, 200_000)!
        expect(sorted(spools.flat())).toEqual(sorted(lengths))
        expect(spools.every((spool) => sum(spool) <= 100)).toBe(true)
        expect(fewest).toBeLessThanOrEqual(spools.length)
      }),
    )
  })

  it('proves 18 where bounds by length say 17: fifty pieces, three to a spool, one spool with two', () => {
    // Of the class "mean a third of the spool, 20 % either way" (Scholl, Klein, Juergens), made for this test: 14 full
    // spools of three and four of two.
    const of = (length: number, pieces: number) => Array.from<number>({ length: pieces }).fill(length)
    const lengths = [...of(400, 14), ...of(330, 14), ...of(270, 14), ...of(370, 8)]
    expect(spoolsByTotal(lengths, 1000)).toBe(17)
    expect(spoolsByMartelloToth(lengths, 1000)).toBe(17)
    expect(fewestSpools(lengths, 1000)).toBe(18)
    expect(leastSpools(lengths, 1000)).toMatchObject({ fewest: 18, isProved: true })
  })

  it('says so when it gave up', () => {
    const row = rows.find(({ inputs }) => inputs.instance === 't60_00')!
    const hurried = leastSpools(row.inputs.items, row.inputs.capacity, 1)!
    expect(hurried.spools.length - hurried.fewest).toBeGreaterThan(0)
    expect(hurried.isProved).toBe(false)
  })

  it('is none for no pieces, and unknown for pieces that cannot be cut', () => {
    expect(leastSpools([], 100)).toEqual({ spools: [], fewest: 0, isProved: true })
    expect(leastSpools([101], 100)).toBeNull()
    expect(leastSpools([0], 100)).toBeNull()
    expect(leastSpools([Number.NaN], 100)).toBeNull()
    expect(leastSpools([1], Infinity)).toBeNull()
  })
})

describe('bounds and heuristics', () => {
  it('stand in order: L1, L2, all bounds, the fewest, first and best fit', () => {
    fc.assert(
      fc.property(few, (lengths) => {
        const fewest = byTryingAll(lengths, 30)
        const l1 = spoolsByTotal(lengths, 30)!
        const l2 = spoolsByMartelloToth(lengths, 30)!
        expect(l1).toBeLessThanOrEqual(l2)
        expect(l2).toBeLessThanOrEqual(fewestSpools(lengths, 30)!)
        expect(fewestSpools(lengths, 30)!).toBeLessThanOrEqual(fewest)
        expect(firstFitDecreasing(lengths, 30)!.length).toBeGreaterThanOrEqual(fewest)
        expect(firstFitDecreasing(lengths, 30)!.length).toBeLessThanOrEqual(firstFitGuarantee(fewest)!)
        expect(bestFitDecreasing(lengths, 30)!.length).toBeGreaterThanOrEqual(fewest)
      }),
      { numRuns: 300 },
    )
  })

  it('see that six pieces over half need six spools', () => {
    expect(spoolsByTotal([51, 51, 51, 51, 51, 51], 100)).toBe(4)
    expect(spoolsByMartelloToth([51, 51, 51, 51, 51, 51], 100)).toBe(6)
  })

  it('know how far first fit can miss (Dosa 2007)', () => {
    expect([1, 2, 5, 6, 10].map(firstFitGuarantee)).toEqual([1, 3, 6, 8, 12])
    expect(firstFitGuarantee(1.5)).toBeNull()
  })

  it('find a run that no put-up holds', () => {
    expect(isTooLong(262, 250)).toBe(true)
    expect(isTooLong(250, 250)).toBe(false)
    expect(isTooLong(Number.NaN, 250)).toBeNull()
  })
})

describe('given spools of several lengths', () => {
  it('are packed when trying everything can, and only then', () => {
    const fits = (lengths: readonly number[], rooms: number[]): boolean => {
      const [length, ...rest] = lengths
      if (length === undefined) return true
      return rooms.some((room, spool) => room >= length && fits(rest, rooms.with(spool, room - length)))
    }
    const capacities = fc.array(fc.integer({ min: 5, max: 40 }), { minLength: 1, maxLength: 4 })
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 25 }), { maxLength: 8 }), capacities, (lengths, rooms) => {
        const packing = packSpools(lengths, rooms, 1_000_000)
        expect(packing.outcome).toBe(fits(lengths, rooms) ? 'packed' : 'impossible')
        if (packing.outcome === 'packed')
          expect(packing.spools.every((spool) => sum(spool.lengths) <= spool.capacity)).toBe(true)
      }),
      { numRuns: 500 },
    )
  })
})
