import type { RiserLayout, TagBox } from '../../src/features/riser/layout/riserLayout.ts'

interface Segment {
  readonly x0: number
  readonly y0: number
  readonly x1: number
  readonly y1: number
}

const points = (path: string) => [...path.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map((match) => ({ x: Number(match[1]), y: Number(match[2]) }))

/** The straight stretches of a trunk, and the level or upright one in which the run leaves it. */
function segmentsOf(trunk: string, drop: string): Segment[] {
  const way = points(trunk)
  const segments = way.slice(1).map((to, index) => ({ x0: way[index]!.x, y0: way[index]!.y, x1: to.x, y1: to.y }))
  const tail = points(drop)
  const upright = tail.slice(1).map((to, index) => ({ x0: tail[index]!.x, y0: tail[index]!.y, x1: to.x, y1: to.y })).find((each) => each.x0 === each.x1)
  return upright ? [...segments, upright] : segments
}

/** Pairs of runs whose ways cross in or near a trunk; each as "label x label" by run id. */
export function crossings(layout: RiserLayout): string[] {
  const runs = layout.runs.filter((run) => !run.loose).map((run) => ({ id: run.runId, segments: segmentsOf(run.trunk, run.drop) }))
  const found: string[] = []
  for (const a of runs)
    for (const b of runs) if (a.id < b.id && a.segments.some((one) => b.segments.some((other) => cross(one, other)))) found.push(`${a.id} x ${b.id}`)
  return found
}

function cross(a: Segment, b: Segment): boolean {
  if ((a.x0 === a.x1) === (b.x0 === b.x1)) return false
  const [flat, upright] = a.y0 === a.y1 ? [a, b] : [b, a]
  const [left, right] = [Math.min(flat.x0, flat.x1), Math.max(flat.x0, flat.x1)]
  const [top, bottom] = [Math.min(upright.y0, upright.y1), Math.max(upright.y0, upright.y1)]
  const margin = 0.05
  return upright.x0 > left + margin && upright.x0 < right - margin && flat.y0 > top + margin && flat.y0 < bottom - margin
}

/** Pairs of tags that cover each other. */
export function overlappingTags(tags: readonly TagBox[]): string[] {
  const found: string[] = []
  tags.forEach((a, index) => {
    for (const b of tags.slice(index + 1)) if (a.x < b.x + b.w - 0.01 && b.x < a.x + a.w - 0.01 && a.y < b.y + b.h - 0.01 && b.y < a.y + a.h - 0.01) found.push(`${a.text} / ${b.text}`)
  })
  return found
}
