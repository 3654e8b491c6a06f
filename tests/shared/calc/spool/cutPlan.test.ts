import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type CutPlanAsk, cutPlan } from '../../../../shared/calc/spool/cutPlan.ts'

const foot = 304.8
const box = { id: 'box', lengthMm: 304_800 }
const half = { id: 'half', lengthMm: 152_400 }
const runsOf = (...feet: number[]) =>
  feet.map((length, place) => ({ id: `r${place}`, lengthMm: Math.round(length * foot) }))
const ask = (change: Partial<CutPlanAsk>): CutPlanAsk => ({
  runs: [],
  putUps: [box],
  onHand: [],
  stubMm: 0,
  reserve: 0,
  ...change,
})

describe('a cut plan', () => {
  it('takes three boxes for nine runs of 210 ft', () => {
    const plan = cutPlan(ask({ runs: runsOf(...Array.from({ length: 9 }, () => 210)) }))!
    expect(plan.spools.map(({ runIds }) => runIds.length)).toEqual([4, 4, 1])
    expect(plan).toMatchObject({ boughtMm: 3 * 304_800, isProved: true, tooLong: [] })
  })

  it('buys the least length, and at the same length the fewest pieces', () => {
    expect(cutPlan(ask({ runs: runsOf(400), putUps: [box, half] }))!.spools.map(({ id }) => id)).toEqual(['half'])
    expect(cutPlan(ask({ runs: runsOf(450, 450), putUps: [half, box] }))!.spools.map(({ id }) => id)).toEqual(['box'])
    expect(cutPlan(ask({ runs: runsOf(900, 450, 40), putUps: [half, box] }))!.boughtMm).toBe(457_200)
  })

  it('uses what is on hand before it buys', () => {
    const plan = cutPlan(ask({ runs: runsOf(100, 90), onHand: [{ id: 's7', leftMm: 61_000 }] }))!
    expect(plan.boughtMm).toBe(0)
    expect(plan.spools).toMatchObject([{ id: 's7', isBought: false, cutMm: 57_912, leftMm: 3088 }])
  })

  it('keeps a stub and a reserve', () => {
    const runs = runsOf(250, 250, 250, 250)
    expect(cutPlan(ask({ runs }))!.spools).toHaveLength(1)
    expect(cutPlan(ask({ runs, stubMm: 3048 }))!.spools).toHaveLength(2)
    expect(cutPlan(ask({ runs, reserve: 0.05 }))!.spools).toHaveLength(2)
  })

  it('names runs that no spool holds, and plans the others', () => {
    const plan = cutPlan(ask({ runs: runsOf(1001, 20) }))!
    expect(plan.tooLong).toEqual(['r0'])
    expect(plan.spools.flatMap(({ runIds }) => runIds)).toEqual(['r1'])
  })

  it('is empty without runs, and all too long without spools', () => {
    expect(cutPlan(ask({}))).toEqual({ spools: [], tooLong: [], boughtMm: 0, isProved: true })
    expect(cutPlan(ask({ runs: runsOf(10), putUps: [] }))).toMatchObject({ tooLong: ['r0'], spools: [] })
  })

  it('is unknown for lengths that are none', () => {
    expect(cutPlan(ask({ runs: [{ id: 'x', lengthMm: 0 }] }))).toBeNull()
    expect(cutPlan(ask({ putUps: [{ id: 'x', lengthMm: Number.NaN }] }))).toBeNull()
    expect(cutPlan(ask({ reserve: 1 }))).toBeNull()
    expect(cutPlan(ask({ stubMm: -1 }))).toBeNull()
    expect(cutPlan(ask({ onHand: [{ id: 'x', leftMm: -1 }] }))).toBeNull()
  })

  it('cuts each run once, overfills no spool, and never buys more than one box a run', () => {
    const run = fc.integer({ min: 3000, max: 160_000 })
    const onHand = fc.array(fc.integer({ min: 0, max: 300_000 }), { maxLength: 3 })
    fc.assert(
      fc.property(fc.array(run, { maxLength: 25 }), onHand, (lengths, left) => {
        const runs = lengths.map((lengthMm, place) => ({ id: `r${place}`, lengthMm }))
        const plan = cutPlan(
          ask({
            runs,
            putUps: [box, half],
            onHand: left.map((leftMm, place) => ({ id: `s${place}`, leftMm })),
            stubMm: 3000,
            effort: 500_000,
          }),
        )!
        expect(
          plan.spools
            .flatMap(({ runIds }) => runIds)
            .concat(plan.tooLong)
            .toSorted(),
        ).toEqual(runs.map(({ id }) => id).toSorted())
        for (const spool of plan.spools) {
          expect(spool.cutMm).toBe(
            spool.runIds.reduce((sum, id) => sum + (runs.find((one) => one.id === id)?.lengthMm ?? 0), 0),
          )
          expect(spool.cutMm + 3000).toBeLessThanOrEqual(spool.lengthMm)
          expect(spool.leftMm).toBe(spool.lengthMm - spool.cutMm)
        }
        expect(new Set(plan.spools.filter(({ isBought }) => !isBought).map(({ id }) => id)).size).toBe(
          plan.spools.filter(({ isBought }) => !isBought).length,
        )
        expect(plan.boughtMm).toBeLessThanOrEqual(lengths.length * box.lengthMm)
      }),
      { numRuns: 60 },
    )
  })
})
