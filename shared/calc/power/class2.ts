import { withinLimit } from '../speaker/load.ts'
import { finite, usable } from '../usable.ts'
import { class2Limits } from './class2.table.ts'

export interface Class2Place {
  readonly current: 'AC' | 'DC'
  readonly wet: boolean
}

/** Highest voltage of a class 2 circuit, V. */
export const class2MostV = ({ current, wet }: Class2Place): number => {
  const { acMostV, dcMostV, wetAcMostV, wetDcMostV } = class2Limits
  return current === 'AC' ? (wet ? wetAcMostV : acMostV) : wet ? wetDcMostV : dcMostV
}

/** Whether a voltage may be class 2 there; the exact limit passes. Null unless it is more than nothing. */
export const isClass2Voltage = (voltageV: number, place: Class2Place): boolean | null =>
  usable(voltageV) && voltageV > 0 ? withinLimit(voltageV, class2MostV(place)) : null

/**
 * Most nameplate current of a class 2 supply, A: the lesser of 5 A and 100 VA over the voltage. Null unless the voltage
 * is more than nothing and at most 60, above which nothing is class 2.
 */
export function class2MostA(
  voltageV: number,
  mostVa: number = class2Limits.mostVa,
  mostA: number = class2Limits.mostA,
): number | null {
  if (!usable(voltageV, mostVa, mostA) || voltageV <= 0 || mostVa <= 0 || mostA <= 0) return null
  return withinLimit(voltageV, class2Limits.dcMostV) ? finite(Math.min(mostA, mostVa / voltageV)) : null
}
