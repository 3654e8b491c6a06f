import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.close())

const fresh = { id: 'new-tech', name: 'Wren Alder', email: 'wren@larkhook.example', role: 'technician', passphrase: 'a ladder in the hall' }

describe('members', () => {
  it('are added by the owner and can then sign in', async () => {
    const owner = await test.signIn('owner@larkhook.example')
    expect((await owner.post('/api/members').send(fresh)).body).toMatchObject({ id: 'new-tech', disabled: false })
    const signedIn = await request(test.app).post('/api/session').send({ email: fresh.email, passphrase: fresh.passphrase })
    expect(signedIn.status).toBe(200)
    const again = await owner.post('/api/members').send({ ...fresh, id: 'other' })
    expect([again.status, again.body.detail]).toEqual([422, expect.stringContaining('in use already')])
  })
  it('are signed out at once when disabled', async () => {
    const owner = await test.signIn('owner@larkhook.example')
    const technician = await test.signIn('technician@larkhook.example')
    expect((await owner.patch('/api/members/larkhook-technician').send({ disabled: true })).status).toBe(200)
    expect((await technician.get('/api/session')).status).toBe(401)
    await owner.patch('/api/members/larkhook-technician').send({ disabled: false })
  })
  it('lose and gain rights with the next request', async () => {
    const owner = await test.signIn('owner@larkhook.example')
    const lead = await test.signIn('lead@larkhook.example')
    expect((await lead.get('/api/session')).body.can).not.toContain('job.design')
    await owner.patch('/api/members/larkhook-lead').send({ role: 'designer' })
    expect((await lead.get('/api/session')).body.can).toContain('job.design')
    await owner.patch('/api/members/larkhook-lead').send({ role: 'lead' })
  })
  it('always include an owner', async () => {
    const owner = await test.signIn('owner@larkhook.example')
    for (const change of [{ role: 'office' }, { disabled: true }]) {
      const response = await owner.patch('/api/members/larkhook-owner').send(change)
      expect([response.status, response.body.detail]).toEqual([422, expect.stringContaining('is the only owner')])
    }
  })
  it('keep an owner even when two of them remove each other at once', async () => {
    const owner = await test.signIn('owner@larkhook.example')
    await owner.post('/api/members').send({ ...fresh, id: 'second-owner', email: 'second@larkhook.example', role: 'owner' })
    const second = request.agent(test.app)
    await second.post('/api/session').send({ email: 'second@larkhook.example', passphrase: fresh.passphrase })
    const results = await Promise.all([owner.patch('/api/members/second-owner').send({ role: 'office' }), second.patch('/api/members/larkhook-owner').send({ role: 'office' })])
    expect(results.filter((result) => result.status === 200)).toHaveLength(1)
    const { body } = await (results[0]!.status === 200 ? owner : second).get('/api/members')
    expect(body.members.filter((member: { role: string }) => member.role === 'owner')).toHaveLength(1)
  })
  it.each([
    [{ ...fresh, id: 'x', passphrase: 'too short' }, 'at least 15 characters'],
    [{ ...fresh, id: 'x', passphrase: 'ä'.repeat(40) }, 'at most 72 bytes'],
    [{ ...fresh, id: 'x', role: 'king' }, 'body.role'],
    [{ ...fresh, id: 'x', companyId: 'quoin-batten' }, 'companyId'],
  ])('are refused with a sentence: %#', async (body, sentence) => {
    const quoin = await test.signIn('owner@quoinbatten.example')
    const response = await quoin.post('/api/members').send(body)
    expect([response.status, response.body.detail]).toEqual([400, expect.stringContaining(sentence)])
  })
  it('of another company are nobody', async () => {
    const quoin = await test.signIn('owner@quoinbatten.example')
    const theirs = await quoin.patch('/api/members/larkhook-designer').send({ role: 'owner' })
    const nobody = await quoin.patch('/api/members/nobody-at-all').send({ role: 'owner' })
    const { requestId: _a, ...left } = theirs.body
    const { requestId: _b, ...right } = nobody.body
    expect([theirs.status, left]).toEqual([404, right])
  })
})
