import { createServer, type Server } from 'node:http'
import pino, { type Logger } from 'pino'
import { createApp } from '../app.ts'
import { durabilityFaults } from '../db/assertDurable.ts'
import { openDatabase, type Database } from '../db/client.ts'
import { migrateDatabase } from '../db/migrate.ts'
import { loadDemo } from '../demo/loadDemo.ts'
import type { AppDeps } from '../http/deps.ts'
import { isFree, startMariadb } from './mariadb.ts'
import { ensureInstalled } from './installed.ts'
import type { Settings } from './settings.ts'

export interface Serving {
  readonly address: string
  readonly stop: () => Promise<void>
  /** Resolves when the database has gone by itself. */
  readonly databaseGone: Promise<void>
}

/** Everything behind the address: database, migration, demo company, application. Throws an Error with a sentence. */
export async function serve(settings: Settings, options: { clientFolder: string | null; say: (line: string) => void; log?: Logger }): Promise<Serving> {
  const { say } = options
  if (!(await isFree(settings.port))) throw new Error(`Port ${settings.port} is in use. Set PORT to another, for instance PORT=${settings.port + 1} npm start`)
  const log = options.log ?? pino({ level: process.env['LOG_LEVEL'] ?? 'warn' })
  const running = settings.databaseUrl === undefined ? await startOwn(settings, say) : undefined
  const url = settings.databaseUrl ?? running!.url
  const closing = new AbortController()
  let database: Database | undefined
  let server: Server | undefined
  const stop = async () => {
    closing.abort()
    if (server) await closeServer(server)
    await database?.close()
    await running?.stop()
  }
  try {
    await migrateDatabase(url)
    database = openDatabase(url)
    const faults = await durabilityFaults(database.db)
    if (faults.length) throw new Error(`The database would not keep what it acknowledged: ${faults.join('; ')}`)
    const deps: AppDeps = { db: database.db, log, sessionSecret: settings.sessionSecret, secure: settings.secure, clientFolder: options.clientFolder, bcryptCost: 12, closing: closing.signal }
    await loadDemo(deps, say)
    server = await listen(createServer({ requestTimeout: 60_000, headersTimeout: 10_000 }, createApp(deps)), settings.port)
  } catch (error) {
    await stop()
    throw error
  }
  const databaseGone = running ? new Promise<void>((gone) => running.process.once('exit', () => !closing.signal.aborted && gone())) : new Promise<void>(() => undefined)
  return { address: `http://127.0.0.1:${settings.port}`, stop, databaseGone }
}

async function startOwn(settings: Settings, say: (line: string) => void) {
  ensureInstalled([{ package: 'mariadb-server', program: 'mariadbd' }], say)
  return startMariadb(settings.dataFolder)
}

const listen = (server: Server, port: number) =>
  new Promise<Server>((done, fail) => {
    server.once('error', fail)
    server.listen(port, '127.0.0.1', () => done(server))
  })

/** Takes nothing new, lets what runs finish, and after eight seconds cuts off what does not. */
const closeServer = (server: Server) =>
  new Promise<void>((done) => {
    const cut = setTimeout(() => server.closeAllConnections(), 8000)
    server.close(() => {
      clearTimeout(cut)
      done()
    })
    server.closeIdleConnections()
  })
