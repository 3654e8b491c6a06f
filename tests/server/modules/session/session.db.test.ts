import { eq } from 'drizzle-orm'
import request, { type Response } from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createApp } from '../../../../server/app.ts'
import { sessions, signInAttempts } from '../../../../server/db/tables/sessions.ts'
import { demoPassphrase } from '../../../../server/demo/demoCompany.ts'
import { absoluteMs, idleMs } from '../../../../server/http/sessionStore.ts'
import { mostAttempts } from '../../../../server/modules/session/attempts.ts'
import { expectProblem, withoutId } from '../../../support/problem.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.close())
beforeEach(async () => {
  await test.database.db.delete(signInAttempts)
})

const path = '/api/session'
const designer = { email: 'designer@larkhook.example', passphrase: demoPassphrase }
const wrong = { ...designer, passphrase: 'a guess, nothing more' }
const post = (body: object, app = test.app) => request(app).post(path).send(body)
const cookieOf = (response: Response) => String(response.headers['set-cookie']?.[0] ?? '')
const pairOf = (response: Response) => cookieOf(response).split(';')[0]!
const statuses = (responses: readonly Response[]) => responses.map((response) => response.status)

describe('signing in', () => {
  it('answers who one is, where, and what one may do', async () => {
    const response = await post({ ...designer, email: ' Designer@Larkhook.example ' })
    expect(response.status).toBe(200)
    expect(response.body).toMatchObject({
      member: { role: 'designer', name: 'Dana Sorrel' },
      company: { name: 'Larkhook Low Voltage', lengthUnit: 'ft' },
    })
    expect(response.body.can).toContain('job.design')
    expect(response.body.can).not.toContain('member.manage')
    expect(JSON.stringify(response.body)).not.toMatch(/hash/i)
  })
  it('lets a crowd in that comes all at once', async () => {
    const people = ['owner', 'office', 'designer', 'lead', 'technician'].map((role) => `${role}@larkhook.example`)
    const crowd = Array.from({ length: 40 }, (_, i) => post({ ...designer, email: people[i % people.length] }))
    expect(new Set(statuses(await Promise.all(crowd)))).toEqual(new Set([200]))
  })
  it('keeps the cookie from scripts and other sites, and behind HTTPS from everything else', async () => {
    const plain = cookieOf(await post(designer))
    expect(plain).toMatch(/^mudring=s%3A.+; Path=\/; Expires=.+; HttpOnly; SameSite=Lax$/)
    const secure = await request(createApp({ ...test.deps, secure: true }))
      .post(path)
      .set('X-Forwarded-Proto', 'https')
      .send(designer)
    expect(cookieOf(secure)).toMatch(/^__Host-mudring=.+; Path=\/; Expires=.+; HttpOnly; Secure; SameSite=Lax$/)
    expect(cookieOf(secure)).not.toContain('Domain')
  })
  it('gives no cookie to whoever is not signed in', async () => {
    expect(cookieOf(await post(wrong))).toBe('')
    expect(cookieOf(await request(test.app).get(path))).toBe('')
  })
  it('gives a new id, so that a session planted or known from before is worth nothing', async () => {
    const agent = request.agent(test.app)
    const before = pairOf(await agent.post(path).send(designer))
    const after = pairOf(await agent.post(path).send(designer))
    expect(after).not.toBe(before)
    expectProblem(await request(test.app).get(path).set('Cookie', before), 401)
    expect((await request(test.app).get(path).set('Cookie', after)).status).toBe(200)
  })
  it('never takes an id that somebody made up', async () => {
    const planted = 'mudring=s%3Aplanted-by-somebody.c2lnbmF0dXJl'
    const response = await request(test.app).post(path).set('Cookie', planted).send(designer)
    expect(response.status).toBe(200)
    expect(pairOf(response)).not.toContain('planted')
    expectProblem(await request(test.app).get(path).set('Cookie', planted), 401)
  })
  it('says the same of an unknown address and of a wrong passphrase', async () => {
    const known = expectProblem(await post(wrong), 401)
    const unknown = expectProblem(await post({ ...wrong, email: 'nobody@larkhook.example' }), 401)
    expect(withoutId(known)).toEqual(withoutId(unknown))
  })
  it('takes an address only as it is written', async () => {
    expectProblem(await post({ ...designer, email: 'dèsigner@larkhook.example' }), 401)
  })
  it.each([
    [{ email: 'x', passphrase: 'y' }, 'e-mail address'],
    [{ email: designer.email }, 'body.passphrase'],
    [{ ...designer, role: 'owner' }, 'role'],
    [[designer], 'body'],
  ])('refuses %j with a sentence', async (body, sentence) => {
    expect(expectProblem(await post(body), 400).detail).toContain(sentence)
  })
})

