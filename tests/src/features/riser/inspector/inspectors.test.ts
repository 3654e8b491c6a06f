import { afterEach, describe, expect, it } from 'vitest'
import type { VueWrapper } from '@vue/test-utils'
import { recordsOf } from '../../../../../shared/model/jobDocument.ts'
import { useSelectionStore } from '../../../../../src/features/job/selectionStore.ts'
import DeviceInspector from '../../../../../src/features/riser/inspector/DeviceInspector.vue'
import { endChoices } from '../../../../../src/features/riser/inspector/endChoices.ts'
import LevelInspector from '../../../../../src/features/riser/inspector/LevelInspector.vue'
import ManyInspector from '../../../../../src/features/riser/inspector/ManyInspector.vue'
import PathwayInspector from '../../../../../src/features/riser/inspector/PathwayInspector.vue'
import PlateInspector from '../../../../../src/features/riser/inspector/PlateInspector.vue'
import RackInspector from '../../../../../src/features/riser/inspector/RackInspector.vue'
import RiserKey from '../../../../../src/features/riser/inspector/RiserKey.vue'
import RoomInspector from '../../../../../src/features/riser/inspector/RoomInspector.vue'
import RunInspector from '../../../../../src/features/riser/inspector/RunInspector.vue'
import { buildDoc, buildLevel, buildPathway, buildPlate, buildRun, rectangle, smallHouse } from '../../../../support/build.ts'
import { lastEdit, mountOnRiser, openJob } from '../../../../support/riserMount.ts'

let shown: VueWrapper | undefined
afterEach(() => shown?.unmount())
const show = (part: Parameters<typeof mountOnRiser>[0], props: Record<string, unknown>) => (shown = mountOnRiser(part, props))

const field = (wrapper: VueWrapper, label: string) => {
  const found = wrapper.findAll('label.field').find((each) => each.find('span').text() === label)
  if (!found) throw new Error(`no field ${label}`)
  return found.find<HTMLInputElement>('input, select')
}
async function type(wrapper: VueWrapper, label: string, text: string) {
  await field(wrapper, label).setValue(text)
  await field(wrapper, label).trigger('blur')
}
const pick = (wrapper: VueWrapper, label: string, value: string | number) => field(wrapper, label).setValue(value)

