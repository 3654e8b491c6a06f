import { describe, expect, it } from 'vitest'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildDevice, buildLevel, buildPathway, buildPlate, buildRoom, buildRun, rectangle, smallHouse } from '../../support/build.ts'
import { changed, derive, withRecords } from '../../support/derivedHouse.ts'
import { wiredHouse } from '../../support/wiredHouse.ts'

const said = { at: '2026-12-01T10:00:00.000Z', byId: 'lead' }
const lengthOf = (records: readonly JobRecord[], id: string) => derive(records).runs.get(id)!
const house = smallHouse()
const wired = wiredHouse()

describe('drawn length: rise at end a, way along the framing, drop at end b, slack at both', () => {
  it('goes over the ceiling of a living level', () => {
    // Port at unit 30 of a rack on the floor: 30 x 44.45 = 1,334 mm up; the ceiling is at 2,743.
    // Rise 2,743 - 1,334 = 1,409; along |12,000 - 1,000| + |2,000 - 0| = 13,000; drop 2,743 - 400 = 2,343; slack 2,134 + 914.
    expect(lengthOf(house, 'r1').length).toEqual({
      basis: 'drawn', totalMm: 19_800,
      drawn: { riseMm: 1409, alongMm: 13_000, dropMm: 2343, slackAMm: 2134, slackBMm: 914, totalMm: 19_800, pathwayIds: [], way: ['rack', 'Level 1 ceiling', 'Patio'] },
    })
  })
  it('goes under the floor where the run says so', () => {
    // 1,334 down at the rack, 13,000 along, 400 down at the plate, slack 3,048.
    const { length } = lengthOf(withRecords(house, changed(house, 'run', 'r1', { route: 'underfloor' })), 'r1')
    expect(length).toMatchObject({ totalMm: 17_782, drawn: { riseMm: 1334, dropMm: 400, way: ['rack', 'Level 1 floor', 'Patio'] } })
  })
  it('lies on the floor of an attic and on the ground outside, under the ceiling of a crawl space', () => {
    // A plate 600 mm up, ceiling at 1,500: down to the floor 600, up to the ceiling 900.
    const on = (use: 'attic' | 'outside' | 'crawl') =>
      lengthOf(withRecords(house, changed(house, 'level', 'l1', { use, ceilingHeightMm: 1500 }), changed(house, 'plate', 'pat1', { heightMm: 600 })), 'r1').length!.drawn!.dropMm
    expect([on('attic'), on('outside'), on('crawl')]).toEqual([600, 600, 900])
  })
  it('takes the run’s own slack before the rule for a rack or a plate', () => {
    const { length } = lengthOf(withRecords(house, changed(house, 'run', 'r1', { slackAMm: 0, slackBMm: 3000 })), 'r1')
    expect(length).toMatchObject({ totalMm: 19_800 - 2134 - 914 + 3000, drawn: { slackAMm: 0, slackBMm: 3000 } })
  })
  it('takes an end at a rack whose port is open as half way up the rack', () => {
    // 42 units: 21 x 44.45 = 933 mm; rise 2,743 - 933 = 1,810.
    expect(lengthOf(withRecords(house, changed(house, 'run', 'r1', { a: { rackId: 'rk1' } })), 'r1').length?.drawn).toMatchObject({ riseMm: 1810, slackAMm: 2134 })
  })
  it('measures along a wall from its left end as one faces it from inside', () => {
    // South wall of a 6 x 4 m room: one faces south, so its left end is the east corner: 6,000 - 1,000 = 5,000, y 4,000.
    // |12,000 - 5,000| + |2,000 - 4,000| = 9,000.
    expect(lengthOf(withRecords(house, changed(house, 'plate', 'pat1', { wall: 2 })), 'r1').length?.drawn?.alongMm).toBe(9000)
  })
  it('stops at the wall’s end where a plate is said to be past it', () => {
    expect(lengthOf(withRecords(house, changed(house, 'plate', 'pat1', { alongMm: 99_000 })), 'r1').length?.drawn?.alongMm).toBe(6000 + 2000)
  })
  it('takes a ceiling plate at its own point: no drop at ceiling height', () => {
    const plate = buildPlate({ mounting: 'ceiling', wall: null, alongMm: null, at: { xMm: 3000, yMm: 2000 }, heightMm: 2743 })
    expect(lengthOf(withRecords(house, plate), 'r1').length?.drawn).toMatchObject({ alongMm: 9000, dropMm: 0 })
  })
})

