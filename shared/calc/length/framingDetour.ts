import { finite, usable } from '../usable.ts'

/**
 * How much longer the way along the framing is than the straight line in plan: (|x| + |y|) / hypot(x, y), 1 to 1.414.
 * Null: a value that is no number, or no distance at all. Derived.
 */
export function framingDetour(alongX: number, alongY: number): number | null {
  if (!usable(alongX, alongY)) return null
  const straight = Math.hypot(alongX, alongY)
  return straight === 0 ? null : finite((Math.abs(alongX) + Math.abs(alongY)) / straight)
}
