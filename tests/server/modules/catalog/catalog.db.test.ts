import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Catalog, CatalogCableType, CatalogDeviceModel } from '../../../../shared/api/catalog.ts'
import type { CableDescription } from '../../../../shared/model/cableType.ts'
import { can, roles } from '../../../../shared/policy.ts'
import { cableTypeFixtures } from '../../../../fixtures/catalog/cableTypes.ts'
import { deviceModelFixtures } from '../../../../fixtures/catalog/deviceModels.ts'
import { command, freshId, open, push, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let designer: Agent
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
})
afterAll(() => test.close())

const cable = (over: Partial<CableDescription> = {}): CableDescription => ({ ...cableTypeFixtures[0]!, code: freshId('X').slice(0, 16), ...over })
const list = async (agent = designer) => (await agent.get('/api/catalog')).body as Catalog
const cables = '/api/catalog/cable-types'
const models = '/api/catalog/device-models'
async function added(over: Partial<CableDescription> = {}): Promise<CatalogCableType> {
  return (await designer.post(cables).send({ id: freshId('cable'), description: cable(over) })).body as CatalogCableType
}

describe('the catalogue of a new company', () => {
  it('holds the generic cable and devices, exactly as described', async () => {
    const { cableTypes, deviceModels } = await list(await test.signIn('technician@larkhook.example'))
    expect(cableTypes.map((entry) => entry.description).sort((a, b) => a.code.localeCompare(b.code))).toEqual([...cableTypeFixtures].sort((a, b) => a.code.localeCompare(b.code)))
    expect(Object.fromEntries(deviceModels.map((entry) => [entry.id, entry.description]))).toEqual(deviceModelFixtures)
    expect(new Set([...cableTypes, ...deviceModels].map((entry) => entry.version))).toEqual(new Set([1]))
  })
})

