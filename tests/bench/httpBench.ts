import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import autocannon, { type CannonRequest } from 'autocannon'
import type { PushAnswer } from '../../shared/api/jobs.ts'
import type { Change } from '../../shared/sync/change.ts'
import { freePort } from '../../server/start/ports.ts'
import { projectFolder } from '../../server/start/settings.ts'
import { planOf, type BarePlan } from './barePlan.ts'
import { designer, type BenchWorld } from './benchWorld.ts'
import { bigHouse } from './bigHouse.ts'
import { withCapture } from './captureStatements.ts'
import { median, type Row } from './measure.ts'

const connections = 10
const pairs = 5
const seconds = 3
const warmUpSeconds = 2
/** One job of 60 runs for each connection and side, so that no command waits for another's lock; and one to open. */
const jobOf = (name: string) => ({ ...bigHouse(60), id: `bench-${name}`, name: `House ${name}` })
const ourJobs = Array.from({ length: connections }, (_, i) => `bench-ours-${i}`)
const bareJobs = Array.from({ length: connections }, (_, i) => `bench-bare-${i}`)
const [openJob, probeJob] = ['bench-open', 'bench-probe']
export const httpStories = () => [openJob, probeJob, ...ourJobs, ...bareJobs].map((id) => jobOf(id.replace('bench-', '')))

/** Opening a job and sending one command, against the same statements and JSON by Express and mysql2 alone. */
export async function httpBench(world: BenchWorld, say: (line: string) => void): Promise<Row[]> {
  const bare = await startBare(world)
  try {
    await assertSameAnswer(world, bare.address)
    say('Opening a job over HTTP')
    const opened = await (await fetch(`${world.address}/api/jobs/${openJob}`, { headers: { cookie: world.cookie } })).text()
    const open = await compare((side, duration) => load(side === 'ours' ? world.address : bare.address, duration, () => openings(world.cookie, opened)))
    say('Sending commands over HTTP')
    const senders = { ours: await sendersFor(world, ourJobs), bare: await sendersFor(world, bareJobs) }
    const command = await compare((side, duration) => load(side === 'ours' ? world.address : bare.address, duration, (i) => senders[side][i % connections]!))
    return [
      { name: 'http-open', ...open, unit: `requests/s, a job of 60 runs, ${Math.round(opened.length / 1024)} kB of JSON` },
      { name: 'http-command', ...command, unit: 'requests/s, one field of one run, spread over 10 jobs' },
    ]
  } finally {
    await bare.stop()
  }
}

/** What our server runs for one opening and one command, replayed by the bare one in a process of its own. */
async function startBare(world: BenchWorld) {
  const headers = { cookie: world.cookie, 'content-type': 'application/json' }
  const plans = await withCapture(world.environment, world.databaseUrl, async (ask) => {
    await ask(`/api/jobs/${probeJob}`, { headers })
    const open = await ask(`/api/jobs/${probeJob}`, { headers })
    const { version, records } = await world.open(probeJob)
    const command = commandFor(records.find(({ kind }) => kind === 'run')!.id, 'probe', version, 'Probe')
    const push = await ask(`/api/jobs/${probeJob}/commands`, { method: 'POST', headers, body: JSON.stringify({ baseVersion: version, commands: [command] }) })
    const [entry] = (JSON.parse(push.body) as PushAnswer).since
    const known = {
      jobId: probeJob, commandId: command.id, runId: command.args.ids[0]!, purpose: 'Probe', version, next: version + 1, args: JSON.stringify(command.args),
      change: JSON.stringify(entry!.change satisfies Change), at: entry!.at.replace('T', ' ').replace('Z', ''),
    }
    return { open: planOf(open.statements, { jobId: probeJob }), command: planOf(push.statements, known) }
  })
  const jobs = []
  for (const id of [openJob, ...bareJobs]) jobs.push({ id, records: (await world.open(id)).records })
  const file = join(world.folder, 'bare-plan.json')
  writeFileSync(file, JSON.stringify({ ...plans, databaseUrl: world.databaseUrl, jobs, actorId: designer.id } satisfies BarePlan))
  const port = await freePort()
  const child = spawn(process.execPath, ['--import', 'tsx', 'tests/bench/bareServer.ts'], { cwd: projectFolder, env: { ...process.env, PORT: String(port), BARE_PLAN: file }, stdio: ['ignore', 'pipe', 'inherit'] })
  const ended = once(child, 'exit')
  await Promise.race([once(child.stdout, 'data'), ended.then(() => Promise.reject(new Error('The bare server did not start')))])
  return {
    address: `http://127.0.0.1:${port}`,
    stop: async () => {
      child.kill('SIGTERM')
      await ended
    },
  }
}