describe('between levels', () => {
  it('goes through the chase that joins them', () => {
    // Port at unit 28: 1,245 up, rise 1,498. Along: rack to chase 3,000; ceiling of level 1 (2,743) to that of level 2
    // (3,048 + 2,438 = 5,486) 2,743; chase to plate |9,000 - 2,500| + |2,000 - 4,000| = 8,500; in all 14,243. Drop 2,438 - 400 = 2,038.
    const { length } = lengthOf(wired, 'data')
    expect(length?.drawn).toMatchObject({ riseMm: 1498, alongMm: 14_243, dropMm: 2038, pathwayIds: ['w1'], way: ['rack', 'Level 1 ceiling', 'Chase A', 'Level 2 ceiling', 'Study'] })
    expect(length?.totalMm).toBe(1498 + 14_243 + 2038 + 2134 + 914)
  })
  it('takes the nearer of two chases', () => {
    // By a chase at the plate's own corner: |12,000 - 2,500| + |2,000 - 4,000| + 2,743 = 14,243 is no longer; at (20,000, 0) it would be.
    const far = buildPathway({ id: 'w2', name: 'Chase far', at: { xMm: 20_000, yMm: 0 } })
    expect(lengthOf(withRecords(wired, far), 'data').length?.drawn?.pathwayIds).toEqual(['w1'])
    // Without the near one: 8,000 + 2,000, 2,743 up, 17,500 + 4,000.
    const only = wired.filter((record) => record.kind !== 'pathway')
    expect(lengthOf([...only, far], 'data').length?.drawn).toMatchObject({ pathwayIds: ['w2'], alongMm: 34_243 })
  })
  it('takes the chases a run is told to take', () => {
    const far = buildPathway({ id: 'w2', name: 'Chase far', at: { xMm: 20_000, yMm: 0 } })
    const records = withRecords(wired, far, changed(wired, 'run', 'data', { pathwayIds: ['w2'] }))
    expect(lengthOf(records, 'data').length?.drawn).toMatchObject({ pathwayIds: ['w2'], alongMm: 34_243 })
  })
  it('says so where the chosen chases do not lead there, and takes the nearest', () => {
    const third = buildLevel({ id: 'l3', name: 'Level 3', code: 'L3', elevationMm: 6000 })
    const stray = buildPathway({ id: 'w3', name: 'Chase up', bottomLevelId: 'l2', topLevelId: 'l3' })
    const records = withRecords(wired, third, stray, changed(wired, 'run', 'data', { pathwayIds: ['w3'] }))
    const { length, findings } = lengthOf(records, 'data')
    expect(length?.drawn?.pathwayIds).toEqual(['w1'])
    expect(findings.map((finding) => [finding.check, finding.severity, finding.sentence])).toEqual([['runEnds', 'note', 'Chase up does not lead from Level 1 to Level 2; the length is that of the nearest way.']])
  })
  it('goes straight up at the rack where no chase is drawn, and says so', () => {
    const none = wired.filter((record) => record.kind !== 'pathway')
    // |12,000 - 2,500| + |2,000 - 4,000| = 11,500 along and 2,743 up.
    expect(lengthOf(none, 'data').length?.drawn).toMatchObject({ alongMm: 14_243, pathwayIds: [], way: ['rack', 'Level 1 ceiling', 'straight up, no chase drawn', 'Level 2 ceiling', 'Study'] })
  })
  it('chains chases over a level between, the shortest chain of all', () => {
    const records = withRecords(
      wired, buildLevel({ id: 'l3', name: 'Level 3', code: 'L3', elevationMm: 6000, ceilingHeightMm: 2400 }), buildRoom({ id: 'top', levelId: 'l3', name: 'Top', code: 'TOP', outline: rectangle(0, 0, 4000, 4000) }),
      buildPlate({ id: 'top1', roomId: 'top', alongMm: 2000, jacks: [{ id: 'tj', position: 1, connector: 'modular' }] }),
      buildPathway({ id: 'near', name: 'Near', at: { xMm: 8000, yMm: 2000 }, bottomLevelId: 'l2', topLevelId: 'l3' }),
      buildPathway({ id: 'off', name: 'Off', at: { xMm: 0, yMm: 30_000 }, bottomLevelId: 'l2', topLevelId: 'l3' }),
      buildRun({ id: 'top', serial: 9, label: 'TOP1-D1', cableTypeId: 'c-cat6', a: { deviceId: 'pp1', terminal: 'p2' }, b: { plateId: 'top1', jackId: 'tj' } }),
    )
    // 3,000 to chase A, 2,743 up, 1,000 to Near, up from 5,486 to 8,400 is 2,914, then |8,000 - 2,000| + |2,000 - 0| = 8,000.
    expect(lengthOf(records, 'top').length?.drawn).toMatchObject({ pathwayIds: ['w1', 'near'], alongMm: 3000 + 2743 + 1000 + 2914 + 8000 })
  })
})

