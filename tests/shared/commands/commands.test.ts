import { describe, expect, it } from 'vitest'
import { describe as describeCommand, plan, type Intent } from '../../../shared/commands/index.ts'
import { find, jobOf } from '../../../shared/model/jobDocument.ts'
import { removalOf } from '../../../shared/commands/items.ts'
import { apply } from '../../../shared/sync/change.ts'
import { assertSound } from '../../../shared/sync/soundness.ts'
import { buildDoc, buildJob, buildLevel, buildPathway, buildPlate, buildRoom, buildRun, smallHouse } from '../../support/build.ts'
import { asDesigner, checkCommand } from '../../support/checkCommand.ts'

const house = () => buildDoc(...smallHouse())
const at = '2026-12-01T10:00:00.000Z'
const refuse = (doc = house(), intent: Intent) => () => {
  const change = plan(doc, intent, asDesigner)
  assertSound(apply(doc, change), change)
}

describe('run.add', () => {
  const second: Intent = { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat1', jackId: null } } }
  it('labels the run by the pattern, with the first free number', () => {
    const { after } = checkCommand(house(), second)
    expect(find(after, 'run', 'r2')).toMatchObject({ label: 'PAT1-S2', serial: 2, loadJoin: 'parallel', dropped: null })
  })
  it('never gives a label that was printed for a run that is gone', () => {
    const printed = checkCommand(house(), { verb: 'label.print', args: { prints: [{ id: 'lp', at, runId: 'r1', end: 'b', copies: 2, stock: 'letter-30' }] } }).after
    const relabelled = apply(printed, { added: [], removed: [], updated: [{ kind: 'run', id: 'r1', fields: { label: ['PAT1-S1', 'OLD-1'] } }] })
    expect(find(checkCommand(relabelled, second).after, 'run', 'r2')?.label).toBe('PAT1-S2')
  })
  it('refuses a run whose two ends are one place', () => {
    expect(refuse(house(), { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: { plateId: 'pat1', jackId: 'j1' }, b: { plateId: 'pat1', jackId: 'j1' } } })).toThrow('two different ends')
  })
  it('refuses a jack that the plate does not have', () => {
    expect(refuse(house(), { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: null, b: { plateId: 'pat1', jackId: 'nope' } } })).toThrow('jack that the plate does not have')
  })
})

describe('room.update', () => {
  it('keeps the old name as an alias', () => {
    const { after } = checkCommand(house(), { verb: 'room.update', args: { ids: ['pat'], set: { name: 'Terrace' } } })
    expect(find(after, 'room', 'pat')).toMatchObject({ name: 'Terrace', aliases: ['Patio'] })
    expect(find(after, 'run', 'r1')?.label).toBe('PAT1-S1')
  })
  it('gives new labels only to runs whose label was never printed', () => {
    const fresh = checkCommand(house(), { verb: 'room.update', args: { ids: ['pat'], set: { code: 'TER' } } }).after
    expect(find(fresh, 'run', 'r1')?.label).toBe('TER1-S1')
    const printed = checkCommand(house(), { verb: 'label.print', args: { prints: [{ id: 'lp', at, runId: 'r1', end: 'b', copies: 2, stock: 'letter-30' }] } }).after
    expect(find(checkCommand(printed, { verb: 'room.update', args: { ids: ['pat'], set: { code: 'TER' } } }).after, 'run', 'r1')?.label).toBe('PAT1-S1')
  })
  it('refuses a code that another room has, and names that room', () => {
    expect(refuse(house(), { verb: 'room.update', args: { ids: ['pat'], set: { code: 'MCH' } } })).toThrow('Code MCH is taken by Mechanical')
  })
})

describe('run.setLabel', () => {
  it('is refused once the label is printed', () => {
    const printed = checkCommand(house(), { verb: 'label.print', args: { prints: [{ id: 'lp', at, runId: 'r1', end: 'a', copies: 1, stock: 'letter-30' }] } }).after
    expect(refuse(printed, { verb: 'run.setLabel', args: { id: 'r1', label: 'W0001' } })).toThrow('printed, so it stays')
  })
  it('is refused when another run has it, whatever the capitals', () => {
    const doc = checkCommand(house(), { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: null, b: null } }).after
    expect(refuse(doc, { verb: 'run.setLabel', args: { id: 'r2', label: 'pat1-s1' } })).toThrow('on another run already')
  })
})

