import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { maxEntriesPerAnswer, type PushAnswer } from '../../../../shared/api/jobs.ts'
import { verbs, type Command, type Intent } from '../../../../shared/commands/index.ts'
import { find } from '../../../../shared/model/jobDocument.ts'
import { apply } from '../../../../shared/sync/change.ts'
import { createApp } from '../../../../server/app.ts'
import { buildCableType, buildCord, buildLevel, buildModel, buildPathway, buildPlate, buildRack, buildRoom, smallHouse } from '../../../support/build.ts'
import { changesSince, command, freshId, open, push, signInAt, startJob, type Agent } from '../../../support/jobOnServer.ts'
import { startTestApp, type TestApp } from '../../../support/testApp.ts'

let test: TestApp
let designer: Agent
let owner: Agent
beforeAll(async () => {
  test = await startTestApp()
  designer = await test.signIn('designer@larkhook.example')
  owner = await test.signIn('owner@larkhook.example')
})
afterAll(() => test.close())

const at = '2026-12-01T10:00:00.000Z'
const rename = (name: string, madeAt: number, id?: string) => command({ verb: 'room.update', args: { ids: ['pat'], set: { name } } }, madeAt, id)
/** A second application on the same database, with nothing of the first in its memory. */
const anotherProcess = () => createApp({ ...test.deps, closing: new AbortController().signal })
const nameOf = async (agent: Agent, jobId: string) => find((await open(agent, jobId)).doc, 'room', 'pat')?.name
const without = <T extends { kind: string }>({ kind: _kind, ...rest }: T) => rest

/** One of each verb, in an order in which each has what it needs. */
const one: { [V in Exclude<Command['verb'], 'revert'>]: Extract<Intent, { verb: V }>['args'] } = {
  'job.update': { set: { client: 'New client', limits: { ...smallHouseLimits(), speakerLossCaution: 0.4 } } },
  'level.add': without(buildLevel({ id: 'l2', code: 'L2', name: 'Level 2', elevationMm: 3048 })),
  'level.update': { ids: ['l2'], set: { ceilingHeightMm: 2600 } },
  'room.add': without(buildRoom({ id: 'lof', levelId: 'l2', name: 'Loft', code: 'LOF' })),
  'room.update': { ids: ['lof'], set: { code: 'LFT', name: 'Attic room' } },
  'plate.add': without(buildPlate({ id: 'lof1', roomId: 'lof', jacks: [{ id: 'j1', position: 1, connector: 'speaker-pair' }, { id: 'j2', position: 2, connector: 'coax' }] })),
  'plate.update': { ids: ['lof1'], set: { heightMm: 1200, jacks: [{ id: 'j2', position: 2, connector: 'coax' }, { id: 'j3', position: 1, connector: 'modular' }] } },
  'plate.move': { moves: [{ id: 'lof1', to: { alongMm: 2000 } }] },
  'rack.add': without(buildRack({ id: 'rk2', code: 'RK2', roomId: 'lof' })),
  'rack.update': { ids: ['rk2'], set: { units: 20 } },
  'pathway.add': without(buildPathway()),
  'pathway.update': { ids: ['w1'], set: { name: 'Chase B' } },
  'cableType.add': without(buildCableType({ id: 'c-rg6', code: 'RG6', family: 'coax', labelKind: 'V', conductors: 1, awg: 18 })),
  'cableType.update': { ids: ['c-rg6'], set: { outerDiameterUm: 7500, awg: null, areaMm2: 0.75 } },
  'deviceModel.add': without(buildModel({ id: 'm-2', name: 'Speaker panel, 24' })),
  'deviceModel.update': { ids: ['m-2'], set: { sharedPowerW: 240.5 } },
  'device.add': { id: 'sp2', modelId: 'm-2', rackId: 'rk2', unit: 4, name: 'Panel', code: 'SP2', zones: { p1: 'Patio' } },
  'device.update': { ids: ['sp2'], set: { tapW: 7.5, videoFormat: '2160p60-420' } },
  'device.move': { moves: [{ id: 'sp2', to: { rackId: null, unit: null, roomId: 'lof', at: { xMm: 10, yMm: -20 }, heightMm: 900 } }] },
  'run.add': { id: 'r2', cableTypeId: 'c-rg6', a: { rackId: 'rk2' }, b: { plateId: 'lof1', jackId: 'j2' }, pathwayIds: ['w1', 'w1'] },
  'run.update': { ids: ['r2', 'r1'], set: { bundle: 'A', slackBMm: 300, pathwayIds: ['w1'] } },
  'run.changeCable': { ids: ['r1'], cableTypeId: 'c-14-2' },
  'run.setEnd': { id: 'r2', end: 'a', to: { deviceId: 'sp2', terminal: 'p3' } },
  'run.setLabel': { id: 'r2', label: 'W0002' },
  'run.relabel': { ids: ['r2'] },
  'run.drop': { ids: ['r2'], reason: 'CO-2' },
  'cord.add': without(buildCord()),
  'cord.update': { ids: ['k1'], set: { lengthMm: 2500, form: 'jumper' } },
  'label.print': { prints: [{ id: 'lp', at, runId: 'r1', end: 'a', copies: 2, stock: 'letter-30' }] },
  'pull.record': { pulls: [{ id: 'p', at, runId: 'r1', markA: 1247, markB: 1335, markUnit: 'ft', spool: '0417' }] },
  'termination.record': { terminations: [{ id: 't', at, runId: 'r1', end: 'b', scheme: 'bare to binding post' }] },
  'test.record': { tests: [{ id: 'x', at, runId: 'r1', testKind: 'polarity', result: 'pass', reading: '' }] },
  'finding.accept': { acceptances: [{ id: 'ac', at, check: 'speakerLoss', aboutKind: 'run', aboutId: 'r1', figures: '1.1 dB', reason: 'Agreed with the owner' }] },
  'record.strike': { strikes: [{ id: 'st', at, targetKind: 'test', targetId: 'x', reason: 'wrong pair' }] },
  'items.remove': { items: [{ kind: 'room', id: 'lof' }, { kind: 'pathway', id: 'w1' }] },
  batch: { label: 'Two things', steps: [{ verb: 'level.add', args: without(buildLevel({ id: 'l3', code: 'L3', name: 'Attic' })) }, { verb: 'level.update', args: { ids: ['l3'], set: { use: 'attic' } } }] },
}
function smallHouseLimits() {
  const [job] = smallHouse()
  if (job?.kind !== 'job') throw new Error('The small house has no job of its own')
  return job.limits
}

