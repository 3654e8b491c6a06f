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
export async function pushCommands(context: JobsContext, actor: Actor, scope: JobScope, push: Push): Promise<PushAnswer> {
  const version = await needVersion(context, scope)
  if (push.baseVersion > version) throw new AppError('conflict', 'This device knows a later state of the job than the server does. Load the job again', { version })
  assertNotReused(actor, push.commands, await knownCommands(context.db, scope, push.commands.map((command) => command.id)))
  const foreign = foreignReader(scope, actor.id)
  const accepted = new Map<string, number>()
  const refused = new Map<string, RefusedCommand>()
  for (const command of push.commands) {
    if (accepted.has(command.id) || refused.has(command.id)) continue
    const outcome = await acceptCommand(context, actor, scope, command, foreign)
    if ('version' in outcome) accepted.set(command.id, outcome.version)
    else refused.set(command.id, { commandId: command.id, code: outcome.refusal.code, message: outcome.refusal.message, details: outcome.refusal.details ?? null })
  }
  const changes = await readChanges(context, scope, push.baseVersion)
  return { ...changes, accepted: [...accepted].map(([commandId, at]) => ({ commandId, version: at })), refused: [...refused.values()] }
}

/** What happened after a version, and where the job stands. Never tells a version older than what it lists. */
export async function readChanges(context: JobsContext, scope: JobScope, baseVersion: number): Promise<Changes> {
  const since = await logSince(context.db, scope, baseVersion, maxEntriesPerAnswer)
  const version = await needVersion(context, scope)
  return { version: Math.max(version, since.at(-1)?.version ?? 0), since }
}

function assertNotReused(actor: Actor, commands: readonly Command[], known: readonly KnownCommand[]) {
  const sent = new Map<string, Omit<KnownCommand, 'version'>>(known.map((each) => [each.commandId, each]))
  for (const command of commands) {
    const before = sent.get(command.id)
    if (before && !isSameCommand(actor, command, before)) throw reused(command.id)
    sent.set(command.id, { commandId: command.id, actorId: actor.id, verb: command.verb, args: command.args })
  }
}
