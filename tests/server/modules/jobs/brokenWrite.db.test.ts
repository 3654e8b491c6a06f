import { and, eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { inTransaction } from '../../../../server/db/transaction.ts'
import { rooms } from '../../../../server/db/tables/places.ts'
import { createJobsContext, type JobsContext } from '../../../../server/modules/jobs/jobsContext.ts'
import { loadJob } from '../../../../server/modules/jobs/documentRepo.ts'
import { pushCommands } from '../../../../server/modules/jobs/pushCommands.ts'
import { readDocument } from '../../../../server/modules/jobs/readDocument.ts'
import type { Intent } from '../../../../shared/commands/index.ts'
import { breakable } from '../../../support/breakableDatabase.ts'
import { buildRoom } from '../../../support/build.ts'
import { command, open, push, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let designer: Agent
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
})
afterAll(() => test.close())

const actor = { id: 'larkhook-designer', role: 'designer' } as const
const roomArgs = (id: string, code: string) => {
  const { kind: _kind, ...args } = buildRoom({ id, code })
  return args
}
const addRoom = (id: string, code: string): Intent => ({ verb: 'room.add', args: roomArgs(id, code) })
const loaded = (jobId: string) => inTransaction(test.database.db, (tx) => loadJob(tx, { companyId: 'larkhook', jobId }))

describe('a write that the tables refuse', () => {
  it('is a refusal that leaves no trace, neither in the tables nor in memory', async () => {
    const id = await startJob(designer)
    const before = (await open(designer, id)).doc
    // A row behind the program's back: the document does not know it, the tables do.
    const stray = { companyId: 'larkhook', jobId: id, ...roomArgs('stray', 'SAU') }
    await test.database.db.insert(rooms).values(stray)
    const sauna = command(addRoom('sauna', 'SAU'), 1)
    const refused = await push(designer, id, [sauna, command(addRoom('cellar', 'CEL'), 1)], 1)
    expect(refused.refused).toMatchObject([{ commandId: sauna.id, code: 'refused', message: expect.stringContaining('Nothing was changed') }])
    expect(refused.version).toBe(2)
    await test.database.db.delete(rooms).where(and(eq(rooms.jobId, id), eq(rooms.id, 'stray')))
    expect([...(await open(designer, id)).doc.records.room.keys()]).toEqual([...before.records.room.keys(), 'cellar'])
    expect(await push(designer, id, [sauna], 2)).toMatchObject({ version: 3, refused: [] })
    expect(await loaded(id)).toEqual((await open(designer, id)).doc)
  })
})

describe('a database that breaks at the n-th statement of a command', () => {
  const work: [string, Intent][] = [
    ['room.update', { verb: 'room.update', args: { ids: ['pat'], set: { code: 'TER' } } }],
    ['run.changeCable', { verb: 'run.changeCable', args: { ids: ['r1'], cableTypeId: 'c-14-2' } }],
    ['plate.update', { verb: 'plate.update', args: { ids: ['pat1'], set: { jacks: [{ id: 'j1', position: 2, connector: 'speaker-pair' }, { id: 'j2', position: 1, connector: 'coax' }] } } }],
    ['items.remove', { verb: 'items.remove', args: { items: [{ kind: 'room', id: 'pat' }] } }],
    ['batch', { verb: 'batch', args: { label: 'x', steps: [{ verb: 'room.add', args: roomArgs('s', 'SAU') }, { verb: 'items.remove', args: { items: [{ kind: 'run', id: 'r1' }] } }] } }],
  ]
  it.each(work)('%s: for every n nothing is half done, and the same command works afterwards', async (_verb, intent) => {
    const { database, breakAt, mend, broke } = breakable(test.url)
    const context: JobsContext = createJobsContext({ ...test.deps, db: database.db, closing: new AbortController().signal })
    let broken = 0
    for (let n = 1; n < 60; n++) {
      const jobId = await startJob(designer)
      const scope = { companyId: 'larkhook', jobId }
      const before = await readDocument(context, scope)
      const sent = command(intent, 1)
      breakAt(n)
      const failed = await pushCommands(context, actor, scope, { baseVersion: 1, commands: [sent] }).then(() => false, () => true)
      mend()
      if (!broke()) break
      broken++
      expect(failed, `statement ${n}`).toBe(true)
      expect(await loaded(jobId), `statement ${n}`).toEqual(before)
      const other = await pushCommands(context, actor, scope, { baseVersion: 1, commands: [command({ verb: 'job.update', args: { set: { client: 'Somebody' } } }, 1)] })
      const again = await pushCommands(context, actor, scope, { baseVersion: other.version, commands: [sent] })
      expect([again.version, again.refused], `statement ${n}`).toEqual([3, []])
      expect(await readDocument(context, scope), `statement ${n}`).toEqual(await loaded(jobId))
    }
    expect(broken).toBeGreaterThan(5)
    await database.close()
  }, 60_000)
})
