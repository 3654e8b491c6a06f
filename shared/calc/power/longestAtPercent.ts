import { usable } from '../usable.ts'
import { longestAtDropM } from './voltageDrop.ts'

export const loadKinds = ['constant current', 'constant power'] as const
/**
 * What a load's current is taken to be. At constant current it is P/V whatever arrives: a camera-housing manual's table
 * of 24 VAC. At constant power it is P over the voltage that is left: later camera manuals, for the same copper
 * shorter.
 */
export type LoadKind = (typeof loadKinds)[number]

/** Drops that are usual, percent: LED lines 3, cameras and AC devices 10 (manuals and practice, public copies). */
export const usualDropPercent = { led: 3, camera: 10 } as const

export interface FedLoad {
  readonly sourceV: number
  readonly powerW: number
  readonly kind: LoadKind
}

/**
 * Longest one-way line that loses at most a share of the source's voltage, m; one conductor's resistance in ohm/km.
 * Null for a share outside 0 to 100 %, a load or source of nothing, or a conductor without resistance.
 */
export function longestAtPercentM(percent: number, load: FedLoad, conductorOhmPerKm: number): number | null {
  const { sourceV, powerW, kind } = load
  if (!usable(percent, sourceV, powerW) || percent < 0 || percent >= 100 || sourceV <= 0 || powerW <= 0) return null
  const share = percent / 100
  const currentA = powerW / (kind === 'constant power' ? sourceV * (1 - share) : sourceV)
  return longestAtDropM(share * sourceV, conductorOhmPerKm, currentA)
}
