import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Intent } from '../../../../shared/commands/index.ts'
import { find } from '../../../../shared/model/jobDocument.ts'
import { ApiProblem } from '../../../../src/api/request.ts'
import { FakeJobServer } from '../../../support/fakeJobServer.ts'
import { jobClient, type JobClient, type JobStore } from '../../../support/jobClient.ts'

const rename = (name: string): Intent => ({ verb: 'room.update', args: { ids: ['pat'], set: { name } } })
const roomName = (store: JobStore) => find(store.doc, 'room', 'pat')?.name
const problem = (status: number, sentence = 'No') => new ApiProblem(status, '/problems/some', sentence, null)

beforeEach(() => setActivePinia(createPinia()))
afterEach(() => vi.useRealTimers())

describe('a lost answer', () => {
  it('is asked for again with the same ids, and nothing is done twice', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
    me.losesAnswers = true
    me.store.edit(rename('Deck'))
    await me.store.sync()
    expect([server.log.length, me.store.outbox.length, me.store.isOffline]).toEqual([1, 1, true])
    me.losesAnswers = false
    await me.store.sync()
    expect([server.log.length, me.store.outbox.length, roomName(me.store), me.store.trouble]).toEqual([1, 0, 'Deck', 'none'])
  })
  it('is waited for a little longer each time, up to a quarter of a minute', async () => {
    vi.useFakeTimers()
    const me = await jobClient(new FakeJobServer(), 'me')
    me.connected = false
    me.store.edit(rename('Deck'))
    await vi.advanceTimersByTimeAsync(1)
    const waits: number[] = []
    for (let last = me.pushes, waited = 0; waits.length < 7; waited += 250) {
      await vi.advanceTimersByTimeAsync(250)
      if (me.pushes === last) continue
      waits.push(waited + 250)
      waited = -250
      last = me.pushes
    }
    expect(waits).toEqual([500, 1000, 2000, 4000, 8000, 15_000, 15_000])
    me.store.close()
    await vi.advanceTimersByTimeAsync(60_000)
    expect(me.pushes, 'one more on the way out, and then none').toBe(9)
  })
})

describe('one request at a time', () => {
  it('sends what was done meanwhile after the answer, in the order it was done', async () => {
    const server = new FakeJobServer()
    let underWay = 0
    let most = 0
    const sent: string[][] = []
    const me: JobClient = await jobClient(server, 'me', {
      api: {
        push: async (base, commands) => {
          most = Math.max(most, ++underWay)
          sent.push(commands.map((command) => command.id))
          await new Promise((done) => setTimeout(done, 5))
          underWay--
          return server.push({ id: 'me', role: 'designer' }, base, commands)
        },
      },
    })
    me.store.edit(rename('One'))
    await Promise.resolve()
    await Promise.resolve()
    me.store.edit(rename('Two'))
    me.store.edit(rename('Three'))
    await me.store.sync()
    expect([most, sent.map((each) => each.length), roomName(me.store), server.log.length]).toEqual([1, [1, 2], 'Three', 3])
  })
})

describe('an answer in several parts', () => {
  it('never lets one’s own edit vanish for a moment', async () => {
    const server = new FakeJobServer()
    server.most = 2
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    for (let n = 0; n < 7; n++) you.store.edit({ verb: 'room.update', args: { ids: ['mch'], set: { name: `Plant ${n}` } } })
    await you.store.sync()
    const seen: (string | undefined)[] = []
    me.store.$subscribe(() => seen.push(roomName(me.store)), { flush: 'sync' })
    me.store.edit(rename('Deck'))
    await me.store.sync()
    expect(seen.length).toBeGreaterThan(2)
    expect(new Set(seen)).toEqual(new Set(['Deck']))
    expect([me.store.doc.version, find(me.store.doc, 'room', 'mch')?.name, me.store.outbox.length]).toEqual([8, 'Plant 6', 0])
  })
  it('is asked for once and not for ever when the server holds back what it says it has', async () => {
    const server = new FakeJobServer()
    let asked = 0
    const me = await jobClient(server, 'me', {
      api: { since: () => (asked++, Promise.resolve({ version: 5, since: [] })), open: () => Promise.resolve(server.open()) },
    })
    const error = vi.spyOn(console, 'error').mockReturnValue()
    me.store.heard(5)
    await me.store.sync()
    expect(asked).toBeLessThanOrEqual(3)
    expect(me.store.trouble).toBe('not taken')
    expect(error).toHaveBeenCalledOnce()
    me.store.close()
  })
})