describe('every verb', () => {
  it('is taken over HTTP, written to the tables, logged, and undone and done again', async () => {
    expect([...Object.keys(one), 'revert'].sort()).toEqual([...verbs].sort())
    const id = await startJob(designer)
    let { doc } = await open(designer, id)
    const fresh = anotherProcess()
    const reader = await signInAt(fresh, 'designer@larkhook.example')
    for (const [verb, args] of Object.entries(one)) {
      const sent = command({ verb, args } as Intent, doc.version)
      const undo = command({ verb: 'revert', args: { commandId: sent.id, at } }, doc.version + 1)
      const redo = command({ verb: 'revert', args: { commandId: undo.id, at } }, doc.version + 2)
      const steps: Command[] = [sent, undo, redo]
      for (const step of steps) {
        const answer = await push(designer, id, [step], doc.version)
        expect(answer.refused, `${verb} by ${step.verb}`).toEqual([])
        expect(answer).toMatchObject({ version: doc.version + 1, accepted: [{ commandId: step.id, version: doc.version + 1 }] })
        expect(answer.since).toHaveLength(1)
        expect(answer.since[0]).toMatchObject({ version: doc.version + 1, commandId: step.id, actorId: 'larkhook-designer', verb: step.verb })
        doc = { ...apply(doc, answer.since[0]!.change), version: answer.version }
      }
      // A second application has none of this in memory: it reads the tables.
      expect((await open(reader, id)).doc, verb).toEqual(doc)
    }
    const log = await changesSince(designer, id, 1)
    expect(log.since.map((entry) => entry.version)).toEqual(Array.from({ length: 3 * Object.keys(one).length }, (_, i) => i + 2))
    expect(log.since.slice(3, 6).map((entry) => entry.label)).toEqual(['Add level Level 2', 'Undo: Add level Level 2', 'Redo: Add level Level 2'])
  })
})

