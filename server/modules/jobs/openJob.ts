import type { JobOpened } from '../../../shared/api/jobs.ts'
import { allRecords, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { listMembers } from '../members/memberRepo.ts'
import type { JobScope } from './documentRepo.ts'
import type { JobsContext } from './jobsContext.ts'
import { readDocument } from './readDocument.ts'

/**
 * A job whole, and the names of the people its records and its log speak of: a JobOpened as JSON text. The records are
 * written out once for each version, however often it is opened.
 */
export async function openJob(context: JobsContext, scope: JobScope): Promise<string> {
  const doc = await readDocument(context, scope)
  const members = await listMembers(context.db, scope.companyId)
  const rest = { version: doc.version, members: members.map(({ id, name, role }) => ({ id, name, role })) } satisfies Omit<JobOpened, 'records'>
  return `{"version":${rest.version},"records":${recordsText(doc)},"members":${JSON.stringify(rest.members)}}`
}

const texts = new WeakMap<JobDocument, string>()

/** It goes with its document, which never changes once made. */
function recordsText(doc: JobDocument): string {
  const known = texts.get(doc)
  if (known !== undefined) return known
  const text = JSON.stringify([...allRecords(doc)])
  texts.set(doc, text)
  return text
}