describe('a server that is not where this device thinks', () => {
  it('is followed from its whole job again, and what waits is sent', async () => {
    const server = new FakeJobServer()
    const early = server.doc
    const me = await jobClient(server, 'me', {
      api: {
        push: (base, commands) => (base > server.doc.version ? Promise.reject(problem(409)) : Promise.resolve(server.push({ id: 'me', role: 'designer' }, base, commands))),
      },
    })
    me.store.edit(rename('Deck'))
    await me.store.sync()
    server.restore(0, early)
    me.store.edit({ verb: 'room.update', args: { ids: ['mch'], set: { name: 'Plant' } } })
    await me.store.sync()
    expect([me.store.trouble, me.store.outbox.length, me.store.doc.version, server.doc.version]).toEqual(['none', 0, 1, 1])
    expect(me.store.doc.records).toEqual(server.doc.records)
    expect([roomName(me.store), find(me.store.doc, 'room', 'mch')?.name]).toEqual(['Patio', 'Plant'])
  })
  it('is begun afresh with when an entry is missing or does not fit', async () => {
    for (const spoil of ['gap', 'misfit']) {
      const server = new FakeJobServer()
      let spoiled = false
      const you = await jobClient(server, 'you')
      const me = await jobClient(server, 'me', {
        api: {
          since: (version) => {
            const answer = server.since(version)
            if (spoiled) return Promise.resolve(answer)
            spoiled = true
            return Promise.resolve(spoil === 'gap' ? { ...answer, since: answer.since.slice(1) } : { ...answer, since: answer.since.map((entry) => ({ ...entry, change: { ...entry.change, updated: [{ kind: 'room' as const, id: 'pat', fields: { name: ['Never', 'So'] as const } }] } })) })
          },
        },
      })
      you.store.edit(rename('One'))
      you.store.edit(rename('Two'))
      await you.store.sync()
      me.store.heard(server.doc.version)
      await me.store.sync()
      expect([roomName(me.store), me.store.doc.version, me.store.trouble], spoil).toEqual(['Two', 2, 'none'])
    }
  })
})

describe('a request the server will not take', () => {
  it('does not hold up the rest: the one command it is about is refused by itself', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me', {
      api: {
        push: (base, commands) =>
          commands.some((command) => JSON.stringify(command).includes('Poison')) ? Promise.reject(problem(422, 'That command was never meant')) : Promise.resolve(server.push({ id: 'me', role: 'designer' }, base, commands)),
      },
    })
    const renameOther = (name: string): Intent => ({ verb: 'room.update', args: { ids: ['mch'], set: { name } } })
    for (let n = 0; n < 5; n++) me.store.edit(renameOther(`Plant ${n}`))
    me.store.edit(rename('Poison'))
    for (let n = 5; n < 9; n++) me.store.edit(renameOther(`Plant ${n}`))
    await me.store.sync()
    expect([me.store.outbox.length, server.log.length, find(server.doc, 'room', 'mch')?.name, me.store.trouble]).toEqual([0, 9, 'Plant 8', 'none'])
    expect(me.store.refused.map(({ words, message }) => [words, message])).toEqual([['Rename Patio', 'That command was never meant']])
    expect(roomName(me.store)).toBe('Patio')
  })
  it('is kept and tried again when it is the server that is at fault, with its sentence', async () => {
    vi.useFakeTimers()
    const server = new FakeJobServer()
    let isIll = true
    const me = await jobClient(server, 'me', {
      api: { push: (base, commands) => (isIll ? Promise.reject(problem(500, 'Something went wrong on our side')) : Promise.resolve(server.push({ id: 'me', role: 'designer' }, base, commands))) },
    })
    me.store.edit(rename('Deck'))
    await vi.advanceTimersByTimeAsync(10)
    expect([me.store.trouble, me.store.troubleText, me.store.outbox.length, roomName(me.store)]).toEqual(['not taken', 'Something went wrong on our side', 1, 'Deck'])
    isIll = false
    await vi.advanceTimersByTimeAsync(15_000)
    expect([me.store.trouble, me.store.outbox.length, server.log.length]).toEqual(['none', 0, 1])
  })
})

