import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { TestProject } from 'vitest/node'
import { ensureInstalled } from '../../server/start/installed.ts'
import { startMariadb } from '../../server/start/mariadb.ts'

declare module 'vitest' {
  interface ProvidedContext {
    databaseUrl: string
  }
}

/** One throw-away MariaDB for the whole run of database tests; each test file makes a schema of its own on it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env['DATABASE_URL']
  if (given) {
    project.provide('databaseUrl', given.replace(/^mariadb:/, 'mysql:'))
    return async () => undefined
  }
  ensureInstalled([{ package: 'mariadb-server', program: 'mariadbd' }], console.log)
  const folder = mkdtempSync(join(tmpdir(), 'mudring-test-'))
  const database = await startMariadb(folder, { throwAway: true })
  project.provide('databaseUrl', database.url)
  return async () => {
    await database.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}
