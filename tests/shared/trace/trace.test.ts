import { describe, expect, it } from 'vitest'
import type { JobRecord } from '../../../shared/model/record.ts'
import { findByText } from '../../../shared/trace/findByText.ts'
import { runsFrom, traceOf, type TraceStart, type TraceStop } from '../../../shared/trace/traceOf.ts'
import { buildCord, buildDevice, buildPlate, buildRun } from '../../support/build.ts'
import { changed, derive, withRecords } from '../../support/derivedHouse.ts'
import { atPlate, wiredHouse } from '../../support/wiredHouse.ts'

const wired = wiredHouse()
const words = (stops: readonly TraceStop[]): unknown[] => stops.map((stop) => (stop.branches ? [stop.title, ...stop.branches.map(words)] : stop.title))
const way = (records: readonly JobRecord[], start: string | TraceStart) => words(traceOf(derive(records), start)?.stops ?? [])

describe('the whole way of a wire', () => {
  it('from the device at the jack to the switch port: cord, plate, run, panel port, cord', () => {
    expect(way(wired, 'data')).toEqual(['desk', 'patch cord, 3 ft', 'STU1', 'STU1-D1', 'PP1-01', 'patch cord, 3 ft', 'Switch, port 1'])
  })
  it('lights the jack and the port, and says the cable, its jacket, length and stage', () => {
    const { stops } = traceOf(derive(wired), 'data')!
    expect(stops.find((stop) => stop.kind === 'plate')).toMatchObject({ jackId: 'sj1', lines: ['Study, south wall', '1 ft 3 3/4 in up, to the center', 'jack 1 of 2'] })
    expect(stops.find((stop) => stop.kind === 'port')!.ports!.filter((port) => port.lit)).toEqual([{ position: 1, connector: 'modular', lit: true, used: true }])
    expect(stops.find((stop) => stop.kind === 'run')!.lines).toEqual(['CAT6, white jacket, planned', '68 ft drawn'])
  })
  it('goes on through a volume control to both speakers, and back from each to the amplifier’s channel and zone', () => {
    expect(way(wired, 'home')).toEqual([['2 ways on', ['left', 'PAT2-S1'], ['right', 'PAT3-S1']], 'vol', 'PAT1-S1', 'SP1-01', 'patch cord, 3 ft', 'Amp A, channel 1'])
    expect(way(wired, 'to-right')).toEqual(['right', 'PAT3-S1', 'vol', 'PAT1-S1', 'SP1-01', 'patch cord, 3 ft', 'Amp A, channel 1'])
    expect(traceOf(derive(wired), 'to-right')!.stops.at(-1)!.lines).toEqual(['zone Patio', 'Mechanical'])
  })
  it('follows a 70 V line over its hops, from either leg', () => {
    const all = ['bar-b', 'BAR2-S1', 'bar-a', 'BAR1-S1', '70 V amplifier, channel 1']
    expect([way(wired, 'line'), way(wired, 'hop')]).toEqual([all, all])
    expect(traceOf(derive(wired), 'line')!.stops[0]!.lines).toEqual(['line in', 'tap 15 W', 'Bar'])
  })
  it('says what is missing: a cord, a port, an end', () => {
    expect(way(wired.filter((record) => record.id !== 'k-sw'), 'data').slice(-2)).toEqual(['PP1-01', 'no cord from PP1-01 yet'])
    expect(way(withRecords(wired, changed(wired, 'run', 'data', { a: { rackId: 'rk1' } })), 'data').slice(-2)).toEqual(['Rack 1', 'STU1-D1 lands on no port yet'])
    expect(way(withRecords(wired, changed(wired, 'run', 'data', { b: null })), 'data')[0]).toBe('STU1-D1 has no end there yet')
    expect(way(withRecords(wired, changed(wired, 'run', 'data', { b: { plateId: 'stu1', jackId: 'sj2' } })).filter((record) => record.id !== 'k-desk' && record.id !== 'desk'), 'data')[0]).toBe('no cord from STU1 jack 2 yet')
  })
  it('a device at the plate without a cord is a guess, and one that is corded elsewhere is none', () => {
    const uncorded = wired.filter((record) => record.id !== 'k-desk')
    const [desk] = traceOf(derive(uncorded), 'data')!.stops
    expect(desk).toMatchObject({ title: 'desk', known: 'guess' })
    expect(desk!.lines).toContain('no cord drawn; it stands at this plate')
    const other = buildRun({ id: 'data2', serial: 7, label: 'STU1-D2', cableTypeId: 'c-cat6', a: { deviceId: 'pp1', terminal: 'p2' }, b: { plateId: 'stu1', jackId: 'sj2' } })
    expect(way([...wired, other], 'data2')[0]).toBe('no cord from STU1 jack 2 yet')
    // Two runs without cords share two devices out by position.
    const two = [...uncorded, other, atPlate('desk2', 'm-pc', 'stu1')]
    expect([way(two, 'data')[0], way(two, 'data2')[0]]).toEqual(['desk', 'desk2'])
  })
  it('says how each is known: drawn, pulled, tested', () => {
    const said = { at: '2026-12-01T10:00:00.000Z', byId: 'lead', runId: 'data' }
    const pull: JobRecord = { kind: 'pull', id: 'p', ...said, markA: 99_990, markB: 60, markUnit: 'ft', spool: 'D6-04' }
    const on = (end: 'a' | 'b'): JobRecord => ({ kind: 'termination', id: end, ...said, end, scheme: 'T568B' })
    const test: JobRecord = { kind: 'test', id: 't', ...said, testKind: 'wire map', result: 'pass', reading: '' }
    const known = (...records: JobRecord[]) => traceOf(derive([...wired, ...records]), 'data')!.stops.filter((stop) => ['run', 'plate', 'port'].includes(stop.kind)).map((stop) => stop.known)
    expect([known(), known(pull), known(pull, on('a'), on('b')), known(pull, on('a'), on('b'), test)]).toEqual([['drawn', 'drawn', 'drawn'], ['pulled', 'pulled', 'pulled'], ['pulled', 'pulled', 'pulled'], ['tested', 'tested', 'tested']])
    expect(traceOf(derive([...wired, pull, on('b')]), 'data')!.stops.find((stop) => stop.kind === 'run')!.lines).toEqual(['CAT6, white jacket, one end on', '70 ft pulled', 'marks 99990 to 60 ft, spool D6-04'])
  })
  it('does not go round in circles', () => {
    const loop = [...wired, buildRun({ id: 'back', serial: 9, label: 'X', a: { deviceId: 'bar-b', terminal: 'thru' }, b: { deviceId: 'bar-a', terminal: 'in' } })]
    expect(way(loop, 'line').length).toBeLessThan(12)
    const cords = [...wired, buildCord({ id: 'k2', a: { deviceId: 'sw1', terminal: 'p1' }, b: { deviceId: 'pp1', terminal: 'p1' } })]
    expect(way(cords, 'data').length).toBeLessThan(12)
  })
})

