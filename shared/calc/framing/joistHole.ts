import { finite, usable } from '../usable.ts'
import { joistRules, type MemberKind } from './framing.table.ts'

/**
 * Largest hole in a joist, in: the lesser of a third of its depth and what leaves 2 in to top and bottom. In a 2x6 the
 * 2 in leave 1.5 in, less than a third; some public lists print 1-13/16 and forget it.
 * Null: anything but sawn lumber (maker's chart or an engineer), or a depth that leaves no hole. Source: IRC R502.8.1.
 */
export function largestJoistHoleIn(depthIn: number, member: MemberKind = 'sawn'): number | null {
  if (member !== 'sawn' || !usable(depthIn) || depthIn <= 0) return null
  const hole = Math.min(depthIn * joistRules.holeShare, depthIn - 2 * joistRules.edgeIn)
  return hole > 0 ? finite(hole) : null
}

/**
 * Whether a hole keeps 2 in to another hole or a notch, edge to edge, in. Null: a value that is no number or negative.
 */
export function isJoistHoleClear(gapIn: number): boolean | null {
  return usable(gapIn) && gapIn >= 0 ? gapIn >= joistRules.edgeIn : null
}
