import 'fake-indexeddb/auto'
import { openDB } from 'idb'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Command } from '../../../shared/commands/index.ts'
import { keptByJob, outboxDisk, type Kept } from '../../../src/api/outboxDisk.ts'
import type { TabLocks } from '../../../src/api/tabLocks.ts'

/** Locks as browsers give them out: one holder at a time, the others wait their turn or give up. */
class FakeLocks implements TabLocks {
  private readonly held = new Map<string, Promise<unknown>>()
  request = async (name: string, { ifAvailable, signal }: { ifAvailable?: boolean; signal?: AbortSignal }, work: (lock: unknown) => Promise<void>) => {
    if (ifAvailable && this.held.has(name)) return work(null)
    while (this.held.has(name)) {
      await this.held.get(name)
      if (signal?.aborted) throw new DOMException('Aborted', 'AbortError')
    }
    const holding = work({ name }).finally(() => this.held.delete(name))
    this.held.set(name, holding)
    return holding
  }
  /** A page that lives until it is told to go. */
  live(tab: string): () => Promise<void> {
    let go: () => void = () => undefined
    const gone = this.request(`mudring-tab-${tab}`, {}, () => new Promise((done) => (go = done)))
    return async () => {
      go()
      await gone
    }
  }
}

const rename = (id: string, name = id): Kept => ({
  command: { id, madeAt: 3, verb: 'room.update', args: { ids: ['pat'], set: { name } } } as Command,
  words: `Rename to ${name}`, undoes: null, refusal: null,
})
const ids = (kept: readonly Kept[]) => kept.map((each) => each.command.id)
const ignore = () => undefined
let locks: FakeLocks
let job = 0
let jobId = ''

beforeEach(() => {
  locks = new FakeLocks()
  jobId = `job-${++job}`
})
const disk = (tab: string, member = 'me') => outboxDisk(jobId, member, { tab, locks })

describe('the outbox on disk', () => {
  it('gives a page that is loaded again what it had, in the order it was done', async () => {
    const stop = locks.live('a')
    const before = disk('a')
    const made = Array.from({ length: 30 }, (_, n) => `c${n}`)
    for (const id of made) void before.add(rename(id))
    await before.remove(['c7'])
    await stop()
    locks.live('b')
    const { kept, unreadable } = await disk('b').load(ignore)
    expect(ids(kept)).toEqual(made.filter((id) => id !== 'c7'))
    expect(kept[0]).toEqual(rename('c0'))
    expect(unreadable).toBe(0)
  })
  it('keeps the place and the reason of a command that was refused', async () => {
    const here = disk('a')
    await here.add(rename('c0'))
    await here.add(rename('c1'))
    await here.add({ ...rename('c0'), refusal: { code: 'conflict', message: 'Two people', details: { field: 'name' } } })
    const { kept } = await here.load(ignore)
    expect(kept.map(({ command, refusal }) => [command.id, refusal?.message])).toEqual([['c0', 'Two people'], ['c1', undefined]])
    expect((await keptByJob('me')).get(jobId)).toBe(1)
  })
  it('shows and counts nothing of another member or another job', async () => {
    await disk('a', 'somebody').add(rename('c0'))
    await disk('a', 'me').add(rename('c1'))
    expect(ids((await disk('a', 'me').load(ignore)).kept)).toEqual(['c1'])
    expect((await outboxDisk(`${jobId}x`, 'me', { tab: 'a', locks }).load(ignore)).kept).toEqual([])
    expect((await keptByJob('somebody')).get(jobId)).toBe(1)
  })
  it('leaves what another version of the program wrote where it is, and says how much', async () => {
    await disk('a').add(rename('c0'))
    const raw = await openDB('mudring-outbox')
    const row = await raw.get('commands', [`${jobId}/me`, 'c0'])
    await raw.put('commands', { ...row, commandId: 'c9', format: 99, shape: 'new' })
    const loaded = await disk('a').load(ignore)
    expect([ids(loaded.kept), loaded.unreadable]).toEqual([['c0'], 1])
    expect(await raw.get('commands', [`${jobId}/me`, 'c9'])).toMatchObject({ format: 99, shape: 'new' })
    raw.close()
  })
})

describe('two pages on one job', () => {
  it('each send their own', async () => {
    locks.live('a')
    locks.live('b')
    await disk('a').add(rename('from-a'))
    await disk('b').add(rename('from-b'))
    expect(ids((await disk('a').load(ignore)).kept)).toEqual(['from-a'])
    expect(ids((await disk('b').load(ignore)).kept)).toEqual(['from-b'])
  })
  it('take over what the other leaves behind when it goes, once', async () => {
    const stopA = locks.live('a')
    const stopB = locks.live('b')
    const stopC = locks.live('c')
    await disk('a').add(rename('from-a'))
    const told: string[] = []
    await disk('b').load((kept) => told.push(...ids(kept).map((id) => `b ${id}`)))
    await disk('c').load((kept) => told.push(...ids(kept).map((id) => `c ${id}`)))
    await stopA()
    await vi.waitFor(() => expect(told.filter((each) => each.endsWith('from-a'))).toHaveLength(1))
    const [taker] = told[0]!.split(' ')
    expect(ids((await disk(taker!).load(ignore)).kept)).toEqual(['from-a'])
    await stopB()
    await stopC()
  })
  it('do not wait for each other after the job is left', async () => {
    const stopA = locks.live('a')
    locks.live('b')
    await disk('a').add(rename('from-a'))
    const told: string[] = []
    const left = disk('b')
    await left.load((kept) => told.push(...ids(kept)))
    left.close()
    await stopA()
    await new Promise((done) => setTimeout(done, 20))
    expect(told).toEqual([])
    expect(ids((await disk('c').load(ignore)).kept)).toEqual(['from-a'])
  })
  it('both hold everything where a browser has no locks', async () => {
    const bare = (tab: string) => outboxDisk(jobId, 'me', { tab, locks: undefined })
    await bare('a').add(rename('c0'))
    expect(ids((await bare('b').load(ignore)).kept)).toEqual(['c0'])
  })
})
