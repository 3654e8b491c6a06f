import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import type { Changes, LogEntry, PushAnswer } from '../../../../shared/api/jobs.ts'
import type { Command, Intent } from '../../../../shared/commands/index.ts'
import { allRecords, find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { referencesOf } from '../../../../shared/model/references.ts'
import { foreignWrites } from '../../../../shared/sync/conflict.ts'
import { replay } from '../../../../shared/sync/replay.ts'
import { ApiProblem, NoConnection } from '../../../../src/api/request.ts'
import { useJobStore } from '../../../../src/features/job/jobStore.ts'
import { buildDoc, smallHouse } from '../../../support/build.ts'
import { randomIntent, seeded } from '../../../support/randomIntents.ts'

const wire = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T

/** A server in memory that judges with the shared code, as the real one does. */
class FakeServer {
  doc: JobDocument = buildDoc(...smallHouse())
  log: LogEntry[] = []

  push(actor: { id: string; role: 'designer' }, baseVersion: number, commands: readonly Command[]): PushAnswer {
    const refused: PushAnswer['refused'][number][] = []
    const accepted: PushAnswer['accepted'][number][] = []
    for (const command of commands) {
      const known = this.log.find((entry) => entry.commandId === command.id)
      if (known) {
        accepted.push({ commandId: command.id, version: known.version })
        continue
      }
      const changeOf = (id: string) => this.log.find((entry) => entry.commandId === id && entry.actorId === actor.id)?.change
      const played = replay(this.doc, [command], { actor, changeOf, foreignSince: (madeAt) => foreignWrites(this.log.filter((entry) => entry.version > madeAt), actor.id) })
      const [refusal] = played.refused
      const change = played.changes.get(command.id)
      if (refusal || !change) {
        refused.push({ commandId: command.id, code: refusal?.error.code ?? 'refused', message: refusal?.error.message ?? '', details: refusal?.error.details ?? null })
        continue
      }
      const version = this.doc.version + 1
      this.doc = { ...played.doc, version }
      this.log.push({ version, commandId: command.id, actorId: actor.id, verb: command.verb, label: '', at: '', change })
      accepted.push({ commandId: command.id, version })
    }
    return wire({ version: this.doc.version, since: this.since(baseVersion).since, accepted, refused })
  }
  since(version: number): Changes {
    return wire({ version: this.doc.version, since: this.log.filter((entry) => entry.version > version) })
  }
}

type Store = ReturnType<typeof useJobStore>
interface Client {
  readonly store: Store
  connected: boolean
  /** The server does it, and the answer never comes. */
  losesAnswers: boolean
}

let counter = 0
async function client(server: FakeServer, name: string): Promise<Client> {
  const store = useJobStore(createPinia())
  const self: Client = { store, connected: true, losesAnswers: false }
  const answer = <T>(work: () => T): Promise<T> => {
    if (!self.connected) return Promise.reject(new NoConnection('none'))
    const result = work()
    return self.losesAnswers ? Promise.reject(new NoConnection('lost')) : Promise.resolve(result)
  }
  await store.open({
    jobId: 'job',
    actor: { id: name, role: 'designer' },
    newId: () => `${name}-${counter++}`,
    now: () => '2026-12-01T10:00:00.000Z',
    api: {
      open: () => answer(() => wire({ version: server.doc.version, records: [...allRecords(server.doc)], members: [] })),
      push: (base, commands) => answer(() => server.push({ id: name, role: 'designer' }, base, wire(commands))),
      since: (version) => answer(() => server.since(version)),
    },
  })
  return self
}
const rename = (name: string): Intent => ({ verb: 'room.update', args: { ids: ['pat'], set: { name } } })
const roomName = (store: Store) => find(store.doc, 'room', 'pat')?.name

beforeEach(() => {
  setActivePinia(createPinia())
  counter = 0
})

describe('editing', () => {
  it('shows at once, undoes and redoes with the words of what was done, and reaches the server', async () => {
    const server = new FakeServer()
    const me = await client(server, 'me')
    me.connected = false
    me.store.edit({ verb: 'run.changeCable', args: { ids: ['r1'], cableTypeId: 'c-14-2' } })
    expect(find(me.store.doc, 'run', 'r1')?.cableTypeId).toBe('c-14-2')
    expect(me.store.undoWords).toBe('Change PAT1-S1 to 14/2')
    me.store.undo()
    expect([find(me.store.doc, 'run', 'r1')?.cableTypeId, me.store.redoWords]).toEqual(['c-16-2', 'Change PAT1-S1 to 14/2'])
    me.store.redo()
    await me.store.sync()
    expect([me.store.isOffline, me.store.outbox.length]).toEqual([true, 3])
    me.connected = true
    await me.store.sync()
    expect([me.store.isOffline, me.store.outbox.length]).toEqual([false, 0])
    expect(find(server.doc, 'run', 'r1')?.cableTypeId).toBe('c-14-2')
    me.store.undo()
    await me.store.sync()
    expect(find(server.doc, 'run', 'r1')?.cableTypeId).toBe('c-16-2')
  })
  it('says why an edit is refused, and changes nothing', async () => {
    const me = await client(new FakeServer(), 'me')
    const before = me.store.doc
    expect(me.store.edit({ verb: 'room.update', args: { ids: ['pat'], set: { code: 'MCH' } } })).toBeUndefined()
    expect(me.store.notice).toContain('Code MCH is taken by Mechanical')
    expect(me.store.doc).toBe(before)
  })
  it('gives an offline run the next label when a colleague took it, and still undoes it', async () => {
    const server = new FakeServer()
    const [me, you] = [await client(server, 'me'), await client(server, 'you')]
    me.connected = false
    const lay = (id: string): Intent => ({ verb: 'run.add', args: { id, cableTypeId: 'c-16-2', a: null, b: { plateId: 'pat1', jackId: null } } })
    you.store.edit(lay('ry'))
    me.store.edit(lay('rm'))
    await you.store.sync()
    expect(find(me.store.doc, 'run', 'rm')?.label).toBe('PAT1-S2')
    me.connected = true
    await me.store.sync()
    expect([find(me.store.doc, 'run', 'ry')?.label, find(me.store.doc, 'run', 'rm')?.label]).toEqual(['PAT1-S2', 'PAT1-S3'])
    me.store.undo()
    await me.store.sync()
    expect(server.doc.records.run.has('rm')).toBe(false)
  })
})

describe('two people on one field', () => {
  async function conflicted() {
    const server = new FakeServer()
    const [me, you] = [await client(server, 'me'), await client(server, 'you')]
    me.connected = false
    me.store.edit(rename('Deck'))
    you.store.edit(rename('Lanai'))
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    return { server, me }
  }
  it('shows both values, and keeps theirs when its author says so', async () => {
    const { server, me } = await conflicted()
    expect(me.store.refused[0]).toMatchObject({ words: 'Rename Patio', conflict: { field: 'name', mine: 'Deck', theirs: 'Lanai', byId: 'you' } })
    me.store.dismiss(me.store.refused[0]!.command.id)
    expect([roomName(me.store), me.store.refused.length, find(server.doc, 'room', 'pat')?.name]).toEqual(['Lanai', 0, 'Lanai'])
  })
  it('does it after all when its author insists', async () => {
    const { server, me } = await conflicted()
    me.store.insist(me.store.refused[0]!.command.id)
    await me.store.sync()
    expect([roomName(me.store), find(server.doc, 'room', 'pat')?.name]).toEqual(['Deck', 'Deck'])
  })
  it('undo does not trample a later edit by somebody else', async () => {
    const server = new FakeServer()
    const [me, you] = [await client(server, 'me'), await client(server, 'you')]
    me.store.edit(rename('Mine'))
    await me.store.sync()
    you.store.heard(server.doc.version)
    await you.store.sync()
    you.store.edit(rename('Yours'))
    await you.store.sync()
    me.store.heard(server.doc.version)
    await me.store.sync()
    me.store.undo()
    expect(me.store.notice).toContain('Somebody has changed')
    expect(roomName(me.store)).toBe('Yours')
  })
})

describe('a lost answer', () => {
  it('is asked for again with the same ids, and nothing is done twice', async () => {
    const server = new FakeServer()
    const me = await client(server, 'me')
    me.losesAnswers = true
    me.store.edit(rename('Deck'))
    await me.store.sync()
    expect([server.log.length, me.store.outbox.length, me.store.isOffline]).toEqual([1, 1, true])
    me.losesAnswers = false
    await me.store.sync()
    expect([server.log.length, me.store.outbox.length, roomName(me.store)]).toEqual([1, 0, 'Deck'])
  })
})

describe('a session that ends while editing', () => {
  it('keeps the queue, and sends it when somebody is back', async () => {
    const server = new FakeServer()
    const store = useJobStore(createPinia())
    let signedIn = false
    await store.open({
      jobId: 'job',
      actor: { id: 'me', role: 'designer' },
      api: {
        open: () => Promise.resolve(wire({ version: 0, records: [...allRecords(server.doc)], members: [] })),
        push: (base, commands) => (signedIn ? Promise.resolve(server.push({ id: 'me', role: 'designer' }, base, wire(commands))) : Promise.reject(new ApiProblem(401, '/problems/unauthenticated', 'Sign in', null))),
        since: (version) => Promise.resolve(server.since(version)),
      },
    })
    store.edit(rename('Deck'))
    await store.sync()
    expect([store.outbox.length, roomName(store), server.log.length]).toEqual([1, 'Deck', 0])
    signedIn = true
    await store.sync()
    expect([store.outbox.length, server.log.length]).toEqual([0, 1])
  })
})

describe('three clients with offline spells, lost answers, undo and redo', () => {
  it('all come to the server’s job, with nothing waiting, nothing dangling and no label twice, over 120 seeds', async () => {
    let edits = 0
    let refusals = 0
    for (let seed = 1; seed <= 120; seed++) {
      const random = seeded(seed)
      const server = new FakeServer()
      const names = ['me', 'you', 'they']
      const clients = await Promise.all(names.map((name) => client(server, name)))
      for (let step = 0; step < 60; step++) {
        const self = clients[Math.floor(random() * 3)]!
        const roll = random()
        if (roll < 0.08) self.connected = !self.connected
        else if (roll < 0.12) self.losesAnswers = !self.losesAnswers
        else if (roll < 0.22) self.store.undo()
        else if (roll < 0.28) self.store.redo()
        else if (roll < 0.4) {
          self.store.heard(server.doc.version)
          await self.store.sync()
        } else {
          const intent = randomIntent(self.store.doc, random, () => `x${seed}-${counter++}`)
          if (intent && self.store.edit(intent)) edits++
        }
      }
      for (const self of clients) Object.assign(self, { connected: true, losesAnswers: false })
      for (let round = 0; round < 3; round++)
        for (const self of clients) {
          self.store.heard(server.doc.version)
          await self.store.sync()
        }
      for (const self of clients) {
        refusals += self.store.refused.length
        expect(self.store.outbox, `seed ${seed}`).toEqual([])
        expect(self.store.doc.version, `seed ${seed}`).toBe(server.doc.version)
        expect(self.store.doc.records, `seed ${seed}`).toEqual(server.doc.records)
        self.store.close()
      }
      for (const record of allRecords(server.doc)) for (const reference of referencesOf(record)) expect(find(server.doc, reference.kind, reference.id), `seed ${seed} ${record.kind}`).toBeDefined()
      const labels = recordsOf(server.doc, 'run').map((run) => run.label.toUpperCase())
      expect(new Set(labels).size, `seed ${seed}`).toBe(labels.length)
    }
    expect(edits).toBeGreaterThan(2000)
    expect(refusals, 'some were refused, and every refusal was shown').toBeGreaterThan(20)
  }, 60_000)
})