describe('how a length is known', () => {
  const pull = (id: string, markA: number | null, markB: number | null, markUnit: 'ft' | 'm' = 'ft'): JobRecord => ({ kind: 'pull', id, ...said, runId: 'r1', markA, markB, markUnit, spool: null })
  const strike = (id: string, targetId: string, targetKind: 'pull' | 'strike' = 'pull'): JobRecord => ({ kind: 'strike', id, ...said, targetKind, targetId, reason: '' })
  const stated = changed(house, 'run', 'r1', { statedLengthMm: 25_000 })
  const total = (...records: JobRecord[]) => {
    const { length } = lengthOf(withRecords(house, ...records), 'r1')
    return [length?.basis, length?.totalMm, length?.drawn?.totalMm]
  }
  it('states before it draws, and keeps the drawn parts beside', () => {
    expect(total(stated)).toEqual(['stated', 25_000, 19_800])
  })
  it('measures the pulled cable by its jacket marks before either', () => {
    // 1,070 - 1,000 = 70 ft = 21,336 mm.
    expect(total(stated, pull('p1', 1000, 1070))).toEqual(['pulled', 21_336, 19_800])
    expect(total(pull('p1', 20, 41, 'm'))).toEqual(['pulled', 21_000, 19_800])
  })
  it('lets the five-digit counter roll over', () => {
    // 99,990 to 00,060: 70 marks.
    expect(total(pull('p1', 99_990, 60))).toEqual(['pulled', 21_336, 19_800])
  })
  it('takes the last pull that stands and has both marks', () => {
    expect(total(pull('p1', 0, 70), pull('p2', 0, 80), pull('p3', null, null))).toEqual(['pulled', 24_384, 19_800])
    expect(total(pull('p1', 0, 70), pull('p2', 0, 80), strike('s1', 'p2'))).toEqual(['pulled', 21_336, 19_800])
    expect(total(pull('p1', 0, 70), strike('s1', 'p1'))).toEqual(['drawn', 19_800, 19_800])
    // A strike that is struck out itself no longer strikes.
    expect(total(pull('p1', 0, 70), strike('s1', 'p1'), strike('s2', 's1', 'strike'))).toEqual(['pulled', 21_336, 19_800])
  })
  it('makes no length of two equal marks', () => {
    expect(total(pull('p1', 500, 500))).toEqual(['drawn', 19_800, 19_800])
  })
})

describe('what is missing is said in a sentence', () => {
  const missing = (...records: JobRecord[]) => {
    const { length, lengthMissing } = lengthOf(withRecords(house, ...records), 'r1')
    return [length, lengthMissing]
  }
  it('an end', () => {
    expect(missing(changed(house, 'run', 'r1', { b: null }))).toEqual([null, 'No length drawn: at end b, it has no end there yet'])
  })
  it('a position', () => {
    expect(missing(buildPlate({ mounting: 'ceiling', wall: null, alongMm: null, at: null }))).toEqual([null, 'No length drawn: at end b, PAT1 has no position in Patio'])
    const lost = buildDevice({ id: 'sp1', rackId: null, unit: null, roomId: 'mch', name: 'Speaker panel 1' })
    expect(missing(lost)).toEqual([null, 'No length drawn: at end a, Speaker panel 1 has no position in Mechanical'])
  })
  it('and a stated length stands without a drawing', () => {
    expect(missing(changed(house, 'run', 'r1', { b: null, statedLengthMm: 9000 }))).toEqual([{ basis: 'stated', totalMm: 9000, drawn: null }, null])
  })
})
