import { finite, usable } from '../usable.ts'
import { joistRules, type MemberKind } from './framing.table.ts'

export interface NotchLimit {
  depthIn: number
  lengthIn: number
}

/**
 * Largest notch in a joist, in: a sixth of its depth (a quarter at the end), a third of its depth long; none in the
 * middle third of the span. Null: anything but sawn lumber, or a depth that is no number. Source: IRC R502.8.1.
 */
export function largestJoistNotch(depthIn: number, atEnd = false, member: MemberKind = 'sawn'): NotchLimit | null {
  if (member !== 'sawn' || !usable(depthIn) || depthIn <= 0) return null
  const depth = finite((atEnd ? joistRules.endNotchDepthShare : joistRules.notchDepthShare) * depthIn)
  const length = finite(joistRules.notchLengthShare * depthIn)
  return depth === null || length === null ? null : { depthIn: depth, lengthIn: length }
}

/**
 * Whether a notch at this distance along a span lies in its middle third, where none may be. Null: outside the span.
 */
export function isInMiddleThird(alongMm: number, spanMm: number): boolean | null {
  if (!usable(alongMm, spanMm) || spanMm <= 0 || alongMm < 0 || alongMm > spanMm) return null
  return alongMm > spanMm / 3 && alongMm < (2 * spanMm) / 3
}
