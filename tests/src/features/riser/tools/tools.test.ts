import { describe, expect, it } from 'vitest'
import { cableTypeFixtures } from '../../../../../fixtures/catalog/cableTypes.ts'
import { deviceModelFixtures } from '../../../../../fixtures/catalog/deviceModels.ts'
import type { Catalog } from '../../../../../shared/api/catalog.ts'
import type { Command, Intent } from '../../../../../shared/commands/index.ts'
import { recordsOf, type JobDocument } from '../../../../../shared/model/jobDocument.ts'
import { replay } from '../../../../../shared/sync/replay.ts'
import { layoutRiser } from '../../../../../src/features/riser/layout/layoutRiser.ts'
import { roomPointAt } from '../../../../../src/features/riser/tools/drawnPoint.ts'
import { isCordWay, planCord, planRun } from '../../../../../src/features/riser/tools/planConnect.ts'
import { nextCode, planDevice, planRackDevice } from '../../../../../src/features/riser/tools/planDevice.ts'
import { planDuplicate, planMoves, removalWords } from '../../../../../src/features/riser/tools/planEdits.ts'
import { planJackRun, planPlate, usualCable } from '../../../../../src/features/riser/tools/planPlate.ts'
import { platePresets, presetFor } from '../../../../../src/features/riser/tools/platePresets.ts'
import { placeAt, snapHeight } from '../../../../../src/features/riser/tools/roomPoint.ts'
import { buildDevice, buildDoc, buildModel, buildPlate, buildRack, buildRoom, buildTerminal, rectangle, smallHouse } from '../../../../support/build.ts'

const catalog: Catalog = {
  cableTypes: cableTypeFixtures.map((description) => ({ id: `cat-${description.code.replace(/[^A-Za-z0-9]/g, '-')}`, version: 2, description })),
  deviceModels: Object.entries(deviceModelFixtures).map(([key, description]) => ({ id: `mod-${key}`, version: 1, description })),
}
const preset = (key: string) => platePresets.find((each) => each.key === key)!
const model = (key: string) => catalog.deviceModels.find((entry) => entry.id === `mod-${key}`)!
const ids = () => {
  let n = 0
  return () => `new-${++n}`
}
function done(doc: JobDocument, intent: Intent): JobDocument {
  const played = replay(doc, [{ ...intent, id: 'c1', madeAt: 0 } as Command], { actor: { id: 'me', role: 'designer' }, changeOf: () => undefined })
  if (played.refused[0]) throw played.refused[0].error
  return played.doc
}
const house = () => buildDoc(...smallHouse())