describe('a session that ends while editing', () => {
  it('keeps the queue without asking on and on, and sends it when somebody is back', async () => {
    vi.useFakeTimers()
    const server = new FakeJobServer()
    let signedIn = false
    let asked = 0
    const me = await jobClient(server, 'me', {
      api: { push: (base, commands) => (asked++, signedIn ? Promise.resolve(server.push({ id: 'me', role: 'designer' }, base, commands)) : Promise.reject(problem(401))) },
    })
    me.store.edit(rename('Deck'))
    await vi.advanceTimersByTimeAsync(120_000)
    expect([asked, me.store.trouble, me.store.outbox.length, roomName(me.store), server.log.length]).toEqual([1, 'signed out', 1, 'Deck', 0])
    signedIn = true
    await me.store.ask()
    expect([me.store.trouble, me.store.outbox.length, server.log.length]).toEqual(['none', 0, 1])
  })
})

describe('a page that is loaded again', () => {
  it('still has what was not sent, the undo of an earlier session included', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
    me.store.edit(rename('Deck'))
    await me.store.sync()
    me.connected = false
    me.store.undo()
    me.store.edit({ verb: 'room.update', args: { ids: ['mch'], set: { name: 'Plant' } } })
    me.connected = true
    const [push] = [me.api.push]
    Object.assign(me.api, { push: () => new Promise(() => undefined) })
    await me.reload()
    expect([roomName(me.store), find(me.store.doc, 'room', 'mch')?.name, me.store.outbox.length]).toEqual(['Patio', 'Plant', 2])
    Object.assign(me.api, { push })
    await me.reload()
    await me.store.sync()
    expect([find(server.doc, 'room', 'pat')?.name, find(server.doc, 'room', 'mch')?.name, me.disk.rows.size]).toEqual(['Patio', 'Plant', 0])
  })
  it('still shows what was refused and not yet seen, with its words', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.connected = false
    me.store.edit(rename('Deck'))
    you.store.edit(rename('Lanai'))
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    await me.reload()
    expect(me.store.refused).toMatchObject([{ words: 'Rename Patio', conflict: { mine: 'Deck', theirs: 'Lanai' } }])
    me.store.dismiss(me.store.refused[0]!.command.id)
    await me.reload()
    expect(me.store.refused).toEqual([])
  })
  it('opens without the disk when the browser does not give one, and says so', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
    const broken = () => Promise.reject(new Error('The disk is full'))
    Object.assign(me.disk, { load: broken, add: broken })
    await me.reload()
    expect([me.store.status, me.store.isSafe]).toEqual(['ready', false])
    me.store.edit(rename('Deck'))
    await me.store.sync()
    expect(find(server.doc, 'room', 'pat')?.name).toBe('Deck')
  })
})

describe('leaving a job', () => {
  it('sends what still waits on the way out', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
    me.store.edit(rename('Deck'))
    me.store.close()
    await vi.waitFor(() => expect([find(server.doc, 'room', 'pat')?.name, me.disk.rows.size]).toEqual(['Deck', 0]))
  })
  it('keeps on the disk what could not be sent, and what was refused meanwhile', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.connected = false
    me.store.edit(rename('Deck'))
    you.store.edit(rename('Lanai'))
    await you.store.sync()
    me.store.close()
    await vi.waitFor(() => expect(me.disk.rows.size).toBe(1))
    await me.reload()
    me.connected = true
    await me.reload()
    await me.store.sync()
    expect(me.store.refused).toHaveLength(1)
  })
  it('does not let a slow answer for the old job reach the new one', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
    const answers: (() => void)[] = []
    const slow = (name: string) => ({
      jobId: 'job', actor: { id: 'me', role: 'designer' as const },
      api: { ...me.api, open: () => new Promise<ReturnType<typeof server.open>>((done) => answers.push(() => done({ ...server.open(), members: [{ id: 'me', name, role: 'designer' }] }))) },
    })
    const [first, second] = [me.store.open(slow('Old')), me.store.open(slow('New'))]
    answers[1]!()
    await second
    answers[0]!()
    await first
    expect([me.store.status, me.store.memberName('me')]).toEqual(['ready', 'New'])
  })
})
