import { describe, type Actor, type Command } from '../../../shared/commands/index.ts'
import { AppError } from '../../../shared/errors.ts'
import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import type { Change } from '../../../shared/sync/change.ts'
import { replay } from '../../../shared/sync/replay.ts'
import type { Tx } from '../../db/client.ts'
import { isRefusedByTables } from '../../db/errors.ts'
import { inTransaction } from '../../db/transaction.ts'
import { isSameCommand, reused } from './commandIdentity.ts'
import { loadJob, writeChange, type JobScope } from './documentRepo.ts'
import type { ForeignReader } from './foreignReader.ts'
import { lockJob, setVersion } from './jobRepo.ts'
import { noSuchJob, type JobsContext } from './jobsContext.ts'
import { appendLog, changeOfCommand, knownCommands } from './logRepo.ts'
import { assertStorable } from './storable.ts'

export type Outcome = { readonly version: number } | { readonly refusal: AppError }

/**
 * One command in one transaction: the job's lock first, then what the log knows, then the same replay that the client
 * ran. Only after the commit is the document kept and are others told.
 */
export async function acceptCommand(context: JobsContext, actor: Actor, scope: JobScope, command: Command, foreign: ForeignReader): Promise<Outcome> {
  const { outcome, doc, written } = await inTransaction(context.db, (tx) => decide(context, tx, actor, scope, command, foreign)).catch((error: unknown) => refusedByTables(context, command, error))
  if (doc) context.documents.keep(scope, doc)
  if (written && doc) context.feed.announce(scope, doc.version)
  return outcome
}

interface Decision {
  readonly outcome: Outcome
  readonly doc?: JobDocument
  readonly written?: true
}

async function decide(context: JobsContext, tx: Tx, actor: Actor, scope: JobScope, command: Command, foreign: ForeignReader): Promise<Decision> {
  const version = await lockJob(tx, scope)
  if (version === undefined) throw noSuchJob()
  const [known] = await knownCommands(tx, scope, [command.id])
  if (known) {
    if (!isSameCommand(actor, command, known)) throw reused(command.id)
    return { outcome: { version: known.version } }
  }
  const doc = context.documents.at(scope, version) ?? (await loadJob(tx, scope))
  if (!doc) throw noSuchJob()
  const undone = command.verb === 'revert' ? await changeOfCommand(tx, scope, actor.id, command.args.commandId) : undefined
  const foreignSince = await foreign(tx, command.madeAt, version)
  const played = play(context, doc, command, { actor, changeOf: () => undone?.change, foreignSince })
  if ('refusal' in played) return { outcome: played, doc }
  const next = { ...played.doc, version: version + 1 }
  await writeChange(tx, scope, played.change, next)
  await appendLog(tx, scope, {
    version: next.version, commandId: command.id, actorId: actor.id, verb: command.verb, label: labelOf(doc, command, undone), args: command.args,
    change: played.change, madeAt: command.madeAt, at: context.now().toISOString(),
  })
  await setVersion(tx, scope, next.version)
  return { outcome: { version: next.version }, doc: next, written: true }
}

/**
 * The tables are the second wall: what only they refuse is a fault of ours, which is reported. Sent again it would be
 * refused again, so it is a refusal and not an error, which would hold up the queue behind it for ever.
 */
function refusedByTables(context: JobsContext, command: Command, error: unknown): Decision {
  if (!isRefusedByTables(error)) throw error
  context.report(error, { commandId: command.id, verb: command.verb })
  return { outcome: { refusal: new AppError('refused', 'That does not fit what the database holds. Nothing was changed; load the job again') } }
}

/** A fault in a verb refuses that command, so that it cannot block the queue behind it; it is reported all the same. */
function play(context: JobsContext, doc: JobDocument, command: Command, replayContext: Parameters<typeof replay>[2]): { doc: JobDocument; change: Change } | { refusal: AppError } {
  try {
    assertStorable(command)
    const played = replay(doc, [command], replayContext)
    const [refusal] = played.refused
    return refusal ? { refusal: refusal.error } : { doc: played.doc, change: played.changes.get(command.id)! }
  } catch (error) {
    if (error instanceof AppError) return { refusal: error }
    context.report(error, { commandId: command.id, verb: command.verb })
    return { refusal: new AppError('refused', 'Mudring could not carry that out. Nothing was changed') }
  }
}

/** What the log calls a command; an undo is called after what it undoes. */
function labelOf(doc: JobDocument, command: Command, undone: { readonly verb: string; readonly label: string } | undefined): string {
  if (!undone) return describe(doc, command).slice(0, 300)
  return (undone.verb === 'revert' ? undone.label.replace(/^(Undo|Redo): /, (_all, word: string) => (word === 'Undo' ? 'Redo: ' : 'Undo: ')) : `Undo: ${undone.label}`).slice(0, 300)
}
