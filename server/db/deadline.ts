import type { Pool, PoolConnection, QueryOptions, QueryValues } from 'mysql2/promise'

/** How long a caller waits for a connection of the pool. */
export const connectionDeadlineMs = 2000
/** How long one statement may take. The server stops it a little earlier by itself, which keeps the connection. */
export const statementDeadlineMs = 3000

interface Deadlines {
  readonly connectionMs: number
  readonly statementMs: number
}

/** What mysql2 says by its own `timeout`; waiting too long for a connection is the same to whoever waited. */
const timedOut = 'PROTOCOL_SEQUENCE_TIMEOUT'

class NoConnection extends Error {
  readonly code = timedOut
  constructor() {
    super('No connection to the database became free in time')
  }
}

/**
 * Gives every statement on this pool an end, so that a database that hangs is answered like one that is gone.
 * A connection whose statement ran out of time is thrown away, since its answer may still come.
 */
export function withDeadlines(pool: Pool, { connectionMs, statementMs }: Deadlines): Pool {
  const acquire = pool.getConnection.bind(pool)

  const getConnection = async (): Promise<PoolConnection> =>
    limitStatements(await inTime(acquire(), connectionMs), statementMs)

  const query = async (...given: Parameters<PoolConnection['query']>) => {
    const connection = await getConnection()
    try {
      return await connection.query(...given)
    } finally {
      connection.release()
    }
  }
  return Object.assign(pool, { getConnection, query })
}

/** A connection that comes too late goes back at once. */
function inTime(coming: Promise<PoolConnection>, deadlineMs: number): Promise<PoolConnection> {
  return new Promise((done, fail) => {
    let late = false
    const timer = setTimeout(() => {
      late = true
      fail(new NoConnection())
    }, deadlineMs)
    coming.then(
      (connection) => {
        clearTimeout(timer)
        if (late) connection.release()
        else done(connection)
      },
      (error: unknown) => {
        clearTimeout(timer)
        fail(error instanceof Error ? error : new Error(String(error)))
      },
    )
  })
}

function limitStatements(connection: PoolConnection, statementMs: number): PoolConnection {
  const run = connection.query.bind(connection)
  const query = async (statement: string | QueryOptions, values?: QueryValues) => {
    const options = typeof statement === 'string' ? { sql: statement } : statement
    try {
      return await run({ ...options, timeout: statementMs }, values)
    } catch (error) {
      if ((error as { code?: string }).code === timedOut) connection.destroy()
      throw error
    }
  }
  return Object.assign(connection, { query })
}
