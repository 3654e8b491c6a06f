import type { JobList, JobStanding, JobSummary } from '../../../shared/api/jobs.ts'
import { deriveJob } from '../../../shared/derive/deriveJob.ts'
import { listMembers } from '../members/memberRepo.ts'
import { listJobRows } from './jobRepo.ts'
import type { JobsContext } from './jobsContext.ts'
import { readDocument } from './readDocument.ts'

/** How long a list may work on what it does not know yet; the rest follows when it is asked for again. */
const patienceMs = 1500

/** All jobs of a company, the one last worked on first. */
export async function listJobs(context: JobsContext, companyId: string): Promise<JobList> {
  const [rows, members] = await Promise.all([listJobRows(context.db, companyId), listMembers(context.db, companyId)])
  const names = new Map(members.map(({ id, name }) => [id, name]))
  rows.sort((a, b) => b.lastWord.at.localeCompare(a.lastWord.at) || a.name.localeCompare(b.name))
  const end = context.now().getTime() + patienceMs
  const jobs: JobSummary[] = []
  for (const { lastWord, ...row } of rows) {
    const scope = { companyId, jobId: row.id }
    const known = context.standings.at(scope, row.version)
    const standing = known ?? (context.now().getTime() < end ? await workOut(context, scope) : null)
    jobs.push({ ...row, lastWord: { ...lastWord, byName: names.get(lastWord.byId) ?? '' }, standing })
  }
  return { jobs }
}

/** What follows from a job now; a list must not fail because of one job. */
async function workOut(context: JobsContext, scope: { companyId: string; jobId: string }): Promise<JobStanding | null> {
  try {
    const doc = await readDocument(context, scope)
    const { progress, counts } = deriveJob(doc)
    const standing = { progress, findings: counts }
    context.standings.keep(scope, doc.version, standing)
    return standing
  } catch (error) {
    context.report(error, { doing: 'working out a job', jobId: scope.jobId })
    return null
  }
}
