import { usable } from '../usable.ts'
import { voltageDropV } from './voltageDrop.ts'

/**
 * Drop at the end of a line along which the load lies evenly, V: half of what the whole load at the end would take, as
 * in an LED strip's own copper. Null for a negative figure.
 */
export function evenlySpreadDropV(lengthM: number, conductorOhmPerKm: number, totalA: number): number | null {
  const lumped = voltageDropV(lengthM, conductorOhmPerKm, totalA)
  return lumped === null ? null : lumped / 2
}

export interface PointLoad {
  /** From the point before, or from the source, m. */
  readonly lengthM: number
  readonly currentA: number
}

/**
 * Drop at each of several loads on one line, V, the nearest first: each stretch carries all the current beyond it. Null
 * for a negative figure, or no load.
 */
export function dropsAlongV(loads: readonly PointLoad[], conductorOhmPerKm: number): number[] | null {
  if (!loads.length || loads.some(({ currentA }) => !usable(currentA) || currentA < 0)) return null
  let beyondA = loads.reduce((sum, { currentA }) => sum + currentA, 0)
  let dropV = 0
  const drops: number[] = []
  for (const { lengthM, currentA } of loads) {
    const stretch = voltageDropV(lengthM, conductorOhmPerKm, Math.max(0, beyondA))
    if (stretch === null) return null
    dropV += stretch
    drops.push(dropV)
    beyondA -= currentA
  }
  return usable(...drops) ? drops : null
}
