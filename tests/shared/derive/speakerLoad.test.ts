import { describe, expect, it } from 'vitest'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildCord, buildDevice, buildPlate, buildRun, smallHouse } from '../../support/build.ts'
import { changed, derive, withRecords } from '../../support/derivedHouse.ts'
import { atPlate, cables, models, speaker, wiredHouse } from '../../support/wiredHouse.ts'

const wired = wiredHouse()
const speakerOf = (records: readonly JobRecord[], id: string) => derive(records).runs.get(id)!.speaker

/** The small house with 16/2 of 13.17 ohm/km, 30 m stated, and speaker models. */
const small = (() => {
  const house = withRecords(smallHouse(), ...Object.values(cables), ...Object.values(models))
  return withRecords(house, changed(house, 'run', 'r1', { statedLengthMm: 30_000 }))
})()
const jacks = (count: number) => buildPlate({ jacks: Array.from({ length: count }, (_, i) => ({ id: `j${i + 1}`, position: i + 1, connector: 'speaker-pair' as const })) })

describe('the load as the amplifier sees it', () => {
  it('one speaker at the plate without a cord is taken to be on it, and that is said', () => {
    expect(speakerOf(withRecords(small, atPlate('s1', 'm-spk', 'pat1')), 'r1')).toMatchObject({ loadOhm: 8, loadText: '8 ohm', assumed: true, lineVoltageV: null })
  })
  it('with a cord it is known', () => {
    const records = withRecords(small, atPlate('s1', 'm-spk', 'pat1'), buildCord({ a: { plateId: 'pat1', jackId: 'j1' }, b: { deviceId: 's1', terminal: 'in' } }))
    expect(speakerOf(records, 'r1')).toMatchObject({ loadOhm: 8, assumed: false })
  })
  it('two on two conductors are in parallel unless the run says series', () => {
    const two = withRecords(small, atPlate('s1', 'm-spk', 'pat1'), atPlate('s2', 'm-spk', 'pat1'))
    expect(speakerOf(two, 'r1')).toMatchObject({ loadOhm: 4, loadText: 'two 8 ohm speakers in parallel, 4 ohm' })
    expect(speakerOf(withRecords(two, changed(two, 'run', 'r1', { loadJoin: 'series' })), 'r1')).toMatchObject({ loadOhm: 16, loadText: 'two 8 ohm speakers in series, 16 ohm' })
  })
  it('unlike ones: 1/(1/8 + 1/6) = 3.43 ohm', () => {
    const facts = speakerOf(withRecords(small, speaker('m-6', 6), atPlate('s1', 'm-spk', 'pat1'), atPlate('s2', 'm-6', 'pat1')), 'r1')
    expect(facts?.loadOhm).toBeCloseTo(3.4286, 4)
    expect(facts?.loadText).toBe('8 ohm and 6 ohm in parallel, 3.43 ohm')
  })
  it('four conductors are two loops: a pair of speakers is 8 ohm on each', () => {
    const two = withRecords(small, atPlate('s1', 'm-spk', 'pat1'), atPlate('s2', 'm-spk', 'pat1'))
    expect(speakerOf(withRecords(two, changed(two, 'run', 'r1', { cableTypeId: 'c-16-4' })), 'r1')).toMatchObject({ loadOhm: 8, loadText: '8 ohm' })
  })
  it('the device’s own load goes before its model’s', () => {
    expect(speakerOf(withRecords(small, { ...atPlate('s1', 'm-spk', 'pat1'), loadOhm: 6 }), 'r1')).toMatchObject({ loadOhm: 6 })
  })
  it('two runs without cords share the plate’s speakers out by the jacks’ positions', () => {
    const records = withRecords(small, jacks(2), atPlate('s1', 'm-spk', 'pat1'), atPlate('s2', 'm-spk', 'pat1'), buildRun({ id: 'r2', serial: 2, label: 'PAT1-S2', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat1', jackId: 'j2' }, statedLengthMm: 30_000 }))
    expect([speakerOf(records, 'r1')?.loadOhm, speakerOf(records, 'r2')?.loadOhm]).toEqual([8, 8])
  })
  it('a speaker that has a cord from another jack is not taken twice', () => {
    const records = withRecords(small, jacks(2), atPlate('s1', 'm-spk', 'pat1'), buildCord({ a: { plateId: 'pat1', jackId: 'j2' }, b: { deviceId: 's1', terminal: 'in' } }))
    expect(speakerOf(records, 'r1')).toBeNull()
  })
  it('reaches both speakers through a volume control, left and right on their own pairs', () => {
    expect(speakerOf(wired, 'home')).toMatchObject({ loadOhm: 8, assumed: false })
    // On two conductors both hang on one loop.
    expect(speakerOf(withRecords(wired, changed(wired, 'run', 'home', { cableTypeId: 'c-16-2' })), 'home')).toMatchObject({ loadOhm: 4 })
  })
  it('keeps the sides of a control apart: two in parallel left, one right', () => {
    const records = withRecords(
      wired, atPlate('left-b', 'm-spk', 'pat2'),
      buildRun({ id: 'on', serial: 7, label: 'PAT2-S2', a: { deviceId: 'left', terminal: 'thru' }, b: { deviceId: 'left-b', terminal: 'in' } }),
    )
    expect(speakerOf(records, 'home')).toMatchObject({ loadOhm: 4, loadText: 'two 8 ohm speakers in parallel, 4 ohm' })
    expect(speakerOf(records, 'to-right')).toMatchObject({ loadOhm: 8 })
  })
  it('does not go round in a loop of hops', () => {
    const loop = withRecords(wired, buildRun({ id: 'back', serial: 8, label: 'X', a: { deviceId: 'bar-b', terminal: 'thru' }, b: { deviceId: 'bar-a', terminal: 'in' } }))
    expect(speakerOf(loop, 'line')?.loadOhm).toBeCloseTo(5000 / 30, 6)
  })
  it('a dropped run feeds nothing on', () => {
    expect(speakerOf(withRecords(wired, changed(wired, 'run', 'hop', { dropped: 'CO-2' })), 'line')?.loadOhm).toBeCloseTo(5000 / 15, 6)
  })
})

describe('constant-voltage lines', () => {
  it('two 15 W taps on 70.7 V: 5000/30 = 166.7 ohm', () => {
    expect(speakerOf(wired, 'line')).toMatchObject({ lineVoltageV: Math.sqrt(5000), loadText: 'two taps, 30 W on 70.7 V' })
    expect(speakerOf(wired, 'line')?.loadOhm).toBeCloseTo(166.667, 3)
    expect(speakerOf(wired, 'hop')?.loadOhm).toBeCloseTo(333.333, 3)
  })
  it('the amplifier’s voltage counts: a 70.7 V tap of 15 W takes 30 W on 100 V, its impedance stays', () => {
    const amplifier = wired.find((record) => record.kind === 'deviceModel' && record.id === 'm-amp70') as typeof models.lineAmplifier
    const hundred = { ...amplifier, terminals: amplifier.terminals.map((each) => ({ ...each, ratings: { lineVoltageV: 100 } })) }
    const facts = speakerOf(withRecords(wired, hundred), 'line')
    expect(facts).toMatchObject({ lineVoltageV: 100, loadText: 'two taps, 60 W on 100 V' })
    expect(facts?.loadOhm).toBeCloseTo(166.667, 3)
  })
  it('a hop asks the amplifier beyond the speaker before it', () => {
    const plain = { ...models.lineSpeaker, terminals: models.lineSpeaker.terminals.map((each) => ({ ...each, ratings: { loadOhm: 8 } })) }
    expect(speakerOf(withRecords(wired, plain), 'hop')).toMatchObject({ lineVoltageV: Math.sqrt(5000) })
  })
  it('says that the voltage is missing where nothing tells it', () => {
    const plain = { ...models.lineSpeaker, terminals: models.lineSpeaker.terminals.map((each) => ({ ...each, ratings: { loadOhm: 8 } })) }
    const records = withRecords(wired, plain, { ...models.lineAmplifier, terminals: models.lineAmplifier.terminals.map((each) => ({ ...each, ratings: {} })) })
    const { speaker: facts, findings } = derive(records).runs.get('line')!
    expect(facts).toBeNull()
    expect(findings.map((finding) => finding.sentence)).toEqual(['The loss of this run is not worked out: the line voltage of bar-a is not known.'])
  })
})

describe('what a run loses', () => {
  const lengths = withRecords(wired, changed(wired, 'run', 'home', { statedLengthMm: 30_000 }), changed(wired, 'run', 'to-left', { statedLengthMm: 10_000 }), changed(wired, 'run', 'to-right', { statedLengthMm: 20_000 }), changed(wired, 'run', 'line', { statedLengthMm: 50_000 }), changed(wired, 'run', 'hop', { statedLengthMm: 50_000 }))
  it('is the loop over the load, in four figures: 2 x 30 m x 13.17 ohm/km into 8 ohm', () => {
    const facts = speakerOf(withRecords(small, atPlate('s1', 'm-spk', 'pat1')), 'r1')!
    // Rc = 0.7902 ohm, x = 0.098775: 20 log 1.098775 = 0.8182 dB; x/(1 + x) = 8.990 %; 1 - 1/1.098775² = 17.17 %.
    expect(facts.loopResistanceOhm).toBeCloseTo(0.7902, 4)
    expect(facts.impedancePercent).toBeCloseTo(9.8775, 4)
    expect(facts.lossDb).toBeCloseTo(0.8182, 4)
    expect(facts.voltagePercent).toBeCloseTo(8.9896, 3)
    expect(facts.powerPercent).toBeCloseTo(17.1711, 3)
    expect(facts.withLegs).toBeNull()
  })
  it('with the legs after a volume control: 0.7902 and 0.5268 ohm into 8 ohm', () => {
    const facts = speakerOf(lengths, 'home')!
    expect(facts.impedancePercent).toBeCloseTo(9.8775, 4)
    expect(facts.withLegs?.impedancePercent).toBeCloseTo((100 * (0.7902 + 0.5268)) / 8, 3)
    expect(facts.withLegs?.lossDb).toBeCloseTo(20 * Math.log10(1 + 1.317 / 8), 4)
  })
  it('with the hop of a 70 V line, worked back from its end', () => {
    // Each leg 1.317 ohm, each tap 333.33 ohm. Behind the first: 333.33 and 334.65 in parallel, 166.996 ohm.
    // (1 + 1.317/166.996)(1 + 1.317/333.33) - 1 = 1.1869 %; the home run by itself 1.317/166.667 = 0.790 %.
    const facts = speakerOf(lengths, 'line')!
    expect(facts.impedancePercent).toBeCloseTo(0.7902, 3)
    expect(facts.withLegs?.impedancePercent).toBeCloseTo(1.1869, 3)
  })
  it('in series one current goes through every leg', () => {
    const records = withRecords(lengths, changed(lengths, 'run', 'home', { cableTypeId: 'c-16-2', loadJoin: 'series', statedLengthMm: 30_000 }))
    // (0.7902 + 0.2634 + 0.5268) ohm into 16 ohm.
    const facts = speakerOf(records, 'home')!
    expect(facts.loadOhm).toBe(16)
    expect(facts.withLegs?.impedancePercent).toBeCloseTo((100 * 1.5804) / 16, 3)
  })
  it('names legs that have no length, and leaves them out', () => {
    const records = withRecords(lengths, changed(lengths, 'run', 'to-right', { statedLengthMm: null }), buildDevice({ ...atPlate('right', 'm-spk', 'pat3'), plateId: null, roomId: 'pat', at: null }))
    expect(speakerOf(records, 'home')).toMatchObject({ uncounted: ['PAT3-S1'] })
  })
  it('is warmer at 50 °C: 11.8 % more (0.00393 a kelvin)', () => {
    const job = records50()
    const [cold, warm] = [speakerOf(withRecords(small, atPlate('s1', 'm-spk', 'pat1')), 'r1')!, speakerOf(job, 'r1')!]
    expect(warm.loopResistanceOhm / cold.loopResistanceOhm).toBeCloseTo(1.1179, 4)
  })
})

function records50(): JobRecord[] {
  const records = withRecords(small, atPlate('s1', 'm-spk', 'pat1'))
  const job = records.find((record) => record.kind === 'job')!
  return withRecords(records, { ...job, limits: { ...job.limits, conductorTemperatureC: 50 } })
}
