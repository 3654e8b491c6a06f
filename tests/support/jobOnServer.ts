import type { Express } from 'express'
import request from 'supertest'
import { demoPassphrase } from '../../server/demo/demoCompany.ts'
import type { Changes, JobOpened, PushAnswer } from '../../shared/api/jobs.ts'
import type { Command, Intent, Step } from '../../shared/commands/index.ts'
import { buildDocument, type JobDocument } from '../../shared/model/jobDocument.ts'
import type { JobRecord } from '../../shared/model/record.ts'
import { smallHouse } from './build.ts'

export type Agent = ReturnType<typeof request.agent>

/** A browser signed in at an application, which may be a second one on the same database. */
export async function signInAt(app: Express, email: string): Promise<Agent> {
  const agent = request.agent(app)
  const response = await agent.post('/api/session').send({ email, passphrase: demoPassphrase })
  if (response.status !== 200) throw new Error(`${email} could not sign in: ${response.text}`)
  return agent
}

let counter = 0
export const freshId = (what: string) => `${what}-${process.pid}-${counter++}`

/** The steps that make these records; fields that the commands assign by themselves are left out. */
export function stepsFor(records: readonly JobRecord[]): Step[] {
  return records.flatMap((record): Step[] => {
    switch (record.kind) {
      case 'level':
      case 'room':
      case 'plate':
      case 'rack':
      case 'pathway':
      case 'cableType':
      case 'deviceModel':
      case 'device':
      case 'cord': {
        const { kind, ...args } = record
        return [{ verb: `${kind}.add`, args } as Step]
      }
      case 'run': {
        const { kind: _kind, serial: _serial, label: _label, dropped: _dropped, ...args } = record
        return [{ verb: 'run.add', args }]
      }
      default:
        return []
    }
  })
}

/** A new job on the server, by whoever this browser is signed in as, with the small house in it: version 1. */
export async function startJob(agent: Agent, records: readonly JobRecord[] = smallHouse()): Promise<string> {
  const id = freshId('job')
  const made = await agent.post('/api/jobs').send({ id, name: 'Heron Point, lot 14', client: 'A client', address: '' })
  if (made.status !== 200) throw new Error(`The job was not made: ${made.text}`)
  const { refused } = await push(agent, id, [command({ verb: 'batch', args: { label: 'Draw the house', steps: stepsFor(records) } }, 0)])
  if (refused[0]) throw new Error(refused[0].message)
  return id
}

/** An intent with an identity, made while looking at a version. */
export const command = (intent: Intent, madeAt: number, id = freshId('c')): Command => ({ ...intent, id, madeAt })

export async function push(agent: Agent, jobId: string, commands: readonly Command[], baseVersion = 0): Promise<PushAnswer> {
  const response = await agent.post(`/api/jobs/${jobId}/commands`).send({ baseVersion, commands })
  if (response.status !== 200) throw new Error(`${response.status} ${response.text}`)
  return response.body as PushAnswer
}

export async function changesSince(agent: Agent, jobId: string, since: number): Promise<Changes> {
  const response = await agent.get(`/api/jobs/${jobId}/changes?since=${since}`)
  if (response.status !== 200) throw new Error(`${response.status} ${response.text}`)
  return response.body as Changes
}

export async function open(agent: Agent, jobId: string): Promise<{ doc: JobDocument; opened: JobOpened }> {
  const response = await agent.get(`/api/jobs/${jobId}`)
  if (response.status !== 200) throw new Error(`${response.status} ${response.text}`)
  const opened = response.body as JobOpened
  return { doc: buildDocument(jobId, opened.version, opened.records), opened }
}
