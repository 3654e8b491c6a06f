import { describe, expect, it } from 'vitest'
import type { Command } from '../../../shared/commands/index.ts'
import { find } from '../../../shared/model/jobDocument.ts'
import { roles, can, type Role } from '../../../shared/policy.ts'
import { foreignWrites } from '../../../shared/sync/conflict.ts'
import { replay, type ReplayContext } from '../../../shared/sync/replay.ts'
import { buildDoc, smallHouse } from '../../support/build.ts'

const at = '2026-12-01T10:00:00.000Z'
const as = (role: Role, over: Partial<ReplayContext> = {}): ReplayContext => ({ actor: { id: role, role }, changeOf: () => undefined, ...over })
const rename = (id: string, name: string, madeAt = 0): Command => ({ id, verb: 'room.update', args: { ids: ['pat'], set: { name } }, madeAt })
const house = () => buildDoc(...smallHouse())

describe('replay', () => {
  it('goes on after a refusal, and says which command it was', () => {
    const bad: Command = { id: 'bad', verb: 'run.drop', args: { ids: ['nope'], reason: 'x' }, madeAt: 0 }
    const played = replay(house(), [rename('c1', 'Deck'), bad, rename('c2', 'Terrace')], as('designer'))
    expect(played.refused.map(({ command, error }) => [command.id, error.code])).toEqual([['bad', 'not_found']])
    expect(find(played.doc, 'room', 'pat')?.name).toBe('Terrace')
  })
  it('undoes a command of the same queue', () => {
    const played = replay(house(), [rename('c1', 'Deck'), { id: 'u', verb: 'revert', args: { commandId: 'c1', at }, madeAt: 0 }], as('designer'))
    expect(played.doc.records.room).toEqual(house().records.room)
  })
  it('refuses an undo that would trample on somebody', () => {
    const mine = replay(house(), [rename('c1', 'Deck')], as('designer'))
    const theirs = replay(mine.doc, [rename('c2', 'Lanai')], as('owner'))
    const undo = replay(theirs.doc, [{ id: 'u', verb: 'revert', args: { commandId: 'c1', at }, madeAt: 1 }], as('designer', { changeOf: (id) => mine.changes.get(id) }))
    expect(undo.refused[0]?.error.message).toContain('Somebody has changed the')
    expect(find(undo.doc, 'room', 'pat')?.name).toBe('Lanai')
  })
})

describe('rights', () => {
  const work: Record<string, Command> = {
    design: rename('c', 'Deck'),
    settings: { id: 'c', verb: 'job.update', args: { set: { client: 'Somebody' } }, madeAt: 0 },
    pull: { id: 'c', verb: 'pull.record', args: { pulls: [{ id: 'p', at, runId: 'r1', markUnit: 'ft' }] }, madeAt: 0 },
    print: { id: 'c', verb: 'label.print', args: { prints: [{ id: 'p', at, runId: 'r1', end: 'a', copies: 1, stock: 's' }] }, madeAt: 0 },
    accept: { id: 'c', verb: 'finding.accept', args: { acceptances: [{ id: 'x', at, check: 'speakerLoss', aboutKind: 'run', aboutId: 'r1', figures: '', reason: 'short run' }] }, madeAt: 0 },
  }
  const needs = { design: 'job.design', settings: 'job.settings', pull: 'job.record', print: 'label.print', accept: 'finding.accept' } as const
  it.each(roles.flatMap((role) => Object.keys(work).map((what) => [role, what] as const)))('a %s and %s: as the policy says', (role, what) => {
    const { refused } = replay(house(), [work[what]!], as(role))
    expect(refused.map(({ error }) => error.code)).toEqual(can(role, needs[what as keyof typeof needs]) ? [] : ['forbidden'])
  })
  it('hold for a batch and for an undo', () => {
    const batch: Command = { id: 'b', verb: 'batch', args: { label: 'x', steps: [{ verb: 'room.update', args: { ids: ['pat'], set: { name: 'Deck' } } }] }, madeAt: 0 }
    expect(replay(house(), [batch], as('technician')).refused[0]?.error.code).toBe('forbidden')
    const designed = replay(house(), [rename('c1', 'Deck')], as('designer'))
    const undo: Command = { id: 'u', verb: 'revert', args: { commandId: 'c1', at }, madeAt: 0 }
    expect(replay(designed.doc, [undo], as('technician', { changeOf: (id) => designed.changes.get(id) })).refused[0]?.error.code).toBe('forbidden')
  })
  it('lets a technician take back a wrong pull, but not an acceptance', () => {
    const pulled = replay(house(), [work['pull']!], as('technician'))
    const strike = (targetKind: 'pull' | 'acceptance', targetId: string): Command => ({ id: 's', verb: 'record.strike', args: { strikes: [{ id: 'st', at, targetKind, targetId, reason: '' }] }, madeAt: 0 })
    expect(replay(pulled.doc, [strike('pull', 'p')], as('technician')).refused).toEqual([])
    const accepted = replay(house(), [work['accept']!], as('designer'))
    expect(replay(accepted.doc, [strike('acceptance', 'x')], as('technician')).refused[0]?.error.code).toBe('forbidden')
  })
})

describe('conflict', () => {
  const theirs = replay(house(), [rename('t', 'Lanai')], as('owner'))
  const entries = [{ version: 1, actorId: 'owner', change: theirs.changes.get('t')! }]
  const mine = (over: Partial<ReplayContext> = {}) => as('designer', { foreignSince: (madeAt) => foreignWrites(entries.filter((entry) => entry.version > madeAt), 'designer'), ...over })

  it('is refused with both values and who wrote the other', () => {
    const { refused } = replay(theirs.doc, [rename('m', 'Deck', 0)], mine())
    expect(refused[0]?.error).toMatchObject({ code: 'conflict', details: { field: 'name', mine: 'Deck', theirs: 'Lanai', byId: 'owner', version: 1 } })
  })
  it('is none when its author has seen the other value', () => {
    expect(replay(theirs.doc, [rename('m', 'Deck', 1)], mine()).refused).toEqual([])
  })
  it('is none on another field, nor on the same value', () => {
    const other: Command = { id: 'm', verb: 'room.update', args: { ids: ['pat'], set: { spaceClass: 'outdoor' } }, madeAt: 0 }
    expect(replay(theirs.doc, [other], mine()).refused).toEqual([])
    expect(replay(theirs.doc, [rename('m', 'Lanai', 0)], mine()).refused).toEqual([])
  })
  it('is none with oneself', () => {
    expect(foreignWrites(entries, 'owner').size).toBe(0)
  })
  it('guards what somebody just changed from being removed unseen', () => {
    const remove: Command = { id: 'm', verb: 'items.remove', args: { items: [{ kind: 'room', id: 'pat' }] }, madeAt: 0 }
    expect(replay(theirs.doc, [remove], mine()).refused[0]?.error.code).toBe('conflict')
  })
})
