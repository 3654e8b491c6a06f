import { readFileSync } from 'node:fs'
import express from 'express'
import mysql, { type PoolConnection, type RowDataPacket } from 'mysql2/promise'
import type { BarePlan, PlannedStatement, Varying } from './barePlan.ts'

// The least that answers the same: Express and mysql2, every statement that the program sent for one such request (those
// that find the session and the member too), in the same order and the same transaction, and the same JSON. The records
// of a job are in memory, as they are in the program. It leaves out: express-session, the policy, zod, drizzle, time
// limits on statements, security headers, the log of requests, checking the command, replaying it, and everybody else.
const plan = JSON.parse(readFileSync(process.env['BARE_PLAN']!, 'utf8')) as BarePlan
const pool = mysql.createPool({ uri: plan.databaseUrl, connectionLimit: 10, timezone: 'Z', charset: 'utf8mb4', dateStrings: true, supportBigNumbers: true, enableKeepAlive: true, trace: false })
pool.pool.on('connection', (connection: { query: (sql: string) => void }) => connection.query("SET SESSION innodb_snapshot_isolation = ON, max_statement_time = 2.9, time_zone = '+00:00'"))
const records = new Map(plan.jobs.map((job) => [job.id, job.records]))
const purposes = new Map<string, string>()
for (const job of plan.jobs) for (const { kind, id, purpose } of job.records) if (kind === 'run') purposes.set(`${job.id}/${id}`, purpose ?? '')

type Known = Partial<Record<Varying, unknown>>
type Rows = RowDataPacket[]

/** Runs the statements, those from `begin` to `commit` on one connection. Each is told of what came back before it. */
async function run(statements: readonly PlannedStatement[], known: Known, onRows: (rows: Rows, index: number) => void): Promise<void> {
  let held: PoolConnection | undefined
  try {
    for (const [index, { sql, values }] of statements.entries()) {
      if (sql === 'begin') held = await pool.getConnection()
      const [rows] = await (held ?? pool).query<Rows>(sql, values.map((value) => ('of' in value ? known[value.of] : value.is)))
      onRows(rows, index)
      if (sql === 'commit') {
        held?.release()
        held = undefined
      }
    }
  } catch (error) {
    held?.destroy()
    throw error
  }
}

const lockAt = plan.command.findIndex(({ sql }) => sql.endsWith('for update'))
const openVersionAt = plan.open.findIndex(({ sql }) => sql.startsWith('select `version` from `jobs`'))
if (lockAt < 0 || openVersionAt < 0) throw new Error('The statements do not read the version of a job')

const app = express()
app.use(express.json({ limit: '1mb' }))

app.get('/api/jobs/:jobId', async (request, response) => {
  const { jobId } = request.params
  let version = 0
  let members: Rows = []
  await run(plan.open, { jobId }, (rows, index) => {
    if (index === openVersionAt) version = (rows[0] as { version: number }).version
    else if (index === plan.open.length - 1) members = rows
  })
  response.json({ version, records: records.get(jobId), members: members.map((row) => ({ id: row['id'] as string, name: row['name'] as string, role: row['role'] as string })) })
})

interface Sent {
  readonly baseVersion: number
  readonly commands: readonly { readonly id: string; readonly args: { readonly ids: readonly string[]; readonly set: { readonly purpose: string } } }[]
}

app.post('/api/jobs/:jobId/commands', async (request, response) => {
  const { jobId } = request.params
  const { baseVersion, commands } = request.body as Sent
  const { id, args } = commands[0]!
  const runId = args.ids[0]!
  const { purpose } = args.set
  const key = `${jobId}/${runId}`
  const known: Known = {
    jobId, commandId: id, runId, purpose, version: baseVersion, args: JSON.stringify(args), at: new Date().toISOString().replace('T', ' ').replace('Z', ''),
    change: JSON.stringify({ added: [], removed: [], updated: [{ kind: 'run', id: runId, fields: { purpose: [purposes.get(key), purpose] } }] }),
  }
  let since: Rows = []
  await run(plan.command, known, (rows, index) => {
    if (index === lockAt) known.next = (rows[0] as { version: number }).version + 1
    else if (index === plan.command.length - 1) since = rows
  })
  purposes.set(key, purpose)
  response.json({
    version: known.next,
    since: since.map((row) => ({
      version: row['version'] as number, commandId: row['command_id'] as string, actorId: row['actor_id'] as string, verb: row['verb'] as string, label: row['label'] as string,
      at: `${(row['at'] as string).replace(' ', 'T')}Z`, change: typeof row['change'] === 'string' ? (JSON.parse(row['change']) as unknown) : (row['change'] as unknown),
    })),
    accepted: [{ commandId: id, version: known.next }],
    refused: [],
  })
})

app.listen(Number(process.env['PORT']), '127.0.0.1', () => process.stdout.write('ready\n'))
