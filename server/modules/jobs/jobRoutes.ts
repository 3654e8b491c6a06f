import type { z } from 'zod'
import { changesQuerySchema, createJobSchema, jobParamsSchema, pushSchema, type Push } from '../../../shared/api/jobs.ts'
import { answered, defineRoute, noInput, type MemberContext, type Route } from '../../http/routeTable.ts'
import { createJob } from './createJob.ts'
import { followJob } from './followJob.ts'
import type { JobsContext } from './jobsContext.ts'
import { listJobs } from './listJobs.ts'
import { openJob } from './openJob.ts'
import { pushCommands, readChanges } from './pushCommands.ts'

const scopeOf = ({ member }: MemberContext, { jobId }: z.output<typeof jobParamsSchema>) => ({ companyId: member.companyId, jobId })

/** Jobs: the list, a new one, one whole, the one door for edits, what came after, and the poke that more has come. */
export const jobRoutes = (jobs: JobsContext): readonly Route[] => [
  defineRoute({
    method: 'get', path: '/api/jobs', action: 'job.read', params: noInput, query: noInput, body: noInput,
    handle: ({ member }) => listJobs(jobs, member.companyId),
  }),
  defineRoute({
    method: 'post', path: '/api/jobs', action: 'job.create', params: noInput, query: noInput, body: createJobSchema,
    handle: ({ member }, { body }) => createJob(jobs, member, body),
  }),
  defineRoute({
    method: 'get', path: '/api/jobs/:jobId', action: 'job.read', params: jobParamsSchema, query: noInput, body: noInput,
    handle: async (context, { params }) => {
      context.response.type('json').send(await openJob(jobs, scopeOf(context, params)))
      return answered
    },
  }),
  defineRoute({
    method: 'post', path: '/api/jobs/:jobId/commands', action: 'job.command', params: jobParamsSchema, query: noInput, body: pushSchema,
    handle: (context, { params, body }) => pushCommands(jobs, context.member, scopeOf(context, params), body as Push),
  }),
  defineRoute({
    method: 'get', path: '/api/jobs/:jobId/changes', action: 'job.read', params: jobParamsSchema, query: changesQuerySchema, body: noInput,
    handle: (context, { params, query }) => readChanges(jobs, scopeOf(context, params), query.since),
  }),
  defineRoute({
    method: 'get', path: '/api/jobs/:jobId/events', action: 'job.read', params: jobParamsSchema, query: noInput, body: noInput,
    handle: async (context, { params }) => {
      await followJob(jobs, context, scopeOf(context, params))
      return answered
    },
  }),
]
