import { AppError } from '../../../shared/errors.ts'
import type { Db } from '../../db/client.ts'
import type { DocumentCache } from './documentCache.ts'
import type { JobScope } from './documentRepo.ts'
import type { JobFeed } from './jobFeed.ts'
import { versionOf } from './jobRepo.ts'

/** What the jobs of one process share. */
export interface JobsContext {
  readonly db: Db
  readonly now: () => Date
  readonly documents: DocumentCache
  readonly feed: JobFeed
  /** Takes note of a fault that was answered with a refusal. */
  readonly report: (error: unknown, about: object) => void
}

/** Another company's job and one that never was are the same answer. */
export const noSuchJob = () => new AppError('not_found', 'There is no such job')

export async function needVersion({ db }: JobsContext, scope: JobScope): Promise<number> {
  const version = await versionOf(db, scope)
  if (version === undefined) throw noSuchJob()
  return version
}
