import { finite, usable } from '../usable.ts'

/**
 * Longest one-way run of a supervised zone, m: R/(2 r), out to the end-of-line resistor and back. One conductor's
 * resistance in ohm/km. Null for a negative limit or a conductor without resistance.
 */
export const longestZoneM = (mostLoopOhm: number, conductorOhmPerKm: number): number | null =>
  usable(mostLoopOhm, conductorOhmPerKm) && mostLoopOhm >= 0 && conductorOhmPerKm > 0
    ? finite((mostLoopOhm * 1000) / (2 * conductorOhmPerKm))
    : null

/** All the wire of such a loop, m: twice the run. Some fire panels print this; it is not how far the cable goes. */
export function zoneWireM(mostLoopOhm: number, conductorOhmPerKm: number): number | null {
  const runM = longestZoneM(mostLoopOhm, conductorOhmPerKm)
  return runM === null ? null : finite(2 * runM)
}

/**
 * What a zone is found in, by how many of its end-of-line resistors are seen: double end of line, one at the contact.
 */
export const zoneStates = { short: 0, secure: 1, violated: 2 } as const
export type ZoneState = keyof typeof zoneStates

/** Resistance that a panel sees, ohm: so many end-of-line resistors in series. Null unless the count is whole. */
export const endOfLineOhm = (resistorOhm: number, inSeries: number): number | null =>
  usable(resistorOhm) && resistorOhm > 0 && Number.isSafeInteger(inSeries) && inSeries >= 0
    ? finite(resistorOhm * inSeries)
    : null
