import { finite, usable } from '../usable.ts'

/** Longest cable that a loss budget allows, m: B/a 100, dB per 100 m. Null for a negative budget or no attenuation. */
export const longestAtBudgetM = (budgetDb: number, dbPer100M: number): number | null =>
  usable(budgetDb, dbPer100M) && budgetDb >= 0 && dbPer100M > 0 ? finite((100 * budgetDb) / dbPer100M) : null

export interface SplitBudget {
  readonly budgetDb: number
  readonly splitDb: number
  /** Cable before the splitter. */
  readonly nearM: number
  readonly nearDbPer100M: number
  /** Cable after it. */
  readonly dbPer100M: number
}

/**
 * All of a run with a splitter in it, m: what is before it, and as much after it as the rest of the budget allows. Null
 * for a negative figure, or where splitter and near cable use the budget up.
 */
export function longestPastSplitM({ budgetDb, splitDb, nearM, nearDbPer100M, dbPer100M }: SplitBudget): number | null {
  if (!usable(budgetDb, splitDb, nearM, nearDbPer100M) || splitDb < 0 || nearM < 0 || nearDbPer100M < 0) return null
  const farM = longestAtBudgetM(budgetDb - splitDb - (nearM * nearDbPer100M) / 100, dbPer100M)
  return farM === null ? null : finite(nearM + farM)
}

/** Attenuation that a stated length implies, dB per 100 m: what uses the budget up just there. Null for no length. */
export const impliedDbPer100M = (budgetDb: number, lengthM: number): number | null =>
  usable(budgetDb, lengthM) && budgetDb >= 0 && lengthM > 0 ? finite((100 * budgetDb) / lengthM) : null
