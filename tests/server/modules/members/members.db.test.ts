import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { MemberAnswer } from '../../../../shared/api/members.ts'
import { signInAt } from '../../../support/jobOnServer.ts'
import { expectProblem, withoutId } from '../../../support/problem.ts'
import { startTestApp, type Agent, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let owner: Agent
beforeAll(async () => {
  test = await startTestApp()
  owner = await test.signIn('owner@larkhook.example')
})
afterAll(() => test.close())

const passphrase = 'a ladder in the hall'
const fresh = { id: 'new-tech', name: 'Wren Alder', email: 'wren@larkhook.example', role: 'technician', passphrase }
const add = (body: object, agent = owner) => agent.post('/api/members').send(body)
const change = (id: string, body: object, agent = owner) => agent.patch(`/api/members/${id}`).send(body)
const list = async (agent = owner) => ((await agent.get('/api/members')).body as { members: MemberAnswer[] }).members
const signIn = (email: string, given = passphrase) =>
  request(test.app).post('/api/session').send({ email, passphrase: given })

describe('members', () => {
  it('are listed without anything that signs in', async () => {
    const members = await list()
    expect(members.find((member) => member.role === 'designer')).toEqual({
      id: 'larkhook-designer',
      name: 'Dana Sorrel',
      email: 'designer@larkhook.example',
      role: 'designer',
      disabled: false,
    })
    expect(JSON.stringify(members)).not.toMatch(/hash|\$2b|quoin/i)
  })
  it('are added by the owner and can then sign in', async () => {
    expect((await add(fresh)).body).toEqual({
      id: 'new-tech',
      name: 'Wren Alder',
      email: fresh.email,
      role: 'technician',
      disabled: false,
    })
    expect((await signIn(fresh.email)).status).toBe(200)
  })
  it.each([
    ['an address in use', { ...fresh, id: 'other' }],
    ['an address that looks like one in use', { ...fresh, id: 'other', email: 'WRÉN@larkhook.example' }],
    ['an address of another company', { ...fresh, id: 'other', email: 'designer@quoinbatten.example' }],
  ])('are not added with %s', async (_what, body) => {
    const before = await list()
    expect(expectProblem(await add(body), 422).detail).toContain('in use already')
    expect(await list()).toEqual(before)
  })
  it('are signed out at once when disabled, cannot sign in, and can again when let in', async () => {
    const technician = await test.signIn('technician@larkhook.example')
    expect((await change('larkhook-technician', { disabled: true })).status).toBe(200)
    expectProblem(await technician.get('/api/session'), 401)
    expectProblem(await signIn('technician@larkhook.example', 'studs are open today'), 401)
    await change('larkhook-technician', { disabled: false })
    expectProblem(await technician.get('/api/session'), 401)
    expect((await signIn('technician@larkhook.example', 'studs are open today')).status).toBe(200)
  })
  it('are signed out when somebody gives them a new passphrase', async () => {
    await add({ ...fresh, id: 'forgetful', email: 'forgetful@larkhook.example' })
    const agent = request.agent(test.app)
    await agent.post('/api/session').send({ email: 'forgetful@larkhook.example', passphrase })
    expect((await change('forgetful', { passphrase: 'another one, longer still' })).status).toBe(200)
    expectProblem(await agent.get('/api/session'), 401)
    expect((await signIn('forgetful@larkhook.example', 'another one, longer still')).status).toBe(200)
  })
  it('lose and gain rights with the next request', async () => {
    const lead = await test.signIn('lead@larkhook.example')
    expect((await lead.get('/api/session')).body.can).not.toContain('job.design')
    await change('larkhook-lead', { role: 'designer' })
    expect((await lead.get('/api/session')).body.can).toContain('job.design')
    await change('larkhook-lead', { role: 'lead' })
    expectProblem(await lead.patch('/api/company').send({ version: 1 }), 403)
  })
  const bad: [object, string][] = [
    [{ passphrase: 'too short' }, 'at least 15 characters'],
    [{ passphrase: 'ä'.repeat(40) }, 'at most 72 bytes'],
    [{ role: 'king' }, 'body.role'],
    [{ companyId: 'quoin-batten' }, 'companyId'],
    [{ email: 'nobody' }, 'e-mail'],
  ]
  it.each(bad)('are refused with a sentence: %j', async (over, sentence) => {
    expect(expectProblem(await add({ ...fresh, id: 'x', ...over }), 400).detail).toContain(sentence)
  })
  it('of another company are nobody', async () => {
    const before = await list()
    const quoin = await test.signIn('owner@quoinbatten.example')
    const theirs = expectProblem(await change('larkhook-designer', { role: 'owner' }, quoin), 404)
    const nobody = expectProblem(await change('nobody-at-all', { role: 'owner' }, quoin), 404)
    expect(withoutId(theirs)).toEqual(withoutId(nobody))
    expect(await list()).toEqual(before)
    expect((await list(quoin)).map((member) => member.id).sort()).toEqual(['quoinbatten-designer', 'quoinbatten-owner'])
  })
})

describe('a company', () => {
  it.each([{ role: 'office' }, { disabled: true }])('keeps its last owner: %j is refused', async (body) => {
    expect(expectProblem(await change('larkhook-owner', body), 422).detail).toContain('is the only owner')
  })
  it('does not count an owner who is disabled', async () => {
    await add({ ...fresh, id: 'away', email: 'away@larkhook.example', role: 'owner' })
    await change('away', { disabled: true })
    expectProblem(await change('larkhook-owner', { role: 'office' }), 422)
    await change('away', { role: 'technician' })
  })
  it('keeps an owner however often two of them remove each other at the same moment', async () => {
    await add({ ...fresh, id: 'second', email: 'second@larkhook.example', role: 'owner' })
    const agents = { 'larkhook-owner': owner, second: request.agent(test.app) }
    await agents.second.post('/api/session').send({ email: 'second@larkhook.example', passphrase })
    for (let round = 0; round < 20; round++) {
      const answers = await Promise.all([
        change('second', { role: 'office' }, agents['larkhook-owner']),
        change('larkhook-owner', { role: 'office' }, agents.second),
      ])
      // Whoever came second is an owner no more, or the only one.
      const statuses = answers.map((answer) => answer.status).sort()
      expect(
        [
          [200, 403],
          [200, 422],
        ],
        `round ${round}`,
      ).toContainEqual(statuses)
      const left = answers[0].status === 200 ? 'larkhook-owner' : 'second'
      const removed = left === 'second' ? 'larkhook-owner' : 'second'
      const owners = (await list(agents[left])).filter((member) => member.role === 'owner' && !member.disabled)
      expect(
        owners.map((member) => member.id),
        `round ${round}`,
      ).toEqual([left])
      expect((await change(removed, { role: 'owner' }, agents[left])).status).toBe(200)
    }
  })
  it('may hand itself over', async () => {
    const quoin = await signInAt(test.app, 'owner@quoinbatten.example')
    expect((await change('quoinbatten-designer', { role: 'owner' }, quoin)).status).toBe(200)
    expect((await change('quoinbatten-owner', { role: 'designer' }, quoin)).status).toBe(200)
    expectProblem(await change('quoinbatten-owner', { role: 'owner' }, quoin), 403)
  })
})
