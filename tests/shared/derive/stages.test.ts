import { describe, expect, it } from 'vitest'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildLevel, buildPlate, buildRoom, buildRun, rectangle, smallHouse } from '../../support/build.ts'
import { changed, derive, withRecords } from '../../support/derivedHouse.ts'

const said = { at: '2026-12-01T10:00:00.000Z', byId: 'lead', runId: 'r1' }
const pull: JobRecord = { kind: 'pull', id: 'pull', ...said, markA: null, markB: null, markUnit: 'ft', spool: null }
const on = (end: 'a' | 'b'): JobRecord => ({ kind: 'termination', id: `on-${end}`, ...said, end, scheme: '' })
const test = (id: string, result: 'pass' | 'fail', reading = ''): JobRecord => ({ kind: 'test', id, ...said, testKind: 'polarity', result, reading })
const print: JobRecord = { kind: 'labelPrint', id: 'print', ...said, end: 'a', text: 'PAT1-S1', copies: 2, stock: 'letter-30' }
const strike = (targetKind: 'pull' | 'termination' | 'test' | 'labelPrint', targetId: string): JobRecord => ({ kind: 'strike', id: `x-${targetId}`, at: said.at, byId: said.byId, targetKind, targetId, reason: '' })
const after = (...records: JobRecord[]) => derive([...smallHouse(), ...records]).runs.get('r1')!

describe('the stage of a run follows from its records', () => {
  it('planned, pulled, one end on, terminated, tested', () => {
    expect([after(), after(pull), after(pull, on('a')), after(pull, on('a'), on('b')), after(pull, on('a'), on('b'), test('t', 'pass'))].map((facts) => facts.stage)).toEqual(['planned', 'pulled', 'one end on', 'terminated', 'tested'])
  })
  it('an end that is on says that the cable is there, with or without a pull record', () => {
    expect(after(on('b'))).toMatchObject({ stage: 'one end on', ends: { a: false, b: true } })
  })
  it('"pulled" is never "tested": a test of a bare cable moves nothing', () => {
    expect(after(pull, test('t', 'pass')).stage).toBe('pulled')
    expect(after(pull, on('a'), test('t', 'pass')).stage).toBe('one end on')
  })
  it('a failed test leaves it terminated, and is found; a later pass clears it', () => {
    const failed = after(pull, on('a'), on('b'), test('t1', 'fail', 'pair reversed'))
    expect(failed.stage).toBe('terminated')
    expect(failed.findings.map((finding) => [finding.check, finding.severity, finding.sentence])).toEqual([['testResult', 'caution', 'The last polarity test failed: pair reversed.']])
    const passed = after(pull, on('a'), on('b'), test('t1', 'fail'), test('t2', 'pass'))
    expect([passed.stage, passed.findings]).toEqual(['tested', []])
    expect(after(pull, on('a'), on('b'), test('t1', 'pass'), test('t2', 'fail')).stage).toBe('terminated')
  })
  it('what is struck out does not count', () => {
    expect(after(pull, strike('pull', 'pull')).stage).toBe('planned')
    expect(after(on('a'), on('b'), strike('termination', 'on-b')).stage).toBe('one end on')
    expect(after(on('a'), on('b'), test('t1', 'pass'), test('t2', 'fail'), strike('test', 't2')).stage).toBe('tested')
  })
  it('printed while a print stands', () => {
    expect([after().printed, after(print).printed, after(print, strike('labelPrint', 'print')).printed]).toEqual([false, true, false])
  })
})

describe('progress', () => {
  const two = withRecords(
    smallHouse(), buildLevel({ id: 'l2', code: 'L2' }), buildRoom({ id: 'up', levelId: 'l2', code: 'UP', outline: rectangle(0, 0, 3000, 3000) }), buildPlate({ id: 'up1', roomId: 'up', jacks: [{ id: 'uj', position: 1, connector: 'speaker-pair' }] }),
    buildRun({ id: 'r2', serial: 2, label: 'UP1-S1', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'up1', jackId: 'uj' } }),
    buildRun({ id: 'r3', serial: 3, label: 'UP1-S2', a: { deviceId: 'sp1', terminal: 'p3' }, b: { plateId: 'up1', jackId: null } }),
  )
  it('counts each stage reached, by job, room and level of the field end', () => {
    const derived = derive([...two, pull, on('a'), on('b'), test('t', 'pass')])
    expect(derived.progress).toEqual({ total: 3, pulled: 1, terminated: 1, tested: 1 })
    expect(derived.progressOfRoom('pat')).toEqual({ total: 1, pulled: 1, terminated: 1, tested: 1 })
    expect(derived.progressOfRoom('up')).toEqual({ total: 2, pulled: 0, terminated: 0, tested: 0 })
    expect([derived.progressOfLevel('l1').total, derived.progressOfLevel('l2').total, derived.progressOfRoom('mch').total]).toEqual([1, 2, 0])
  })
  it('leaves out runs that are dropped, which keep their reason and have no findings', () => {
    const derived = derive(withRecords(two, changed(two, 'run', 'r3', { dropped: 'CO-2', b: null })))
    expect([derived.progress.total, derived.progressOfRoom('up').total, derived.runs.get('r3')!.dropped, derived.runs.get('r3')!.findings]).toEqual([2, 1, 'CO-2', []])
  })
})