describe('guessing', () => {
  it('stops after ten tries, says when to come back, and is remembered across a restart', async () => {
    for (let i = 0; i < mostAttempts.pair; i++) expectProblem(await post(wrong), 401)
    const stopped = await post(wrong)
    expect(expectProblem(stopped, 429).detail).toContain('15 minutes')
    expect(Number(stopped.headers['retry-after'])).toBeGreaterThan(14 * 60)
    const restarted = createApp(test.deps)
    expectProblem(await post(designer, restarted), 429)
  })
  it('stops in a burst as it does one by one', async () => {
    const burst = await Promise.all(Array.from({ length: 40 }, () => post(wrong)))
    expect(statuses(burst).filter((status) => status === 401)).toHaveLength(mostAttempts.pair)
    expect(statuses(burst).filter((status) => status === 429)).toHaveLength(40 - mostAttempts.pair)
  })
  it('from one address at many people stops too', async () => {
    const guesses = await Promise.all(
      Array.from({ length: mostAttempts.address + 5 }, (_, i) =>
        post({ ...wrong, email: `somebody${i}@larkhook.example` }),
      ),
    )
    expect(statuses(guesses).filter((status) => status === 429)).toHaveLength(5)
  })
  it('from one address does not keep the member out everywhere else', async () => {
    const app = createApp({ ...test.deps, secure: true })
    const from = (address: string, body: object) =>
      request(app).post(path).set({ 'X-Forwarded-Proto': 'https', 'X-Forwarded-For': address }).send(body)
    for (let i = 0; i <= mostAttempts.pair; i++) await from('192.0.2.1', wrong)
    expectProblem(await from('192.0.2.1', designer), 429)
    expect((await from('192.0.2.2', designer)).status).toBe(200)
  })
  it('from everywhere at one member stops at last', async () => {
    const app = createApp({ ...test.deps, secure: true })
    const from = (i: number) =>
      request(app)
        .post(path)
        .set({ 'X-Forwarded-Proto': 'https', 'X-Forwarded-For': `192.0.2.${i}` })
        .send(wrong)
    const all: Response[] = []
    for (let i = 0; i < mostAttempts.email + 4; i++) all.push(await from(i))
    expect(statuses(all).filter((status) => status === 429)).toHaveLength(4)
  })
  it('is not moved to another address by a header where there is no proxy', async () => {
    for (let i = 0; i < mostAttempts.pair; i++)
      await request(test.app).post(path).set('X-Forwarded-For', `198.51.100.${i}`).send(wrong)
    expectProblem(await request(test.app).post(path).set('X-Forwarded-For', '198.51.100.99').send(wrong), 429)
  })
  it('is forgotten when the right one comes, or the window ends', async () => {
    for (let i = 0; i < mostAttempts.pair - 1; i++) await post(wrong)
    expect((await post(designer)).status).toBe(200)
    for (let i = 0; i < mostAttempts.pair; i++) await post(wrong)
    expectProblem(await post(designer), 429)
    await test.database.db.update(signInAttempts).set({ windowEnds: Date.now() - 1 })
    expect((await post(designer)).status).toBe(200)
  })
})

