export type EnclosureDivider = 'none' | 'permanent barrier' | 'listed divider'

/**
 * Whether communications cable may share a box, raceway or compartment with power: only with a permanent barrier or a
 * listed divider, or where the power is there only to feed the equipment and 1/4 in is kept inside.
 * Source: NEC 800.133(A)(1), 725.136 (forum 130543, ecmweb).
 */
export function mayShareEnclosure(divider: EnclosureDivider, feedsEquipmentWithQuarterInch = false): boolean {
  return divider !== 'none' || feedsEquipmentWithQuarterInch
}
