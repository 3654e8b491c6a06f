import { finite, usable } from '../usable.ts'
import { newtonsPerPoundForce } from './pullTension.table.ts'

/** Pounds-force in newtons. Null: a value that is no number. Definition. */
export function newtonsOfPoundsForce(poundsForce: number): number | null {
  return usable(poundsForce) ? finite(poundsForce * newtonsPerPoundForce) : null
}
