import { createServer, get, type IncomingMessage, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { setTimeout as pause } from 'node:timers/promises'
import type { Express } from 'express'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../../../server/app.ts'
import { versionEventSchema } from '../../../../shared/api/jobs.ts'
import { demoPassphrase } from '../../../../server/demo/demoCompany.ts'
import { command, push, signInAt, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let designer: Agent
let jobId: string
const servers: Server[] = []
const streams: IncomingMessage[] = []
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
  jobId = await startJob(designer)
})
afterEach(async () => {
  for (const stream of streams.splice(0)) stream.destroy()
  for (const server of servers.splice(0)) await new Promise((done) => server.closeAllConnections() ?? server.close(done))
})
afterAll(() => test.close())

async function listen(app: Express): Promise<string> {
  const server = createServer(app)
  servers.push(server)
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done))
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`
}
const cookieAt = async (address: string, email: string) => {
  const response = await fetch(`${address}/api/session`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ email, passphrase: demoPassphrase }) })
  return response.headers.getSetCookie()[0]!.split(';')[0]!
}
/** A client that follows the job: what it was told, and whether the stream has ended. */
async function follow(address: string, cookie: string, id = jobId) {
  const response = await new Promise<IncomingMessage>((done, fail) => get(`${address}/api/jobs/${id}/events`, { headers: { cookie } }, done).on('error', fail))
  streams.push(response)
  const told: number[] = []
  let ended = false
  response.on('end', () => (ended = true)).on('error', () => (ended = true))
  let text = ''
  response.on('data', (chunk: Buffer) => {
    text += chunk.toString()
    const events = text.split('\n\n')
    text = events.pop()!
    for (const event of events) {
      const data = event.split('\n').find((line) => line.startsWith('data: '))
      if (data) told.push(versionEventSchema.parse(JSON.parse(data.slice(6))).version)
    }
  })
  return { status: response.statusCode, type: response.headers['content-type'], told, ended: () => ended }
}
async function until(true_: () => boolean, withinMs: number): Promise<number> {
  const start = Date.now()
  while (!true_() && Date.now() - start < withinMs) await pause(10)
  return Date.now() - start
}
const rename = (name: string) => command({ verb: 'room.update', args: { ids: ['pat'], set: { name } } }, 1_000_000)

describe('following a job', () => {
  it('tells the version at once, then each new one within a second, also of another process', async () => {
    const [here, there] = [await listen(test.app), await listen(createApp({ ...test.deps, closing: new AbortController().signal }))]
    const near = await follow(here, await cookieAt(here, 'lead@larkhook.example'))
    const far = await follow(there, await cookieAt(there, 'technician@larkhook.example'))
    expect([near.status, near.type]).toEqual([200, 'text/event-stream'])
    await until(() => near.told.length > 0 && far.told.length > 0, 1000)
    const { version } = await push(designer, jobId, [rename('Deck')])
    await until(() => near.told.includes(version) && far.told.includes(version), 2000)
    expect([near.told.at(-1), far.told.at(-1)]).toEqual([version, version])
    for (const name of ['Lanai', 'Porch', 'Patio']) {
      const next = (await push(designer, jobId, [rename(name)])).version
      expect(await until(() => near.told.includes(next) && far.told.includes(next), 2000), 'ms until both heard').toBeLessThan(1000)
    }
    expect(near.told).toEqual([...near.told].sort((a, b) => a - b))
  })
  it('ends when its session ends, and when the member is disabled', async () => {
    const address = await listen(test.app)
    const owner = await test.signIn('owner@larkhook.example')
    const cookie = await cookieAt(address, 'office@larkhook.example')
    const [signsOut, disabled] = [await follow(address, cookie), await follow(address, await cookieAt(address, 'technician@larkhook.example'))]
    await fetch(`${address}/api/session`, { method: 'DELETE', headers: { cookie } })
    await owner.patch('/api/members/larkhook-technician').send({ disabled: true })
    await until(() => signsOut.ended() && disabled.ended(), 6000)
    expect([signsOut.ended(), disabled.ended()]).toEqual([true, true])
    await owner.patch('/api/members/larkhook-technician').send({ disabled: false })
  })
  it('ends with the server, and leaves nothing running', async () => {
    const closing = new AbortController()
    const address = await listen(createApp({ ...test.deps, closing: closing.signal }))
    const stream = await follow(address, await cookieAt(address, 'lead@larkhook.example'))
    closing.abort()
    await until(stream.ended, 1000)
    expect(stream.ended()).toBe(true)
  })
  it('is given to one member only so many times', async () => {
    const address = await listen(test.app)
    const cookie = await cookieAt(address, 'lead@larkhook.example')
    const opened = await Promise.all(Array.from({ length: 14 }, () => follow(address, cookie)))
    expect(opened.map((each) => each.status).sort()).toEqual([...Array.from({ length: 12 }, () => 200), 429, 429])
    for (const stream of streams.splice(0)) stream.destroy()
    await pause(50)
    expect((await follow(address, cookie)).status).toBe(200)
  })
  it('is not given to a stranger', async () => {
    const address = await listen(test.app)
    expect((await follow(address, await cookieAt(address, 'owner@quoinbatten.example'))).status).toBe(404)
    expect((await follow(address, 'mudring=nothing')).status).toBe(401)
    const agent = await signInAt(test.app, 'owner@larkhook.example')
    expect((await agent.get('/api/jobs/never-was/events')).status).toBe(404)
  })
})
