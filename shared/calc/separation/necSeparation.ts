import { usable } from '../usable.ts'

/** How the power beside a communications cable is wired. */
export const powerWirings = [
  'single conductors',
  'raceway',
  'metal-sheathed cable',
  'AC cable',
  'NM cable',
  'UF cable',
] as const
export type PowerWiring = (typeof powerWirings)[number]

/** Least distance from open conductors of light and power, mm (2 in). Source: NEC 800.133(A)(2). */
export const necSeparationMm = 50.8

export interface PowerBeside {
  power: PowerWiring
  gapMm: number
  /** A fixed non-conductor such as flexible tubing or porcelain lies between. */
  hasNonconductor: boolean
  /** The communications cable itself runs in raceway. */
  isDataInRaceway?: boolean
}

/**
 * Whether a cable keeps clear of power: 2 in from single conductors, nothing where either is in raceway or the power
 * is a metal-sheathed, AC, NM or UF cable, or a fixed non-conductor is added. So NM beside data is allowed with no
 * gap; some municipalities still fail it, and practice keeps 6 to 12 in or the next bay. Null: a gap that is no number
 * or negative. Source: NEC 800.133(A)(2) (cabling-design.com 885; forum 123155).
 */
export function isClearOfPower({
  power,
  gapMm,
  hasNonconductor,
  isDataInRaceway = false,
}: PowerBeside): boolean | null {
  if (!usable(gapMm) || gapMm < 0) return null
  return power !== 'single conductors' || isDataInRaceway || hasNonconductor || gapMm >= necSeparationMm - 1e-9
}
