import type { z } from 'zod'
import type { createJobSchema, JobCreated } from '../../../shared/api/jobs.ts'
import { AppError } from '../../../shared/errors.ts'
import type { Job } from '../../../shared/model/job.ts'
import { dbErrno, errnoOf } from '../../db/errors.ts'
import { readCompany } from '../company/companyRepo.ts'
import { assertStorable } from './storable.ts'
import { findJob, insertJob } from './jobRepo.ts'
import type { JobsContext } from './jobsContext.ts'

type Wanted = z.output<typeof createJobSchema>

/**
 * A new job with the company's rules. The id comes from the client: the same request sent twice makes one job.
 * Throws AppError conflict when the id is another job's.
 */
export async function createJob(context: JobsContext, creator: { readonly companyId: string; readonly id: string }, wanted: Wanted): Promise<JobCreated> {
  assertStorable(wanted)
  const { companyId, id: createdById } = creator
  const company = await readCompany(context.db, companyId)
  if (!company) throw new AppError('not_found', 'There is no such company')
  const { lengthUnit, conductorUnit, labelPattern, slackRackMm, slackPlateMm, limits } = company
  const job: Job = {
    kind: 'job', id: wanted.id, name: wanted.name, client: wanted.client, address: wanted.address,
    lengthUnit: wanted.lengthUnit ?? lengthUnit, conductorUnit: wanted.conductorUnit ?? conductorUnit, labelPattern, slackRackMm, slackPlateMm, limits,
  }
  try {
    await insertJob(context.db, { companyId, job, createdById, createdAt: context.now().toISOString() })
    return { id: job.id, version: 0 }
  } catch (error) {
    if (errnoOf(error) !== dbErrno.duplicate) throw error
    const standing = await findJob(context.db, { companyId, jobId: job.id })
    if (!standing || standing.createdById !== createdById || (standing.version === 0 && !isSameForm(standing.job, job))) throw new AppError('conflict', 'There is a job with this id already', { id: job.id })
    return { id: job.id, version: standing.version }
  }
}

const isSameForm = (a: Job, b: Job) => a.name === b.name && a.client === b.client && a.address === b.address && a.lengthUnit === b.lengthUnit && a.conductorUnit === b.conductorUnit
