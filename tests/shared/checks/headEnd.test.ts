import { describe, expect, it } from 'vitest'
import { defaultLimits } from '../../../shared/model/limits.ts'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildCord, buildDevice, buildJob, buildPlate, buildRack, buildRoom, buildRun, rectangle, smallHouse } from '../../support/build.ts'
import { changed, foundBy, withRecords } from '../../support/derivedHouse.ts'
import { amplifier, atPlate, cables, models, wiredHouse } from '../../support/wiredHouse.ts'

const base = withRecords(smallHouse(), ...Object.values(cables), ...Object.values(models)).filter((record) => record.kind !== 'run')
const wired = wiredHouse()

/** A speaker in a room on its own plate, run to a port; `cord` to a channel of the amplifier. */
function speakerIn(room: string, n: number, over: { cable?: string; channel?: number; load?: number; device?: boolean } = {}): JobRecord[] {
  const plate = `${room}-p${n}`
  return [
    buildPlate({ id: plate, roomId: room, number: 50 + n, jacks: [{ id: `${plate}-j`, position: 1, connector: 'speaker-pair' }] }),
    ...(over.device === false ? [] : [{ ...atPlate(`${plate}-s`, 'm-spk', plate), loadOhm: over.load ?? null }]),
    buildRun({ id: `${plate}-r`, serial: n, label: `${room.toUpperCase()}${n}`, cableTypeId: over.cable ?? 'c-12-2', a: { deviceId: 'sp1', terminal: `p${n}` }, b: { plateId: plate, jackId: `${plate}-j` } }),
    ...(over.channel === undefined ? [] : [buildCord({ id: `${plate}-k`, a: { deviceId: 'sp1', terminal: `p${n}` }, b: { deviceId: 'amp', terminal: `ch${over.channel}` } })]),
  ]
}
const amp = buildDevice({ id: 'amp', modelId: 'm-amp', unit: 10, name: 'Amp A', code: 'AMPA' })
const den = buildRoom({ id: 'den', name: 'Den', code: 'DEN', outline: rectangle(0, 5000, 6000, 4000) })
const many = (room: string, count: number, from = 1, over: Parameters<typeof speakerIn>[2] = {}) => Array.from({ length: count }, (_, i) => speakerIn(room, from + i, over)).flat()
const sentences = (check: string, ...records: JobRecord[]) => foundBy(check, withRecords(base, ...records)).map((finding) => [finding.severity, finding.sentence])

describe('amplifier channels', () => {
  it('as many as there are pass; one more names what goes silent: the smaller room gives way', () => {
    expect(sentences('channelBudget', amp, den, ...many('den', 3), ...speakerIn('pat', 4))).toEqual([])
    expect(sentences('channelBudget', amp, den, ...many('den', 4), ...speakerIn('pat', 5))).toEqual([['stop', '5 speaker channels are wired to Mechanical, and its amplifiers have 4. Left silent: PAT5 (Patio).']])
  })
  it('in one room the run without a cord is the silent one', () => {
    expect(sentences('channelBudget', amp, ...many('pat', 1, 1), ...Array.from({ length: 4 }, (_, i) => speakerIn('pat', 2 + i, { channel: i + 1 })).flat())[0]![1]).toContain('Left silent: PAT1 (Patio).')
  })
  it('four conductors ask for two channels, also where no speaker is drawn yet', () => {
    expect(sentences('channelBudget', amp, ...many('pat', 2, 1, { cable: 'c-16-4' }))).toEqual([])
    expect(sentences('channelBudget', amp, ...many('pat', 2, 1, { cable: 'c-16-4' }), ...speakerIn('pat', 3, { device: false }))[0]![1]).toContain('5 speaker channels')
  })
  it('a constant-voltage line is one channel whatever hangs on it; hops and what comes after a volume control ask for none', () => {
    // In the wired house the 16/4 asks for two, the line for one, hop and legs for none: three of six.
    const three = withRecords(wired, amplifier('m-amp', 2), buildDevice({ ...amp, zones: {} }))
    expect(foundBy('channelBudget', three)).toEqual([])
    const two = three.filter((record) => record.id !== 'amp70')
    const line = withRecords(two, changed(two, 'run', 'line', { a: { deviceId: 'sp1', terminal: 'p2' } }))
    expect(foundBy('channelBudget', line)[0]).toMatchObject({ figure: { value: 3 }, limit: { value: 2 } })
  })
  it('claims nothing without an amplifier, nor for dropped runs or speaker cable that carries control', () => {
    expect(sentences('channelBudget', ...many('pat', 12))).toEqual([])
    expect(sentences('channelBudget', amp, ...many('pat', 4), changed(speakerIn('pat', 5), 'run', 'pat-p5-r', { dropped: 'CO-2' }), ...speakerIn('pat', 5).filter((record) => record.kind !== 'run'))).toEqual([])
    const trigger = buildPlate({ id: 'trig', roomId: 'pat', number: 99, jacks: [{ id: 'tj', position: 1, connector: 'control' }] })
    expect(sentences('channelBudget', amp, ...many('pat', 4), trigger, buildRun({ id: 'trig', serial: 60, label: 'T', a: { deviceId: 'sp1', terminal: 'p9' }, b: { plateId: 'trig', jackId: 'tj' } }))).toEqual([])
  })
  it('counts all racks of a room as one head end, and another room’s apart', () => {
    const second = [buildRack({ id: 'rk2', name: 'Rack 2', code: 'RK2', at: { xMm: 12_500, yMm: 2000 } }), buildDevice({ id: 'amp2', modelId: 'm-amp', rackId: 'rk2', unit: 4, name: 'Amp B', code: 'AMPB' })]
    expect(sentences('channelBudget', amp, ...second, ...many('pat', 8))).toEqual([])
    expect(sentences('channelBudget', amp, buildRoom({ id: 'far', name: 'Far', code: 'FAR' }), ...second.map((record) => (record.kind === 'rack' ? { ...record, roomId: 'far' } : record)), ...many('pat', 8))).toHaveLength(1)
  })
})