describe('a command', () => {
  it('is taken once, however often it is sent', async () => {
    const id = await startJob(designer)
    const sent = rename('Deck', 1)
    const first = await push(designer, id, [sent], 1)
    const again = await push(designer, id, [sent, sent], 1)
    const later = await push(designer, id, [sent], 2)
    expect([first.version, again.version, later.version]).toEqual([2, 2, 2])
    expect(again).toEqual(first)
    expect(later).toEqual({ version: 2, since: [], accepted: [{ commandId: sent.id, version: 2 }], refused: [] })
  })
  it('that changes nothing is settled all the same', async () => {
    const id = await startJob(designer)
    const answer = await push(designer, id, [rename('Patio', 1)], 1)
    expect(answer).toMatchObject({ version: 2, refused: [], since: [{ change: { added: [], removed: [], updated: [] } }] })
  })
  it('with the id of another is refused, and nothing of the request is done', async () => {
    const id = await startJob(designer)
    await push(designer, id, [rename('Deck', 1, 'twice')], 1)
    const same = (commands: Command[], agent = designer) => agent.post(`/api/jobs/${id}/commands`).send({ baseVersion: 1, commands })
    const responses = [await same([rename('Lanai', 1), rename('Porch', 1, 'twice')]), await same([rename('Deck', 1, 'twice')], owner), await same([rename('A', 1, 'new'), rename('B', 1, 'new')])]
    for (const response of responses) expect([response.status, response.body.type]).toEqual([422, '/problems/command-id-reused'])
    expect((await open(designer, id)).opened.version).toBe(2)
    expect(await nameOf(designer, id)).toBe('Deck')
  })
  it('may have an id that another job has seen', async () => {
    const [a, b] = [await startJob(designer), await startJob(designer)]
    expect((await push(designer, a, [rename('Deck', 1, 'shared-id')], 1)).version).toBe(2)
    expect((await push(designer, b, [rename('Porch', 1, 'shared-id')], 1)).version).toBe(2)
  })
  it('that is refused does not hold up those behind it', async () => {
    const id = await startJob(designer)
    const bad = command({ verb: 'run.drop', args: { ids: ['nope'], reason: 'x' } }, 1)
    const good = rename('Deck', 1)
    const answer = await push(designer, id, [bad, good], 1)
    expect(answer.refused).toEqual([{ commandId: bad.id, code: 'not_found', message: 'That run is no longer on the job', details: { kind: 'run', id: 'nope' } }])
    expect(answer.accepted).toEqual([{ commandId: good.id, version: 2 }])
  })
  const foolish: [string, { verb: string; args: unknown }, string, string][] = [
    ['an unknown verb', { verb: 'run.teleport', args: {} }, 'invalid', 'does not know'],
    ['a verb from the prototype', { verb: 'constructor', args: {} }, 'invalid', 'does not know'],
    ['an unknown field', { verb: 'run.update', args: { ids: ['r1'], set: { companyId: 'quoin-batten' } } }, 'invalid', 'companyId'],
    ['a negative length', { verb: 'run.update', args: { ids: ['r1'], set: { slackAMm: -1 } } }, 'invalid', 'cannot be negative'],
    ['an absurd length', { verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: 4_000_000 } } }, 'invalid', 'at most 3 km'],
    ['a length that is not a number', { verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: 'long' } } }, 'invalid', 'whole millimetres'],
    ['a room’s code twice', { verb: 'room.add', args: without(buildRoom({ id: 'x', code: 'MCH' })) }, 'refused', 'Code MCH is taken by Mechanical'],
    ['a link to another job’s record', { verb: 'room.add', args: without(buildRoom({ id: 'x', code: 'X', levelId: 'elsewhere' })) }, 'not_found', 'level is no longer on the job'],
    ['no arguments', { verb: 'run.update', args: null }, 'invalid', ''],
    ['__proto__ in its arguments', { verb: 'device.update', args: JSON.parse('{"ids":["sp1"],"set":{"__proto__":{"polluted":1}}}') }, 'invalid', ''],
    ['half a surrogate', { verb: 'room.update', args: { ids: ['pat'], set: { name: 'a\udc00' } } }, 'invalid', 'damaged'],
    ['an undo of nothing', { verb: 'revert', args: { commandId: 'never', at } }, 'not_found', 'nothing to undo'],
  ]
  it.each(foolish)('with %s is refused with a sentence', async (_what, { verb, args }, code, words) => {
    const id = await startJob(designer)
    const answer = await push(designer, id, [{ id: freshId('c'), verb, args, madeAt: 1 } as Command], 1)
    expect(answer.version).toBe(1)
    expect(answer.refused).toHaveLength(1)
    expect(answer.refused[0]?.code).toBe(code)
    expect(answer.refused[0]?.message).toContain(words)
    expect(({} as { polluted?: unknown }).polluted).toBeUndefined()
  })
})

