import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { createServer } from 'node:net'
import { setTimeout as pause } from 'node:timers/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { inTransaction } from '../../../../server/db/transaction.ts'
import { demoPassphrase } from '../../../../server/demo/demoCompany.ts'
import { loadJob } from '../../../../server/modules/jobs/documentRepo.ts'
import type { Changes, PushAnswer } from '../../../../shared/api/jobs.ts'
import type { Command, Intent } from '../../../../shared/commands/index.ts'
import { apply } from '../../../../shared/sync/change.ts'
import { changesSince, command, freshId, open, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { seeded } from '../../../support/randomIntents.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

const kills = Number(process.env['KILLS'] ?? 22)
const writers = 4

let test: TestApp
let designer: Agent
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
})
afterAll(() => test.close())

const freePort = () =>
  new Promise<number>((done) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address() as { port: number }
      probe.close(() => done(port))
    })
  })

async function startProcess(port: number): Promise<ChildProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'tests/support/serverProcess.ts'], { env: { ...process.env, DATABASE_URL: test.url, PORT: String(port) }, stdio: ['ignore', 'pipe', 'inherit'] })
  await once(child.stdout!, 'data')
  return child
}

/** Light edits, heavy ones of eighty rows, and edits of what others edit too. */
function work(random: () => number): Intent {
  const dice = random()
  if (dice < 0.3) return { verb: 'room.update', args: { ids: ['pat'], set: { ceilingHeightMm: 2000 + Math.floor(random() * 2000) } } }
  if (dice < 0.6) return { verb: 'run.add', args: { id: freshId('r'), cableTypeId: 'c-16-2', a: null, b: { plateId: 'pat1', jackId: null } } }
  const plateId = freshId('p')
  return {
    verb: 'batch',
    args: {
      label: 'A plate with many runs',
      steps: [
        { verb: 'plate.add', args: { id: plateId, roomId: 'mch', form: 'wall-box', mounting: 'wall', wall: 1, alongMm: 100, heightMm: 400, jacks: [{ id: 'j', position: 1, connector: 'coax' }] } },
        ...Array.from({ length: 40 }, () => ({ verb: 'run.add' as const, args: { id: freshId('r'), cableTypeId: 'c-14-2', a: { rackId: 'rk1' }, b: { plateId, jackId: 'j' } } })),
      ],
    },
  }
}

describe('a server that is killed in mid-write', () => {
  it(`${kills} times loses nothing it acknowledged, does nothing twice and nothing by half`, async () => {
    const jobId = await startJob(designer)
    const start = (await open(designer, jobId)).doc
    const port = await freePort()
    const address = `http://127.0.0.1:${port}`
    let child = await startProcess(port)
    const signedIn = await fetch(`${address}/api/session`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ email: 'designer@larkhook.example', passphrase: demoPassphrase }) })
    const cookie = signedIn.headers.getSetCookie()[0]!.split(';')[0]!

    const acknowledged = new Map<string, number>()
    let cut = 0
    let seen = start.version
    let stopping = false
    /** Sends a command until it is answered, as a client's queue does. */
    async function deliver(sent: Command): Promise<void> {
      for (;;) {
        try {
          const response = await fetch(`${address}/api/jobs/${jobId}/commands`, { method: 'POST', headers: { 'Content-Type': 'application/json', cookie }, body: JSON.stringify({ baseVersion: seen, commands: [sent] }) })
          if (response.status !== 200) throw new Error(`answered ${response.status}`)
          const answer = (await response.json()) as PushAnswer
          expect(answer.refused).toEqual([])
          acknowledged.set(sent.id, answer.accepted[0]!.version)
          seen = Math.max(seen, answer.version)
          return
        } catch (error) {
          if (error instanceof Error && error.name === 'AssertionError') throw error
          if ((error as { cause?: { code?: string } }).cause?.code !== 'ECONNREFUSED') cut++
          await pause(20)
        }
      }
    }
    const writing = Array.from({ length: writers }, async (_, writer) => {
      const random = seeded(100 + writer)
      while (!stopping) await deliver(command(work(random), 1_000_000))
    })
    const random = seeded(7)
    for (let kill = 0; kill < kills; kill++) {
      await pause(200 + Math.floor(random() * 500))
      child.kill('SIGKILL')
      await once(child, 'exit')
      child = await startProcess(port)
    }
    stopping = true
    await Promise.all(writing)
    child.kill('SIGKILL')

    console.log(`${kills} kills, ${acknowledged.size} commands acknowledged, ${cut} requests cut off`)
    expect(cut, 'the kills hit requests on their way').toBeGreaterThan(kills)
    expect(acknowledged.size).toBeGreaterThan(kills * 2)
    const log: Changes['since'][number][] = []
    for (let at = start.version; ; at = log.at(-1)!.version) {
      const { since } = await changesSince(designer, jobId, at)
      log.push(...since)
      if (!since.length) break
    }
    expect(log.map((entry) => entry.version), 'gapless').toEqual(log.map((_, i) => start.version + 1 + i))
    expect(new Set(log.map((entry) => entry.commandId)).size, 'nothing twice').toBe(log.length)
    expect(new Map(log.map((entry) => [entry.commandId, entry.version])), 'what was acknowledged, at the version that was said').toEqual(acknowledged)
    const told = log.reduce((doc, { change, version }) => ({ ...apply(doc, change), version }), start)
    const loaded = await inTransaction(test.database.db, (tx) => loadJob(tx, { companyId: 'larkhook', jobId }))
    expect(loaded, 'the tables say what the log says').toEqual(told)
  }, 240_000)
})