describe('a plate with its runs in one click', () => {
  it('is one command that makes plate, run and label', () => {
    const doc = house()
    const planned = planPlate(doc, catalog, { roomId: 'pat', across: 0.5, up: 0.3 }, preset('wallSpeaker'), { withRuns: true, newId: ids() })
    expect(planned.intent.verb).toBe('batch')
    const after = done(doc, planned.intent)
    const run = after.records.run.get(planned.runIds[0]!)!
    expect(run.label).toBe('PAT2-S1')
    expect(run.a).toEqual({ deviceId: 'sp1', terminal: 'p2' })
    expect(run.cableTypeId).toBe('c-16-2')
    expect(planned.caution).toBeNull()
  })

  it('lays each jack of a plate on the next port, and takes cables of the catalogue onto the job', () => {
    const doc = house()
    const planned = planPlate(doc, catalog, { roomId: 'pat', across: 0.2, up: 0.6 }, preset('tv'), { withRuns: true, newId: ids() })
    const after = done(doc, planned.intent)
    expect(planned.runIds).toHaveLength(3)
    const cables = planned.runIds.map((id) => after.records.cableType.get(after.records.run.get(id)!.cableTypeId)!)
    expect(cables.map((type) => type.code)).toEqual(['CAT6', 'CAT6', 'RG6'])
    expect(cables[0]!.catalogId).toBe('cat-CAT6')
    expect(recordsOf(after, 'cableType').filter((type) => type.code === 'CAT6')).toHaveLength(1)
  })

  it('says so where no port of that kind is free, and ends the run at the rack', () => {
    const planned = planPlate(house(), catalog, { roomId: 'pat', across: 0.2, up: 0.6 }, preset('data'), { withRuns: true, newId: ids() })
    expect(planned.caution).toContain('data port')
    const after = done(house(), planned.intent)
    expect(after.records.run.get(planned.runIds[0]!)!.a).toEqual({ rackId: 'rk1' })
  })

  it('says so where there is no rack', () => {
    const bare = buildDoc(...smallHouse().filter((record) => !['rack', 'device', 'run'].includes(record.kind)))
    const planned = planPlate(bare, catalog, { roomId: 'pat', across: 0.2, up: 0.6 }, preset('data'), { withRuns: true, newId: ids() })
    expect(planned.caution).toContain('no rack')
    expect(done(bare, planned.intent).records.run.get(planned.runIds[0]!)!.a).toBeNull()
  })

  it('never lands two runs on one port, however many are drawn', () => {
    let doc = house()
    const newId = ids()
    for (let n = 0; n < 15; n++) doc = done(doc, planPlate(doc, catalog, { roomId: 'pat', across: n / 15, up: 0.3 }, preset('wallSpeaker'), { withRuns: true, newId }).intent)
    const ports = recordsOf(doc, 'run').flatMap((run) => (run.a && 'deviceId' in run.a ? [`${run.a.deviceId}:${run.a.terminal}`] : []))
    expect(new Set(ports).size).toBe(ports.length)
    expect(ports).toHaveLength(12)
    expect(new Set(recordsOf(doc, 'run').map((run) => run.label)).size).toBe(16)
  })

  it('adds a jack and a run to a plate that is there', () => {
    const doc = house()
    const planned = planJackRun(doc, doc.records.plate.get('pat1')!, { cableTypeId: 'c-14-2' }, ids())
    const after = done(doc, planned.intent)
    expect(after.records.plate.get('pat1')!.jacks).toHaveLength(2)
    expect(after.records.run.get(planned.runIds[0]!)!.label).toBe('PAT1-S2')
  })

  it('chooses the cable the job uses most for a jack', () => {
    expect(usualCable(house(), catalog, 'speaker-pair')).toEqual({ cableTypeId: 'c-16-2' })
    expect(usualCable(house(), catalog, 'hdmi')).toMatchObject({ entry: { description: { code: 'HDMI-AO' } } })
  })

  it('knows what a cable comes out of high up, low down and outside', () => {
    expect(presetFor('speaker-pair', true, false).form).toBe('ceiling-opening')
    expect(presetFor('speaker-pair', false, false).form).toBe('wall-box')
    expect(presetFor('coax', false, true)).toMatchObject({ form: 'exterior-box', jacks: ['coax'] })
  })
})