describe('where a trace may start', () => {
  const from = (start: TraceStart) => runsFrom(derive(wired).doc, start).map((run) => run.id)
  it('a run, a plate or one of its jacks, a port, a terminal', () => {
    expect(from({ runId: 'data' })).toEqual(['data'])
    expect(from({ plateId: 'stu1' })).toEqual(['data'])
    expect([from({ plateId: 'stu1', jackId: 'sj1' }), from({ plateId: 'stu1', jackId: 'sj2' })]).toEqual([['data'], []])
    expect(from({ plateId: 'pat1' })).toEqual(['home', 'to-left', 'to-right'])
    expect(from({ deviceId: 'pp1', terminal: 'p1' })).toEqual(['data'])
  })
  it('a terminal without a run of its own leads on over its cord', () => {
    expect(from({ deviceId: 'amp', terminal: 'ch1' })).toEqual(['home'])
    expect(from({ deviceId: 'desk', terminal: 'net' })).toEqual(['data'])
    expect(way(wired, { deviceId: 'sw1', terminal: 'p1' })).toEqual(way(wired, 'data'))
  })
  it('nothing there, nothing traced', () => {
    expect(traceOf(derive(wired), { deviceId: 'sw1', terminal: 'p7' })).toBeNull()
    expect(traceOf(derive(wired), 'gone')).toBeNull()
  })
})

describe('finding by a few typed characters', () => {
  const records = [
    ...wired, buildPlate({ id: 'pat12', number: 12, jacks: [] }), buildDevice({ id: 'sp2', modelId: 'm-sp', unit: 32, name: 'Speaker panel 2', code: 'SP2' }),
    buildRun({ id: 'far', serial: 10, label: 'PAT12-S1', purpose: 'Pool speaker', a: null, b: { plateId: 'pat12', jackId: null } }),
  ]
  const found = (text: string) => findByText(derive(records), text).map((each) => each.name)
  it('forgives case, spaces and hyphens', () => {
    for (const text of ['STU1-D1', 'stu1d1', 'stu1 d1', ' Stu 1-D-1 ']) expect(found(text)[0], text).toBe('STU1-D1')
  })
  it('puts the whole code first, then what begins so, shorter first', () => {
    expect(found('pat1').slice(0, 2)).toEqual(['PAT1', 'PAT12'])
    expect(found('pat1')).toContain('PAT1-S1')
    expect(found('PAT12')[0]).toBe('PAT12')
  })
  it('knows ports, rooms, devices and purposes', () => {
    expect(found('sp103')[0]).toBe('SP1-03')
    expect(found('study')).toContain('STU')
    expect(found('pool')).toContain('PAT12-S1')
    expect(findByText(derive(records), 'amp a')[0]).toMatchObject({ kind: 'device', id: 'amp' })
  })
  it('finds nothing for nothing, and never more than asked', () => {
    expect([found(''), found('  '), found('-'), found('zzzz')]).toEqual([[], [], [], []])
    expect(findByText(derive(records), 's', 5)).toHaveLength(5)
  })
})
