import { withinLimit } from '../speaker/load.ts'
import { usable } from '../usable.ts'
import { type PoeClass, poeClasses, poeClassPower } from './poe.table.ts'

/**
 * Least class whose device power covers a load in watts; 12.95 W itself is still class 3. Class 0 is never chosen: it
 * says nothing about the load. Null for a negative load, or one that no class covers.
 */
export const poeClassFor = (deviceW: number): PoeClass | null =>
  usable(deviceW) && deviceW >= 0
    ? (poeClasses.find((name) => name > 0 && withinLimit(deviceW, poeClassPower[name].deviceW)) ?? null)
    : null
