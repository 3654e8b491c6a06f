import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { jobFixtures } from '../../../fixtures/jobs/allJobs.ts'
import { deriveJob } from '../../../shared/derive/deriveJob.ts'
import { migrateDatabase } from '../../../server/db/migrate.ts'
import { loadDemo, playDemoJobs } from '../../../server/demo/loadDemo.ts'
import { countCompanies } from '../../../server/modules/company/companyRepo.ts'
import { listJobRows } from '../../../server/modules/jobs/jobRepo.ts'
import type { JobList } from '../../../shared/api/jobs.ts'
import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import { changesSince, open, type Agent } from '../../support/jobOnServer.ts'
import { playFixture } from '../../support/playFixture.ts'
import { breakable } from '../../support/breakableDatabase.ts'
import { startTestApp, type TestApp } from '../../support/testApp.ts'
import { makeSchema } from '../../support/testSchema.ts'

let test: TestApp
let designer: Agent
beforeAll(async () => {
  test = await startTestApp()
  await playDemoJobs(test.deps)
  designer = await test.signIn('designer@larkhook.example')
})
afterAll(() => test.close())

/** Records by kind, without who said them: in memory a role says it, in the company its member. */
const said = (doc: JobDocument) => Object.fromEntries(Object.entries(doc.records).map(([kind, map]) => [kind, [...map.values()].map((record) => ({ ...record, byId: '' }))]))

describe('the demo company’s jobs', () => {
  it.each(jobFixtures.map((write) => [write().name, write] as const))('%s is in the tables as its story tells it', async (_name, write) => {
    const story = write()
    const { doc } = await open(designer, story.id)
    const played = playFixture(story)
    expect({ ...said(doc), job: [] }).toEqual({ ...said(played), job: [] })
    expect(doc.version).toBe(story.commands.length)
    const { since } = await changesSince(designer, story.id, 0)
    expect(since.map((entry) => entry.actorId)).toEqual(story.commands.map(({ as }) => `larkhook-${as}`))
  })
  it('stand in the list with what follows from them', async () => {
    const { jobs } = (await designer.get('/api/jobs')).body as JobList
    expect(jobs.map((job) => job.id).sort()).toEqual(jobFixtures.map((write) => write().id).sort())
    for (const job of jobs) {
      const { doc } = await open(designer, job.id)
      const { progress, counts } = deriveJob(doc)
      expect(job.standing, job.name).toEqual({ progress, findings: counts })
      expect([job.runs, job.levels]).toEqual([doc.records.run.size, doc.records.level.size])
    }
  })
})

describe('a first start that is broken off while it loads the demo company', () => {
  it.each([2, 400])('at statement %i leaves an empty database, and the next start loads it whole', async (statement) => {
    const schema = await makeSchema()
    await migrateDatabase(schema.migrationUrl)
    const { database, breakAt, mend, broke } = breakable(schema.url)
    const deps = { ...test.deps, db: database.db, closing: new AbortController().signal }
    breakAt(statement)
    await expect(loadDemo(deps, () => undefined)).rejects.toThrow()
    expect(broke()).toBe(true)
    mend()
    expect(await countCompanies(database.db)).toBe(0)
    await loadDemo(deps, () => undefined)
    expect(await listJobRows(database.db, 'larkhook')).toHaveLength(jobFixtures.length)
    await loadDemo(deps, () => undefined)
    expect(await countCompanies(database.db)).toBe(2)
    await database.close()
    await schema.drop()
  }, 30_000)
})
