import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../../../server/app.ts'
import { inTransaction } from '../../../../server/db/transaction.ts'
import { loadJob } from '../../../../server/modules/jobs/documentRepo.ts'
import type { LogEntry } from '../../../../shared/api/jobs.ts'
import type { Command } from '../../../../shared/commands/index.ts'
import type { JobDocument } from '../../../../shared/model/jobDocument.ts'
import { apply } from '../../../../shared/sync/change.ts'
import { assertSound } from '../../../../shared/sync/soundness.ts'
import { command, freshId, open, push, signInAt, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { randomIntent, seeded } from '../../../support/randomIntents.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.close())

const at = '2026-12-01T10:00:00.000Z'
const seeds = Number(process.env['SEEDS'] ?? 3)
const length = 250

interface Person {
  readonly agent: Agent
  doc: JobDocument
  /** Ids of this person's own commands that were accepted. */
  readonly done: string[]
}

/** Whatever follows what a person has, applied in order: what a client does with an answer. */
function catchUp(person: Person, since: readonly LogEntry[]) {
  for (const { version, change } of since) {
    expect(version).toBe(person.doc.version + 1)
    const after = { ...apply(person.doc, change), version }
    assertSound(after, change)
    person.doc = after
  }
}

describe('random work of three people on two processes', () => {
  it.each(Array.from({ length: seeds }, (_, i) => i + 1))(`seed %i, ${length} steps: tables, log and everybody’s document agree`, async (seed) => {
    const random = seeded(seed)
    const apps = [test.app, createApp({ ...test.deps, closing: new AbortController().signal })]
    const emails = ['designer@larkhook.example', 'owner@larkhook.example', 'lead@larkhook.example']
    const agents = await Promise.all(emails.map((email, i) => signInAt(apps[i % 2]!, email)))
    const id = await startJob(agents[0]!)
    const people: Person[] = await Promise.all(agents.map(async (agent) => ({ agent, doc: (await open(agent, id)).doc, done: [] })))
    const counts = { accepted: 0, refused: 0, undone: 0 }

    for (let step = 0; step < length; step++) {
      const person = people[Math.floor(random() * people.length)]!
      const isUndo = person.done.length > 0 && random() < 0.2
      const intent = isUndo
        ? ({ verb: 'revert', args: { commandId: person.done[Math.floor(random() * person.done.length)]!, at } } as const)
        : randomIntent(person.doc, random, () => freshId('n'))
      if (!intent) continue
      const sent: Command[] = [command(intent, person.doc.version)]
      if (random() < 0.1) sent.push(sent[0]!)
      const answer = await push(person.agent, id, sent, person.doc.version)
      catchUp(person, answer.since)
      expect(person.doc.version).toBe(answer.version)
      counts.accepted += answer.accepted.length
      counts.refused += answer.refused.length
      if (answer.accepted.length) person.done.push(sent[0]!.id)
      if (isUndo) counts.undone += answer.accepted.length
      if (step % 25 === 0) await compare(id, person.doc)
    }

    for (const person of people) catchUp(person, (await push(person.agent, id, [], person.doc.version)).since)
    expect(people[1]!.doc).toEqual(people[0]!.doc)
    expect(people[2]!.doc).toEqual(people[0]!.doc)
    await compare(id, people[0]!.doc)
    expect(counts.accepted, JSON.stringify(counts)).toBeGreaterThan(length / 3)
    expect(counts.refused, 'the story holds foolish commands too').toBeGreaterThan(10)
    expect(counts.undone, 'and undos that worked').toBeGreaterThan(10)
  }, 120_000)

  /** The tables hold exactly this document, in its order. */
  async function compare(jobId: string, doc: JobDocument) {
    const loaded = await inTransaction(test.database.db, (tx) => loadJob(tx, { companyId: 'larkhook', jobId }))
    expect(loaded).toEqual(doc)
    for (const [kind, map] of Object.entries(doc.records)) expect([...loaded!.records[kind as 'run'].keys()], kind).toEqual([...map.keys()])
  }
})
