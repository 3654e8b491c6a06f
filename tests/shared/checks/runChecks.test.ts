import { describe, expect, it } from 'vitest'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildCableType, buildCord, buildDevice, buildJob, buildLevel, buildModel, buildPathway, buildPlate, buildRoom, buildRun, buildTerminal, rectangle, smallHouse } from '../../support/build.ts'
import { changed, derive, foundBy, withRecords } from '../../support/derivedHouse.ts'
import { atPlate, cables, models, wiredHouse } from '../../support/wiredHouse.ts'
import { defaultLimits } from '../../../shared/model/limits.ts'

const small = withRecords(smallHouse(), ...Object.values(cables), ...Object.values(models))
const wired = wiredHouse()
const sentences = (check: string, records: readonly JobRecord[]) => foundBy(check, records).map((finding) => [finding.severity, finding.aboutName, finding.sentence])

describe('data run length', () => {
  const at = (mm: number, ...more: JobRecord[]) => withRecords(wired, changed(wired, 'run', 'data', { statedLengthMm: mm }), ...more)
  it('says nothing up to the caution, cautions near the link’s 90 m, stops over it; both boundaries pass', () => {
    expect(sentences('dataLength', at(79_248))).toEqual([])
    expect(sentences('dataLength', at(80_000))).toEqual([['caution', 'STU1-D1', 'The run is 262 ft; the limit is 260 ft.']])
    expect(foundBy('dataLength', at(90_000))[0]!.severity).toBe('caution')
    expect(sentences('dataLength', at(90_001))).toEqual([['stop', 'STU1-D1', 'The run is 295 ft 3 3/8 in; the limit is 295 ft 3 5/16 in.']])
    expect(sentences('dataLength', at(108_204))).toEqual([['stop', 'STU1-D1', 'The run is 355 ft; the limit is 295 ft.']])
  })
  it('adds the cords at both ends for the channel’s 100 m', () => {
    const cords = (mm: number) => [changed(wired, 'cord', 'k-sw', { lengthMm: mm }), changed(wired, 'cord', 'k-desk', { lengthMm: 5000 })]
    // 88 m with 5 m and 7 m is 100 m exactly; one centimetre more is over.
    expect(foundBy('dataLength', at(88_000, ...cords(7000)))[0]!.severity).toBe('caution')
    expect(foundBy('dataLength', at(88_000, ...cords(7010)))[0]).toMatchObject({ severity: 'stop', figure: { value: 100_010 }, limit: { value: 100_000, setBy: 'default' } })
  })
  it('leaves twisted pair alone that a keypad or a sensor says it is for', () => {
    const keypad = buildModel({ id: 'm-pc', category: 'keypad', terminals: [buildTerminal({ key: 'net', signal: 'control', connector: 'modular' })] })
    expect(foundBy('dataLength', at(150_000, keypad))).toEqual([])
  })
  it('judges by the job’s own limit and says whose it is', () => {
    const job = buildJob({ limits: { ...defaultLimits, dataLinkMm: 60_000, dataLinkCautionMm: 50_000 } })
    expect(foundBy('dataLength', at(61_000, job))[0]).toMatchObject({ severity: 'stop', limit: { setBy: 'job' } })
  })
})