describe('a point of the drawing', () => {
  it('is the room under it, and where in it', () => {
    const doc = house()
    const layout = layoutRiser(doc, { apart: false, mark: () => undefined })
    const bay = layout.bays.find((each) => each.roomId === 'pat')!
    const low = roomPointAt(doc, layout, { x: bay.x + bay.w * 0.9, y: bay.y + bay.h - 50 })!
    const high = roomPointAt(doc, layout, { x: bay.x + bay.w * 0.1, y: bay.y + 5 })!
    expect(low.roomId).toBe('pat')
    expect(low.across).toBeGreaterThan(high.across)
    expect(low.up).toBeLessThan(0.1)
    expect(high.up).toBeGreaterThan(0.94)
    expect(roomPointAt(doc, layout, { x: 2, y: 2 })).toBeNull()
  })

  it('comes out on the drawing where it went in', () => {
    const doc = house()
    const layout = layoutRiser(doc, { apart: false, mark: () => undefined })
    const spot = layout.plates.find((each) => each.plate.id === 'pat1')!
    const point = roomPointAt(doc, layout, spot, null)!
    expect(placeAt(doc, point, 'wall').alongMm).toBeCloseTo(spot.plate.alongMm!, -2)
  })

  it('snaps to usual heights, and to none that is above the ceiling', () => {
    expect(snapHeight(1190, 2743)).toBe(1219)
    expect(snapHeight(5, 2743)).toBe(51)
    expect(snapHeight(9000, 2400)).toBeLessThanOrEqual(2400)
    expect(snapHeight(500, 2743, 'm')).toBe(500)
    expect(snapHeight(500, 2743, 'ft')).toBe(508)
  })

  it('puts a ceiling plate inside a room that has a corner cut out', () => {
    const outline = [{ xMm: 0, yMm: 0 }, { xMm: 2000, yMm: 0 }, { xMm: 2000, yMm: 3000 }, { xMm: 6000, yMm: 3000 }, { xMm: 6000, yMm: 5000 }, { xMm: 0, yMm: 5000 }]
    const doc = buildDoc(...smallHouse(), buildRoom({ id: 'ell', code: 'ELL', outline }))
    expect(placeAt(doc, { roomId: 'ell', across: 0.8, up: 1 }, 'ceiling').at).toEqual({ xMm: 4800, yMm: 4000 })
  })
})