describe('the inspector of a run', () => {
  it('shows what the run is, from end to end', async () => {
    await openJob(buildDoc(...smallHouse()))
    const text = show(RunInspector, { runId: 'r1', catalog: null }).text()
    for (const part of ['PAT1-S1', 'planned', '16/2 speaker, white jacket', 'PAT1 jack 1', 'SP1-01', 'Speaker panel 1', 'along', 'slack', 'Patio']) expect(text).toContain(part)
  })

  it('says what is missing where there is no length', async () => {
    await openJob(buildDoc(...smallHouse(), buildRun({ id: 'r2', serial: 2, label: 'X-1', b: null })))
    expect(show(RunInspector, { runId: 'r2', catalog: null }).text()).toContain('it has no end there yet')
  })

  it('turns each field into its command', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    const run = show(RunInspector, { runId: 'r1', catalog: null })
    await type(run, 'Purpose', 'Left speaker')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { purpose: 'Left speaker' } } })
    await type(run, 'Slack at end b', '5 ft')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { slackBMm: 1524 } } })
    await type(run, 'Stated length', '27 m')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: 27_000 } } })
    await type(run, 'Bundle', 'B4')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { bundle: 'B4' } } })
    await type(run, 'Label', 'PATIO-L')
    expect(lastEdit(job)).toEqual({ verb: 'run.setLabel', args: { id: 'r1', label: 'PATIO-L' } })
    await pick(run, 'Cable', 'c-14-2')
    expect(lastEdit(job)).toEqual({ verb: 'run.changeCable', args: { ids: ['r1'], cableTypeId: 'c-14-2' } })
    await pick(run, 'Way', 'underfloor')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { route: 'underfloor' } } })
    expect(job.outbox).toHaveLength(7)
  })

  it('takes a stated length back when the field is emptied', async () => {
    const job = await openJob(buildDoc(...smallHouse().map((record) => (record.kind === 'run' ? buildRun({ statedLengthMm: 5000 }) : record))))
    await type(show(RunInspector, { runId: 'r1', catalog: null }), 'Stated length', '')
    expect(lastEdit(job)).toEqual({ verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: null } } })
  })

  it('keeps what cannot be read, says why, and sends nothing', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    const run = show(RunInspector, { runId: 'r1', catalog: null })
    await type(run, 'Stated length', 'about ten')
    expect(field(run, 'Stated length').element.value).toBe('about ten')
    expect(run.find('[role="alert"]').text()).toContain('about ten')
    expect(job.outbox).toHaveLength(0)
  })

  it('freezes a label that was printed', async () => {
    const printed = { kind: 'labelPrint' as const, id: 'lp', at: '2026-05-19T12:00:00.000Z', byId: 'me', runId: 'r1', end: 'a' as const, text: 'PAT1-S1', copies: 1, stock: 'x' }
    await openJob(buildDoc(...smallHouse(), printed))
    expect(field(show(RunInspector, { runId: 'r1', catalog: null }), 'Label, printed').element.disabled).toBe(true)
  })

  it('is for reading only where one may not design', async () => {
    await openJob(buildDoc(...smallHouse()), 'technician')
    const run = show(RunInspector, { runId: 'r1', catalog: null })
    expect(run.findAll<HTMLInputElement>('input, select').every((each) => each.element.disabled)).toBe(true)
    expect(run.text()).not.toContain('Delete')
  })

  it('offers only ends that take the cable and are free', () => {
    const doc = buildDoc(...smallHouse(), buildPlate({ id: 'pat2', number: 2, jacks: [{ id: 'k1', position: 1, connector: 'speaker-pair' }, { id: 'k2', position: 2, connector: 'coax' }] }))
    const keys = endChoices(doc, 'speaker-pair', 'other').map((choice) => choice.key)
    expect(keys).toContain('k1')
    expect(keys).not.toContain('k2')
    expect(keys).not.toContain('j1')
    expect(keys).not.toContain('sp1:p1')
    expect(keys).toContain('sp1:p2')
    expect(keys.slice(-2)).toEqual(['rk1', 'none'])
    expect(endChoices(doc, 'speaker-pair', 'r1').map((choice) => choice.key)).toContain('j1')
  })
})

