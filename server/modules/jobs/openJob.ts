import type { JobOpened } from '../../../shared/api/jobs.ts'
import { allRecords } from '../../../shared/model/jobDocument.ts'
import { listMembers } from '../members/memberRepo.ts'
import type { JobScope } from './documentRepo.ts'
import type { JobsContext } from './jobsContext.ts'
import { readDocument } from './readDocument.ts'

/** A job whole, and the names of the people its records and its log speak of. */
export async function openJob(context: JobsContext, scope: JobScope): Promise<JobOpened> {
  const doc = await readDocument(context, scope)
  const members = await listMembers(context.db, scope.companyId)
  return { version: doc.version, records: [...allRecords(doc)], members: members.map(({ id, name, role }) => ({ id, name, role })) }
}
