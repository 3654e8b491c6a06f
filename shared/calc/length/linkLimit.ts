import { usable } from '../usable.ts'

/**
 * Longest permanent link of a twisted-pair run, mm; cords have 10 m of their own. Source: TIA-568, TIA-570 (90 m and
 * 100 m).
 */
export const permanentLinkMm = 90_000

/**
 * Whether a run with its stored slack stays within the permanent link. Slack counts: it carries the signal like the
 * rest (common practice). Null: a value that is no number, or negative.
 */
export function isWithinLink(pathMm: number, slackMm: number, limitMm: number = permanentLinkMm): boolean | null {
  if (!usable(pathMm, slackMm, limitMm) || pathMm < 0 || slackMm < 0 || limitMm < 0) return null
  return pathMm + slackMm <= limitMm
}
