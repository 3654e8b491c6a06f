import { and, asc, eq, gt, inArray, lte, ne, sql } from 'drizzle-orm'
import type { LogEntry } from '../../../shared/api/jobs.ts'
import type { LoggedChange } from '../../../shared/sync/conflict.ts'
import type { Session, Tx } from '../../db/client.ts'
import { momentColumn, momentOf } from '../../db/rows/leafs.ts'
import { oncePerDatabase } from '../../db/oncePerDatabase.ts'
import { jobLog } from '../../db/tables/jobs.ts'
import type { JobScope } from './documentRepo.ts'

const isOf = ({ companyId, jobId }: JobScope) => and(eq(jobLog.companyId, companyId), eq(jobLog.jobId, jobId))

export interface NewEntry extends LogEntry {
  readonly args: unknown
  readonly madeAt: number
}

export async function appendLog(tx: Tx, scope: JobScope, entry: NewEntry): Promise<void> {
  await tx.insert(jobLog).values({ ...scope, ...entry, at: momentColumn(entry.at) })
}

const entriesSince = oncePerDatabase((db) =>
  db
    .select({ version: jobLog.version, commandId: jobLog.commandId, actorId: jobLog.actorId, verb: jobLog.verb, label: jobLog.label, at: jobLog.at, change: jobLog.change })
    .from(jobLog)
    .where(and(eq(jobLog.companyId, sql.placeholder('companyId')), eq(jobLog.jobId, sql.placeholder('jobId')), gt(jobLog.version, sql.placeholder('version'))))
    .orderBy(asc(jobLog.version))
    .limit(sql.placeholder('limit'))
    .prepare(),
)
/** What happened after a version, in order, the first `limit` entries. */
export async function logSince(db: Session, scope: JobScope, version: number, limit: number): Promise<LogEntry[]> {
  const rows = await entriesSince(db).execute({ ...scope, version, limit })
  return rows.map((row) => ({ ...row, at: momentOf(row.at) }))
}

/** What others than this member wrote after one version and up to another, in order. */
export async function othersSince(tx: Tx, scope: JobScope, actorId: string, after: number, upTo: number): Promise<LoggedChange[]> {
  return tx
    .select({ version: jobLog.version, actorId: jobLog.actorId, change: jobLog.change })
    .from(jobLog)
    .where(and(isOf(scope), gt(jobLog.version, after), lte(jobLog.version, upTo), ne(jobLog.actorId, actorId)))
    .orderBy(asc(jobLog.version))
}

export interface KnownCommand {
  readonly commandId: string
  readonly version: number
  readonly actorId: string
  readonly verb: string
  readonly args: unknown
}

/** Which of these command ids the log knows, with what was sent under them. */
export async function knownCommands(db: Session, scope: JobScope, commandIds: readonly string[]): Promise<KnownCommand[]> {
  if (!commandIds.length) return []
  return db
    .select({ commandId: jobLog.commandId, version: jobLog.version, actorId: jobLog.actorId, verb: jobLog.verb, args: jobLog.args })
    .from(jobLog)
    .where(and(isOf(scope), inArray(jobLog.commandId, [...commandIds])))
}

/** What a command of this member did and was called; never somebody else's. */
export async function changeOfCommand(tx: Tx, scope: JobScope, actorId: string, commandId: string): Promise<Pick<LogEntry, 'verb' | 'label' | 'change'> | undefined> {
  const [row] = await tx
    .select({ verb: jobLog.verb, label: jobLog.label, change: jobLog.change })
    .from(jobLog)
    .where(and(isOf(scope), eq(jobLog.commandId, commandId), eq(jobLog.actorId, actorId)))
  return row
}
