import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { JobOpened } from '../../shared/api/jobs.ts'
import { openDatabase } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { demoCompanies, demoPassphrase } from '../../server/demo/demoCompany.ts'
import { loadDemo } from '../../server/demo/loadDemo.ts'
import { playJob, type JobStory } from '../../server/demo/playJob.ts'
import { createLogger } from '../../server/http/logger.ts'
import { createJobsContext } from '../../server/modules/jobs/jobsContext.ts'
import { buildClientIfStale } from '../../server/start/buildClient.ts'
import { ensureInstalled } from '../../server/start/installed.ts'
import { startMariadb } from '../../server/start/mariadb.ts'
import { freePort } from '../../server/start/ports.ts'
import { startServer, untilServing } from '../support/startedServer.ts'

/** A program as people start it, in a process of its own, on a database that keeps what it acknowledges. */
export interface BenchWorld {
  readonly address: string
  readonly folder: string
  readonly databaseUrl: string
  /** Of the settings: whatever is served on this folder knows the same sessions. */
  readonly environment: Readonly<Record<string, string>>
  /** The Cookie header of the designer, signed in. */
  readonly cookie: string
  readonly open: (jobId: string) => Promise<JobOpened>
  readonly stop: () => Promise<void>
}

export const designer = demoCompanies[0]!.members.find(({ role }) => role === 'designer')!

/** Starts it with these jobs played into the database by the same commands that people send. */
export async function startBenchWorld(stories: readonly JobStory[], say: (line: string) => void): Promise<BenchWorld> {
  ensureInstalled([{ package: 'mariadb-server', program: 'mariadbd' }], say)
  await buildClientIfStale(say)
  const folder = mkdtempSync(join(tmpdir(), 'mudring-bench-'))
  const ends: (() => Promise<unknown>)[] = [async () => rmSync(folder, { recursive: true, force: true })]
  const stop = async () => {
    for (const end of ends.splice(0).toReversed()) await end()
  }
  try {
    const database = await startMariadb(join(folder, 'database'))
    ends.push(database.stop)
    await migrateDatabase(database.migrationUrl)
    say(`Playing ${stories.length} jobs`)
    await playAll(database.url, stories)
    const environment = { PORT: String(await freePort()), MUDRING_DATA: join(folder, 'settings'), DATABASE_URL: database.url, DATABASE_MIGRATION_URL: database.migrationUrl, LOG_LEVEL: 'error' }
    const server = startServer('start.ts', environment)
    ends.push(async () => {
      server.process.kill('SIGTERM')
      await server.ended
    })
    await untilServing(server)
    const { address } = server
    const cookie = await signIn(address)
    const open = async (jobId: string) => {
      const response = await fetch(`${address}/api/jobs/${jobId}`, { headers: { cookie } })
      if (response.status !== 200) throw new Error(`${jobId} could not be opened: ${response.status} ${await response.text()}`)
      return (await response.json()) as JobOpened
    }
    return { address, folder, databaseUrl: database.url, environment, cookie, open, stop }
  } catch (error) {
    await stop()
    throw error
  }
}

async function playAll(url: string, stories: readonly JobStory[]): Promise<void> {
  const database = openDatabase(url)
  const closing = new AbortController()
  const deps = { db: database.db, log: createLogger('error'), sessionSecret: '', secure: false, clientFolder: null, bcryptCost: 10, closing: closing.signal }
  try {
    await loadDemo(deps, () => undefined)
    const context = createJobsContext(deps)
    const [company] = demoCompanies
    for (const story of stories) await playJob(context, company!.id, (role) => company!.members.find((member) => member.role === role)!.id, story)
  } finally {
    closing.abort()
    await database.close()
  }
}

/** Signs the designer in and returns the Cookie header. */
export async function signIn(address: string): Promise<string> {
  const response = await fetch(`${address}/api/session`, {
    method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ email: designer.email, passphrase: demoPassphrase }),
  })
  const cookie = response.headers.getSetCookie()[0]?.split(';')[0]
  if (response.status !== 200 || !cookie) throw new Error(`Could not sign in: ${response.status} ${await response.text()}`)
  return cookie
}
