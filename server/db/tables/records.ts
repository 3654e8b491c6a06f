import { sql } from 'drizzle-orm'
import { check, datetime, foreignKey, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar, type AnyMySqlColumn } from 'drizzle-orm/mysql-core'
import { testKinds } from '../../../shared/model/fieldRecord.ts'
import { endNames } from '../../../shared/model/run.ts'
import { idColumn } from '../columns.ts'
import { runs } from './cabling.ts'
import { members } from './companies.ts'
import { jobs } from './jobs.ts'
import { owned } from './owned.ts'

type Owned = Record<'companyId' | 'jobId' | 'id', AnyMySqlColumn>

/** What every record from the field carries: by whom, and when by that person's clock. Rows are only ever added. */
const said = () => ({ ...owned(), at: datetime('at', { mode: 'string', fsp: 3 }).notNull(), byId: idColumn('by_id').notNull() })
const toMember = (name: string, table: Owned & { byId: AnyMySqlColumn }) =>
  foreignKey({ name, columns: [table.companyId, table.byId], foreignColumns: [members.companyId, members.id] })
const toRun = (name: string, table: Owned & { runId: AnyMySqlColumn }) =>
  foreignKey({ name, columns: [table.companyId, table.jobId, table.runId], foreignColumns: [runs.companyId, runs.jobId, runs.id] })
const toRecord = (name: string, table: Owned, column: AnyMySqlColumn, target: Owned) =>
  foreignKey({ name, columns: [table.companyId, table.jobId, column], foreignColumns: [target.companyId, target.jobId, target.id] })

export const labelPrints = mysqlTable(
  'label_prints',
  {
    ...said(),
    runId: idColumn('run_id').notNull(),
    end: mysqlEnum('end', endNames).notNull(),
    text: varchar('text', { length: 24 }).notNull(),
    copies: int('copies').notNull(),
    stock: varchar('stock', { length: 40 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('label_prints_seq').on(table.seq),
    toRun('label_prints_run', table),
    toMember('label_prints_member', table),
  ],
)

export const pulls = mysqlTable(
  'pulls',
  {
    ...said(),
    runId: idColumn('run_id').notNull(),
    markA: int('mark_a'),
    markB: int('mark_b'),
    markUnit: mysqlEnum('mark_unit', ['ft', 'm']).notNull(),
    spool: varchar('spool', { length: 24 }),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('pulls_seq').on(table.seq),
    toRun('pulls_run', table),
    toMember('pulls_member', table),
  ],
)

export const terminations = mysqlTable(
  'terminations',
  {
    ...said(),
    runId: idColumn('run_id').notNull(),
    end: mysqlEnum('end', endNames).notNull(),
    scheme: varchar('scheme', { length: 40 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('terminations_seq').on(table.seq),
    toRun('terminations_run', table),
    toMember('terminations_member', table),
  ],
)

export const tests = mysqlTable(
  'tests',
  {
    ...said(),
    runId: idColumn('run_id').notNull(),
    testKind: mysqlEnum('test_kind', testKinds).notNull(),
    result: mysqlEnum('result', ['pass', 'fail']).notNull(),
    reading: varchar('reading', { length: 80 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('tests_seq').on(table.seq),
    toRun('tests_run', table),
    toMember('tests_member', table),
  ],
)

/** An acceptance names what the finding was about, which may be gone since: so it holds no link. */
export const acceptances = mysqlTable(
  'acceptances',
  {
    ...said(),
    check: varchar('check', { length: 40 }).notNull(),
    aboutKind: varchar('about_kind', { length: 20 }).notNull(),
    aboutId: idColumn('about_id').notNull(),
    figures: varchar('figures', { length: 400 }).notNull(),
    reason: varchar('reason', { length: 500 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('acceptances_seq').on(table.seq),
    foreignKey({ name: 'acceptances_job', columns: [table.companyId, table.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    toMember('acceptances_member', table),
  ],
)

/** A strike names exactly one record that it strikes out. */
export const strikes = mysqlTable(
  'strikes',
  {
    ...said(),
    labelPrintId: idColumn('label_print_id'),
    pullId: idColumn('pull_id'),
    terminationId: idColumn('termination_id'),
    testId: idColumn('test_id'),
    acceptanceId: idColumn('acceptance_id'),
    strikeId: idColumn('strike_id'),
    reason: varchar('reason', { length: 200 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('strikes_seq').on(table.seq),
    toMember('strikes_member', table),
    toRecord('strikes_label_print', table, table.labelPrintId, labelPrints),
    toRecord('strikes_pull', table, table.pullId, pulls),
    toRecord('strikes_termination', table, table.terminationId, terminations),
    toRecord('strikes_test', table, table.testId, tests),
    toRecord('strikes_acceptance', table, table.acceptanceId, acceptances),
    toRecord('strikes_strike', table, table.strikeId, table),
    check(
      'strikes_one_target',
      sql`(${table.labelPrintId} is not null) + (${table.pullId} is not null) + (${table.terminationId} is not null) + (${table.testId} is not null) + (${table.acceptanceId} is not null) + (${table.strikeId} is not null) = 1`,
    ),
  ],
)
