import { ZodError } from 'zod'
import { plan, type Command, type PlanContext } from '../commands/index.ts'
import { AppError } from '../errors.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import { authorize } from './access.ts'
import { apply, isEmpty, type Change } from './change.ts'
import { assertNoConflict, type ForeignWrites } from './conflict.ts'
import { assertSound } from './soundness.ts'

export interface ReplayContext {
  readonly actor: PlanContext['actor']
  /** What an earlier command of this actor did: the server asks its log, the client its session. */
  readonly changeOf: (commandId: string) => Change | undefined
  /** What others have written since a version; only the server knows it all. */
  readonly foreignSince?: (madeAt: number) => ForeignWrites
}

export interface Refusal {
  readonly command: Command
  readonly error: AppError
}

export interface Replay {
  readonly doc: JobDocument
  readonly changes: ReadonlyMap<string, Change>
  readonly refused: readonly Refusal[]
}

/** Plays commands over a job, one after the other. Used for optimism, for rebasing, and by the server. */
export function replay(base: JobDocument, commands: readonly Command[], context: ReplayContext): Replay {
  const changes = new Map<string, Change>()
  const refused: Refusal[] = []
  const changeOf = (id: string) => changes.get(id) ?? context.changeOf(id)
  let doc = base
  for (const command of commands) {
    try {
      const change = plan(doc, command, { actor: context.actor, commandId: command.id, changeOf })
      doc = admit(doc, change, command, context)
      changes.set(command.id, change)
    } catch (error) {
      refused.push({ command, error: asAppError(error) })
    }
  }
  return { doc, changes, refused }
}

/** The job after a change that has passed every gate: rights, conflict, form, soundness. */
function admit(doc: JobDocument, change: Change, command: Command, context: ReplayContext): JobDocument {
  if (isEmpty(change)) return doc
  authorize(context.actor.role, change)
  if (context.foreignSince) assertNoConflict(doc, change, context.foreignSince(command.madeAt))
  const next = apply(doc, change)
  assertSound(next, change)
  return next
}

/** A malformed record is a refusal with a sentence; anything else unexpected is a fault and goes on up. */
function asAppError(error: unknown): AppError {
  if (error instanceof AppError) return error
  if (error instanceof ZodError) {
    const first = error.issues[0]
    return new AppError('invalid', `${first?.message ?? 'That is not valid'}${first?.path.length ? ` (${first.path.join('.')})` : ''}`, error.issues.slice(0, 10))
  }
  throw error
}
