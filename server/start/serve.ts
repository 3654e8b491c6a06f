import { setMaxListeners } from 'node:events'
import { createServer, type Server } from 'node:http'
import { setTimeout as pause } from 'node:timers/promises'
import { createApp } from '../app.ts'
import { durabilityFaults } from '../db/assertDurable.ts'
import { openDatabase, type Database } from '../db/client.ts'
import { migrateDatabase } from '../db/migrate.ts'
import { loadDemo } from '../demo/loadDemo.ts'
import type { AppDeps } from '../http/deps.ts'
import { createLogger } from '../http/logger.ts'
import { databaseOf, type DatabaseHere } from './ownDatabase.ts'
import { assertPortFree } from './ports.ts'
import type { Settings } from './settings.ts'

export interface Serving {
  readonly address: string
  readonly stop: () => Promise<void>
  /** Resolves when the database has gone by itself. */
  readonly databaseGone: Promise<void>
}

/** bcrypt's work factor: about a third of a second a try, on another thread than the one that answers. */
const bcryptCost = 12

/** Everything behind the address: database, migration, demo company, application. Throws an Error with a sentence. */
export async function serve(
  settings: Settings,
  options: { readonly clientFolder: string | null; readonly say: (line: string) => void },
): Promise<Serving> {
  await assertPortFree(settings.port)
  const closing = new AbortController()
  // Every open stream listens for it.
  setMaxListeners(0, closing.signal)
  let here: DatabaseHere | undefined
  let database: Database | undefined
  let server: Server | undefined
  const stop = async () => {
    closing.abort()
    if (server) await closeServer(server)
    await database?.close()
    await here?.stop()
  }
  try {
    here = await databaseOf(settings, options.say)
    await migrateDatabase(here.migrationUrl)
    database = openDatabase(here.url)
    const faults = await durabilityFaults(database.db)
    if (faults.length)
      throw new Error(
        `The database would not keep what it acknowledged, so Mudring does not serve on it: ${faults.join('; ')}`,
      )
    const deps: AppDeps = {
      db: database.db,
      log: createLogger(settings.logLevel),
      sessionSecret: settings.sessionSecret,
      secure: settings.secure,
      clientFolder: options.clientFolder,
      bcryptCost,
      closing: closing.signal,
    }
    await loadDemo(deps, options.say)
    server = await listen(
      createServer({ requestTimeout: 60_000, headersTimeout: 10_000 }, createApp(deps)),
      settings.port,
    )
    return { address: `http://127.0.0.1:${settings.port}`, stop, databaseGone: here.gone }
  } catch (error) {
    await stop()
    throw error
  }
}

const listen = (server: Server, port: number) =>
  new Promise<Server>((done, fail) => {
    server.once('error', fail)
    server.listen(port, '127.0.0.1', () => done(server))
  })

/** How long requests that are on their way are still taken; each answer then says that the connection ends with it. */
const graceMs = 300
/** How long what runs may take to finish. */
const patienceMs = 8000

/** Lets what was asked finish, takes nothing new, and cuts off what does not end. */
async function closeServer(server: Server): Promise<void> {
  await pause(graceMs)
  await new Promise<void>((done) => {
    const cut = setTimeout(() => server.closeAllConnections(), patienceMs)
    server.close(() => {
      clearTimeout(cut)
      done()
    })
  })
}
