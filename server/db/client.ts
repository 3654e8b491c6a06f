import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2'
import mysql from 'mysql2/promise'

/** A query that takes longer than this is given up: a frozen database is answered as one that is not there. */
export const queryDeadlineMs = 5000

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

/** Opens a pool on a MariaDB. Moments travel in UTC; a caller waits for a free connection, but never for ever. */
export function openDatabase(url: string, connectionLimit = 10): Database {
  const pool = mysql.createPool({
    uri: url,
    connectionLimit,
    queueLimit: 200,
    timezone: 'Z',
    charset: 'utf8mb4',
    dateStrings: true,
    supportBigNumbers: true,
    connectTimeout: queryDeadlineMs,
    enableKeepAlive: true,
    multipleStatements: false,
  })
  // Read-modify-write must fail rather than lose an update; a statement that runs away is stopped by the server too.
  pool.pool.on('connection', (connection: { query: (sql: string) => void }) => {
    connection.query(`SET SESSION innodb_snapshot_isolation = ON, SESSION max_statement_time = ${queryDeadlineMs / 1000}, SESSION time_zone = '+00:00'`)
  })
  return { pool, db: drizzle(pool), close: () => pool.end() }
}
