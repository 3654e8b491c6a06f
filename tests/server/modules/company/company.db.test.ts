import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CompanyAnswer } from '../../../../shared/api/company.ts'
import { defaultLimits } from '../../../../shared/model/limits.ts'
import { expectProblem } from '../../../support/problem.ts'
import { startTestApp, type Agent, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let owner: Agent
beforeAll(async () => {
  test = await startTestApp()
  owner = await test.signIn('owner@larkhook.example')
})
afterAll(() => test.close())

const read = async (agent = owner) => (await agent.get('/api/company')).body as CompanyAnswer
const change = (body: object, agent = owner) => agent.patch('/api/company').send(body)

describe('the company’s rules', () => {
  it('are changed field by field; what was not named stays', async () => {
    const before = await read()
    const response = await change({
      version: before.version,
      slackPlateMm: 1200,
      limits: { ...defaultLimits, speakerLossStop: 0.8 },
    })
    expect(response.status).toBe(200)
    const after = {
      ...before,
      version: before.version + 1,
      slackPlateMm: 1200,
      limits: { ...defaultLimits, speakerLossStop: 0.8 },
    }
    expect(response.body).toEqual(after)
    expect(await read(await test.signIn('technician@larkhook.example'))).toEqual(after)
  })
  it('are not written over what somebody else wrote: both are told', async () => {
    const { version } = await read()
    const office = await test.signIn('office@larkhook.example')
    expect((await change({ version, name: 'Larkhook of the office' }, office)).status).toBe(200)
    const refused = expectProblem(await change({ version, name: 'Larkhook of the owner' }), 409)
    expect(refused.details).toMatchObject({
      mine: { name: 'Larkhook of the owner' },
      current: { name: 'Larkhook of the office', version: version + 1 },
    })
    expect((await read()).name).toBe('Larkhook of the office')
  })
  it('are changed by exactly one of many at once, every time', async () => {
    for (let round = 0; round < 15; round++) {
      const { version } = await read()
      const answers = await Promise.all(
        Array.from({ length: 6 }, (_, i) => change({ version, name: `Round ${round}, number ${i}` })),
      )
      expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409, 409, 409, 409])
      expect(await read()).toMatchObject({
        version: version + 1,
        name: answers.find((answer) => answer.status === 200)!.body.name,
      })
    }
  })
  it('of one company are not the other’s', async () => {
    const quoin = await test.signIn('owner@quoinbatten.example')
    const before = await read()
    const theirs = await read(quoin)
    expect(theirs.lengthUnit).toBe('m')
    expect((await change({ version: theirs.version, name: 'Quoin & Batten & Sons' }, quoin)).status).toBe(200)
    expect(await read()).toEqual(before)
  })
  const bad: [object, string][] = [
    [{ name: '' }, 'body.name'],
    [{ lengthUnit: 'yd' }, 'body.lengthUnit'],
    [{ slackRackMm: 2133.6 }, 'body.slackRackMm'],
    [{ slackRackMm: -1 }, 'body.slackRackMm'],
    [{ labelPattern: '{room' }, 'body.labelPattern'],
    [{ limits: { ...defaultLimits, speakerLossStop: 'much' } }, 'body.limits.speakerLossStop'],
    [{ limits: { ...defaultLimits, complies: true } }, 'body.limits'],
    [{ id: 'quoin-batten' }, 'body'],
  ]
  it.each(bad)('are refused with the place: %j', async (body, where) => {
    const before = await read()
    expect(
      expectProblem(await change({ version: before.version, ...body }), 400).errors!.map((error) => error.where),
    ).toContain(where)
    expect(await read()).toEqual(before)
  })
  it('are not changed without the version that was read', async () => {
    expectProblem(await change({ name: 'Blind' }), 400)
  })
})
