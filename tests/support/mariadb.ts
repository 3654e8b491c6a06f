import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { TestProject } from 'vitest/node'
import { ensureInstalled } from '../../server/start/installed.ts'
import { startMariadb } from '../../server/start/mariadb.ts'

declare module 'vitest' {
  interface ProvidedContext {
    /** As the application's own user: rows only. */
    databaseUrl: string
    /** As the user who makes schemas and migrates. */
    migrationUrl: string
  }
}

/** One throw-away MariaDB for the whole run of database tests; each test file makes a schema of its own on it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { DATABASE_URL: given, DATABASE_MIGRATION_URL: givenForMigration } = process.env
  if (given) {
    provide(project, given, givenForMigration ?? given)
    return async () => undefined
  }
  ensureInstalled([{ package: 'mariadb-server', program: 'mariadbd' }], console.log)
  const folder = mkdtempSync(join(tmpdir(), 'mudring-test-'))
  const database = await startMariadb(folder, { throwAway: true })
  provide(project, database.url, database.migrationUrl)
  return async () => {
    await database.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

function provide(project: TestProject, url: string, migrationUrl: string) {
  project.provide('databaseUrl', url.replace(/^mariadb:/, 'mysql:'))
  project.provide('migrationUrl', migrationUrl.replace(/^mariadb:/, 'mysql:'))
}
