import fc from 'fast-check'
import { sql } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { dbErrno, errnoOf } from '../../../../server/db/errors.ts'
import { inTransaction } from '../../../../server/db/transaction.ts'
import { demoCompanies } from '../../../../server/demo/demoCompany.ts'
import { loadJob, writeChange, type JobScope } from '../../../../server/modules/jobs/documentRepo.ts'
import { insertJob } from '../../../../server/modules/jobs/jobRepo.ts'
import { buildDocument, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { JobRecord } from '../../../../shared/model/record.ts'
import { adds, apply, reverse, type Change } from '../../../../shared/sync/change.ts'
import { buildJob, buildPlate, buildRoom, buildRun, smallHouse } from '../../../support/build.ts'
import { arbitraryRecords } from '../../../support/arbitraryDocument.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.close())

const [company] = demoCompanies
const memberIds = company!.members.map((member) => member.id)
let counter = 0

/** A job in the database that holds these records and nothing else. */
async function keep(records: readonly JobRecord[]): Promise<{ scope: JobScope; doc: JobDocument }> {
  const jobId = `job-${counter++}`
  const scope = { companyId: company!.id, jobId }
  const job = { ...(records.find((record) => record.kind === 'job') ?? buildJob()), id: jobId }
  const rest = records.filter((record) => record.kind !== 'job')
  const doc = buildDocument(jobId, 0, [job, ...rest])
  await inTransaction(test.database.db, async (tx) => {
    await insertJob(tx, { companyId: company!.id, job, createdById: memberIds[0]!, createdAt: '2026-12-01T10:00:00.000Z' })
    await writeChange(tx, scope, adds(...rest), doc)
  })
  return { scope, doc }
}
const load = (scope: JobScope) => inTransaction(test.database.db, (tx) => loadJob(tx, scope))
async function write(scope: JobScope, doc: JobDocument, change: Change): Promise<JobDocument> {
  const after = apply(doc, change)
  await inTransaction(test.database.db, (tx) => writeChange(tx, scope, change, after))
  return after
}
/** Records in the order they were read: the database must remember that too. */
const listed = (doc: JobDocument | undefined) => Object.fromEntries(Object.entries(doc?.records ?? {}).map(([kind, map]) => [kind, [...map.values()]]))
const renamed = (kind: 'room' | 'run' | 'plate', id: string, field: string, from: unknown, to: unknown): Change => ({ added: [], removed: [], updated: [{ kind, id, fields: { [field]: [from, to] } }] })

describe('a document in the database', () => {
  it('comes back as it went, whatever its fields hold, and in its order', async () => {
    await fc.assert(
      fc.asyncProperty(arbitraryRecords(memberIds), async (records) => {
        const { scope, doc } = await keep(records)
        expect(listed(await load(scope))).toEqual(listed(doc))
      }),
      { numRuns: Number(process.env['RUNS'] ?? 40), endOnFailure: true },
    )
  }, 120_000)

  it('is read in the same number of statements, whatever it holds', async () => {
    const count = async (records: readonly JobRecord[]) => {
      const { scope } = await keep(records)
      const asked = async () => Number(((await test.database.db.execute(sql`show global status like 'Com_select'`)) as unknown as [{ Value: string }[]])[0][0]?.Value)
      const before = await asked()
      await load(scope)
      return (await asked()) - before
    }
    const many = Array.from({ length: 300 }, (_, i) => buildRun({ id: `x${i}`, serial: i + 10, label: `X-${i}`, a: null, b: null }))
    expect(await count([...smallHouse(), ...many])).toBe(await count([]))
  })

  it('lets two rooms swap codes, two runs labels and two plates numbers in one change', async () => {
    const house = [...smallHouse(), buildPlate({ id: 'pat2', number: 2, jacks: [] }), buildRun({ id: 'r2', serial: 2, label: 'PAT1-S2', a: null, b: null })]
    const { scope, doc } = await keep(house)
    const swap: Change = {
      added: [], removed: [],
      updated: [
        ...renamed('room', 'pat', 'code', 'PAT', 'MCH').updated, ...renamed('room', 'mch', 'code', 'MCH', 'PAT').updated,
        ...renamed('run', 'r1', 'label', 'PAT1-S1', 'pat1-s2').updated, ...renamed('run', 'r2', 'label', 'PAT1-S2', 'PAT1-S1').updated,
        ...renamed('plate', 'pat1', 'number', 1, 2).updated, ...renamed('plate', 'pat2', 'number', 2, 1).updated,
      ],
    }
    const after = await write(scope, doc, swap)
    expect(listed(await load(scope))).toEqual(listed(after))
    const back = await write(scope, after, reverse(swap))
    expect(listed(await load(scope))).toEqual(listed(back))
  })

  it('gives a new room the code, and a new run the label and serial, of those that go in the same change', async () => {
    const { scope, doc } = await keep(smallHouse())
    const run = doc.records.run.get('r1')!
    const room = doc.records.room.get('pat')!
    const plate = doc.records.plate.get('pat1')!
    const change: Change = { removed: [run, plate, room], added: [buildRoom({ id: 'pat-b' }), buildRun({ id: 'r1-b', b: null })], updated: [] }
    const after = await write(scope, doc, change)
    expect(listed(await load(scope))).toEqual(listed(after))
  })

  it('moves a run to a jack that the same change gives a plate, and takes the old jack away', async () => {
    const { scope, doc } = await keep(smallHouse())
    const jacks = [{ id: 'j9', position: 1, connector: 'speaker-pair' as const }]
    const change: Change = {
      added: [buildRun({ id: 'r2', serial: 2, label: 'PAT1-S2', b: { plateId: 'pat1', jackId: 'j9' } })], removed: [],
      updated: [
        { kind: 'run', id: 'r1', fields: { b: [{ plateId: 'pat1', jackId: 'j1' }, { plateId: 'pat1', jackId: 'j9' }] } },
        { kind: 'plate', id: 'pat1', fields: { jacks: [[{ id: 'j1', position: 1, connector: 'speaker-pair' }], jacks] } },
      ],
    }
    const after = await write(scope, doc, change)
    expect(listed(await load(scope))).toEqual(listed(after))
  })
})

describe('the database itself', () => {
  const refusedWith = async (records: readonly JobRecord[], extra: JobRecord) => {
    const { scope, doc } = await keep(records)
    const change = adds(extra)
    return inTransaction(test.database.db, (tx) => writeChange(tx, scope, change, apply(doc, change))).then(() => 'taken', errnoOf)
  }
  it('refuses a link to another job', async () => {
    await keep([...smallHouse(), buildRoom({ id: 'elsewhere', code: 'ELS' })])
    expect(await refusedWith(smallHouse(), buildPlate({ id: 'stray', number: 9, roomId: 'elsewhere', jacks: [] }))).toBe(dbErrno.reference)
  })
  it('refuses a jack of another plate', async () => {
    expect(await refusedWith([...smallHouse(), buildPlate({ id: 'pat2', number: 2, jacks: [] })], buildRun({ id: 'r2', serial: 2, label: 'X', b: { plateId: 'pat2', jackId: 'j1' } }))).toBe(dbErrno.reference)
  })
  it('refuses a label twice, whatever its capitals, and a code twice', async () => {
    expect(await refusedWith(smallHouse(), buildRun({ id: 'r2', serial: 2, label: 'pat1-s1' }))).toBe(dbErrno.duplicate)
    expect(await refusedWith(smallHouse(), buildRoom({ id: 'other' }))).toBe(dbErrno.duplicate)
  })
  it('tells ids apart by their capitals', async () => {
    expect(await refusedWith(smallHouse(), buildRoom({ id: 'PAT', code: 'OTH' }))).toBe('taken')
  })
  it('refuses a record by somebody who is not of the company', async () => {
    expect(await refusedWith(smallHouse(), { kind: 'pull', id: 'p', at: '2026-12-01T10:00:00.000Z', byId: 'quoinbatten-owner', runId: 'r1', markA: null, markB: null, markUnit: 'ft', spool: null })).toBe(dbErrno.reference)
  })
})
