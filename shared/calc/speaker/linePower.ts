import { finite, usable } from '../usable.ts'

/** Where the output of an ideal voltage source goes, watts. */
export interface LinePower {
  /** All that the amplifier gives: V²/(Z + Rc). */
  readonly amplifierW: number
  /** What arrives: V² Z/(Z + Rc)². */
  readonly speakerW: number
  /** What heats the line: V² Rc/(Z + Rc)². */
  readonly cableW: number
}

/** How a source's output parts between load and line. Null for a negative figure or a load of nothing. */
export function linePower(sourceV: number, loadOhm: number, loopOhm: number): LinePower | null {
  if (!usable(sourceV, loadOhm, loopOhm) || sourceV < 0 || loadOhm <= 0 || loopOhm < 0) return null
  const amplifierW = finite(sourceV ** 2 / (loadOhm + loopOhm))
  if (amplifierW === null) return null
  const cableShare = loopOhm / (loadOhm + loopOhm)
  return { amplifierW, speakerW: amplifierW * (1 - cableShare), cableW: amplifierW * cableShare }
}

/** Voltage that gives a power into a load: square root of P Z. Null for a negative power or a load of nothing. */
export const voltsForPower = (powerW: number, loadOhm: number): number | null =>
  usable(powerW, loadOhm) && powerW >= 0 && loadOhm > 0 ? finite(Math.sqrt(powerW * loadOhm)) : null

/**
 * Heat along a line at a power into its load, watts per metre of run: (P/Z) times the loop resistance per metre (out
 * and back). Null for a negative figure or a load of nothing.
 */
export const heatWPerM = (powerW: number, loadOhm: number, loopOhmPerM: number): number | null =>
  usable(powerW, loadOhm, loopOhmPerM) && powerW >= 0 && loadOhm > 0 && loopOhmPerM >= 0
    ? finite((powerW / loadOhm) * loopOhmPerM)
    : null
