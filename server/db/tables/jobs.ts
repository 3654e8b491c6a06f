import { datetime, foreignKey, index, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar } from 'drizzle-orm/mysql-core'
import { conductorUnits, lengthUnits } from '../../../shared/model/job.ts'
import type { Limits } from '../../../shared/model/limits.ts'
import type { Change } from '../../../shared/sync/change.ts'
import { idColumn, jsonColumn } from '../columns.ts'
import { companies, members } from './companies.ts'

/** A job's own record, and its version: the number of commands accepted. This row's lock is the turn to write. */
export const jobs = mysqlTable(
  'jobs',
  {
    companyId: idColumn('company_id').notNull(),
    id: idColumn('id').notNull(),
    version: int('version').notNull().default(0),
    createdAt: datetime('created_at', { mode: 'string', fsp: 3 }).notNull(),
    createdById: idColumn('created_by_id').notNull(),
    name: varchar('name', { length: 80 }).notNull(),
    client: varchar('client', { length: 80 }).notNull(),
    address: varchar('address', { length: 160 }).notNull(),
    lengthUnit: mysqlEnum('length_unit', lengthUnits).notNull(),
    conductorUnit: mysqlEnum('conductor_unit', conductorUnits).notNull(),
    labelPattern: varchar('label_pattern', { length: 60 }).notNull(),
    slackRackMm: int('slack_rack_mm').notNull(),
    slackPlateMm: int('slack_plate_mm').notNull(),
    limits: jsonColumn<Limits>('limits').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.id] }),
    foreignKey({ name: 'jobs_company', columns: [table.companyId], foreignColumns: [companies.id] }),
    foreignKey({ name: 'jobs_member', columns: [table.companyId, table.createdById], foreignColumns: [members.companyId, members.id] }),
  ],
)

/** Every command accepted, in order: the audit trail, the live feed, the sync and the undo history at once. Only added to. */
export const jobLog = mysqlTable(
  'job_log',
  {
    companyId: idColumn('company_id').notNull(),
    jobId: idColumn('job_id').notNull(),
    version: int('version').notNull(),
    commandId: idColumn('command_id').notNull(),
    actorId: idColumn('actor_id').notNull(),
    verb: varchar('verb', { length: 40 }).notNull(),
    /** What it was called when it was made; the words need the document as it was, so they are kept. */
    label: varchar('label', { length: 300 }).notNull(),
    args: jsonColumn<unknown>('args').notNull(),
    change: jsonColumn<Change>('change').notNull(),
    /** The version its author was looking at. */
    madeAt: int('made_at').notNull(),
    at: datetime('at', { mode: 'string', fsp: 3 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.version] }),
    unique('job_log_command').on(table.companyId, table.jobId, table.commandId),
    foreignKey({ name: 'job_log_job', columns: [table.companyId, table.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    foreignKey({ name: 'job_log_member', columns: [table.companyId, table.actorId], foreignColumns: [members.companyId, members.id] }),
    index('job_log_actor').on(table.companyId, table.actorId),
  ],
)
