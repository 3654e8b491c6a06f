import type { JobSummary } from '../../../shared/api/jobs.ts'
import type { Progress } from '../../../shared/derive/facts.ts'

/** Where a job stands by what was recorded. Gates and dates are not kept yet, so none are shown. */
export type JobPlace = 'design' | 'wall' | 'trim' | 'tested'

export function placeOf({ standing }: JobSummary): JobPlace {
  if (!standing || standing.progress.pulled === 0) return 'design'
  const { total, pulled, tested } = standing.progress
  return tested === total ? 'tested' : pulled === total ? 'trim' : 'wall'
}

/** How far along the line Design, Pulled, Terminated, Tested the job is, 0 to 1: a third of the way for each, by its share. */
export function shareAlong(progress: Progress | undefined): number {
  if (!progress || progress.total === 0) return 0
  return (progress.pulled + progress.terminated + progress.tested) / (3 * progress.total)
}

/** The next thing that is not done, counted: "31 of 60 pulled". */
export function standingWords(progress: Progress | undefined): string {
  if (!progress) return 'working out'
  const { total, pulled, terminated, tested } = progress
  if (total === 0) return 'no runs yet'
  if (tested === total) return 'all tested'
  if (pulled === 0) return `${total} planned`
  if (pulled < total) return `${pulled} of ${total} pulled`
  if (terminated < total) return `${terminated} of ${total} terminated`
  return `${tested} of ${total} tested`
}

/** What the ring counts: what is being worked on now. */
export function ringCount(progress: Progress): number {
  const { total, pulled, terminated, tested } = progress
  return pulled < total ? pulled : terminated < total ? terminated : tested
}
