import { z } from 'zod'
import { AppError } from '../errors.ts'
import { idSchema } from '../model/fields.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import { apply, type Change } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { batchArgsSchema } from './batch.ts'
import { defineCommand, type CommandDef, type PlanContext } from './define.ts'
import { deviceCommands } from './device.ts'
import { fieldCommands } from './field.ts'
import { itemCommands } from './items.ts'
import { jobCommands } from './job.ts'
import { levelCommands } from './level.ts'
import { plateCommands } from './plate.ts'
import { rackCommands } from './rack.ts'
import { revertCommands } from './revert.ts'
import { roomCommands } from './room.ts'
import { runCommands } from './run.ts'

const simple = {
  ...jobCommands,
  ...levelCommands,
  ...roomCommands,
  ...plateCommands,
  ...rackCommands,
  ...deviceCommands,
  ...runCommands,
  ...itemCommands,
  ...fieldCommands,
}

type Simple = typeof simple
export type SimpleVerb = keyof Simple
/** A step of a batch: a verb and what it needs, checked by the compiler. */
export type Step = { [V in SimpleVerb]: { readonly verb: V; readonly args: z.input<Simple[V]['args']> } }[SimpleVerb]

const registry = {
  ...simple,
  ...revertCommands,
  batch: defineCommand({
    args: batchArgsSchema,
    describe: (_doc, { label }) => label,
    plan: (doc, { steps }, context) => planSteps(doc, steps, context),
  }),
}

type Registry = typeof registry
export type Verb = keyof Registry
export type ArgsOf<V extends Verb> = V extends 'batch' ? { readonly label: string; readonly steps: readonly Step[] } : z.input<Registry[V]['args']>

/** What someone wants, before it has an identity. */
export type Intent = { [V in Verb]: { readonly verb: V; readonly args: ArgsOf<V> } }[Verb]

/** The one object behind edit, undo, redo, the offline queue, the request and the audit log. */
export type Command = Intent & {
  readonly id: string
  /** The version its author was looking at. */
  readonly madeAt: number
}

/** A command as it arrives: its arguments are judged by its verb. */
export const commandSchema = z.strictObject({ id: idSchema, verb: z.string().max(40), args: z.unknown(), madeAt: z.int().min(0) })

export const verbs = Object.keys(registry) as Verb[]

/** What a command does to a job, as a change; nothing is done yet. Throws AppError invalid, refused or not_found. */
export function plan(doc: JobDocument, command: { readonly verb: string; readonly args?: unknown }, context: PlanContext): Change {
  const def = definitionOf(registry, command.verb)
  return def.plan(doc, parseArgs(def, command), context)
}

/** What a command is called: "Change 4 runs to 14/2". */
export function describe(doc: JobDocument, command: { readonly verb: string; readonly args?: unknown }): string {
  const def = definitionOf(registry, command.verb)
  return def.describe(doc, parseArgs(def, command))
}

function definitionOf(from: object, verb: string): CommandDef {
  if (!Object.hasOwn(from, verb))
    throw new AppError('invalid', `This version of Mudring does not know “${verb}”. Reload the page; your work is kept`, { verb })
  return (from as Record<string, CommandDef>)[verb]!
}

function parseArgs(def: CommandDef, command: { readonly verb: string; readonly args?: unknown }): unknown {
  const parsed = def.args.safeParse(command.args)
  if (parsed.success) return parsed.data
  const [first] = parsed.error.issues
  const where = first?.path.length ? ` (${first.path.join('.')})` : ''
  throw new AppError('invalid', `${first?.message ?? 'Some of that is not valid'}${where}`, { verb: command.verb, issues: parsed.error.issues.slice(0, 10).map(({ path, message }) => ({ path: path.join('.'), message })) })
}

function planSteps(doc: JobDocument, steps: readonly { readonly verb: string; readonly args?: unknown }[], context: PlanContext): Change {
  const changes: Change[] = []
  let after = doc
  for (const step of steps) {
    const def = definitionOf(simple, step.verb)
    const change = def.plan(after, parseArgs(def, step), context)
    after = apply(after, change)
    changes.push(change)
  }
  return compose(changes)
}

export type { Actor, PlanContext } from './define.ts'
