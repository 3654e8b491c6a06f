import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import { inTransaction } from '../../db/transaction.ts'
import { loadJob, type JobScope } from './documentRepo.ts'
import { needVersion, noSuchJob, type JobsContext } from './jobsContext.ts'

/** The job as it is now, from memory where this process has that version. Throws AppError not_found. */
export async function readDocument(context: JobsContext, scope: JobScope): Promise<JobDocument> {
  const kept = context.documents.at(scope, await needVersion(context, scope))
  if (kept) return kept
  const doc = await inTransaction(context.db, (tx) => loadJob(tx, scope))
  if (!doc) throw noSuchJob()
  context.documents.keep(scope, doc)
  return doc
}