describe('video link reach', () => {
  const link = (ratings: object) => buildModel({ id: 'm-tx', name: 'Sender', category: 'extender', terminals: [buildTerminal({ key: 'link', name: 'Link', signal: 'video-link', direction: 'out', connector: 'modular', ratings })] })
  const at = (mm: number, ratings: object, set: object = {}, cable: object = {}) =>
    withRecords(
      wired, link(ratings), { ...buildDevice({ id: 'tx', modelId: 'm-tx', unit: 20, name: 'Sender', code: 'TX' }), ...set }, buildCableType({ ...cables.cat6, ...cable }),
      changed(wired, 'run', 'data', { statedLengthMm: mm }), changed(wired, 'cord', 'k-sw', { b: { deviceId: 'tx', terminal: 'link' } }), buildPlate({ id: 'stu1', roomId: 'stu', wall: 2, alongMm: 1500, jacks: [{ id: 'sj1', position: 1, connector: 'modular' }] }),
    ).filter((record) => record.id !== 'k-desk')
  it('holds the model’s stated reach by category', () => {
    const ratings = { linkClass: 'uncompressed-10g', reachM: { '6': 55, '6A': 100 } }
    // The cord to the sender is 1 m, and counts.
    expect(sentences('videoReach', at(54_000, ratings))).toEqual([])
    expect(sentences('videoReach', at(54_500, ratings))).toEqual([['stop', 'STU1-D1', 'Sender reaches 180 ft on category 6; this run is 182 ft with its cords.']])
    expect(sentences('videoReach', at(60_000, ratings, {}, { category: '6A' }))).toEqual([])
  })
  it('does not let a model go on a category it states nothing for', () => {
    expect(sentences('videoReach', at(20_000, { linkClass: 'uncompressed-10g', reachM: { '6A': 100 } }))).toEqual([['stop', 'STU1-D1', 'Sender cannot carry its picture over category 6.']])
  })
  it('goes by the format where the model states nothing: 100 m at 1080p60, 70 m at 2160p30 on category 6, 100 m on 6A', () => {
    const format = (videoFormat: string, mm: number, category = '6') => sentences('videoReach', at(mm, { linkClass: 'passive-balun' }, { videoFormat }, { category })).length
    // 148.5 MHz is under 225; 297 MHz is over it.
    expect([format('1080p60', 99_000), format('2160p30', 69_000), format('2160p30', 69_500), format('2160p60-420', 69_500), format('2160p30', 99_000, '6A'), format('1080p60', 99_500)]).toEqual([0, 0, 1, 1, 0, 1])
  })
  it('stops a format that no link without compression carries', () => {
    expect(sentences('videoReach', at(10_000, {}, { videoFormat: '2160p60' }))).toEqual([['stop', 'STU1-D1', 'Sender cannot carry 2160p60 over category 6.']])
  })
  it('says that the reach is not known rather than guess', () => {
    expect(sentences('videoReach', at(10_000, {}))).toEqual([['note', 'STU1-D1', 'How far Sender reaches on category 6 is not known.']])
  })
})

describe('jacket and space', () => {
  const inRoom = (spaceClass: string, cable: object, occupancy: 'one or two family' | 'multifamily' | 'other' = 'other') =>
    withRecords(small, buildRoom({ spaceClass: spaceClass as 'plenum' }), buildCableType({ ...cables.sixteen, ...cable }), buildJob({ limits: { ...defaultLimits, occupancy } }))
  const wrong = (...args: Parameters<typeof inRoom>) => sentences('jacketSpace', inRoom(...args)).map((each) => each[2])
  it('a riser jacket fails in a plenum, a plenum one does not', () => {
    expect(wrong('plenum', { jacketRating: 'CL3R' })).toEqual(['16/2 is marked CL3R, and Patio is a space that carries air: plenum marking needed.'])
    expect(wrong('plenum', { jacketRating: 'CL3P' })).toEqual([])
  })
  it('asks wet, outdoor and buried places for the maker’s word', () => {
    expect(wrong('wet', {})).toEqual(['16/2 is marked CL3R, and Patio is wet: wet rating needed.'])
    expect(wrong('outdoor', {})[0]).toContain('outdoor rating needed')
    expect(wrong('buried', { outdoor: true, wet: true })[0]).toContain('burial rating needed')
    expect(wrong('outdoor', { outdoor: true })).toEqual([])
  })
  it('asks an ordinary room for some listing only, and lets outdoor cable in', () => {
    expect(wrong('general', { jacketRating: 'CL3X' })).toEqual([])
    expect(wrong('general', { jacketRating: 'none' })).toEqual(['16/2 is marked with nothing, and Mechanical is an ordinary room: not listed.'])
    expect(wrong('general', { jacketRating: 'none', outdoor: true })).toEqual([])
  })
  it('wants a riser marking between levels, but not in a dwelling for one or two families', () => {
    const between = (occupancy: 'one or two family' | 'multifamily', ...more: JobRecord[]) =>
      sentences('jacketSpace', withRecords(wired, buildCableType({ ...cables.cat6, jacketRating: 'CM' }), buildJob({ limits: { ...defaultLimits, occupancy } }), ...more)).map((each) => each[2])
    expect(between('one or two family')).toEqual([])
    expect(between('multifamily')).toEqual(['CAT6 is marked CM, and Chase A is a way between floors: riser marking needed.'])
    // Without a chase it still goes through the floor.
    const noChase = withRecords(wired, buildCableType({ ...cables.cat6, jacketRating: 'CM' }), buildJob({ limits: { ...defaultLimits, occupancy: 'multifamily' } })).filter((record) => record.kind !== 'pathway')
    expect(sentences('jacketSpace', noChase).map((each) => each[2])).toEqual(['CAT6 is marked CM, and the way from Level 1 to Level 2 is a way between floors: riser marking needed.'])
  })
  it('does not take the grounds for a storey', () => {
    const outside = withRecords(wired, buildLevel({ id: 'l2', name: 'Grounds', code: 'OUT', use: 'outside' }), buildCableType({ ...cables.cat6, jacketRating: 'CM' }), buildJob({ limits: { ...defaultLimits, occupancy: 'other' } }))
    expect(sentences('jacketSpace', outside)).toEqual([])
  })
  it('offers a cable of the same make-up that may lie in every space the run passes', () => {
    const plenum = buildCableType({ ...cables.cat6, id: 'c-cat6-p', code: 'CAT6-P', jacketRating: 'CMP' })
    const records = withRecords(wired, buildCableType({ ...cables.cat6, jacketRating: 'CM' }), plenum, buildCableType({ ...cables.cat6, id: 'c-cat6-a', code: 'CAT6-R', jacketRating: 'CMR' }), buildRoom({ id: 'stu', levelId: 'l2', name: 'Study', code: 'STU', outline: rectangle(0, 0, 4000, 4000), spaceClass: 'plenum' }), buildJob({ limits: { ...defaultLimits, occupancy: 'other' } }))
    expect(foundBy('jacketSpace', records)[0]).toMatchObject({ severity: 'stop', tier: 'code', remedy: { label: 'Change to CAT6-P', intent: { args: { ids: ['data'], cableTypeId: 'c-cat6-p' } } } })
  })
})

