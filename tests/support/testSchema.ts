import { randomBytes } from 'node:crypto'
import mysql from 'mysql2/promise'
import { inject } from 'vitest'

/** A schema of one test's own on the run's server. */
export interface TestSchema {
  /** As the application's user. */
  readonly url: string
  /** As the user who migrates. */
  readonly migrationUrl: string
  readonly drop: () => Promise<void>
}

/** A fresh and empty schema; its name begins like the application's, because its users may only touch those. */
export async function makeSchema(): Promise<TestSchema> {
  const base = inject('migrationUrl')
  const name = `${new URL(base).pathname.slice(1)}_${randomBytes(6).toString('hex')}`
  await runAt(base, `CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`)
  return {
    url: onSchema(inject('databaseUrl'), name),
    migrationUrl: onSchema(base, name),
    drop: () => runAt(base, `DROP DATABASE IF EXISTS \`${name}\``),
  }
}

function onSchema(base: string, name: string): string {
  const url = new URL(base)
  url.pathname = `/${name}`
  return url.toString()
}

async function runAt(url: string, statement: string) {
  const connection = await mysql.createConnection({ uri: url })
  await connection.query(statement)
  await connection.end()
}
