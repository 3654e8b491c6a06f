import { AppError } from '../../../shared/errors.ts'
import type { Db } from '../../db/client.ts'
import type { AppDeps } from '../../http/deps.ts'
import { createDocumentCache, type DocumentCache } from './documentCache.ts'
import type { JobScope } from './documentRepo.ts'
import { startJobFeed, type JobFeed } from './jobFeed.ts'
import { versionOf, versionsOf } from './jobRepo.ts'
import { createStandingCache, type StandingCache } from './standingCache.ts'

/** What the jobs of one process share. */
export interface JobsContext {
  readonly db: Db
  readonly now: () => Date
  readonly documents: DocumentCache
  readonly standings: StandingCache
  readonly feed: JobFeed
  /** Takes note of a fault that was answered with a refusal. */
  readonly report: (error: unknown, about: object) => void
}

/** One for each application; it ends with it. */
export function createJobsContext({ db, log, closing }: Pick<AppDeps, 'db' | 'log' | 'closing'>): JobsContext {
  const report = (error: unknown, about: object) => log.error({ err: error, ...about }, 'fault in a job')
  const feed = startJobFeed({ readVersions: (scopes) => versionsOf(db, scopes), onError: (error) => report(error, { doing: 'reading versions' }) })
  closing.addEventListener('abort', () => feed.close(), { once: true })
  return { db, now: () => new Date(), documents: createDocumentCache(), standings: createStandingCache(), feed, report }
}

/** Another company's job and one that never was are the same answer. */
export const noSuchJob = () => new AppError('not_found', 'There is no such job')

export async function needVersion({ db }: Pick<JobsContext, 'db'>, scope: JobScope): Promise<number> {
  const version = await versionOf(db, scope)
  if (version === undefined) throw noSuchJob()
  return version
}
