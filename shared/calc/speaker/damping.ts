import { finite, usable } from '../usable.ts'

/** Least and better total damping factor that an amplifier manual advises (public archive, table T3). */
export const advisedDamping = { least: 25, better: 50 } as const

/**
 * Source impedance of an amplifier, ohm, out of its rated load and damping factor: Z/DF. Null unless both are more than
 * nothing.
 */
export const outputOhm = (ratedLoadOhm: number, dampingFactor: number): number | null =>
  usable(ratedLoadOhm, dampingFactor) && ratedLoadOhm > 0 && dampingFactor > 0
    ? finite(ratedLoadOhm / dampingFactor)
    : null

/**
 * Damping factor at the loudspeaker: Z/(Zout + Rc), source impedance and loop resistance in ohm. Null for impossible
 * input, and where both are nothing, since it then has no end.
 */
export const dampingAtSpeaker = (loadOhm: number, sourceOhm: number, loopOhm: number): number | null =>
  usable(loadOhm, sourceOhm, loopOhm) && loadOhm > 0 && sourceOhm >= 0 && loopOhm >= 0
    ? finite(loadOhm / (sourceOhm + loopOhm))
    : null

/**
 * Most loop resistance, ohm, that leaves a wanted damping factor: Z/DFwanted - Z/DFamplifier (pro-audio article, table
 * T6). Null for impossible input, or where the amplifier by itself is already below what is wanted.
 */
export function loopForDampingOhm(loadOhm: number, wantedFactor: number, amplifierFactor: number): number | null {
  if (!usable(loadOhm, wantedFactor, amplifierFactor)) return null
  if (loadOhm <= 0 || wantedFactor <= 0 || amplifierFactor < wantedFactor) return null
  return finite(loadOhm / wantedFactor - loadOhm / amplifierFactor)
}
