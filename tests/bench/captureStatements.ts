import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp } from '../../server/app.ts'
import { openDatabase } from '../../server/db/client.ts'
import { createLogger } from '../../server/http/logger.ts'
import { readSettings } from '../../server/start/settings.ts'

/** One statement as it reached the driver. */
export interface Statement {
  readonly sql: string
  readonly values: readonly unknown[]
}

interface Captured {
  readonly statements: readonly Statement[]
  readonly body: string
}

/** As the pool hands it over: the driver's own kind, with callbacks. */
interface DriverConnection {
  query: (this: DriverConnection, options: string | { sql: string; values?: unknown[] }, ...rest: unknown[]) => unknown
}

/**
 * Serves the application here for a moment on the same database, with an ear on the driver. `ask` sends one request and
 * returns what it ran and what it answered.
 */
export async function withCapture<T>(environment: NodeJS.ProcessEnv, databaseUrl: string, work: (ask: (path: string, request: RequestInit) => Promise<Captured>) => Promise<T>): Promise<T> {
  let heard: Statement[] = []
  const database = openDatabase(databaseUrl)
  database.pool.pool.on('connection', (connection: unknown) => {
    const driver = connection as DriverConnection
    const run = driver.query
    driver.query = function (options, ...rest) {
      const values = typeof options !== 'string' && options.values ? options.values : Array.isArray(rest[0]) ? (rest[0] as unknown[]) : []
      heard.push({ sql: typeof options === 'string' ? options : options.sql, values: [...values] })
      return run.call(this, options, ...rest)
    }
  })
  const closing = new AbortController()
  const { sessionSecret, secure } = readSettings(environment)
  const app = createApp({ db: database.db, log: createLogger('error'), sessionSecret, secure, clientFolder: null, bcryptCost: 10, closing: closing.signal })
  const server = createServer(app)
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done))
  try {
    return await work(async (path, request) => {
      heard = []
      const response = await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}${path}`, request)
      const body = await response.text()
      if (response.status !== 200) throw new Error(`${path}: ${response.status} ${body}`)
      // What sets a new connection up is no part of a request.
      return { statements: heard.filter(({ sql }) => !/^SET SESSION/i.test(sql)), body }
    })
  } finally {
    closing.abort()
    server.closeAllConnections()
    await new Promise((done) => server.close(done))
    await database.close()
  }
}
