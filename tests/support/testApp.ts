import { randomBytes } from 'node:crypto'
import type { Express } from 'express'
import mysql from 'mysql2/promise'
import pino from 'pino'
import request from 'supertest'
import { inject } from 'vitest'
import { createApp } from '../../server/app.ts'
import { openDatabase, type Database } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { demoPassphrase } from '../../server/demo/demoCompany.ts'
import { insertDemoCompanies } from '../../server/demo/loadDemo.ts'
import type { AppDeps } from '../../server/http/deps.ts'

export interface TestApp {
  readonly app: Express
  readonly deps: AppDeps
  readonly database: Database
  readonly url: string
  /** A browser that is signed in as this demo member, by the part of the address before the domain's dot: "designer@larkhook.example". */
  readonly signIn: (email: string) => Promise<ReturnType<typeof request.agent>>
  readonly close: () => Promise<void>
}

/** A schema of its own with both demo companies, and the application on it. */
export async function startTestApp(): Promise<TestApp> {
  const url = await makeSchema(inject('databaseUrl'))
  await migrateDatabase(url)
  const database = openDatabase(url)
  const closing = new AbortController()
  const deps: AppDeps = { db: database.db, log: pino({ level: 'silent' }), sessionSecret: 'a secret of the tests', secure: false, clientFolder: null, bcryptCost: 4, closing: closing.signal }
  await insertDemoCompanies(deps)
  const app = createApp(deps)
  return {
    app,
    deps,
    database,
    url,
    signIn: async (email) => {
      const agent = request.agent(app)
      const response = await agent.post('/api/session').send({ email, passphrase: demoPassphrase })
      if (response.status !== 200) throw new Error(`${email} could not sign in: ${response.status} ${response.text}`)
      return agent
    },
    close: async () => {
      closing.abort()
      await database.close()
      await dropSchema(url)
    },
  }
}

/** A fresh schema beside the given one; its name begins alike, because the application's user may only touch those. */
export async function makeSchema(baseUrl: string): Promise<string> {
  const url = new URL(baseUrl)
  const name = `${url.pathname.slice(1)}_${randomBytes(6).toString('hex')}`
  const connection = await mysql.createConnection({ uri: baseUrl })
  await connection.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`)
  await connection.end()
  url.pathname = `/${name}`
  return url.toString()
}

async function dropSchema(url: string) {
  const connection = await mysql.createConnection({ uri: url })
  await connection.query(`DROP DATABASE \`${new URL(url).pathname.slice(1)}\``)
  await connection.end()
}