describe('ports and jacks', () => {
  const second = (over: object) => buildRun({ id: 'r2', serial: 2, label: 'PAT1-S2', b: null, ...over })
  it('one port used twice is said once, of the later run, and offers the next free one', () => {
    const records = withRecords(small, second({}))
    const [finding, ...more] = foundBy('portUse', records)
    expect(more).toEqual([])
    expect(finding).toMatchObject({
      severity: 'stop', about: { kind: 'run', id: 'r2' }, sentence: 'Two runs land on SP1-01: PAT1-S1 and PAT1-S2.', advice: 'The next free one is SP1-02.',
      remedy: { label: 'Move to SP1-02', intent: { verb: 'run.setEnd', args: { id: 'r2', end: 'a', to: { deviceId: 'sp1', terminal: 'p2' } } } },
    })
  })
  it('skips ports that are taken, and begins again at the first', () => {
    const full = Array.from({ length: 10 }, (_, i) => buildRun({ id: `f${i}`, serial: 10 + i, label: `F${i}`, a: { deviceId: 'sp1', terminal: `p${i + 3}` }, b: null }))
    expect(foundBy('portUse', withRecords(small, second({ a: { deviceId: 'sp1', terminal: 'p12' } }), ...full))[0]!.remedy!.label).toBe('Move to SP1-02')
  })
  it('a jack used twice offers a free jack of its kind, or none', () => {
    const twice = second({ a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat1', jackId: 'j1' } })
    expect(foundBy('portUse', withRecords(small, twice))[0]).toMatchObject({ sentence: 'Two runs land on PAT1 jack 1: PAT1-S1 and PAT1-S2.', remedy: null, advice: 'No other one is free there: add a panel or a jack.' })
    const three = buildPlate({ jacks: [{ id: 'j1', position: 1, connector: 'speaker-pair' }, { id: 'j2', position: 2, connector: 'modular' }, { id: 'j3', position: 3, connector: 'speaker-pair' }] })
    expect(foundBy('portUse', withRecords(small, three, twice))[0]!.remedy!.label).toBe('Move to PAT1 jack 3')
  })
  it('counts neither dropped runs nor ends without a jack', () => {
    expect(foundBy('portUse', withRecords(small, second({ dropped: 'CO-2' })))).toEqual([])
    expect(foundBy('portUse', withRecords(small, second({ a: { deviceId: 'sp1', terminal: null }, b: { plateId: 'pat1', jackId: null } })))).toEqual([])
  })
  it('two cords in one front, and a cord beside a run on a device’s terminal', () => {
    const cord = (id: string, over: object = {}) => buildCord({ id, a: { deviceId: 'sp1', terminal: 'p1' }, b: { deviceId: 'amp', terminal: `ch${id.slice(1)}` }, ...over })
    const amp = buildDevice({ id: 'amp', modelId: 'm-amp', unit: 10, name: 'Amp A', code: 'AMPA' })
    expect(foundBy('cordUse', withRecords(small, amp, cord('k1')))).toEqual([])
    expect(foundBy('cordUse', withRecords(small, amp, cord('k1'), cord('k2')))[0]).toMatchObject({ severity: 'stop', sentence: '2 cords are plugged into SP1-01.' })
    const onAmp = buildRun({ id: 'r2', serial: 2, label: 'PAT1-S2', a: { deviceId: 'amp', terminal: 'ch1' }, b: null })
    expect(foundBy('cordUse', withRecords(small, amp, cord('k1'), onAmp))[0]!.sentence).toBe('Amp A, Channel 1 has a cord and the run PAT1-S2 as well.')
  })
})

describe('labels, ends and lengths', () => {
  it('two runs with one label: the printed one keeps it, the other is labelled anew', () => {
    const twin = buildRun({ id: 'r2', serial: 2, label: 'pat1-s1', a: { deviceId: 'sp1', terminal: 'p2' }, b: null })
    expect(foundBy('labelUse', withRecords(small, twin))[0]).toMatchObject({ severity: 'stop', about: { id: 'r2' }, sentence: '2 runs are labelled pat1-s1.', remedy: { intent: { verb: 'run.relabel', args: { ids: ['r2'] } } } })
    const print: JobRecord = { kind: 'labelPrint', id: 'p', at: '2026-12-01T10:00:00.000Z', byId: 'lead', runId: 'r2', end: 'a', text: 'PAT1-S1', copies: 2, stock: 's' }
    expect(foundBy('labelUse', withRecords(small, twin, print))[0]!.about.id).toBe('r1')
    expect(foundBy('labelUse', withRecords(small, twin, print, { ...print, id: 'p2', runId: 'r1' }))[0]).toMatchObject({ about: { id: 'r2' }, remedy: null })
  })
  it('a run without an end, and one without a length', () => {
    expect(sentences('runEnds', withRecords(small, changed(small, 'run', 'r1', { b: null })))).toEqual([['caution', 'PAT1-S1', 'This run has no end b yet.']])
    expect(sentences('runEnds', withRecords(small, changed(small, 'run', 'r1', { a: null, b: null })))).toEqual([['caution', 'PAT1-S1', 'This run has no end yet.']])
    expect(sentences('runEnds', withRecords(small, buildPlate({ mounting: 'floor', wall: null, alongMm: null, at: null })))).toEqual([['note', 'PAT1-S1', 'No length drawn: at end b, PAT1 has no position in Patio.']])
  })
  const pulled = (markA: number, markB: number, markUnit: 'ft' | 'm' = 'ft'): JobRecord => ({ kind: 'pull', id: 'p', at: '2026-12-01T10:00:00.000Z', byId: 'lead', runId: 'r1', markA, markB, markUnit, spool: null })
  const marks = (...args: Parameters<typeof pulled>) => foundBy('pulledLength', withRecords(small, pulled(...args))).map((finding) => [finding.severity, finding.sentence.split(':')[0]])
  it('believes marks near the drawing: 65 ft are drawn', () => {
    expect([marks(1000, 1065), marks(1065, 1000), marks(99_960, 25)]).toEqual([[], [], []])
  })
  it('notes marks far from the drawing, and cautions of those that cannot be', () => {
    // Drawn 65 ft, 55 ft without slack; the spool holds 500 ft; twice the drawing and 15 m more is past 130 ft.
    expect(marks(1000, 1040)).toEqual([['note', 'The jacket marks give less cable than the way is long']])
    expect(marks(1000, 1140)).toEqual([['note', 'The jacket marks give far more cable than the way is long']])
    expect(marks(1000, 1000)).toEqual([['caution', 'Both jacket marks are the same']])
    expect(marks(1000, 5000)).toEqual([['caution', 'The jacket marks give more cable than its spool holds']])
  })
  it('a run longer than any put-up is not one piece', () => {
    const at = (mm: number) => withRecords(small, changed(small, 'run', 'r1', { statedLengthMm: mm }))
    expect(foundBy('lengthDoubt', at(152_400))).toEqual([])
    expect(sentences('lengthDoubt', at(160_020))).toEqual([['caution', 'PAT1-S1', 'This run is 525 ft, and 16/2 is sold in 500 ft at most.']])
    expect(foundBy('lengthDoubt', [...at(160_020), pulled(0, 65)])).toEqual([])
  })
  it('a stated length of less than half the way is doubted', () => {
    // Rise, along and drop are 1,409 + 13,000 + 2,343 = 16,752 mm: half is 8,376.
    const at = (mm: number) => sentences('lengthDoubt', withRecords(small, changed(small, 'run', 'r1', { statedLengthMm: mm })))
    expect(at(8376)).toEqual([])
    expect(at(8300)).toEqual([['note', 'PAT1-S1', '27 ft is stated, and the drawn way is 55 ft without slack.']])
  })
})

describe('signal and direction', () => {
  const run = (over: object, ...more: JobRecord[]) => sentences('signalMatch', withRecords(small, ...more, buildRun(over))).map((each) => each[2])
  it('cable that does not fit a jack or a port, at either end', () => {
    const modular = buildPlate({ jacks: [{ id: 'j1', position: 1, connector: 'modular' }] })
    expect(run({}, modular)).toEqual(['16/2 does not belong on PAT1 jack 1, which takes twisted pair.'])
    expect(run({ cableTypeId: 'c-cat6', b: null })).toEqual(['CAT6 does not belong on SP1-01, which takes a loudspeaker signal.'])
    expect(run({})).toEqual([])
  })
  it('an output joined to an output, and terminals of two signals, also beyond cords', () => {
    const amps = [buildDevice({ id: 'amp', modelId: 'm-amp', unit: 10, name: 'Amp A', code: 'AMPA' }), buildDevice({ id: 'amp2', modelId: 'm-amp', unit: 6, name: 'Amp B', code: 'AMPB' })]
    expect(run({ a: { deviceId: 'amp', terminal: 'ch1' }, b: { deviceId: 'amp2', terminal: 'ch2' } }, ...amps)).toEqual(['Amp A, channel 1, and Amp B, channel 2 both give out.'])
    const line = atPlate('s70', 'm-spk70', 'pat1')
    const cord = buildCord({ a: { deviceId: 'sp1', terminal: 'p1' }, b: { deviceId: 'amp', terminal: 'ch1' } })
    expect(run({ b: { deviceId: 's70', terminal: 'in' } }, ...amps, line, cord)).toEqual(['Amp A, channel 1, carries a loudspeaker signal; s70, line in, carries a constant-voltage line.'])
  })
  it('cords between devices are held to the same', () => {
    const amp = buildDevice({ id: 'amp', modelId: 'm-amp', unit: 10, name: 'Amp A', code: 'AMPA' })
    const cord = (b: { deviceId: string; terminal: string }) => sentences('cordMatch', withRecords(small, amp, atPlate('s1', 'm-spk', 'pat1'), atPlate('desk', 'm-pc', 'pat1'), buildCord({ a: { deviceId: 'amp', terminal: 'ch1' }, b }))).map((each) => each[2])
    expect(cord({ deviceId: 's1', terminal: 'in' })).toEqual([])
    expect(cord({ deviceId: 's1', terminal: 'thru' })).toEqual(['Amp A, channel 1, and s1, on to the next both give out.'])
    expect(cord({ deviceId: 'desk', terminal: 'net' })).toEqual(['Amp A, channel 1, carries a loudspeaker signal; desk, network, carries network.'])
  })
})

describe('a clean house gives none', () => {
  // The pair behind the control loses 0.83 dB: inside a line of 1 dB.
  const clean = withRecords(wired, buildJob({ limits: { ...defaultLimits, speakerLossCaution: 1, speakerLossStop: 2 } }))
  it('the wired house', () => {
    expect(derive(clean).findings).toEqual([])
  })
  it('nor does a dropped run that is wrong in every way', () => {
    expect(derive(withRecords(clean, changed(wired, 'run', 'data', { dropped: 'CO-2', b: null, statedLengthMm: 500_000 }), buildPathway())).findings).toEqual([])
  })
})