describe('dragging', () => {
  it('moves plates with one command, and does nothing for a plate put back', () => {
    const doc = house()
    const plate = doc.records.plate.get('pat1')!
    const intent = planMoves(doc, [{ plate, to: { roomId: 'mch', across: 0.5, up: 0.45 }, from: null }])!
    const after = done(doc, intent)
    expect(after.records.plate.get('pat1')).toMatchObject({ roomId: 'mch', number: 1, heightMm: 1219 })
    expect(recordsOf(after, 'run')[0]!.label).toBe('MCH1-S1')
    const here = { roomId: 'pat', across: 1000 / 6000, up: plate.heightMm / 2743 }
    expect(planMoves(doc, [{ plate, to: here, from: here }])).toBeNull()
    expect(planMoves(doc, [{ plate, to: { ...here, across: 0.6 }, from: here }])).toMatchObject({ args: { moves: [{ to: { heightMm: 400, alongMm: 3600, wall: 0 } }] } })
    expect(planMoves(doc, [{ plate, to: { ...here, up: here.up + 0.3 }, from: here }])).toMatchObject({ args: { moves: [{ to: { heightMm: 1219, alongMm: 1000 } }] } })
  })

  it('lays a run from a jack to the next free port of the panel it is dropped on', () => {
    const doc = buildDoc(...smallHouse(), buildPlate({ id: 'pat2', number: 2 }))
    const joined = planRun(doc, catalog, { kind: 'jack', plateId: 'pat2', jackId: 'j1' }, { kind: 'device', deviceId: 'sp1' }, { newId: ids() })
    if ('refusal' in joined) throw new Error(joined.refusal)
    const after = done(doc, joined.intent)
    expect(after.records.run.get(joined.runId!)).toMatchObject({ a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat2', jackId: 'j1' }, label: 'PAT2-S1' })
  })

  it('refuses with a sentence what cannot be: a taken jack, a port that does not fit', () => {
    const taken = planRun(house(), catalog, { kind: 'jack', plateId: 'pat1', jackId: 'j1' }, { kind: 'rack', rackId: 'rk1' }, { newId: ids() })
    expect(taken).toEqual({ refusal: expect.stringContaining('PAT1-S1') })
    const data = buildDoc(...smallHouse(), buildModel({ id: 'm-pp', name: 'Patch panel', terminals: [buildTerminal({ connector: 'modular', signal: 'ethernet' })] }), buildDevice({ id: 'pp1', modelId: 'm-pp', code: 'PP1', unit: 20 }), buildPlate({ id: 'pat2', number: 2 }))
    const misfit = planRun(data, catalog, { kind: 'jack', plateId: 'pat2', jackId: 'j1' }, { kind: 'port', deviceId: 'pp1', terminal: 'p1' }, { newId: ids() })
    expect(misfit).toEqual({ refusal: expect.stringContaining('does not fit') })
  })

  it('joins two things in the rack by a cord, all else by a run', () => {
    const doc = buildDoc(...smallHouse(), buildModel({ id: 'm-amp', category: 'amplifier', name: 'Amp' }), buildDevice({ id: 'amp', modelId: 'm-amp', code: 'AMP', unit: 10 }))
    expect(isCordWay(doc, { kind: 'port', deviceId: 'sp1', terminal: 'p1' }, { kind: 'device', deviceId: 'amp' })).toBe(true)
    expect(isCordWay(doc, { kind: 'plate', plateId: 'pat1' }, { kind: 'device', deviceId: 'sp1' })).toBe(false)
    const cord = planCord(doc, { kind: 'port', deviceId: 'sp1', terminal: 'p1' }, { kind: 'device', deviceId: 'amp' }, ids())
    if ('refusal' in cord) throw new Error(cord.refusal)
    expect(recordsOf(done(doc, cord.intent), 'cord')).toHaveLength(1)
  })
})

describe('duplicating and deleting', () => {
  it('duplicates a plate with its run to the next port', () => {
    const doc = house()
    const planned = planDuplicate(doc, ['pat1'], ids())!
    const after = done(doc, planned.intent)
    expect(recordsOf(after, 'plate').map((plate) => plate.number).sort()).toEqual([1, 2])
    const [, copy] = recordsOf(after, 'run')
    expect(copy).toMatchObject({ label: 'PAT2-S1', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: planned.plateIds[0]! } })
  })

  it('says what hangs on a room before it goes', () => {
    const words = removalWords(house(), [{ kind: 'room', id: 'pat' }])
    expect(words).toEqual({ summary: '1 room', hanging: '1 plate, 1 run', refusal: null })
  })
})

describe('filling a rack', () => {
  it('puts each panel at the highest free place, with the next code', () => {
    const doc = buildDoc(...smallHouse(), buildRack({ id: 'rk2', code: 'RK2', units: 4 }))
    const planned = planRackDevice(doc, model('panel-data-24'), 'rk2', ids(), 3)!
    const after = done(doc, planned.intent)
    const made = recordsOf(after, 'device').filter((device) => device.rackId === 'rk2')
    expect(made.map((device) => [device.code, device.unit])).toEqual([['PP1', 4], ['PP2', 3], ['PP3', 2]])
    expect(recordsOf(after, 'deviceModel').filter((each) => each.catalogId === 'mod-panel-data-24')).toHaveLength(1)
  })

  it('says nothing fits where nothing does', () => {
    const doc = buildDoc(...smallHouse(), buildRack({ id: 'rk2', code: 'RK2', units: 1 }))
    expect(planRackDevice(doc, model('amp-12'), 'rk2', ids())).toBeNull()
    expect(nextCode(doc, model('panel-speaker-12'))).toBe('SP2')
  })

  it('puts a device at the plate it is dropped on, else in the room', () => {
    const doc = buildDoc(...smallHouse(), buildRoom({ id: 'den', code: 'DEN', outline: rectangle(20_000, 0, 4000, 4000) }))
    const at = planDevice(doc, model('display'), { roomId: 'pat', across: 0.5, up: 0.5 }, doc.records.plate.get('pat1')!, ids())
    expect(recordsOf(done(doc, at.intent), 'device').at(-1)).toMatchObject({ plateId: 'pat1', roomId: null })
    const free = planDevice(doc, model('display'), { roomId: 'den', across: 0.5, up: 0.55 }, null, ids())
    expect(recordsOf(done(doc, free.intent), 'device').at(-1)).toMatchObject({ plateId: null, roomId: 'den', at: { xMm: 22_000, yMm: 2000 }, heightMm: 1524 })
  })
})
