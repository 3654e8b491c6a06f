import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import type { Intent } from '../../../../shared/commands/index.ts'
import { find } from '../../../../shared/model/jobDocument.ts'
import { FakeJobServer } from '../../../support/fakeJobServer.ts'
import { jobClient, type JobStore } from '../../../support/jobClient.ts'

const rename = (name: string): Intent => ({ verb: 'room.update', args: { ids: ['pat'], set: { name } } })
const roomName = (store: JobStore) => find(store.doc, 'room', 'pat')?.name

beforeEach(() => setActivePinia(createPinia()))

describe('editing', () => {
  it('shows at once, undoes and redoes with the words of what was done, and reaches the server', async () => {
    const server = new FakeJobServer()
    const me = await jobClient(server, 'me')
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
    const me = await jobClient(new FakeJobServer(), 'me')
    const before = me.store.doc
    expect(me.store.edit({ verb: 'room.update', args: { ids: ['pat'], set: { code: 'MCH' } } })).toBeUndefined()
    expect(me.store.notice).toContain('Code MCH is taken by Mechanical')
    expect(me.store.doc).toBe(before)
    expect([me.store.outbox.length, me.store.undoWords]).toEqual([0, undefined])
  })
  it('refuses what the role may not do, undo included, before anything is sent', async () => {
    const server = new FakeJobServer()
    const tech = await jobClient(server, 'tech', { role: 'technician' })
    expect(tech.store.edit(rename('Deck'))).toBeUndefined()
    expect(tech.store.notice).toContain('A technician may not change a room')
    expect(tech.pushes).toBe(0)
  })
  it('makes nothing of an edit that changes nothing', async () => {
    const me = await jobClient(new FakeJobServer(), 'me')
    expect(me.store.edit(rename('Patio'))).toBeUndefined()
    expect([me.store.notice, me.store.outbox.length, me.store.undoWords]).toEqual(['', 0, undefined])
  })
  it('ends the redo line with a new edit', async () => {
    const me = await jobClient(new FakeJobServer(), 'me')
    me.store.edit(rename('One'))
    me.store.undo()
    me.store.edit(rename('Two'))
    me.store.redo()
    expect([roomName(me.store), me.store.redoWords]).toEqual(['Two', undefined])
  })
  it('remembers a hundred steps back, and no more', async () => {
    const me = await jobClient(new FakeJobServer(), 'me')
    for (let n = 0; n < 103; n++) me.store.edit(rename(`Patio ${n}`))
    for (let n = 0; n < 103; n++) me.store.undo()
    expect([roomName(me.store), me.store.undoWords]).toEqual(['Patio 2', undefined])
    for (let n = 0; n < 103; n++) me.store.redo()
    expect(roomName(me.store)).toBe('Patio 102')
  })
  it('derives once for each state of the job, and keeps what an edit did not reach', async () => {
    const me = await jobClient(new FakeJobServer(), 'me')
    const before = me.store.derived!
    expect(me.store.derived).toBe(before)
    me.store.edit(rename('Deck'))
    expect(me.store.derived).not.toBe(before)
    expect(me.store.derived!.doc).toBe(me.store.doc)
  })
  it('gives an offline run the next label when a colleague took it, and still undoes it', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
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
  it('takes pulls from the field back by striking them out, never by removing them', async () => {
    const server = new FakeJobServer()
    const tech = await jobClient(server, 'tech', { role: 'technician' })
    tech.store.edit({ verb: 'pull.record', args: { pulls: [{ id: 'p1', at: '2026-12-01T10:00:00.000Z', runId: 'r1', markUnit: 'ft' }] } })
    await tech.store.sync()
    expect(tech.store.derived!.runs.get('r1')?.stage).toBe('pulled')
    tech.store.undo()
    await tech.store.sync()
    expect([tech.store.derived!.runs.get('r1')?.stage, server.doc.records.pull.size]).toEqual(['planned', 1])
  })
})

describe('two people on one field', () => {
  async function conflicted() {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.connected = false
    me.store.edit(rename('Deck'))
    you.store.edit(rename('Lanai'))
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    return { server, me, you }
  }
  it('shows both values, and keeps theirs when its author says so', async () => {
    const { server, me } = await conflicted()
    expect(me.store.refused[0]).toMatchObject({ words: 'Rename Patio', conflict: { field: 'name', mine: 'Deck', theirs: 'Lanai', byId: 'you' } })
    expect([roomName(me.store), me.store.memberName('you'), me.store.undoWords]).toEqual(['Lanai', 'Yorick', undefined])
    me.store.dismiss(me.store.refused[0]!.command.id)
    expect([roomName(me.store), me.store.refused.length, find(server.doc, 'room', 'pat')?.name, me.disk.rows.size]).toEqual(['Lanai', 0, 'Lanai', 0])
  })
  it('does it after all when its author insists, and can be undone then', async () => {
    const { server, me } = await conflicted()
    me.store.insist(me.store.refused[0]!.command.id)
    await me.store.sync()
    expect([roomName(me.store), find(server.doc, 'room', 'pat')?.name, me.store.refused.length]).toEqual(['Deck', 'Deck', 0])
    me.store.undo()
    await me.store.sync()
    expect(find(server.doc, 'room', 'pat')?.name).toBe('Lanai')
  })
  it('keeps what was refused visible when insisting is refused as well', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.connected = false
    me.store.edit({ verb: 'room.update', args: { ids: ['pat'], set: { code: 'DEK' } } })
    you.store.edit({ verb: 'room.update', args: { ids: ['mch'], set: { code: 'DEK' } } })
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    me.store.insist(me.store.refused[0]!.command.id)
    expect([me.store.refused.length, me.store.notice]).toEqual([1, expect.stringContaining('Code DEK is taken by Mechanical')])
  })
  it('says nothing of what was refused and undone since, and does again once it is redone', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.connected = false
    me.store.edit(rename('Deck'))
    me.store.undo()
    you.store.edit(rename('Lanai'))
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    expect([me.store.refused, me.store.outbox, roomName(me.store), me.disk.rows.size]).toEqual([[], [], 'Lanai', 0])

    me.connected = false
    me.store.edit(rename('Terrace'))
    me.store.undo()
    me.store.redo()
    you.store.heard(server.doc.version)
    you.store.edit(rename('Veranda'))
    await you.store.sync()
    me.connected = true
    await me.store.sync()
    expect(me.store.refused.map((each) => each.words)).toEqual(['Rename Lanai'])
  })
  it('lets undo not trample a later edit by somebody else', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
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
  it('refuses to undo a plate that somebody has wired since, with the run that would lose its end', async () => {
    const server = new FakeJobServer()
    const [me, you] = [await jobClient(server, 'me'), await jobClient(server, 'you')]
    me.store.edit({ verb: 'plate.add', args: { id: 'new', roomId: 'pat', number: 9, form: 'wall-box', mounting: 'wall', wall: 1, alongMm: 500, heightMm: 400, jacks: [] } })
    await me.store.sync()
    you.store.heard(server.doc.version)
    await you.store.sync()
    you.store.edit({ verb: 'run.add', args: { id: 'wired', cableTypeId: 'c-16-2', a: null, b: { plateId: 'new', jackId: null } } })
    await you.store.sync()
    me.store.heard(server.doc.version)
    await me.store.sync()
    me.store.undo()
    expect(me.store.notice).toMatch(/^Run PAT9-S1 still needs/)
    expect(me.store.doc.records.plate.has('new')).toBe(true)
  })
})
