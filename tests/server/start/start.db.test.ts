import { cpSync, existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import mysql from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { freePort } from '../../../server/start/ports.ts'
import { databaseProcessOf, startServer, untilServing, type StartedServer } from '../../support/startedServer.ts'

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
/** A folder that was started and stopped before. */
const used = (folder: string) => {
  cpSync(join(root, 'first'), join(root, folder), { recursive: true })
  return folder
}
const stop = async (server: StartedServer, signal: NodeJS.Signals = 'SIGTERM') => {
  server.process.kill(signal)
  return server.ended
}

async function signIn({ address }: StartedServer): Promise<(method: string, path: string, body?: object) => Promise<Response>> {
  const json = { 'Content-Type': 'application/json' }
  const signedIn = await fetch(`${address}/api/session`, { method: 'POST', headers: json, body: JSON.stringify({ email: 'owner@larkhook.example', passphrase: demoPassphrase }) })
  expect(signedIn.status).toBe(200)
  const cookie = signedIn.headers.getSetCookie()[0]!.split(';')[0]!
  return (method, path, body) => fetch(`${address}${path}`, { method, headers: { ...json, cookie }, ...(body ? { body: JSON.stringify(body) } : {}) })
}
const nameOf = async (server: StartedServer) => ((await (await (await signIn(server))('GET', '/api/company')).json()) as { name: string; version: number }).name
async function rename(server: StartedServer, name: string) {
  const send = await signIn(server)
  const { version } = (await (await send('GET', '/api/company')).json()) as { version: number }
  expect((await send('PATCH', '/api/company', { version, name })).status).toBe(200)
}

let first: StartedServer
beforeAll(async () => {
  first = await serving('first')
})

describe('a first start', () => {
  it('prepares a private folder, a database that keeps what it acknowledges, and the demo jobs', async () => {
    const server = first
    const folder = join(root, 'first')
    expect(statSync(folder).mode & 0o777).toBe(0o700)
    for (const file of ['database.json', 'session-secret']) expect(statSync(join(folder, file)).mode & 0o777, file).toBe(0o600)
    const { jobs } = (await (await (await signIn(server))('GET', '/api/jobs')).json()) as { jobs: unknown[] }
    expect(jobs.length).toBeGreaterThan(0)
    const { port, password } = JSON.parse(readFileSync(join(folder, 'database.json'), 'utf8')) as { port: number; password: string }
    const connection = await mysql.createConnection({ host: '127.0.0.1', port, user: 'mudring', password, database: 'mudring' })
    const [[row]] = await connection.query<mysql.RowDataPacket[]>(
      'SELECT @@innodb_flush_log_at_trx_commit AS flush, @@innodb_doublewrite AS doublewrite, @@innodb_snapshot_isolation AS snapshot, @@innodb_rollback_on_timeout AS rollback, @@bind_address AS bind, @@character_set_server AS charset, @@global.time_zone AS zone, @@sql_mode LIKE "%STRICT_TRANS_TABLES%" AS strict',
    )
    expect(row).toEqual({ flush: 1, doublewrite: 1, snapshot: 1, rollback: 1, bind: '127.0.0.1', charset: 'utf8mb4', zone: '+00:00', strict: 1 })
    await connection.end()
    await expect(mysql.createConnection({ host: '127.0.0.1', port, user: 'root', password: '' }), 'root over the network').rejects.toThrow()
    await expect(mysql.createConnection({ host: '127.0.0.1', port, user: '', password: '' }), 'nobody in particular').rejects.toThrow()
  })
})

describe('a stop and a second start', () => {
  it('end the server, then the database, and find everything again', async () => {
    const folder = join(root, 'first')
    await rename(first, 'Renamed before the stop')
    expect(databaseProcessOf(folder)).toBeDefined()
    expect(await stop(first, 'SIGINT')).toBe(0)
    expect(databaseProcessOf(folder)).toBeUndefined()
    expect(readFileSync(join(folder, 'mariadb.log'), 'utf8').trimEnd()).toMatch(/Shutdown complete$/)
    const remembered = JSON.parse(readFileSync(join(folder, 'database.json'), 'utf8')) as unknown
    const second = await serving('first')
    expect(await nameOf(second)).toBe('Renamed before the stop')
    expect(second.said()).not.toContain('demo')
    expect(JSON.parse(readFileSync(join(folder, 'database.json'), 'utf8'))).toEqual(remembered)
    await rename(second, 'Larkhook Low Voltage')
    await stop(second)
  })
  it('end streams that are open, and answer what was asked before', async () => {
    const server = await serving(used('two-b'))
    const send = await signIn(server)
    const { jobs } = (await (await send('GET', '/api/jobs')).json()) as { jobs: { id: string }[] }
    const stream = await send('GET', `/api/jobs/${jobs[0]!.id}/events`)
    expect(stream.headers.get('content-type')).toContain('event-stream')
    const asked = Array.from({ length: 10 }, () => send('GET', '/api/company').then((response) => response.status))
    await new Promise((done) => setTimeout(done, 30))
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
    const before = await serving(used('three'))
    await rename(before, 'Renamed before the kill')
    expect(await stop(before, 'SIGKILL')).toBe('SIGKILL')
    const orphan = databaseProcessOf(join(root, 'three'))
    expect(orphan).toBeDefined()
    const second = await serving('three')
    expect(await nameOf(second)).toBe('Renamed before the kill')
    expect(existsSync(`/proc/${orphan}`) && databaseProcessOf(join(root, 'three')) === orphan).toBe(false)
  })
  it('of server and database, nothing acknowledged is lost', async () => {
    const before = await serving(used('four'))
    await rename(before, 'Renamed and acknowledged')
    process.kill(databaseProcessOf(join(root, 'four'))!, 'SIGKILL')
    before.process.kill('SIGKILL')
    await before.ended
    expect(await nameOf(await serving('four'))).toBe('Renamed and acknowledged')
  })
  it('of the database alone, the server says so and ends', async () => {
    const server = await serving('four')
    process.kill(databaseProcessOf(join(root, 'four'))!, 'SIGKILL')
    expect(await server.ended).toBe(1)
  })
  it('in the middle of the first start, the next one begins again', async () => {
    for (const afterMs of [300, 900, 1500, 2100]) {
      const killed = await start('five')
      await new Promise((done) => setTimeout(done, afterMs))
      await stop(killed, 'SIGKILL')
    }
    expect(await nameOf(await serving('five'))).toBe('Larkhook Low Voltage')
  }, 90_000)
})

describe('two starts', () => {
  it('on two folders and ports run side by side and know nothing of each other', async () => {
    const [left, right] = await Promise.all([serving(used('six')), serving(used('seven'))])
    await rename(left, 'The left one')
    expect(await nameOf(right)).toBe('Larkhook Low Voltage')
    expect(await stop(left)).toBe(0)
    expect(await nameOf(right)).toBe('Larkhook Low Voltage')
  })
  it('on one folder: the second is refused with a sentence, the first serves on', async () => {
    const before = await serving(used('eight'))
    const second = await start('eight')
    expect(await second.ended).toBe(1)
    expect(second.said()).toContain(`Mudring is running already on ${join(root, 'eight')} (process ${before.process.pid})`)
    expect(await nameOf(before)).toBe('Larkhook Low Voltage')
  })
  it('on one port: the second says what to do', async () => {
    const before = await serving(used('nine'))
    const second = await start('ten', { PORT: new URL(before.address).port })
    expect(await second.ended).toBe(1)
    expect(second.said()).toMatch(/Port \d+ is in use.*PORT=\d+ npm start/)
    expect(existsSync(join(root, 'ten/data'))).toBe(false)
  })
})

describe('a start is refused', () => {
  it('in a folder of somebody else’s files, which are left alone', async () => {
    const folder = mkdtempSync(join(root, 'others-'))
    writeFileSync(join(folder, 'letter.txt'), 'dear')
    const server = await start(folder.slice(root.length + 1))
    expect(await server.ended).toBe(1)
    expect(server.said()).toContain('holds other files')
    expect(existsSync(join(folder, 'session-secret'))).toBe(false)
  })
  it('with settings that make no sense, all of them named', async () => {
    const server = await start('eleven', { PORT: '99999', LOG_LEVEL: 'loud', DATABASE_URL: 'postgres://x' })
    expect(await server.ended).toBe(1)
    expect(server.said()).toMatch(/PORT must be 1 to 65535.*DATABASE_URL begins with mysql:\/\/.*LOG_LEVEL is one of/s)
  })
  it('on a database that would not keep what it acknowledges', async () => {
    const server = await start('twelve', { DATABASE_URL: inject('migrationUrl') })
    expect(await server.ended).toBe(1)
    expect(server.said()).toContain('innodb_flush_log_at_trx_commit is 0, not 1')
    expect(server.said()).toContain('innodb_doublewrite is')
  })
  it('on a database that is not there', async () => {
    const server = await start('thirteen', { DATABASE_URL: 'mysql://mudring:x@127.0.0.1:9/mudring' })
    expect(await server.ended).toBe(1)
    expect(server.said()).toContain('ECONNREFUSED')
  })
})