describe('a request', () => {
  const post = (jobId: string, body: string, type = 'application/json') => designer.post(`/api/jobs/${jobId}/commands`).set('Content-Type', type).send(body)
  it('that is broken, too large, or not what is expected is refused whole', async () => {
    const id = await startJob(designer)
    const many = { baseVersion: 1, commands: Array.from({ length: 501 }, () => rename('Deck', 1)) }
    const cases: [string, string, number, string][] = [
      ['broken JSON', '{"baseVersion":1,', 400, 'invalid'],
      ['5 MB', JSON.stringify({ baseVersion: 1, commands: [rename('x'.repeat(5_000_000), 1)] }), 413, 'too-large'],
      ['over 500 commands', JSON.stringify(many), 400, 'invalid'],
      ['an unknown field', JSON.stringify({ baseVersion: 1, commands: [], actorId: 'larkhook-owner' }), 400, 'invalid'],
      ['a negative version', JSON.stringify({ baseVersion: -1, commands: [] }), 400, 'invalid'],
      ['a command with a field of its own', JSON.stringify({ baseVersion: 1, commands: [{ ...rename('Deck', 1), actorId: 'x' }] }), 400, 'invalid'],
      ['a change instead of a command', JSON.stringify({ baseVersion: 1, commands: [{ id: 'c', change: {}, madeAt: 1 }] }), 400, 'invalid'],
      ['a version the job never had', JSON.stringify({ baseVersion: 9, commands: [] }), 409, 'conflict'],
    ]
    for (const [what, body, status, type] of cases) {
      const response = await post(id, body)
      expect([response.status, response.body.type], what).toEqual([status, `/problems/${type}`])
    }
    expect((await post(id, 'baseVersion=1', 'application/x-www-form-urlencoded')).status).toBe(415)
    expect((await open(designer, id)).opened.version).toBe(1)
  })
})

describe('many at once', () => {
  it('40 commands, each sent twice over ten processes: 40 versions without a gap', async () => {
    const id = await startJob(designer)
    const agents = await Promise.all(Array.from({ length: 10 }, () => signInAt(anotherProcess(), 'designer@larkhook.example')))
    const commands = Array.from({ length: 40 }, (_, i) => command({ verb: 'room.add', args: without(buildRoom({ id: `n${i}`, code: `N${i}` })) }, 1))
    const answers: PushAnswer[] = await Promise.all([...commands, ...commands].map((each, i) => push(agents[(i * 7) % 10]!, id, [each], 1)))
    expect(answers.flatMap((answer) => answer.refused)).toEqual([])
    const { since, version } = await changesSince(designer, id, 1)
    expect(version).toBe(41)
    expect(since.map((entry) => entry.version)).toEqual(Array.from({ length: 40 }, (_, i) => i + 2))
    expect(new Set(since.map((entry) => entry.commandId)).size).toBe(40)
    expect((await open(agents[3]!, id)).doc.records.room.size).toBe(42)
  })
  it('both people offline may lay “run 1”: the second becomes another label', async () => {
    const id = await startJob(designer)
    const lay = (runId: string) => command({ verb: 'run.add', args: { id: runId, cableTypeId: 'c-16-2', a: null, b: { plateId: 'pat1', jackId: null } } }, 1)
    await push(designer, id, [lay('mine')], 1)
    await push(owner, id, [lay('theirs')], 1)
    const { doc } = await open(owner, id)
    expect([find(doc, 'run', 'mine')?.label, find(doc, 'run', 'theirs')?.label]).toEqual(['PAT1-S2', 'PAT1-S3'])
  })
})

