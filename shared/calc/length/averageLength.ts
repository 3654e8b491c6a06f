import { finite, usable } from '../usable.ts'

/** What the averaging method asks of a house. */
export interface AveragedRuns {
  shortestMm: number
  longestMm: number
  /** Slack per run, both ends together. */
  slackMm: number
  /** Vertical drops per run, both ends together. */
  dropMm: number
  runs: number
}

/** Slack and drop that the method takes when nothing better is known, mm. */
export const averagingDefaults = { slackMm: 1100, dropMm: 4500 } as const

/**
 * Total cable for a house by the averaging method, mm: ((shortest + longest) / 2 + slack + drop) x runs. Null: a value
 * that is no number, a negative length, a longest below the shortest, or runs that are no whole number. Source:
 * Residential Cabling Guide, 3rd ed. (cabling-design.com tips 14Nov20011). It prints 0.2 "mm" for 0.2 m, and its 44 in
 * of slack are 1.1176 m, so that totals in feet and metres differ by 1.6 % of the slack.
 */
export function averagedTotalMm({ shortestMm, longestMm, slackMm, dropMm, runs }: AveragedRuns): number | null {
  if (!usable(shortestMm, longestMm, slackMm, dropMm, runs)) return null
  if (shortestMm < 0 || longestMm < shortestMm || slackMm < 0 || dropMm < 0 || runs < 0 || !Number.isSafeInteger(runs))
    return null
  return finite(((shortestMm + longestMm) / 2 + slackMm + dropMm) * runs)
}
