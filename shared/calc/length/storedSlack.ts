import { bicsiSlack, type SlackMedium } from './slack.table.ts'

/** Slack that both ends of a run keep together, mm. Source beside the table. */
export function storedSlackMm(medium: SlackMedium): number {
  const { atHeadMm, atOutletMm } = bicsiSlack[medium]
  return atHeadMm + atOutletMm
}
