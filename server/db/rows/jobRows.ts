import type { Job } from '../../../shared/model/job.ts'
import { limitsSchema } from '../../../shared/model/limits.ts'
import type { jobs } from '../tables/jobs.ts'

type JobRow = Omit<(typeof jobs)['$inferSelect'], 'companyId' | 'version' | 'createdAt' | 'createdById'>

/** The job's own record as columns of its row. */
export const jobRow = ({ kind: _kind, ...job }: Job): JobRow => job

/** And back. A limit that is newer than the row takes its default. */
export const jobRecordOf = ({ id, name, client, address, lengthUnit, conductorUnit, labelPattern, slackRackMm, slackPlateMm, limits }: JobRow): Job => ({
  kind: 'job', id, name, client, address, lengthUnit, conductorUnit, labelPattern, slackRackMm, slackPlateMm, limits: limitsSchema.parse(limits),
})
