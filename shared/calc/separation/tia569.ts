import { usable } from '../usable.ts'
import { type Tia569Condition, tia569Table } from './tia569.table.ts'

/**
 * Separation from power by EIA/TIA-569 (1990), in: bands under 2 kVA, 2 to 5, and over 5. Advice from a dropped
 * edition. Null: the table gives none, a load that is no number, or negative. Source beside the table.
 */
export function separationTia569In(condition: Tia569Condition, loadKva: number): number | null {
  if (!usable(loadKva) || loadKva < 0) return null
  return tia569Table[condition][loadKva < 2 ? 'under2' : loadKva <= 5 ? 'from2to5' : 'over5']
}
