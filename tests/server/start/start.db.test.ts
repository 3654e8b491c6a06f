import { existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import mysql from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, inject, it, vi } from 'vitest'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { freePort } from '../../../server/start/ports.ts'
import { databaseProcessOf, startServer, untilServing, type StartedServer } from '../../support/startedServer.ts'

// Processes take their time on a busy machine.
vi.setConfig({ testTimeout: 90_000 })

const root = mkdtempSync(join(tmpdir(), 'mudring-start-'))
const started: StartedServer[] = []
afterAll(async () => {
  for (const server of started) {
    server.process.kill('SIGTERM')
    await server.ended
  }
  rmSync(root, { recursive: true, force: true })
})

async function start(folder: string, over: Record<string, string> = {}): Promise<StartedServer> {
  const server = startServer('api.ts', { MUDRING_DATA: join(root, folder), PORT: String(await freePort()), ...over })
  started.push(server)
  return server
}
async function serving(folder: string, over: Record<string, string> = {}): Promise<StartedServer> {
  const server = await start(folder, over)
  await untilServing(server)
  return server
}
const stop = async (server: StartedServer, signal: NodeJS.Signals = 'SIGTERM') => {
  server.process.kill(signal)
  return server.ended
}

async function signIn({
  address,
}: StartedServer): Promise<(method: string, path: string, body?: object) => Promise<Response>> {
  const json = { 'Content-Type': 'application/json' }
  const signedIn = await fetch(`${address}/api/session`, {
    method: 'POST',
    headers: json,
    body: JSON.stringify({ email: 'owner@larkhook.example', passphrase: demoPassphrase }),
  })
  expect(signedIn.status).toBe(200)
  const cookie = signedIn.headers.getSetCookie()[0]!.split(';')[0]!
  return (method, path, body) =>
    fetch(`${address}${path}`, {
      method,
      headers: { ...json, cookie },
      ...(body ? { body: JSON.stringify(body) } : {}),
    })
}
const nameOf = async (server: StartedServer) =>
  ((await (await (await signIn(server))('GET', '/api/company')).json()) as { name: string; version: number }).name
async function rename(server: StartedServer, name: string) {
  const send = await signIn(server)
  const { version } = (await (await send('GET', '/api/company')).json()) as { version: number }
  expect((await send('PATCH', '/api/company', { version, name })).status).toBe(200)
}

// One life of a data folder after another: each test goes on where the one before it ended.
let server: StartedServer
const home = join(root, 'home')
beforeAll(async () => {
  server = await serving('home')
}, 120_000)

describe('a first start', () => {
  it('prepares a private folder, a database that keeps what it acknowledges, and the demo jobs', async () => {
    expect(statSync(home).mode & 0o777).toBe(0o700)
    for (const file of ['database.json', 'session-secret'])
      expect(statSync(join(home, file)).mode & 0o777, file).toBe(0o600)
    const { jobs } = (await (await (await signIn(server))('GET', '/api/jobs')).json()) as { jobs: unknown[] }
    expect(jobs.length).toBeGreaterThan(0)
    const { port, password } = JSON.parse(readFileSync(join(home, 'database.json'), 'utf8')) as {
      port: number
      password: string
    }
    const connection = await mysql.createConnection({
      host: '127.0.0.1',
      port,
      user: 'mudring',
      password,
      database: 'mudring',
    })
    const [[row]] = await connection.query<mysql.RowDataPacket[]>(
      `SELECT @@innodb_flush_log_at_trx_commit AS flush, @@innodb_doublewrite AS doublewrite,
        @@innodb_snapshot_isolation AS snapshot, @@innodb_rollback_on_timeout AS rollback, @@bind_address AS bind,
        @@character_set_server AS charset, @@global.time_zone AS zone,
        @@sql_mode LIKE '%STRICT_TRANS_TABLES%' AS strict`,
    )
    expect(row).toEqual({
      flush: 1,
      doublewrite: 1,
      snapshot: 1,
      rollback: 1,
      bind: '127.0.0.1',
      charset: 'utf8mb4',
      zone: '+00:00',
      strict: 1,
    })
    await connection.end()
    await expect(
      mysql.createConnection({ host: '127.0.0.1', port, user: 'root', password: '' }),
      'root over the network',
    ).rejects.toThrow()
    await expect(
      mysql.createConnection({ host: '127.0.0.1', port, user: '', password: '' }),
      'nobody in particular',
    ).rejects.toThrow()
  })
})

describe('another start', () => {
  it('on the same folder is refused with a sentence, and the first serves on', async () => {
    const second = await start('home')
    expect(await second.ended).toBe(1)
    expect(second.said()).toContain(`Mudring is running already on ${home} (process ${server.process.pid})`)
    expect(await nameOf(server)).toBe('Larkhook Low Voltage')
  })
  it('on the same port says what to do, and prepares nothing', async () => {
    const second = await start('elsewhere', { PORT: new URL(server.address).port })
    expect(await second.ended).toBe(1)
    expect(second.said()).toMatch(/Port \d+ is in use.*PORT=\d+ npm start/)
    expect(existsSync(join(root, 'elsewhere/data'))).toBe(false)
  })
})

