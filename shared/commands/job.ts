import { z } from 'zod'
import { jobSchema } from '../model/job.ts'
import { jobOf } from '../model/jobDocument.ts'
import { updates } from '../sync/change.ts'
import { defineCommand } from './define.ts'

export const jobCommands = {
  'job.update': defineCommand({
    args: z.strictObject({ set: jobSchema.omit({ kind: true, id: true }).partial() }),
    describe: () => 'Change the job’s settings',
    plan: (doc, { set }) => updates<'job'>(jobOf(doc), Object.fromEntries(Object.entries(set).filter(([, value]) => value !== undefined))),
  }),
}
