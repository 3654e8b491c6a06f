import { Writable } from 'node:stream'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../../server/app.ts'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { createLogger } from '../../../server/http/logger.ts'
import { defineRoute, noInput } from '../../../server/http/routeTable.ts'
import { insertMember } from '../../../server/modules/members/memberRepo.ts'
import { buildRoutes } from '../../../server/routes.ts'
import { startTestApp, type TestApp } from '../../support/testApp.ts'

let test: TestApp
const lines: string[] = []
const log = createLogger(
  'info',
  new Writable({ write: (chunk, _encoding, done) => (lines.push(String(chunk)), done()) }),
)

const twice = {
  id: 'twin',
  companyId: 'larkhook',
  name: 'Twin\n{"level":60}',
  email: 'canary@larkhook.example',
  role: 'lead',
  passphraseHash: '$2b$canary-hash',
  createdAt: '2026-01-01 00:00:00.000',
} as const
beforeAll(async () => {
  test = await startTestApp({ log })
  // A statement that fails with values in it: the same member twice.
  const broken = defineRoute({
    method: 'get',
    path: '/api/broken',
    action: 'job.read',
    params: noInput,
    query: noInput,
    body: noInput,
    handle: async ({ db }) => {
      await insertMember(db, twice)
      await insertMember(db, twice)
    },
  })
  const app = createApp(test.deps, [...buildRoutes(test.deps), broken])
  const agent = request.agent(app)
  await agent.post('/api/session').send({ email: 'owner@larkhook.example', passphrase: demoPassphrase })
  await agent.post('/api/session').send({ email: 'owner@larkhook.example', passphrase: 'a passphrase canary' })
  expect((await agent.get('/api/broken')).status).toBe(500)
})
afterAll(() => test.close())

describe('the log', () => {
  it('has one JSON line for each request, with its number, and for each fault', () => {
    const events = lines.map((line) => JSON.parse(line) as { msg: string; level: number; requestId?: string })
    expect(events.filter((event) => event.msg === 'request completed')).toHaveLength(2)
    expect(events.filter((event) => event.msg === 'a sign-in did not fit')).toHaveLength(1)
    const faults = events.filter((event) => event.msg === 'unexpected error')
    expect(faults).toHaveLength(1)
    expect(faults[0]).toMatchObject({
      level: 50,
      requestId: expect.stringMatching(/^[0-9a-f-]{36}$/),
      method: 'GET',
      path: '/api/broken',
    })
  })
  it('tells of a fault its statement, its number and where it happened', () => {
    const fault = JSON.parse(lines.find((line) => line.includes('unexpected error'))!) as {
      err: Record<string, unknown>
    }
    expect(fault.err).toMatchObject({
      query: expect.stringContaining('insert into `members`'),
      cause: { errno: 1062, code: 'ER_DUP_ENTRY' },
    })
    expect(fault.err['stack']).toContain('insertMember')
  })
  it('never holds what people typed, a hash or a cookie', () => {
    const all = lines.join('')
    for (const secret of ['canary', demoPassphrase, 'Twin', 'mudring=s', 's%3A']) expect(all).not.toContain(secret)
  })
})
