import { finite, usable } from '../usable.ts'
import { type MemberKind, studRules } from './framing.table.ts'

export interface StudCut {
  member?: MemberKind
  depthIn: number
  /** A bearing wall or an exterior wall. */
  isBearing: boolean
}

/**
 * Largest hole in a stud, in: the lesser of 40 % (bearing) or 60 % (not) of its depth and what leaves 5/8 in at each
 * edge. Null: anything but sawn lumber (maker's chart or an engineer), or a depth that leaves no hole. Source: IRC
 * R602.6. Advice; local code and the framing inspector come first.
 */
export function largestStudHoleIn({ member = 'sawn', depthIn, isBearing }: StudCut): number | null {
  if (member !== 'sawn' || !usable(depthIn) || depthIn <= 0) return null
  const share = isBearing ? studRules.bearing.holeShare : studRules.nonBearing.holeShare
  const hole = Math.min(share * depthIn, depthIn - 2 * studRules.edgeIn)
  return hole > 0 ? finite(hole) : null
}

/** Deepest notch in a stud, in: 25 % of its depth (bearing or exterior) or 40 %. Null as above. Source: IRC R602.6. */
export function deepestStudNotchIn({ member = 'sawn', depthIn, isBearing }: StudCut): number | null {
  if (member !== 'sawn' || !usable(depthIn) || depthIn <= 0) return null
  return finite((isBearing ? studRules.bearing.notchShare : studRules.nonBearing.notchShare) * depthIn)
}
