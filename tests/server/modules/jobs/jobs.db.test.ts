import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { JobList } from '../../../../shared/api/jobs.ts'
import { buildDocument, jobOf } from '../../../../shared/model/jobDocument.ts'
import { roles } from '../../../../shared/policy.ts'
import { can } from '../../../../shared/policy.ts'
import { command, freshId, open, push, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let designer: Agent
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
})
afterAll(() => test.close())

const form = (over: object = {}) => ({ id: freshId('job'), name: 'Tern Cottage', client: 'Client', address: '4 Long Lane', lengthUnit: 'm', conductorUnit: 'mm2', ...over })

describe('a new job', () => {
  it('begins with the company’s rules and what the short form says', async () => {
    const wanted = form()
    const made = await designer.post('/api/jobs').send(wanted)
    expect([made.status, made.body]).toEqual([200, { id: wanted.id, version: 0 }])
    const { opened } = await open(designer, wanted.id)
    expect(opened.version).toBe(0)
    expect(opened.records).toHaveLength(1)
    expect(jobOf(buildDocument(wanted.id, 0, opened.records))).toMatchObject({ ...wanted, labelPattern: '{room}{plate}-{kind}{n}', slackRackMm: 2134, slackPlateMm: 914 })
    expect(opened.members.map((member) => member.role).sort()).toEqual([...roles].sort())
    expect(JSON.stringify(opened)).not.toMatch(/hash|@larkhook/i)
  })
  it('takes the company’s units where the form leaves them out', async () => {
    const { lengthUnit: _length, conductorUnit: _conductor, ...wanted } = form()
    await designer.post('/api/jobs').send(wanted)
    expect(jobOf((await open(designer, wanted.id)).doc)).toMatchObject({ lengthUnit: 'ft', conductorUnit: 'awg' })
  })
  it('is made once when the request is sent twice, and not over another job', async () => {
    const wanted = form()
    const twice = await Promise.all([designer.post('/api/jobs').send(wanted), designer.post('/api/jobs').send(wanted)])
    expect(twice.map((each) => [each.status, each.body])).toEqual([[200, { id: wanted.id, version: 0 }], [200, { id: wanted.id, version: 0 }]])
    const other = await designer.post('/api/jobs').send({ ...wanted, name: 'Another house' })
    expect([other.status, other.body.type]).toEqual([409, '/problems/conflict'])
    const owner = await test.signIn('owner@larkhook.example')
    expect((await owner.post('/api/jobs').send(wanted)).status).toBe(409)
  })
  const bad: [string, object][] = [
    ['no name', { name: ' ' }], ['a name over 80 characters', { name: 'x'.repeat(81) }], ['a name of two lines', { name: 'a\nb' }], ['an unknown unit', { lengthUnit: 'yd' }], ['an unknown field', { version: 9 }],
    ['a foreign company', { companyId: 'quoin-batten' }], ['an id with a slash', { id: 'a/b' }], ['half a surrogate', { name: 'a\ud800' }],
  ]
  it.each(bad)('is refused with %s', async (_what, over) => {
    const response = await designer.post('/api/jobs').send(form(over))
    expect([response.status, response.body.type]).toEqual([400, '/problems/invalid'])
  })
  it.each(roles)('may be made by a %s as the policy says', async (role) => {
    const agent = await test.signIn(`${role}@larkhook.example`)
    expect((await agent.post('/api/jobs').send(form())).status).toBe(can(role, 'job.create') ? 200 : 403)
  })
})

describe('the list of jobs', () => {
  it('tells of each job what it holds, what follows, and the last word', async () => {
    const owner = await test.signIn('owner@quoinbatten.example')
    const untouched = form()
    await owner.post('/api/jobs').send(untouched)
    const id = await startJob(owner)
    await push(owner, id, [command({ verb: 'pull.record', args: { pulls: [{ id: 'p', at: '2026-12-01T10:00:00.000Z', runId: 'r1', markUnit: 'ft' }] } }, 1)])
    const { jobs } = (await owner.get('/api/jobs')).body as JobList
    expect(jobs.map((job) => job.id)).toEqual([id, untouched.id])
    expect(jobs[0]).toMatchObject({
      id, name: 'Heron Point, lot 14', client: 'A client', version: 2, levels: 1, runs: 1,
      lastWord: { byName: 'Quill Barrow', label: 'Record PAT1-S1 as pulled' },
      standing: { progress: { total: 1, pulled: 1, terminated: 0, tested: 0 } },
    })
    expect(Object.keys(jobs[0]!.standing!.findings).sort()).toEqual(['caution', 'note', 'stop'])
    expect(jobs[1]).toMatchObject({ version: 0, levels: 0, runs: 0, lastWord: { label: 'Create the job', byName: 'Quill Barrow' }, standing: { progress: { total: 0 }, findings: { stop: 0, caution: 0, note: 0 } } })
    expect(Math.abs(Date.parse(jobs[0]!.lastWord.at) - Date.now())).toBeLessThan(60_000)
  })
  it('follows an edit', async () => {
    const owner = await test.signIn('owner@quoinbatten.example')
    const id = await startJob(owner)
    const standing = async () => ((await owner.get('/api/jobs')).body as JobList).jobs.find((job) => job.id === id)!.standing!
    const before = await standing()
    await push(owner, id, [command({ verb: 'run.drop', args: { ids: ['r1'], reason: 'CO-2' } }, 1)])
    expect([before.progress.total, (await standing()).progress.total]).toEqual([1, 0])
  })
})

describe('another company’s job', () => {
  it('is the same answer as a job that never was, at every address', async () => {
    const id = await startJob(designer)
    const stranger = await test.signIn('designer@quoinbatten.example')
    const rename = command({ verb: 'room.update', args: { ids: ['pat'], set: { name: 'Taken over' } } }, 1)
    const asked = (jobId: string) =>
      Promise.all([
        stranger.get(`/api/jobs/${jobId}`), stranger.get(`/api/jobs/${jobId}/changes?since=0`), stranger.get(`/api/jobs/${jobId}/events`),
        stranger.post(`/api/jobs/${jobId}/commands`).send({ baseVersion: 0, commands: [rename] }), stranger.post(`/api/jobs/${jobId}/commands`).send({ baseVersion: 0, commands: [] }),
      ])
    const [foreign, never] = await Promise.all([asked(id), asked('never-was')])
    const plain = (responses: Awaited<ReturnType<typeof asked>>) => responses.map(({ status, body }) => ({ status, ...body, requestId: '' }))
    expect(plain(foreign)).toEqual(plain(never))
    expect(foreign.map((each) => each.status)).toEqual([404, 404, 404, 404, 404])
    expect((await open(designer, id)).doc.records.room.get('pat')?.name).toBe('Patio')
    expect(((await stranger.get('/api/jobs')).body as JobList).jobs.map((job) => job.id)).not.toContain(id)
  })
  it('may have the same id as one’s own', async () => {
    const id = await startJob(designer)
    const stranger = await test.signIn('designer@quoinbatten.example')
    expect((await stranger.post('/api/jobs').send(form({ id, name: 'Theirs' }))).status).toBe(200)
    await push(stranger, id, [command({ verb: 'job.update', args: { set: { client: 'Somebody' } } }, 0)])
    expect(jobOf((await open(designer, id)).doc)).toMatchObject({ name: 'Heron Point, lot 14', client: 'A client' })
    expect((await open(stranger, id)).opened.records).toHaveLength(1)
  })
})
