import type { Actor, Command } from '../../../shared/commands/index.ts'
import { AppError } from '../../../shared/errors.ts'
import { same } from '../../../shared/sync/same.ts'
import type { KnownCommand } from './logRepo.ts'

/** Whether this is the command the log knows under its id. Where its author stood is no part of it: a queue may be sent again later. */
export const isSameCommand = (actor: Actor, command: Command, known: Omit<KnownCommand, 'version'>): boolean =>
  known.actorId === actor.id && known.verb === command.verb && same(known.args, command.args)

export const reused = (commandId: string) => new AppError('command_id_reused', 'This command’s id belongs to another command. Nothing was changed', { commandId })
