import { f2, metrics } from './metrics.ts'
import type { XY } from './riserLayout.ts'

/** A right-angled way as a path whose corners are round, as far as there is room. */
export function roundedPath(points: readonly XY[], radius: number = metrics.corner): string {
  const way = points.filter((point, index) => index === 0 || Math.abs(point.x - points[index - 1]!.x) > 0.01 || Math.abs(point.y - points[index - 1]!.y) > 0.01)
  const [first] = way
  if (!first) return ''
  let path = `M${f2(first.x)} ${f2(first.y)}`
  for (let index = 1; index < way.length; index++) {
    const from = way[index - 1]!
    const at = way[index]!
    const next = way[index + 1]
    const turns = next && (from.x === at.x) !== (at.x === next.x)
    if (!turns) {
      path += `L${f2(at.x)} ${f2(at.y)}`
      continue
    }
    const r = Math.min(radius, length(from, at) / 2, length(at, next) / 2)
    const before = toward(at, from, r)
    const after = toward(at, next, r)
    path += `L${f2(before.x)} ${f2(before.y)}Q${f2(at.x)} ${f2(at.y)} ${f2(after.x)} ${f2(after.y)}`
  }
  return path
}

/** A way without round corners, for the tight lanes of a trunk. */
export const squarePath = (points: readonly XY[]): string => points.map((point, index) => `${index ? 'L' : 'M'}${f2(point.x)} ${f2(point.y)}`).join('')

const length = (a: XY, b: XY) => Math.abs(a.x - b.x) + Math.abs(a.y - b.y)

/** The point r away from `at` on the way to `to`. */
export function toward(at: XY, to: XY, r: number): XY {
  const whole = length(at, to) || 1
  return { x: at.x + ((to.x - at.x) * r) / whole, y: at.y + ((to.y - at.y) * r) / whole }
}