/** The two must say the same, or the comparison means nothing. */
async function assertSameAnswer(world: BenchWorld, bareAddress: string): Promise<void> {
  const [ours, bare] = await Promise.all([world.address, bareAddress].map(async (address) => (await fetch(`${address}/api/jobs/${openJob}`, { headers: { cookie: world.cookie } })).text()))
  if (ours !== bare) throw new Error('The bare server answers another job than ours')
  const answers = []
  for (const [address, jobId] of [[world.address, ourJobs[0]!], [bareAddress, bareJobs[0]!]] as const) {
    const { version, records } = await world.open(jobId)
    const body = JSON.stringify({ baseVersion: version, commands: [commandFor(records.find(({ kind }) => kind === 'run')!.id, 'same', version, 'Same')] })
    const response = await fetch(`${address}/api/jobs/${jobId}/commands`, { method: 'POST', headers: { cookie: world.cookie, 'content-type': 'application/json' }, body })
    answers.push((await response.text()).replace(/"(at|label)":"[^"]*"/g, '"$1":""'))
  }
  if (answers[0] !== answers[1]) throw new Error(`The bare server answers a command differently:\n${answers.join('\n')}`)
}

const commandFor = (runId: string, id: string, madeAt: number, purpose: string) => ({ id, madeAt, verb: 'run.update', args: { ids: [runId], set: { purpose } } })

/** One connection's requests, and what was wrong with the answers. */
interface Sender {
  readonly request: CannonRequest
  readonly faults: string[]
  answered: number
}

function openings(cookie: string, expected: string): Sender {
  const sender: Sender = {
    faults: [],
    answered: 0,
    request: {
      method: 'GET', path: `/api/jobs/${openJob}`, headers: { cookie },
      onResponse: (status, body) => {
        sender.answered++
        if (status !== 200 || body !== expected) sender.faults.push(`${status} ${body.slice(0, 200)}`)
      },
    },
  }
  return sender
}

/** Each connection edits the runs of its own job, one after the other, and knows the version the last answer told. */
async function sendersFor(world: BenchWorld, jobIds: readonly string[]): Promise<Sender[]> {
  return Promise.all(
    jobIds.map(async (jobId) => {
      const opened = await world.open(jobId)
      const runIds = opened.records.filter(({ kind }) => kind === 'run').map(({ id }) => id)
      let { version } = opened
      let sent = 0
      let commandId = ''
      const sender: Sender = {
        faults: [],
        answered: 0,
        request: {
          method: 'POST', path: `/api/jobs/${jobId}/commands`, headers: { cookie: world.cookie, 'content-type': 'application/json' },
          setupRequest: (request) => {
            commandId = `${jobId}-edit-${sent}`
            const command = commandFor(runIds[sent % runIds.length]!, commandId, version, `Purpose ${sent}`)
            sent++
            return { ...request, body: JSON.stringify({ baseVersion: version, commands: [command] }) }
          },
          onResponse: (status, body) => {
            sender.answered++
            const answer = (status === 200 ? JSON.parse(body) : {}) as Partial<PushAnswer>
            if (answer.refused?.length !== 0 || answer.accepted?.[0]?.commandId !== commandId) sender.faults.push(`${status} ${body.slice(0, 300)}`)
            version = answer.version ?? version
          },
        },
      }
      return sender
    }),
  )
}

/** Requests per second of one side for a while. Throws when any answer was not what it should be. */
async function load(url: string, duration: number, senderOf: (connection: number) => Sender): Promise<number> {
  const senders: Sender[] = []
  const result = await autocannon({
    url, connections, duration,
    setupClient: (client) => {
      const sender = senderOf(senders.length)
      sender.answered = 0
      senders.push(sender)
      client.setRequests([sender.request])
    },
  })
  const faults = senders.flatMap((sender) => sender.faults)
  if (faults.length || result.errors || result.timeouts || result.non2xx)
    throw new Error(`${url}: ${faults.length} wrong answers, ${result.errors} errors, ${result.timeouts} late. ${faults[0] ?? ''}`)
  return senders.reduce((sum, { answered }) => sum + answered, 0) / result.duration
}

/** Both sides in turn, after a warm-up of each: the median of what each pair says. */
async function compare(run: (side: 'ours' | 'bare', duration: number) => Promise<number>): Promise<Pick<Row, 'ours' | 'reference' | 'ratio'>> {
  for (const side of ['ours', 'bare'] as const) await run(side, warmUpSeconds)
  const taken: { ours: number; reference: number }[] = []
  for (let i = 0; i < pairs; i++) taken.push({ ours: await run('ours', seconds), reference: await run('bare', seconds) })
  return { ours: median(taken.map(({ ours }) => ours)), reference: median(taken.map(({ reference }) => reference)), ratio: median(taken.map(({ ours, reference }) => ours / reference)) }
}
