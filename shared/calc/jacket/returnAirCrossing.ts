/** How a cable lies in a joist or stud bay that returns air: across its long dimension, or along it. */
export type BayDirection = 'across' | 'along'

/**
 * Whether a cable without plenum marking may pass a joist or stud bay that is used as return air in a dwelling: at
 * right angles to the long dimension only. A fabricated duct is never such a bay. Source: NEC 300.22(C) exception,
 * several pages.
 */
export function mayCrossReturnAir(direction: BayDirection, isFabricatedDuct = false): boolean {
  return direction === 'across' && !isFabricatedDuct
}
