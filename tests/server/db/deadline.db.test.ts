import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import mysql from 'mysql2/promise'
import pino from 'pino'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../../server/app.ts'
import { openDatabase, type Database } from '../../../server/db/client.ts'
import { connectionDeadlineMs, statementDeadlineMs } from '../../../server/db/deadline.ts'
import { migrateDatabase } from '../../../server/db/migrate.ts'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { insertDemoCompanies } from '../../../server/demo/loadDemo.ts'
import { startMariadb, type RunningDatabase } from '../../../server/start/mariadb.ts'
import { expectProblem } from '../../support/problem.ts'
import type { Agent } from '../../support/testApp.ts'

// A server of this test's own, because it is frozen and killed here.
const folder = mkdtempSync(join(tmpdir(), 'mudring-deadline-'))
let mariadb: RunningDatabase
let database: Database
let owner: Agent
let app: ReturnType<typeof createApp>

beforeAll(async () => {
  mariadb = await startMariadb(folder, { throwAway: true })
  await migrateDatabase(mariadb.migrationUrl)
  database = openDatabase(mariadb.url)
  const deps = {
    db: database.db,
    log: pino({ level: 'silent' }),
    sessionSecret: 'a secret of the tests',
    secure: false,
    clientFolder: null,
    bcryptCost: 4,
    closing: new AbortController().signal,
  }
  await insertDemoCompanies(deps)
  app = createApp(deps)
  owner = request.agent(app)
  expect(
    (await owner.post('/api/session').send({ email: 'owner@larkhook.example', passphrase: demoPassphrase })).status,
  ).toBe(200)
})
afterAll(async () => {
  await database.close()
  await mariadb.stop()
  rmSync(folder, { recursive: true, force: true })
})

const read = () => owner.get('/api/company')
const write = () => owner.patch('/api/members/larkhook-lead').send({ name: 'Lane Garrity' })
const mostMs = connectionDeadlineMs + statementDeadlineMs

async function timed<T>(work: PromiseLike<T>): Promise<{ answer: T; ms: number }> {
  const start = performance.now()
  const answer = await work
  return { answer, ms: performance.now() - start }
}

/** Answered again, and how long that took. */
async function untilWell(): Promise<number> {
  const start = performance.now()
  while ((await read()).status !== 200) {
    if (performance.now() - start > 10_000) throw new Error('Not well again within ten seconds')
    await pause(50)
  }
  return performance.now() - start
}

describe('a database that is frozen', () => {
  it('is answered for as not available, within five seconds and for everybody, and then works by itself', async () => {
    expect(mostMs).toBeLessThanOrEqual(5000)
    mariadb.process.kill('SIGSTOP')
    // More than the pool has connections: those who wait for one get their answer as well.
    const all = await Promise.all([
      ...Array.from({ length: 15 }, () => timed(read())),
      ...Array.from({ length: 15 }, () => timed(write())),
    ])
    for (const { answer, ms } of all) {
      expectProblem(answer, 503)
      expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0)
      expect(ms).toBeLessThan(mostMs + 1000)
    }
    mariadb.process.kill('SIGCONT')
    expect(await untilWell()).toBeLessThan(2000)
    const after = await Promise.all(Array.from({ length: 30 }, (_, i) => (i % 2 ? read() : write())))
    expect(new Set(after.map((response) => response.status))).toEqual(new Set([200]))
  })
})

describe('a row that somebody holds', () => {
  it('is waited for, but not for ever; a quick statement beside it is not kept waiting', async () => {
    const holder = await mysql.createConnection({ uri: mariadb.url })
    await holder.query('BEGIN')
    await holder.query("SELECT * FROM members WHERE company_id = 'larkhook' FOR UPDATE")
    const [held, quick] = await Promise.all([timed(write()), timed(read())])
    expectProblem(held.answer, 503)
    expect(held.ms).toBeLessThan(mostMs + 500)
    expect(quick.answer.status).toBe(200)
    expect(quick.ms).toBeLessThan(1000)
    const waiting = timed(write())
    await pause(500)
    await holder.query('ROLLBACK')
    await holder.end()
    expect((await waiting).answer.status).toBe(200)
  })
})

describe('a database that is gone', () => {
  it('is answered for at once, and used again when it is back, without anybody’s doing', async () => {
    const { process: old } = mariadb
    const exited = new Promise((done) => old.once('exit', done))
    old.kill('SIGKILL')
    await exited
    for (let i = 0; i < 15; i++) {
      const { answer, ms } = await timed(i % 2 ? read() : write())
      expectProblem(answer, 503)
      expect(ms).toBeLessThan(1000)
    }
    mariadb = await startMariadb(folder, { throwAway: true })
    expect(await untilWell()).toBeLessThan(2000)
    expect((await write()).status).toBe(200)
  })
})