describe('a session', () => {
  it('ends when one signs out, clears its cookie, and ending it again is no error', async () => {
    const agent = await test.signIn(designer.email)
    const out = await agent.delete(path)
    expect(out.status).toBe(204)
    expect(cookieOf(out)).toMatch(/^mudring=; Path=\/; Expires=Thu, 01 Jan 1970/)
    expectProblem(await agent.get(path), 401)
    expect((await agent.delete(path)).status).toBe(204)
  })
  it('that was copied ends with it', async () => {
    const agent = request.agent(test.app)
    const pair = pairOf(await agent.post(path).send(designer))
    await agent.delete(path)
    expectProblem(await request(test.app).get(path).set('Cookie', pair), 401)
  })
  it('ends by itself when it was idle for twelve hours, and lasts while it is used', async () => {
    const agent = await test.signIn('lead@larkhook.example')
    const lead = eq(sessions.memberId, 'larkhook-lead')
    await test.database.db
      .update(sessions)
      .set({ idleUntil: Date.now() + 5000 })
      .where(lead)
    expect((await agent.get(path)).status).toBe(200)
    const rows = await test.database.db.select().from(sessions).where(lead)
    expect(Math.max(...rows.map((row) => row.idleUntil))).toBeGreaterThan(Date.now() + idleMs - 60_000)
    await test.database.db
      .update(sessions)
      .set({ idleUntil: Date.now() - 1 })
      .where(lead)
    expectProblem(await agent.get(path), 401)
  })
  it('ends after thirty days however much it was used', async () => {
    const agent = await test.signIn('lead@larkhook.example')
    await test.database.db.update(sessions).set({ createdAt: Date.now() - absoluteMs - 1 })
    expectProblem(await agent.get(path), 401)
  })
  it('is kept as a hash, never by its id', async () => {
    const id = decodeURIComponent(cookieOf(await post(designer)))
      .split('s:')[1]!
      .split('.')[0]!
    const rows = await test.database.db.select().from(sessions)
    expect(rows.length).toBeGreaterThan(0)
    expect(JSON.stringify(rows)).not.toContain(id)
  })
  it('of another secret is none', async () => {
    const pair = pairOf(await post(designer))
    expectProblem(
      await request(createApp({ ...test.deps, sessionSecret: 'another secret' }))
        .get(path)
        .set('Cookie', pair),
      401,
    )
  })
})

describe('one’s own passphrase', () => {
  const fresh = 'four new words, all long'
  it('is changed with the one in use, and signs out everywhere else', async () => {
    const here = await test.signIn('office@larkhook.example')
    const elsewhere = await test.signIn('office@larkhook.example')
    expect((await here.put(`${path}/passphrase`).send({ current: demoPassphrase, passphrase: fresh })).status).toBe(204)
    expect((await here.get(path)).status).toBe(200)
    expectProblem(await elsewhere.get(path), 401)
    expectProblem(await post({ email: 'office@larkhook.example', passphrase: demoPassphrase }), 401)
    expect((await post({ email: 'office@larkhook.example', passphrase: fresh })).status).toBe(200)
  })
  it('is not changed with a wrong one, and guessing it counts like signing in', async () => {
    const agent = await test.signIn('technician@larkhook.example')
    const guess = () => agent.put(`${path}/passphrase`).send({ current: 'not this one at all', passphrase: fresh })
    for (let i = 0; i < mostAttempts.pair; i++)
      expect(expectProblem(await guess(), 422).detail).toContain('Nothing was changed')
    expectProblem(await guess(), 429)
    expect((await agent.get(path)).status).toBe(200)
  })
  it('is not changed to a short one', async () => {
    const agent = await test.signIn('technician@larkhook.example')
    const response = await agent.put(`${path}/passphrase`).send({ current: demoPassphrase, passphrase: 'too short' })
    expect(expectProblem(response, 400).detail).toContain('at least 15 characters')
  })
})
