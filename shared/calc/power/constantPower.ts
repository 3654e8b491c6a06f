import { finite, usable } from '../usable.ts'

export interface Supply {
  readonly currentA: number
  /** Voltage left at the load, V. */
  readonly loadV: number
  /** What the source gives, W. */
  readonly sourceW: number
  /** What the line burns, W. */
  readonly lossW: number
}

/**
 * Most power that arrives through a resistance, W: V²/(4 R). Null unless voltage and resistance are more than nothing.
 */
export const mostLoadW = (sourceV: number, loopOhm: number): number | null =>
  usable(sourceV, loopOhm) && sourceV > 0 && loopOhm > 0 ? finite(sourceV ** 2 / (4 * loopOhm)) : null

/**
 * A load of constant power behind a resistance, such as a regulated or PoE-fed device: current rises as the voltage
 * sags, I = (V - root(V² - 4 R P))/(2 R), the root with the higher voltage. At the very most that can arrive, half the
 * voltage is left. Null for a negative figure, no voltage, or more power than can arrive.
 */
export function constantPowerSupply(sourceV: number, loopOhm: number, loadW: number): Supply | null {
  if (!usable(sourceV, loopOhm, loadW) || sourceV <= 0 || loopOhm < 0 || loadW < 0) return null
  const square = sourceV ** 2
  const left = square - 4 * loopOhm * loadW
  // The exact limit passes: what the last digit of the arithmetic takes below nothing counts as nothing.
  if (!usable(square, left) || left < -1e-12 * square) return null
  const loadV = (sourceV + Math.sqrt(Math.max(0, left))) / 2
  // P over what is left is the same root as the formula's, and keeps its digits where the resistance is small.
  const currentA = loadW / loadV
  const [sourceW, lossW] = [sourceV * currentA, loopOhm * currentA ** 2]
  return usable(loadV, currentA, sourceW, lossW) ? { currentA, loadV, sourceW, lossW } : null
}

/** Whether a load of constant power can be fed at all; null for impossible input. */
export function canFeed(sourceV: number, loopOhm: number, loadW: number): boolean | null {
  if (!usable(sourceV, loopOhm, loadW) || sourceV <= 0 || loopOhm < 0 || loadW < 0) return null
  return constantPowerSupply(sourceV, loopOhm, loadW) !== null
}
