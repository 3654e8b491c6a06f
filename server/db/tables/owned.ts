import { bigint } from 'drizzle-orm/mysql-core'
import { idColumn } from '../columns.ts'

/** What every row of a job carries: whose it is, and when it was added among its kind (records are read in that order). */
export const owned = () => ({
  companyId: idColumn('company_id').notNull(),
  jobId: idColumn('job_id').notNull(),
  id: idColumn('id').notNull(),
  seq: bigint('seq', { mode: 'number', unsigned: true }).autoincrement().notNull(),
})