describe('an entry', () => {
  it('is added once, however often it is sent, and not over another', async () => {
    const id = freshId('cable')
    const description = cable({ resistanceOhmPerKm: 13.173228346456693 })
    const twice = [await designer.post(cables).send({ id, description }), await designer.post(cables).send({ id, description })]
    expect(twice.map((each) => [each.status, each.body])).toEqual([[200, { id, version: 1, description }], [200, { id, version: 1, description }]])
    const other = await designer.post(cables).send({ id, description: cable() })
    expect([other.status, other.body.type]).toEqual([409, '/problems/conflict'])
  })
  it('counts up with each change, and refuses one made over what it no longer is, with both', async () => {
    const entry = await added()
    const mine = { ...entry.description, name: 'Mine' }
    const theirs = { ...entry.description, name: 'Theirs' }
    const first = await designer.put(`${cables}/${entry.id}`).send({ version: 1, description: theirs })
    expect(first.body).toEqual({ id: entry.id, version: 2, description: theirs })
    const second = await designer.put(`${cables}/${entry.id}`).send({ version: 1, description: mine })
    expect([second.status, second.body.details]).toEqual([409, { mine, theirs: { id: entry.id, version: 2, description: theirs } }])
    expect((await designer.put(`${cables}/${entry.id}`).send({ version: 1, description: theirs })).body.version, 'the same once more is no conflict').toBe(2)
  })
  it('of one code is there once', async () => {
    const entry = await added()
    const twin = await designer.post(cables).send({ id: freshId('cable'), description: cable({ code: entry.description.code.toLowerCase() }) })
    expect([twin.status, twin.body.type]).toEqual([422, '/problems/refused'])
    expect(twin.body.detail).toContain('in the catalogue already')
  })
  it('of two people at once is changed by one', async () => {
    const entry = await added()
    const owner = await test.signIn('owner@larkhook.example')
    const both = await Promise.all([designer, owner].map((agent, i) => agent.put(`${cables}/${entry.id}`).send({ version: 1, description: { ...entry.description, name: `Person ${i}` } })))
    expect(both.map((each) => each.status).sort()).toEqual([200, 409])
  })
  it('is removed at the version it was seen at', async () => {
    const entry = await added()
    await designer.put(`${cables}/${entry.id}`).send({ version: 1, description: { ...entry.description, name: 'Newer' } })
    expect((await designer.delete(`${cables}/${entry.id}?version=1`)).status).toBe(409)
    expect((await designer.delete(`${cables}/${entry.id}?version=2`)).status).toBe(204)
    expect((await designer.delete(`${cables}/${entry.id}?version=2`)).status, 'twice is still removed').toBe(204)
    expect((await list()).cableTypes.map((each) => each.id)).not.toContain(entry.id)
    expect((await designer.put(`${cables}/${entry.id}`).send({ version: 2, description: entry.description })).status).toBe(404)
  })
  it('is refused when it is not sound', async () => {
    const model = deviceModelFixtures['amp-2']
    const bad: [string, string, object][] = [
      [cables, 'a code of 17 characters', { id: 'a', description: cable({ code: 'X'.repeat(17) }) }],
      [cables, 'no length it is sold in', { id: 'a', description: cable({ putUps: [] }) }],
      [cables, 'an unknown field', { id: 'a', description: { ...cable(), companyId: 'quoin-batten' } }],
      [models, 'no terminal', { id: 'a', description: { ...model, terminals: [] } }],
      [models, 'two terminals of one key', { id: 'a', description: { ...model, terminals: [model.terminals[0], model.terminals[0]] } }],
      [models, 'a pass to nowhere', { id: 'a', description: { ...model, passes: [{ from: 'ch1', to: 'nowhere' }] } }],
    ]
    for (const [path, what, body] of bad) expect((await designer.post(path).send(body)).status, what).toBe(400)
  })
  it('of another company is not there', async () => {
    const entry = await added()
    const stranger = await test.signIn('owner@quoinbatten.example')
    expect((await list(stranger)).cableTypes.map((each) => each.id)).not.toContain(entry.id)
    const answers = await Promise.all([entry.id, 'never-was'].map((id) => stranger.put(`${cables}/${id}`).send({ version: 1, description: cable() })))
    expect(answers.map(({ status, body }) => ({ status, ...body, requestId: '' }))[0]).toEqual({ ...answers[1]!.body, status: 404, requestId: '' })
    await stranger.delete(`${cables}/${entry.id}?version=1`)
    expect((await list()).cableTypes.map((each) => each.id)).toContain(entry.id)
  })
  it.each(roles)('may be changed by a %s as the policy says', async (role) => {
    const agent = await test.signIn(`${role}@larkhook.example`)
    const may = can(role, 'catalog.update')
    expect((await agent.post(cables).send({ id: freshId('cable'), description: cable() })).status).toBe(may ? 200 : 403)
    expect((await agent.put(`${models}/amp-2`).send({ version: 99, description: deviceModelFixtures['amp-2'] })).status).toBe(may ? 409 : 403)
    expect((await agent.delete(`${models}/never?version=1`)).status).toBe(may ? 204 : 403)
  })
})

describe('a device model', () => {
  it('is added, changed and removed like a cable type', async () => {
    const id = freshId('model')
    const description = { ...deviceModelFixtures['amp-70v-4'], sharedPowerW: 240.25 }
    expect((await designer.post(models).send({ id, description })).body).toEqual({ id, version: 1, description })
    const changed = { ...description, name: 'Line amplifier' }
    expect((await designer.put(`${models}/${id}`).send({ version: 1, description: changed })).body).toEqual({ id, version: 2, description: changed })
    expect((await designer.delete(`${models}/${id}?version=2`)).status).toBe(204)
  })
})

describe('a job’s copy', () => {
  it('remembers the entry and version it was taken from, and stays as it is when the entry changes', async () => {
    const entry = await added()
    const jobId = await startJob(designer)
    const take = command({ verb: 'cableType.add', args: { id: 'copy', catalogId: entry.id, catalogVersion: entry.version, ...entry.description } }, 1)
    expect((await push(designer, jobId, [take], 1)).refused).toEqual([])
    await designer.put(`${cables}/${entry.id}`).send({ version: 1, description: { ...entry.description, outerDiameterUm: 9999 } })
    const copy = (await open(designer, jobId)).doc.records.cableType.get('copy')
    expect(copy).toEqual({ kind: 'cableType', id: 'copy', catalogId: entry.id, catalogVersion: 1, ...entry.description })
    expect(((await list()).deviceModels as CatalogDeviceModel[]).length).toBeGreaterThan(40)
  })
})