describe('a stop', () => {
  it('ends the server, then the database; the next start finds everything again', async () => {
    await rename(server, 'Renamed before the stop')
    expect(databaseProcessOf(home)).toBeDefined()
    expect(await stop(server, 'SIGINT')).toBe(0)
    expect(databaseProcessOf(home)).toBeUndefined()
    expect(readFileSync(join(home, 'mariadb.log'), 'utf8').trimEnd()).toMatch(/Shutdown complete$/)
    const remembered = JSON.parse(readFileSync(join(home, 'database.json'), 'utf8')) as unknown
    server = await serving('home')
    expect(await nameOf(server)).toBe('Renamed before the stop')
    expect(server.said()).not.toContain('demo')
    expect(JSON.parse(readFileSync(join(home, 'database.json'), 'utf8'))).toEqual(remembered)
  })
  it('ends streams that are open, and answers what was asked before', async () => {
    const send = await signIn(server)
    const { jobs } = (await (await send('GET', '/api/jobs')).json()) as { jobs: { id: string }[] }
    const stream = await send('GET', `/api/jobs/${jobs[0]!.id}/events`)
    expect(stream.headers.get('content-type')).toContain('event-stream')
    const asked = Array.from({ length: 10 }, () => send('GET', '/api/company').then((response) => response.status))
    await pause(30)
    const asking = Date.now()
    const ended = stop(server)
    expect(new Set(await Promise.all(asked))).toEqual(new Set([200]))
    await stream.text()
    expect(await ended).toBe(0)
    expect(Date.now() - asking).toBeLessThan(5000)
  })
})

describe('after a kill', () => {
  it('of the server, its database is taken over in order', async () => {
    server = await serving('home')
    await rename(server, 'Renamed before the kill')
    expect(await stop(server, 'SIGKILL')).toBe('SIGKILL')
    const orphan = databaseProcessOf(home)
    expect(orphan).toBeDefined()
    server = await serving('home')
    expect(await nameOf(server)).toBe('Renamed before the kill')
    expect(databaseProcessOf(home)).not.toBe(orphan)
  })
  it('of server and database, nothing acknowledged is lost', async () => {
    await rename(server, 'Renamed and acknowledged')
    process.kill(databaseProcessOf(home)!, 'SIGKILL')
    await stop(server, 'SIGKILL')
    server = await serving('home')
    expect(await nameOf(server)).toBe('Renamed and acknowledged')
  })
  it('of the database alone, the server says so and ends', async () => {
    process.kill(databaseProcessOf(home)!, 'SIGKILL')
    expect(await server.ended).toBe(1)
  })
  it('in the middle of the first start, the next one begins again', async () => {
    for (const afterMs of [300, 1000, 1800]) {
      const killed = await start('young')
      await pause(afterMs)
      await stop(killed, 'SIGKILL')
    }
    const young = await serving('young')
    expect(await nameOf(young)).toBe('Larkhook Low Voltage')
    await stop(young)
  })
})

describe('two starts', () => {
  it('on two folders and ports run side by side and know nothing of each other', async () => {
    const [left, right] = await Promise.all([serving('home'), serving('young')])
    await rename(left, 'The left one')
    expect(await nameOf(right)).toBe('Larkhook Low Voltage')
    expect(await stop(left)).toBe(0)
    expect(await nameOf(right)).toBe('Larkhook Low Voltage')
    await stop(right)
  })
})

describe('a start is refused', () => {
  it('in a folder of somebody else’s files, which are left alone', async () => {
    const folder = mkdtempSync(join(root, 'others-'))
    writeFileSync(join(folder, 'letter.txt'), 'dear')
    const refused = await start(folder.slice(root.length + 1))
    expect(await refused.ended).toBe(1)
    expect(refused.said()).toContain('holds other files')
    expect(existsSync(join(folder, 'session-secret'))).toBe(false)
  })
  it('with settings that make no sense, all of them named', async () => {
    const refused = await start('eleven', { PORT: '99999', LOG_LEVEL: 'loud', DATABASE_URL: 'postgres://x' })
    expect(await refused.ended).toBe(1)
    expect(refused.said()).toMatch(/PORT must be 1 to 65535.*DATABASE_URL begins with mysql:\/\/.*LOG_LEVEL is one of/s)
  })
  it('on a database that would not keep what it acknowledges', async () => {
    const refused = await start('twelve', { DATABASE_URL: inject('migrationUrl') })
    expect(await refused.ended).toBe(1)
    expect(refused.said()).toContain('innodb_flush_log_at_trx_commit is 0, not 1')
    expect(refused.said()).toContain('innodb_doublewrite is')
  })
  it('on a database that is not there', async () => {
    const refused = await start('thirteen', { DATABASE_URL: 'mysql://mudring:x@127.0.0.1:9/mudring' })
    expect(await refused.ended).toBe(1)
    expect(refused.said()).toContain('ECONNREFUSED')
  })
})