describe('load on an amplifier’s channel', () => {
  const two = (load: number) => [...speakerIn('pat', 1, { channel: 1, load }), ...speakerIn('pat', 2, { channel: 1, load })]
  it('4 ohm on a channel that may see 4 ohm passes; two of 6 ohm are 3 ohm and stop', () => {
    expect(sentences('amplifierLoad', amp, ...two(8))).toEqual([])
    expect(sentences('amplifierLoad', amp, ...two(6))).toEqual([['stop', 'Channel 1 of Amp A sees 3 ohm; it may see no less than 4 ohm.']])
    expect(foundBy('amplifierLoad', withRecords(base, amp, ...two(6)))[0]).toMatchObject({ aboutName: 'Amp A, Channel 1', basis: '1/Z = 1/6 ohm + 1/6 ohm', figure: { value: 3, text: '3 ohm' }, limit: { value: 4, setBy: 'source' } })
  })
  it('sees a run on its own terminal as well as one beyond a panel', () => {
    const direct = changed(speakerIn('pat', 2, { load: 6 }), 'run', 'pat-p2-r', { a: { deviceId: 'amp', terminal: 'ch1' } })
    expect(sentences('amplifierLoad', amp, ...speakerIn('pat', 1, { channel: 1, load: 6 }), ...speakerIn('pat', 2, { load: 6 }).filter((record) => record.kind !== 'run'), direct)).toHaveLength(1)
  })
})

describe('taps on a constant-voltage amplifier', () => {
  const tap = (bar: number, other = 15) => withRecords(wired, changed(wired, 'device', 'bar-a', { tapW: bar }), changed(wired, 'device', 'bar-b', { tapW: other }))
  it('the exact boundary of 80 % of 240 W passes, one watt more does not', () => {
    expect(foundBy('amplifierLoad', tap(177, 15))).toEqual([])
    expect(foundBy('amplifierLoad', tap(178, 15))[0]).toMatchObject({ severity: 'caution', figure: { text: '80.4 %' }, limit: { text: '80.0 %', setBy: 'default' }, sentence: 'Taps of 193 W on 70 V amplifier of 240 W are 80.4 %; the limit is 80.0 %.' })
  })
  it('takes the job’s own share', () => {
    const job = buildJob({ limits: { ...defaultLimits, lineLoadShare: 10 } })
    expect(foundBy('amplifierLoad', withRecords(tap(15), job))[0]).toMatchObject({ figure: { text: '13 %' }, limit: { text: '10 %', setBy: 'job' } })
  })
  it('a speaker left without a tap shorts the line', () => {
    const [finding] = foundBy('amplifierLoad', withRecords(wired, changed(wired, 'device', 'bar-b', { tapW: null })))
    expect(finding).toMatchObject({ severity: 'stop', aboutName: '70 V amplifier, Channel 1' })
    expect(finding!.sentence).toBe('bar-b has no tap chosen: on a constant-voltage line a speaker on its low impedance shorts the line.')
  })
})
