import { and, count, eq, or, sql } from 'drizzle-orm'
import type { Job } from '../../../shared/model/job.ts'
import type { Db, Session, Tx } from '../../db/client.ts'
import { oncePerDatabase } from '../../db/oncePerDatabase.ts'
import { jobRecordOf, jobRow } from '../../db/rows/jobRows.ts'
import { momentColumn, momentOf } from '../../db/rows/leafs.ts'
import { runs } from '../../db/tables/cabling.ts'
import { jobLog, jobs } from '../../db/tables/jobs.ts'
import { levels } from '../../db/tables/places.ts'
import type { JobScope } from './documentRepo.ts'

const isJob = ({ companyId, jobId }: JobScope) => and(eq(jobs.companyId, companyId), eq(jobs.id, jobId))

/** Takes the turn to write to a job and tells its version, or undefined. The first statement of its transaction. */
export async function lockJob(tx: Tx, scope: JobScope): Promise<number | undefined> {
  const [row] = await tx.select({ version: jobs.version }).from(jobs).where(isJob(scope)).for('update')
  return row?.version
}

const versionOfJob = oncePerDatabase((db) =>
  db.select({ version: jobs.version }).from(jobs).where(and(eq(jobs.companyId, sql.placeholder('companyId')), eq(jobs.id, sql.placeholder('jobId')))).prepare(),
)
/** A job's version, or undefined where the company has no such job. */
export async function versionOf(db: Session, scope: JobScope): Promise<number | undefined> {
  const [row] = await versionOfJob(db).execute({ ...scope })
  return row?.version
}

/** The versions of many jobs in one statement. */
export async function versionsOf(db: Db, scopes: readonly JobScope[]): Promise<(JobScope & { readonly version: number })[]> {
  if (!scopes.length) return []
  return db.select({ companyId: jobs.companyId, jobId: jobs.id, version: jobs.version }).from(jobs).where(or(...scopes.map(isJob)))
}

export async function setVersion(tx: Tx, scope: JobScope, version: number): Promise<void> {
  await tx.update(jobs).set({ version }).where(isJob(scope))
}

export interface NewJob {
  readonly companyId: string
  readonly job: Job
  readonly createdById: string
  readonly createdAt: string
}

export async function insertJob(tx: Session, { companyId, job, createdById, createdAt }: NewJob): Promise<void> {
  await tx.insert(jobs).values({ companyId, ...jobRow(job), createdById, createdAt: momentColumn(createdAt) })
}

/** A job's own record, its version and who made it, or undefined. */
export async function findJob(db: Session, scope: JobScope): Promise<{ job: Job; version: number; createdById: string } | undefined> {
  const [row] = await db.select().from(jobs).where(isJob(scope))
  return row && { job: jobRecordOf(row), version: row.version, createdById: row.createdById }
}

/** What the list of jobs shows of each, and the last entry of its log. Four statements for any number of jobs. */
export async function listJobRows(db: Db, companyId: string) {
  const [rows, levelCounts, runCounts] = await Promise.all([
    db
      .select({
        id: jobs.id, name: jobs.name, client: jobs.client, address: jobs.address, version: jobs.version, createdAt: jobs.createdAt, createdById: jobs.createdById,
        lastById: jobLog.actorId, lastLabel: jobLog.label, lastAt: jobLog.at,
      })
      .from(jobs)
      .leftJoin(jobLog, and(eq(jobLog.companyId, jobs.companyId), eq(jobLog.jobId, jobs.id), eq(jobLog.version, jobs.version)))
      .where(eq(jobs.companyId, companyId)),
    db.select({ jobId: levels.jobId, number: count() }).from(levels).where(eq(levels.companyId, companyId)).groupBy(levels.jobId),
    db.select({ jobId: runs.jobId, number: count() }).from(runs).where(eq(runs.companyId, companyId)).groupBy(runs.jobId),
  ])
  const levelsOf = new Map(levelCounts.map(({ jobId, number }) => [jobId, number]))
  const runsOf = new Map(runCounts.map(({ jobId, number }) => [jobId, number]))
  return rows.map(({ createdAt, createdById, lastById, lastLabel, lastAt, ...row }) => ({
    ...row,
    createdAt: momentOf(createdAt),
    levels: levelsOf.get(row.id) ?? 0,
    runs: runsOf.get(row.id) ?? 0,
    lastWord: lastById && lastLabel && lastAt ? { byId: lastById, label: lastLabel, at: momentOf(lastAt) } : { byId: createdById, label: 'Create the job', at: momentOf(createdAt) },
  }))
}