describe('run.changeCable', () => {
  it('changes many in one step', () => {
    const doc = checkCommand(house(), { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: null, b: { plateId: 'pat1', jackId: null } } }).after
    const intent: Intent = { verb: 'run.changeCable', args: { ids: ['r1', 'r2'], cableTypeId: 'c-14-2' } }
    const { after, change } = checkCommand(doc, intent)
    expect([find(after, 'run', 'r1')?.cableTypeId, find(after, 'run', 'r2')?.cableTypeId]).toEqual(['c-14-2', 'c-14-2'])
    expect(change.updated).toHaveLength(2)
    expect(describeCommand(doc, intent)).toBe('Change 2 runs to 14/2')
  })
})

describe('items.remove', () => {
  it('takes along what hangs on it', () => {
    const { after, change } = checkCommand(house(), { verb: 'items.remove', args: { items: [{ kind: 'room', id: 'pat' }] } })
    expect(change.removed.map((record) => record.kind).sort()).toEqual(['plate', 'room', 'run'])
    expect(after.records.run.size).toBe(0)
  })
  it('never forgets a cable that was worked on', () => {
    const pulled = checkCommand(house(), { verb: 'pull.record', args: { pulls: [{ id: 'p', at, runId: 'r1', markA: 1247, markB: 1335, markUnit: 'ft' }] } }).after
    expect(removalOf(pulled, [{ kind: 'room', id: 'pat' }]).refusal).toContain('PAT1-S1 is printed or worked on')
    expect(refuse(pulled, { verb: 'items.remove', args: { items: [{ kind: 'run', id: 'r1' }] } })).toThrow('Drop it with a reason')
  })
  it('leaves runs standing when their chase goes', () => {
    const doc = buildDoc(...smallHouse().filter((record) => record.kind !== 'run'), buildLevel({ id: 'l2', code: 'L2', name: 'Level 2', elevationMm: 3048 }), buildPathway(), buildRun({ pathwayIds: ['w1'] }))
    const { after } = checkCommand(doc, { verb: 'items.remove', args: { items: [{ kind: 'pathway', id: 'w1' }] } })
    expect(find(after, 'run', 'r1')?.pathwayIds).toEqual([])
  })
  it('refuses a cable type that is in use', () => {
    expect(refuse(house(), { verb: 'items.remove', args: { items: [{ kind: 'cableType', id: 'c-16-2' }] } })).toThrow('1 runs use this cable type')
  })
})

describe('plate.move', () => {
  it('takes the next free number in another room and labels follow', () => {
    const doc = buildDoc(...smallHouse(), buildPlate({ id: 'm1', roomId: 'mch', jacks: [] }))
    const { after } = checkCommand(doc, { verb: 'plate.move', args: { moves: [{ id: 'pat1', to: { roomId: 'mch', wall: 1, alongMm: 200 } }] } })
    expect(find(after, 'plate', 'pat1')).toMatchObject({ roomId: 'mch', number: 2, wall: 1 })
    expect(find(after, 'run', 'r1')?.label).toBe('MCH2-S1')
  })
})

describe('batch', () => {
  it('does several things as one, each seeing what went before', () => {
    const intent: Intent = {
      verb: 'batch',
      args: {
        label: 'Add a keypad plate',
        steps: [
          { verb: 'plate.add', args: { id: 'k1', roomId: 'pat', form: 'wall-box', mounting: 'wall', wall: 2, alongMm: 500, heightMm: 1219, jacks: [{ id: 'kj', position: 1, connector: 'speaker-pair' }] } },
          { verb: 'run.add', args: { id: 'r2', cableTypeId: 'c-16-2', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'k1', jackId: 'kj' } } },
        ],
      },
    }
    const { after, change } = checkCommand(house(), intent)
    expect(find(after, 'plate', 'k1')?.number).toBe(2)
    expect(find(after, 'run', 'r2')?.label).toBe('PAT2-S1')
    expect(change.added).toHaveLength(2)
  })
  it('does nothing when a step is refused', () => {
    expect(refuse(house(), { verb: 'batch', args: { label: 'x', steps: [{ verb: 'run.drop', args: { ids: ['r1'], reason: 'CO-2' } }, { verb: 'run.drop', args: { ids: ['nope'], reason: 'CO-2' } }] } })).toThrow('no longer on the job')
  })
})

