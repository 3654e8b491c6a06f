import type { Command, Intent } from '../../shared/commands/index.ts'
import type { z } from 'zod'
import type { createJobSchema } from '../../shared/api/jobs.ts'
import type { Role } from '../../shared/policy.ts'
import { createJob } from '../modules/jobs/createJob.ts'
import type { JobsContext } from '../modules/jobs/jobsContext.ts'
import { pushCommands } from '../modules/jobs/pushCommands.ts'

/** A job as the commands that people would send to make it, each by a member of some role. */
export interface JobStory extends Required<Pick<z.output<typeof createJobSchema>, 'id' | 'name' | 'client' | 'address'>> {
  readonly lengthUnit: 'ft' | 'm'
  readonly conductorUnit: 'awg' | 'mm2'
  readonly commands: readonly { readonly as: Role; readonly intent: Intent }[]
}

/**
 * Plays a story into the database through the same door that people's edits take. Throws when a command is refused:
 * a story works as it is told.
 */
export async function playJob(context: JobsContext, companyId: string, memberOf: (role: Role) => string, story: JobStory): Promise<void> {
  const { commands, ...form } = story
  await createJob(context, { companyId, id: memberOf('designer') }, form)
  const scope = { companyId, jobId: form.id }
  for (const [madeAt, { as, intent }] of commands.entries()) {
    const command = { ...intent, id: `${form.id}-${madeAt}`, madeAt } as Command
    const { refused } = await pushCommands(context, { id: memberOf(as), role: as }, scope, { baseVersion: madeAt, commands: [command] })
    if (refused[0]) throw new Error(`${form.name}, command ${madeAt} (${command.verb}): ${refused[0].message}`)
  }
}