describe('a long time away', () => {
  it('is caught up in pieces: an answer holds so many entries, and says that there is more', async () => {
    const id = await startJob(designer)
    const edits = Array.from({ length: maxEntriesPerAnswer + 10 }, (_, i) => command({ verb: 'run.update', args: { ids: ['r1'], set: { slackAMm: i } } }, 1))
    const last = edits.length + 1
    const pushed = await push(designer, id, edits, 0)
    expect([pushed.refused, pushed.accepted.length, pushed.version, pushed.since.length]).toEqual([[], edits.length, last, maxEntriesPerAnswer])
    const first = await changesSince(designer, id, 0)
    expect([first.version, first.since.length, first.since.at(-1)?.version]).toEqual([last, maxEntriesPerAnswer, maxEntriesPerAnswer])
    const rest = await changesSince(designer, id, maxEntriesPerAnswer)
    expect([rest.version, rest.since.length]).toEqual([last, 11])
    expect(await changesSince(designer, id, last)).toEqual({ version: last, since: [] })
    expect((await designer.get(`/api/jobs/${id}/changes?since=${last + 1}`)).status).toBe(409)
    // What was queued long ago conflicts with none of it, because it is one's own.
    expect((await push(designer, id, [command({ verb: 'run.update', args: { ids: ['r1'], set: { slackAMm: 5 } } }, 1)], last)).refused).toEqual([])
  })
})

describe('a conflict', () => {
  it('is refused with both values, who wrote the other and when; another field is merged', async () => {
    const id = await startJob(designer)
    await push(owner, id, [rename('Lanai', 1)], 1)
    const mine = rename('Deck', 1)
    const elsewhere = command({ verb: 'room.update', args: { ids: ['pat'], set: { spaceClass: 'outdoor' } } }, 1)
    const answer = await push(designer, id, [mine, elsewhere], 1)
    expect(answer.refused).toEqual([
      expect.objectContaining({ commandId: mine.id, code: 'conflict', details: { kind: 'room', id: 'pat', field: 'name', mine: 'Deck', theirs: 'Lanai', byId: 'larkhook-owner', version: 2 } }),
    ])
    expect(answer.accepted).toEqual([{ commandId: elsewhere.id, version: 3 }])
    expect(answer.since.map((entry) => entry.actorId)).toEqual(['larkhook-owner', 'larkhook-designer'])
    expect((await push(designer, id, [rename('Deck', 3)], 3)).refused).toEqual([])
  })
})

describe('undo', () => {
  it('is refused when somebody has moved on, and of somebody else’s command always', async () => {
    const id = await startJob(designer)
    const mine = rename('Deck', 1)
    await push(designer, id, [mine], 1)
    const undo = (madeAt: number) => command({ verb: 'revert', args: { commandId: mine.id, at } }, madeAt)
    expect((await push(owner, id, [undo(2)], 2)).refused[0]).toMatchObject({ code: 'not_found', message: 'There is nothing to undo here' })
    await push(owner, id, [rename('Lanai', 2)], 2)
    expect((await push(designer, id, [undo(3)], 3)).refused[0]?.message).toContain('Somebody has changed the')
    expect(await nameOf(designer, id)).toBe('Lanai')
  })
  it('asks for the same rights as the work itself, also when they were lost since', async () => {
    const id = await startJob(designer)
    const lead = await test.signIn('lead@larkhook.example')
    const promoted = await test.signIn('owner@larkhook.example')
    await promoted.patch('/api/members/larkhook-lead').send({ role: 'designer' })
    const mine = rename('Deck', 1)
    expect((await push(lead, id, [mine], 1)).refused).toEqual([])
    await promoted.patch('/api/members/larkhook-lead').send({ role: 'lead' })
    const answer = await push(lead, id, [command({ verb: 'revert', args: { commandId: mine.id, at } }, 2)], 2)
    expect(answer.refused[0]).toMatchObject({ code: 'forbidden', details: { action: 'job.design', kind: 'room' } })
  })
})

describe('rights', () => {
  it('are judged on the change: a technician records, and designs in no disguise', async () => {
    const id = await startJob(designer)
    const technician = await test.signIn('technician@larkhook.example')
    const pull = command({ verb: 'pull.record', args: { pulls: [{ id: 'p', at, runId: 'r1', markUnit: 'ft' }] } }, 1)
    const batch = command({ verb: 'batch', args: { label: 'x', steps: [{ verb: 'room.update', args: { ids: ['pat'], set: { name: 'Deck' } } }] } }, 1)
    const answer = await push(technician, id, [rename('Deck', 1), batch, pull], 1)
    expect(answer.refused.map((each) => each.code)).toEqual(['forbidden', 'forbidden'])
    expect(answer.accepted.map((each) => each.commandId)).toEqual([pull.id])
    expect(find((await open(designer, id)).doc, 'pull', 'p')?.byId).toBe('larkhook-technician')
  })
})