describe('revert', () => {
  it('strikes out what was said in the field, and redo strikes the strike', () => {
    const pull: Intent = { verb: 'pull.record', args: { pulls: [{ id: 'p', at, runId: 'r1', markA: 1, markB: 89, markUnit: 'ft' }] } }
    const { after, change } = checkCommand(house(), pull)
    const undo = plan(after, { verb: 'revert', args: { commandId: 'c1', at } }, { ...asDesigner, commandId: 'u1', changeOf: () => change })
    expect(undo.removed).toEqual([])
    expect(undo.added).toMatchObject([{ kind: 'strike', targetKind: 'pull', targetId: 'p' }])
    const undone = apply(after, undo)
    const redo = plan(undone, { verb: 'revert', args: { commandId: 'u1', at } }, { ...asDesigner, commandId: 'u2', changeOf: () => undo })
    expect(redo.added).toMatchObject([{ kind: 'strike', targetKind: 'strike', targetId: 'u1-0' }])
    assertSound(apply(undone, redo), redo)
  })
})

describe('bad arguments', () => {
  const cases: [string, { verb: string; args: unknown }, string][] = [
    ['unknown verb', { verb: 'run.teleport', args: {} }, 'does not know'],
    ['unknown field', { verb: 'run.update', args: { ids: ['r1'], set: { colour: 'red' } } }, 'colour'],
    ['wrong type', { verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: 'long' } } }, 'whole millimetres'],
    ['negative length', { verb: 'run.update', args: { ids: ['r1'], set: { slackAMm: -1 } } }, 'cannot be negative'],
    ['absurd length', { verb: 'run.update', args: { ids: ['r1'], set: { statedLengthMm: 4_000_000 } } }, 'at most 3 km'],
    ['prototype names', { verb: 'constructor', args: {} }, 'does not know'],
    ['no ids', { verb: 'run.update', args: { ids: [], set: {} } }, 'Choose at least one'],
    ['a model without terminals', { verb: 'deviceModel.add', args: { id: 'm', name: 'Box', category: 'other', rackUnits: 0, terminals: [], passes: [], sharedPowerW: null } }, 'at least one terminal'],
    ['a pattern that gives duplicates', { verb: 'job.update', args: { set: { labelPattern: '{room}{plate}' } } }, 'two runs would get the same label'],
    ['a mark of six digits', { verb: 'pull.record', args: { pulls: [{ id: 'p', at, runId: 'r1', markA: 100_000, markB: 1, markUnit: 'ft' }] } }, 'at most five digits'],
  ]
  it.each(cases)('%s is refused with a sentence', (_name, command, sentence) => {
    expect(() => plan(house(), command, asDesigner)).toThrow(sentence)
  })
})

describe('job.update', () => {
  it('leaves the client and the address of a job whose units change', () => {
    const doc = buildDoc(buildJob({ client: 'A client', address: '4 Long Lane' }))
    const { after, change } = checkCommand(doc, { verb: 'job.update', args: { set: { lengthUnit: 'm' } } })
    expect(Object.keys(change.updated[0]!.fields)).toEqual(['lengthUnit'])
    expect(jobOf(after)).toMatchObject({ client: 'A client', address: '4 Long Lane', lengthUnit: 'm' })
  })
  it('changes limits and leaves the rest', () => {
    const doc = house()
    const limits = { ...jobOf(doc).limits, speakerLossConvention: 'impedance' as const, speakerLossCaution: 5, speakerLossStop: 10 }
    expect(jobOf(checkCommand(doc, { verb: 'job.update', args: { set: { limits } } }).after)).toMatchObject({ limits, name: 'Heron Point, lot 14' })
  })
})

describe('rooms', () => {
  it('has a soundness check of its own, whoever made the change', () => {
    const doc = house()
    const change = { added: [buildRoom({ id: 'x', code: 'PAT' })], removed: [], updated: [] }
    expect(() => assertSound(apply(doc, change), change)).toThrow('Code PAT is taken by Patio')
  })
})
