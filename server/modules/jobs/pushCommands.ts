import { maxEntriesPerAnswer, type Changes, type Push, type PushAnswer, type RefusedCommand } from '../../../shared/api/jobs.ts'
import type { Actor, Command } from '../../../shared/commands/index.ts'
import { AppError } from '../../../shared/errors.ts'
import { acceptCommand } from './acceptCommand.ts'
import { isSameCommand, reused } from './commandIdentity.ts'
import type { JobScope } from './documentRepo.ts'
import { foreignReader } from './foreignReader.ts'
import { needVersion, type JobsContext } from './jobsContext.ts'
import { knownCommands, logSince, type KnownCommand } from './logRepo.ts'

/**
 * Takes a client's queued commands in order, each in its own transaction and each at most once. The answer carries what
 * was accepted after `baseVersion`, the caller's own commands included. Throws not_found, conflict (the client knows
 * versions this job never had), or command_id_reused before anything is done.
 */
export async function pushCommands(context: JobsContext, actor: Actor, scope: JobScope, { baseVersion, commands }: Push): Promise<PushAnswer> {
  await assertReached(context, scope, baseVersion)
  // One command alone is compared with the log where it is done, under the lock.
  if (commands.length > 1) assertNotReused(actor, commands, await knownCommands(context.db, scope, commands.map((command) => command.id)))
  const foreign = foreignReader(scope, actor.id)
  const accepted = new Map<string, number>()
  const refused = new Map<string, RefusedCommand>()
  for (const command of commands) {
    if (accepted.has(command.id) || refused.has(command.id)) continue
    const outcome = await acceptCommand(context, actor, scope, command, foreign)
    if ('version' in outcome) accepted.set(command.id, outcome.version)
    else refused.set(command.id, { commandId: command.id, code: outcome.refusal.code, message: outcome.refusal.message, details: outcome.refusal.details ?? null })
  }
  const changes = await changesAfter(context, scope, baseVersion)
  return { ...changes, accepted: [...accepted].map(([commandId, version]) => ({ commandId, version })), refused: [...refused.values()] }
}

/** What happened to a job after a version. Throws not_found, or conflict where the job never had that version. */
export async function readChanges(context: JobsContext, scope: JobScope, baseVersion: number): Promise<Changes> {
  await assertReached(context, scope, baseVersion)
  return changesAfter(context, scope, baseVersion)
}

async function changesAfter(context: JobsContext, scope: JobScope, baseVersion: number): Promise<Changes> {
  const since = await logSince(context.db, scope, baseVersion, maxEntriesPerAnswer)
  const last = since.at(-1)?.version ?? baseVersion
  return { version: since.length < maxEntriesPerAnswer ? last : Math.max(last, await needVersion(context, scope)), since }
}

/** A client that is ahead of the server has seen what was lost there since, by a restored backup say: it must start afresh. */
async function assertReached(context: JobsContext, scope: JobScope, baseVersion: number): Promise<void> {
  const version = await needVersion(context, scope)
  if (baseVersion > version) throw new AppError('conflict', 'This device knows a later state of the job than the server does. Load the job again', { version })
}

function assertNotReused(actor: Actor, commands: readonly Command[], known: readonly KnownCommand[]) {
  const sent = new Map<string, Omit<KnownCommand, 'version'>>(known.map((each) => [each.commandId, each]))
  for (const command of commands) {
    const before = sent.get(command.id)
    if (before && !isSameCommand(actor, command, before)) throw reused(command.id)
    sent.set(command.id, { commandId: command.id, actorId: actor.id, verb: command.verb, args: command.args })
  }
}