describe('the inspectors of places', () => {
  it('moves a plate along its wall, up, and to the ceiling', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    const plate = show(PlateInspector, { plateId: 'pat1' })
    await type(plate, 'Height over the floor', '48 in')
    expect(lastEdit(job)).toEqual({ verb: 'plate.update', args: { ids: ['pat1'], set: { heightMm: 1219 } } })
    await type(plate, 'From the wall’s left end', '10 ft')
    expect(lastEdit(job)).toEqual({ verb: 'plate.update', args: { ids: ['pat1'], set: { alongMm: 3048 } } })
    await pick(plate, 'On', 'ceiling')
    expect(lastEdit(job)).toEqual({ verb: 'plate.update', args: { ids: ['pat1'], set: { mounting: 'ceiling', wall: null, alongMm: null, at: { xMm: 3048, yMm: 2000 }, heightMm: 2743 } } })
  })

  it('adds a jack to a plate', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    await show(PlateInspector, { plateId: 'pat1' }).find('select[aria-label="Add a jack"]').setValue('coax')
    expect(job.doc.records.plate.get('pat1')!.jacks.map((jack) => [jack.position, jack.connector])).toEqual([[1, 'speaker-pair'], [2, 'coax']])
  })

  it('stretches and moves a room, and writes codes in capitals', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    const room = show(RoomInspector, { roomId: 'pat' })
    await type(room, 'Width, west to east', '8 m')
    expect(job.doc.records.room.get('pat')!.outline).toEqual(rectangle(0, 0, 8000, 4000))
    await type(room, 'West edge at', '-1 m')
    expect(job.doc.records.room.get('pat')!.outline).toEqual(rectangle(-1000, 0, 8000, 4000))
    await type(room, 'Code, in labels', 'ter')
    expect(job.doc.records.room.get('pat')!.code).toBe('TER')
    expect(recordsOf(job.doc, 'run')[0]!.label).toBe('TER1-S1')
    await type(room, 'Ceiling height', '9 ft')
    expect(lastEdit(job)).toEqual({ verb: 'room.update', args: { ids: ['pat'], set: { ceilingHeightMm: 2743 } } })
  })

  it('puts a level under the datum', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    await type(show(LevelInspector, { levelId: 'l1' }), 'Floor, over the datum (below it: a minus sign)', '-9 ft')
    expect(lastEdit(job)).toEqual({ verb: 'level.update', args: { ids: ['l1'], set: { elevationMm: -2743 } } })
  })

  it('carries a rack to another room', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    await pick(show(RackInspector, { rackId: 'rk1' }), 'Room', 'pat')
    expect(lastEdit(job)).toEqual({ verb: 'rack.update', args: { ids: ['rk1'], set: { roomId: 'pat', at: { xMm: 3000, yMm: 2000 } } } })
  })

  it('names a device’s zone and its supplier', async () => {
    const job = await openJob(buildDoc(...smallHouse()))
    await pick(show(DeviceInspector, { deviceId: 'sp1' }), 'Supplied by', 'owner')
    expect(lastEdit(job)).toEqual({ verb: 'device.update', args: { ids: ['sp1'], set: { suppliedBy: 'owner' } } })
  })

  it('leads a chase to another level, and refuses one that goes nowhere', async () => {
    const job = await openJob(buildDoc(...smallHouse(), buildLevel({ id: 'l2', code: 'L2', name: 'Level 2', elevationMm: 3000 }), buildPathway()))
    await pick(show(PathwayInspector, { pathwayId: 'w1' }), 'From level', 'l2')
    expect(job.notice).toContain('two different levels')
    expect(job.outbox).toHaveLength(0)
  })
})

describe('many at once', () => {
  const two = () => buildDoc(...smallHouse(), buildPlate({ id: 'pat2', number: 2 }), buildRun({ id: 'r2', serial: 2, label: 'PAT2-S1', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat2', jackId: 'j1' } }))

  it('changes the cable of all chosen runs with one command', async () => {
    const job = await openJob(two())
    const many = show(ManyInspector, { items: [{ kind: 'run', id: 'r1' }, { kind: 'run', id: 'r2' }] })
    expect(many.text()).toContain('2 runs')
    await pick(many, 'Cable', 'c-14-2')
    expect(job.outbox).toHaveLength(1)
    expect(lastEdit(job)).toEqual({ verb: 'run.changeCable', args: { ids: ['r1', 'r2'], cableTypeId: 'c-14-2' } })
  })

  it('sets one height for all chosen plates', async () => {
    const job = await openJob(two())
    await type(show(ManyInspector, { items: [{ kind: 'plate', id: 'pat1' }, { kind: 'plate', id: 'pat2' }] }), 'Height of them all', '16 in')
    expect(lastEdit(job)).toEqual({ verb: 'plate.update', args: { ids: ['pat1', 'pat2'], set: { heightMm: 406 } } })
  })
})

describe('the key', () => {
  it('counts stages and cables, lists open ends, and lights a cable’s runs', async () => {
    await openJob(buildDoc(...smallHouse(), buildRun({ id: 'r2', serial: 2, label: 'LOOSE-1', a: null, b: null })))
    const key = show(RiserKey, {})
    expect(key.text()).toContain('planned')
    expect(key.text()).toContain('LOOSE-1')
    await key.find('.key.cable tr').trigger('click')
    expect(useSelectionStore().items).toEqual([{ kind: 'cableType', id: 'c-16-2' }])
  })
})
