import { bigint, index, int, mysqlTable, text, varchar } from 'drizzle-orm/mysql-core'
import { idColumn } from '../columns.ts'

/**
 * Signed-in sessions, by the hash of their id: whoever reads the table cannot take one over. Times in ms since 1970.
 */
export const sessions = mysqlTable(
  'sessions',
  {
    idHash: idColumn('id_hash').primaryKey(),
    companyId: idColumn('company_id'),
    memberId: idColumn('member_id'),
    data: text('data').notNull(),
    createdAt: bigint('created_at', { mode: 'number' }).notNull(),
    idleUntil: bigint('idle_until', { mode: 'number' }).notNull(),
  },
  (table) => [index('sessions_member').on(table.companyId, table.memberId), index('sessions_idle').on(table.idleUntil)],
)

/** Attempts to sign in within a window, by a hash of who tries; a success takes its own back. */
export const signInAttempts = mysqlTable('sign_in_attempts', {
  subject: varchar('subject', { length: 80 }).primaryKey(),
  attempts: int('attempts').notNull(),
  windowEnds: bigint('window_ends', { mode: 'number' }).notNull(),
})
