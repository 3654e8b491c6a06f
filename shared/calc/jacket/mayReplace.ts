import { type ListedMarking, standsInFor } from './substitution.table.ts'

/**
 * Whether a cable with one listed marking may be used where another is called for: the same marking, or a way through
 * the substitution table. Unmarked cable replaces nothing. Source beside the table; the local code decides.
 */
export function mayReplace(have: ListedMarking | 'none', need: ListedMarking): boolean {
  return have !== 'none' && replacementsOf(need).has(have)
}

/** Every marking that may be used where one is called for, that one first. */
export function replacementsOf(need: ListedMarking): ReadonlySet<ListedMarking> {
  const found = new Set<ListedMarking>([need])
  for (const marking of found) for (const other of standsInFor[marking]) found.add(other)
  return found
}
