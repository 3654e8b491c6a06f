import FlatQueue from 'flatqueue'
import type { Point } from '../model/fields.ts'
import type { Pathway } from '../model/place.ts'

/** One floor's route plane: how high cables run there over the job's datum, mm. */
export type PlaneOf = (levelId: string) => number

export interface Stop {
  readonly levelId: string
  readonly at: Point
}

export interface Way {
  readonly alongMm: number
  /** Chases passed, in order. */
  readonly pathwayIds: readonly string[]
}

/** Along framing: |dx| + |dy|. */
export const along = (a: Point, b: Point): number => Math.abs(a.xMm - b.xMm) + Math.abs(a.yMm - b.yMm)

/**
 * The shortest way between two stops on different levels through chases: along the framing on a level, straight through
 * a chase. Null when no chain of chases joins the levels.
 */
export function shortestWay(from: Stop, to: Stop, chases: readonly Pathway[], planeOf: PlaneOf): Way | null {
  // A node is one mouth of a chase: chase and level. The queue holds the distance walked to reach it.
  const mouths = chases.flatMap((chase, index) => [{ chase, index, levelId: chase.bottomLevelId, other: chase.topLevelId }, { chase, index, levelId: chase.topLevelId, other: chase.bottomLevelId }])
  const best = new Map<number, { mm: number; from: number | null }>()
  const queue = new FlatQueue<number>()
  const reach = (node: number, mm: number, before: number | null) => {
    const known = best.get(node)
    if (known && known.mm <= mm) return
    best.set(node, { mm, from: before })
    queue.push(node, mm)
  }
  mouths.forEach((mouth, node) => mouth.levelId === from.levelId && reach(node, along(from.at, mouth.chase.at), null))
  let end: { node: number; mm: number } | null = null
  while (queue.length) {
    const mm = queue.peekValue()!
    const node = queue.pop()!
    if (mm > best.get(node)!.mm) continue
    if (end && mm >= end.mm) break
    const mouth = mouths[node]!
    const far = node ^ 1
    const through = mm + Math.abs(planeOf(mouth.levelId) - planeOf(mouth.other))
    const known = best.get(far)
    if (!known || known.mm > through) {
      best.set(far, { mm: through, from: node })
      if (mouth.other === to.levelId && (!end || through + along(mouth.chase.at, to.at) < end.mm)) end = { node: far, mm: through + along(mouth.chase.at, to.at) }
      mouths.forEach((next, other) => other !== far && next.levelId === mouth.other && next.index !== mouth.index && reach(other, through + along(mouth.chase.at, next.chase.at), far))
    }
  }
  if (!end) return null
  const passed: string[] = []
  for (let node: number | null = end.node; node !== null; node = best.get(node)!.from) {
    const { id } = mouths[node]!.chase
    if (passed[0] !== id) passed.unshift(id)
  }
  return { alongMm: end.mm, pathwayIds: passed }
}

/** The way through chases that were chosen, in order, each entered by the mouth on the level where one is. Null when one does not begin there. */
export function chosenWay(from: Stop, to: Stop, chases: readonly Pathway[], planeOf: PlaneOf): Way | null {
  let at = from
  let alongMm = 0
  for (const chase of chases) {
    const other = chase.bottomLevelId === at.levelId ? chase.topLevelId : chase.topLevelId === at.levelId ? chase.bottomLevelId : null
    if (other === null) return null
    alongMm += along(at.at, chase.at) + Math.abs(planeOf(at.levelId) - planeOf(other))
    at = { levelId: other, at: chase.at }
  }
  return at.levelId === to.levelId ? { alongMm: alongMm + along(at.at, to.at), pathwayIds: chases.map((chase) => chase.id) } : null
}
