import { finite, usable } from '../usable.ts'

/** Added for connectors and cords when a channel is worked out, ohm: the upper end of common practice, no source. */
export const connectorsOhm = 0.5

/**
 * Resistance of a fed channel, ohm: both wires of a pair share the way out and both of another the way back, so two
 * pairs make r L and four make half of it. One conductor's resistance in ohm/km, one-way length in metres. Not the loop
 * of one pair, which is twice. Null for a negative figure.
 */
export const poeChannelOhm = (lengthM: number, conductorOhmPerKm: number, pairs: 2 | 4): number | null =>
  usable(lengthM, conductorOhmPerKm) && lengthM >= 0 && conductorOhmPerKm >= 0
    ? finite(((lengthM * conductorOhmPerKm) / 1000) * (2 / pairs))
    : null

export interface PoeDelivery {
  readonly currentA: number
  readonly deviceV: number
  readonly deviceW: number
}

/**
 * What arrives of a source's power: I = P/V, V - I R, P - I² R. Every class's device power follows from it with the
 * worst voltage and resistance, to 0.063 W. Null for impossible input, or where nothing arrives.
 */
export function poeDelivery(sourceW: number, sourceV: number, channelOhm: number): PoeDelivery | null {
  if (!usable(sourceW, sourceV, channelOhm) || sourceW < 0 || sourceV <= 0 || channelOhm < 0) return null
  const currentA = sourceW / sourceV
  const deviceV = sourceV - currentA * channelOhm
  const deviceW = sourceW - currentA ** 2 * channelOhm
  return usable(currentA, deviceV, deviceW) && deviceV >= 0 ? { currentA, deviceV, deviceW } : null
}
