import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { demoPassphrase } from '../../../../server/demo/demoCompany.ts'
import { sessions } from '../../../../server/db/tables/sessions.ts'
import { absoluteMs } from '../../../../server/http/sessionStore.ts'
import { mostAttempts } from '../../../../server/modules/session/signIn.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.close())

const designer = { email: 'designer@larkhook.example', passphrase: demoPassphrase }
const cookieOf = (response: request.Response) => String(response.headers['set-cookie']?.[0] ?? '')

describe('signing in', () => {
  it('answers who one is, where, and what one may do', async () => {
    const response = await request(test.app).post('/api/session').send({ ...designer, email: ' Designer@Larkhook.example ' })
    expect(response.status).toBe(200)
    expect(response.body).toMatchObject({ member: { role: 'designer', name: 'Dana Sorrel' }, company: { name: 'Larkhook Low Voltage', lengthUnit: 'ft' } })
    expect(response.body.can).toContain('job.design')
    expect(response.body.can).not.toContain('member.manage')
    expect(cookieOf(response)).toMatch(/HttpOnly/)
    expect(cookieOf(response)).toMatch(/SameSite=Lax/)
    expect(JSON.stringify(response.body)).not.toMatch(/hash/i)
  })
  it('gives a new id, so that a session planted beforehand is worth nothing', async () => {
    const agent = request.agent(test.app)
    const first = cookieOf(await agent.post('/api/session').send(designer))
    const second = cookieOf(await agent.post('/api/session').send(designer))
    expect(first.split(';')[0]).not.toBe(second.split(';')[0])
    const old = await request(test.app).get('/api/session').set('Cookie', first.split(';')[0]!)
    expect(old.status).toBe(401)
  })
  it('says the same of an unknown address and of a wrong passphrase', async () => {
    const wrong = await request(test.app).post('/api/session').send({ ...designer, passphrase: 'not this one at all' })
    const unknown = await request(test.app).post('/api/session').send({ email: 'nobody@larkhook.example', passphrase: 'not this one at all' })
    expect([wrong.status, unknown.status]).toEqual([401, 401])
    const { requestId: _a, ...left } = wrong.body
    const { requestId: _b, ...right } = unknown.body
    expect(left).toEqual(right)
  })
  it('stops after too many failures, says when to come back, and remembers across a restart', async () => {
    const guess = () => request(test.app).post('/api/session').send({ email: 'office@larkhook.example', passphrase: 'a guess, nothing more' })
    for (let i = 0; i < mostAttempts.pair; i++) expect((await guess()).status).toBe(401)
    const stopped = await guess()
    expect(stopped.status).toBe(429)
    expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(60)
    const right = await request(test.app).post('/api/session').send({ email: 'office@larkhook.example', passphrase: demoPassphrase })
    expect(right.status).toBe(429)
  })
  it.each([
    [{ email: 'x', passphrase: 'y' }, 'e-mail address'],
    [{ email: designer.email }, 'body.passphrase'],
    [{ ...designer, role: 'owner' }, 'role'],
  ])('refuses %j with a sentence', async (body, sentence) => {
    const response = await request(test.app).post('/api/session').send(body)
    expect(response.status).toBe(400)
    expect(response.type).toBe('application/problem+json')
    expect(response.body.detail).toContain(sentence)
  })
})

describe('a session', () => {
  it('ends when one signs out, and again is no error', async () => {
    const agent = await test.signIn(designer.email)
    expect((await agent.get('/api/session')).status).toBe(200)
    expect((await agent.delete('/api/session')).status).toBe(204)
    expect((await agent.get('/api/session')).status).toBe(401)
    expect((await agent.delete('/api/session')).status).toBe(204)
  })
  it('ends by itself when it was idle, and absolutely after thirty days', async () => {
    const agent = await test.signIn('lead@larkhook.example')
    await test.database.db.update(sessions).set({ idleUntil: Date.now() - 1 })
    expect((await agent.get('/api/session')).status).toBe(401)
    const second = await test.signIn('lead@larkhook.example')
    await test.database.db.update(sessions).set({ createdAt: Date.now() - absoluteMs - 1 })
    expect((await second.get('/api/session')).status).toBe(401)
  })
  it('is kept as a hash, never by its id', async () => {
    const response = await request(test.app).post('/api/session').send(designer)
    const id = decodeURIComponent(cookieOf(response)).split('s:')[1]!.split('.')[0]!
    const rows = await test.database.db.select().from(sessions)
    expect(rows.length).toBeGreaterThan(0)
    expect(JSON.stringify(rows.map((row) => row.idHash))).not.toContain(id)
  })
})
