import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { along, chosenWay, shortestWay, type Stop } from '../../../shared/routing/chaseGraph.ts'
import type { Pathway } from '../../../shared/model/place.ts'
import { buildPathway } from '../../support/build.ts'

const planeOf = (levelId: string) => Number(levelId) * 3000
const point = fc.record({ xMm: fc.integer({ min: 0, max: 20_000 }), yMm: fc.integer({ min: 0, max: 20_000 }) })
const level = fc.integer({ min: 0, max: 3 }).map(String)
const chases = fc.array(fc.record({ at: point, bottomLevelId: level, topLevelId: level }).filter((each) => each.bottomLevelId !== each.topLevelId), { maxLength: 5 }).map((all) => all.map((each, i) => buildPathway({ id: `w${i}`, ...each })))

/** Every order of every choice of chases, tried one by one. */
function bruteForce(from: Stop, to: Stop, all: readonly Pathway[]): number | null {
  let best: number | null = null
  const step = (chosen: readonly Pathway[]) => {
    const way = chosen.length ? chosenWay(from, to, chosen, planeOf) : null
    if (way && (best === null || way.alongMm < best)) best = way.alongMm
    for (const next of all) if (!chosen.includes(next)) step([...chosen, next])
  }
  step([])
  return best
}

describe('the way between levels', () => {
  it('is as short as the best of all chains of chases', () => {
    fc.assert(
      fc.property(point, point, level, level, chases, (a, b, from, to, all) => {
        fc.pre(from !== to)
        const [start, end] = [{ levelId: from, at: a }, { levelId: to, at: b }]
        expect(shortestWay(start, end, all, planeOf)?.alongMm ?? null).toBe(bruteForce(start, end, all))
      }),
      { numRuns: 300 },
    )
  })
  it('passes the chases it names: walking them again gives the same length', () => {
    fc.assert(
      fc.property(point, point, level, level, chases, (a, b, from, to, all) => {
        fc.pre(from !== to)
        const [start, end] = [{ levelId: from, at: a }, { levelId: to, at: b }]
        const way = shortestWay(start, end, all, planeOf)
        fc.pre(way !== null)
        const named = way!.pathwayIds.map((id) => all.find((chase) => chase.id === id)!)
        expect(chosenWay(start, end, named, planeOf)?.alongMm).toBe(way!.alongMm)
      }),
      { numRuns: 300 },
    )
  })
  it('is never shorter than along the framing and up', () => {
    fc.assert(
      fc.property(point, point, chases, (a, b, all) => {
        const way = shortestWay({ levelId: '0', at: a }, { levelId: '2', at: b }, all, planeOf)
        expect(way === null || way.alongMm >= along(a, b) + 6000).toBe(true)
      }),
    )
  })
})
