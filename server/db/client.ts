import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2'
import mysql from 'mysql2/promise'
import { connectionDeadlineMs, statementDeadlineMs, withDeadlines } from './deadline.ts'

export type Pool = mysql.Pool
export type Db = MySql2Database
export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0]
/** Whatever a repository function may be given: the pool's database, or a transaction on it. */
export type Session = Db | Tx

export interface Database {
  readonly pool: Pool
  readonly db: Db
  readonly close: () => Promise<void>
}

/**
 * Opens a pool on a MariaDB. Moments travel in UTC; no caller and no statement waits for ever. `onStatement` hears of
 * each statement without its values.
 */
export function openDatabase(url: string, connectionLimit = 10, onStatement?: (statement: string) => void): Database {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    queueLimit: 200,
    timezone: 'Z',
    charset: 'utf8mb4',
    dateStrings: true,
    supportBigNumbers: true,
    connectTimeout: connectionDeadlineMs,
    enableKeepAlive: true,
    multipleStatements: false,
    // An error's stack is complete without: Drizzle adds its own, and this would be taken for every statement that succeeds.
    trace: false,
  })
  // Read-modify-write must fail rather than lose an update; a statement that runs away is stopped by the server too.
  pool.pool.on('connection', (connection: NewConnection) => {
    const seconds = (statementDeadlineMs - 100) / 1000
    const settings = `innodb_snapshot_isolation = ON, max_statement_time = ${seconds}, time_zone = '+00:00'`
    // A connection without these promises is not one to work on; the start-up check then says which are missing.
    connection.query(`SET SESSION ${settings}`, (error) => error && connection.destroy())
  })
  const guarded = withDeadlines(pool, { connectionMs: connectionDeadlineMs, statementMs: statementDeadlineMs })
  const logger = onStatement ? { logQuery: onStatement } : false
  return { pool: guarded, db: drizzle(guarded, { logger }), close: () => pool.end() }
}

/** As the pool hands it over: the driver's own kind, with callbacks. */
interface NewConnection {
  query: (sql: string, done: (error: Error | null) => void) => void
  destroy: () => void
}
