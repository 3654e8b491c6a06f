import { setMaxListeners } from 'node:events'
import type { Express } from 'express'
import pino from 'pino'
import request from 'supertest'
import { createApp } from '../../server/app.ts'
import { openDatabase, type Database } from '../../server/db/client.ts'
import { migrateDatabase } from '../../server/db/migrate.ts'
import { demoPassphrase } from '../../server/demo/demoCompany.ts'
import { insertDemoCompanies } from '../../server/demo/loadDemo.ts'
import type { AppDeps } from '../../server/http/deps.ts'
import { makeSchema } from './testSchema.ts'

export type Agent = ReturnType<typeof request.agent>

export interface TestApp {
  readonly app: Express
  readonly deps: AppDeps
  readonly database: Database
  readonly url: string
  /** A browser signed in as this demo member, such as "designer@larkhook.example". */
  readonly signIn: (email: string) => Promise<Agent>
  readonly close: () => Promise<void>
}

/** A schema of its own with both demo companies, and the application on it. */
export async function startTestApp(changed: Partial<AppDeps> = {}): Promise<TestApp> {
  const schema = await makeSchema()
  await migrateDatabase(schema.migrationUrl)
  const database = openDatabase(schema.url)
  const closing = new AbortController()
  setMaxListeners(0, closing.signal)
  const deps: AppDeps = {
    db: database.db,
    log: pino({ level: 'silent' }),
    sessionSecret: 'a secret of the tests',
    secure: false,
    clientFolder: null,
    // Quick hashes: what is tested is not how long they take.
    bcryptCost: 4,
    closing: closing.signal,
    ...changed,
  }
  await insertDemoCompanies(deps)
  const app = createApp(deps)
  return {
    app,
    deps,
    database,
    url: schema.url,
    signIn: async (email) => {
      const agent = request.agent(app)
      const response = await agent.post('/api/session').send({ email, passphrase: demoPassphrase })
      if (response.status !== 200) throw new Error(`${email} could not sign in: ${response.status} ${response.text}`)
      return agent
    },
    close: async () => {
      closing.abort()
      await database.close()
      await schema.drop()
    },
  }
}
