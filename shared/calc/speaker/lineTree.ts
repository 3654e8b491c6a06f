import { finite, usable } from '../usable.ts'

/** A leg of a line that parts: its own loop, what hangs at its end, and the legs that go on from there. */
export interface LineLeg {
  /** Loop resistance of this leg, ohm. */
  readonly loopOhm: number
  /** Impedances that hang at its end in parallel, ohm. */
  readonly loadsOhm: readonly number[]
  readonly onward: readonly LineLeg[]
}

/** What a leg's end looks like from the amplifier's side of it. */
export interface LineNode {
  /** Impedance of everything from the leg's end on, onward legs included, ohm. */
  readonly behindOhm: number
  /** Level at the leg's end against that at the load which gets least, at least 1. */
  readonly worstFactor: number
}

/**
 * A leg's end seen from the amplifier's side: exact for constant impedances, worked back from the far ends. A line of
 * hops is a tree without a fork (ladder of constant impedances). Null for a negative resistance, a load of nothing, or
 * no load at all.
 */
export function lineNode({ loadsOhm, onward }: Pick<LineLeg, 'loadsOhm' | 'onward'>): LineNode | null {
  if (loadsOhm.some((load) => !usable(load) || load <= 0)) return null
  let admittance = loadsOhm.reduce((sum, load) => sum + 1 / load, 0)
  let worstFactor = 1
  for (const leg of onward) {
    if (!usable(leg.loopOhm) || leg.loopOhm < 0) return null
    const node = lineNode(leg)
    if (!node) return null
    admittance += 1 / (leg.loopOhm + node.behindOhm)
    worstFactor = Math.max(worstFactor, (1 + leg.loopOhm / node.behindOhm) * node.worstFactor)
  }
  const behindOhm = admittance > 0 ? finite(1 / admittance) : null
  return behindOhm === null || behindOhm === 0 || !Number.isFinite(worstFactor) ? null : { behindOhm, worstFactor }
}

/**
 * Share of the load that a loop may have so that it and what comes after it stay within a limit, both as ratios Rc/Z:
 * (1 + x)/k - 1. Below nothing where what comes after loses more than the limit by itself.
 */
export const ownShare = (limitRatio: number, worstFactor: number): number | null =>
  usable(limitRatio, worstFactor) && worstFactor >= 1 ? finite((1 + limitRatio) / worstFactor - 1) : null

/** The ratio Rc/Z of a single line that would lose as much: (1 + R/Z) k - 1. Null for impossible input. */
export function totalRatio(loopOhm: number, { behindOhm, worstFactor }: LineNode): number | null {
  if (!usable(loopOhm, behindOhm, worstFactor) || loopOhm < 0 || behindOhm <= 0 || worstFactor < 1) return null
  return finite((1 + loopOhm / behindOhm) * worstFactor - 1)
}
