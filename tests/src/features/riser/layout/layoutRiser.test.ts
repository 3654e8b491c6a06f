import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { heronPoint } from '../../../../../fixtures/jobs/heronPoint.ts'
import { thornbury } from '../../../../../fixtures/jobs/thornbury.ts'
import { buildDocument, find, recordsOf, type JobDocument } from '../../../../../shared/model/jobDocument.ts'
import { allRecords } from '../../../../../shared/model/jobDocument.ts'
import type { JobRecord } from '../../../../../shared/model/record.ts'
import { layoutRiser } from '../../../../../src/features/riser/layout/layoutRiser.ts'
import type { RiserLayout } from '../../../../../src/features/riser/layout/riserLayout.ts'
import { buildDevice, buildDoc, buildLevel, buildPathway, buildPlate, buildRack, buildRoom, buildRun, rectangle, smallHouse } from '../../../../support/build.ts'
import { playFixture } from '../../../../support/playFixture.ts'
import { crossings, overlappingTags } from '../../../../support/riserGeometry.ts'

const draw = (doc: JobDocument, apart = false): RiserLayout =>
  layoutRiser(doc, { apart, mark: (id) => ({ text: find(doc, 'run', id)?.label ?? '', severity: null }) })
const heron = playFixture(heronPoint())
const thorn = playFixture(thornbury())

describe('the riser of a house with 60 runs', () => {
  const layout = draw(heron)

  it('draws every run once, with its tag, from the rack to its plate', () => {
    expect(layout.runs).toHaveLength(60)
    expect(new Set(layout.runs.map((run) => run.runId)).size).toBe(60)
    expect(layout.tags.map((tag) => tag.text).sort()).toEqual(recordsOf(heron, 'run').map((run) => run.label).sort())
    expect(layout.runs.every((run) => run.whole.startsWith('M') && !/NaN|undefined|Infinity/.test(run.whole + run.trunk + run.drop))).toBe(true)
  })

  it('lets no two runs cross', () => {
    expect(crossings(layout)).toEqual([])
  })

  it('seats no tag on another', () => {
    expect(overlappingTags(layout.tags)).toEqual([])
  })

  it('keeps each tag’s ring on its own cable', () => {
    for (const tag of layout.tags) {
      const run = layout.runs.find((each) => each.runId === tag.runId)!
      expect(Math.abs(tag.cable - run.exit.x)).toBeLessThan(0.01)
      expect(tag.cable).toBeGreaterThan(tag.x)
      expect(tag.cable).toBeLessThan(tag.x + tag.w)
    }
  })

  it('gives the nearest exit the lowest lane', () => {
    const right = layout.runs.filter((run) => /^(ENT|KIT|GRT|PAT)/.test(find(heron, 'run', run.runId)!.label)).sort((a, b) => a.exit.x - b.exit.x)
    const heights = right.map((run) => run.exit.y)
    expect(heights).toEqual([...heights].sort((a, b) => b - a))
    expect(heights.length).toBe(20)
  })

  it('counts what each trunk carries', () => {
    expect(layout.counts.map((count) => count.runIds.length).sort((a, b) => a - b)).toEqual([9, 11, 18, 20])
  })

  it('stacks the levels by elevation and cuts every room as a bay', () => {
    expect(layout.storeys.map((storey) => storey.kind)).toEqual(['crawl', 'full', 'full', 'roof'])
    expect(layout.bays).toHaveLength(13)
    for (const bay of layout.bays) for (const other of layout.bays) if (bay !== other && bay.storey === other.storey) expect(bay.x + bay.w <= other.x + 0.01 || other.x + other.w <= bay.x + 0.01).toBe(true)
    const patio = layout.bays.find((bay) => find(heron, 'room', bay.roomId)!.code === 'PAT')!
    expect(patio.outside).toBe(true)
  })

  it('hangs plates inside their bays, higher ones higher', () => {
    for (const spot of layout.plates) {
      const bay = layout.bays.find((each) => each.roomId === spot.plate.roomId)
      if (!bay) continue
      expect(spot.x).toBeGreaterThan(bay.x)
      expect(spot.x).toBeLessThan(bay.x + bay.w)
      expect(spot.y - spot.h / 2).toBeGreaterThanOrEqual(bay.y)
      expect(spot.y + spot.h / 2).toBeLessThanOrEqual(bay.y + bay.h - 30)
    }
    const y = (code: string) => layout.plates.find((spot) => spot.code === code)!.y
    expect(y('MED5')).toBeLessThan(y('MED3'))
    expect(y('MED3')).toBeLessThan(y('MED2'))
  })

  it('is the same whenever and in whatever order it is drawn', () => {
    expect(draw(heron)).toEqual(layout)
    const shuffled = buildDocument(heron.id, heron.version, [...allRecords(heron)].reverse())
    expect(draw(shuffled).runs.map((run) => run.whole).sort()).toEqual(layout.runs.map((run) => run.whole).sort())
  })

  it('spreads the lanes when runs are drawn one by one', () => {
    const apart = draw(heron, true)
    expect(crossings(apart)).toEqual([])
    expect(apart.height).toBeGreaterThan(layout.height)
  })
})

describe('the riser of a large house', () => {
  const layout = draw(thorn)

  it('draws all 400 runs and folds the tags of full levels into counts', () => {
    expect(layout.runs).toHaveLength(400)
    const folded = layout.folds.flatMap((fold) => fold.runIds)
    expect(new Set([...folded, ...layout.tags.map((tag) => tag.runId)]).size).toBe(400)
    expect(layout.folds.length).toBeGreaterThan(5)
  })

  it('has half-size tags ready for a closer look, none over another', () => {
    expect(layout.closeTags.length).toBeGreaterThan(200)
    expect(overlappingTags(layout.closeTags)).toEqual([])
  })

  it('lays 400 runs out in well under a frame or two', () => {
    for (let i = 0; i < 15; i++) draw(thorn)
    const times = Array.from({ length: 15 }, () => {
      const start = performance.now()
      draw(thorn)
      return performance.now() - start
    }).sort((a, b) => a - b)
    expect(times[3]).toBeLessThan(30)
  })
})

describe('runs that are not from a rack to a plate', () => {
  const add = (...records: JobRecord[]) => buildDoc(...smallHouse(), ...records)

  it('lets a run without an end hang, and says where', () => {
    const doc = add(buildRun({ id: 'r2', serial: 2, label: 'X-1', a: { deviceId: 'sp1', terminal: 'p2' }, b: null }))
    const run = draw(doc).runs.find((each) => each.runId === 'r2')!
    expect(run.loose).not.toBeNull()
    expect(draw(doc).runs.find((each) => each.runId === 'r1')!.loose).toBeNull()
  })

  it('lets a run that only has a plate hang from its plate', () => {
    const doc = add(buildRun({ id: 'r2', serial: 2, label: 'X-1', a: null, b: { plateId: 'pat1', jackId: null } }))
    expect(draw(doc).runs.find((each) => each.runId === 'r2')!.loose).not.toBeNull()
  })

  it('puts a run without any end into the tray', () => {
    const doc = add(buildRun({ id: 'r2', serial: 2, label: 'X-1', a: null, b: null }))
    expect(draw(doc).tray).toEqual(['r2'])
  })

  it('draws a hop from device to device under the trunk', () => {
    const at = (x: number) => ({ xMm: x, yMm: 1000 })
    const place = { rackId: null, unit: null, roomId: 'pat', code: null, heightMm: 2400 }
    const doc = add(
      buildDevice({ id: 'd1', name: 'One', ...place, at: at(1000) }),
      buildDevice({ id: 'd2', name: 'Two', ...place, at: at(4000) }),
      buildRun({ id: 'r2', serial: 2, label: 'PAT-S2', a: { deviceId: 'd1', terminal: 'p2' }, b: { deviceId: 'd2', terminal: 'p1' } }),
    )
    const layout = draw(doc)
    const hop = layout.runs.find((each) => each.runId === 'r2')!
    const home = layout.runs.find((each) => each.runId === 'r1')!
    expect(hop.exit.y).toBeGreaterThan(home.exit.y)
    expect(layout.devices.map((spot) => spot.device.id).sort()).toEqual(['d1', 'd2'])
  })

  it('takes a run between plates on two levels through the nearest column', () => {
    const doc = add(
      buildLevel({ id: 'l2', code: 'L2', name: 'Level 2', elevationMm: 3000 }),
      buildRoom({ id: 'bed', levelId: 'l2', code: 'BED', name: 'Bedroom' }),
      buildPlate({ id: 'bed1', roomId: 'bed' }),
      buildPathway(),
      buildRun({ id: 'r2', serial: 2, label: 'BED1-S1', a: { plateId: 'pat1', jackId: 'j1' }, b: { plateId: 'bed1', jackId: 'j1' } }),
    )
    const layout = draw(doc)
    const run = layout.runs.find((each) => each.runId === 'r2')!
    expect(run.loose).toBeNull()
    expect(layout.chases.flatMap((chase) => chase.runIds)).toContain('r2')
  })

  it('draws a run from rack to rack', () => {
    const doc = add(
      buildRoom({ id: 'gar', code: 'GAR', name: 'Garage', outline: rectangle(20_000, 0, 5000, 5000) }),
      buildRack({ id: 'rk2', roomId: 'gar', code: 'RK2', name: 'Rack 2', at: { xMm: 22_000, yMm: 1000 } }),
      buildRun({ id: 'r2', serial: 2, label: 'RK2-D1', a: { rackId: 'rk1' }, b: { rackId: 'rk2' } }),
    )
    const layout = draw(doc)
    expect(layout.racks).toHaveLength(2)
    expect(layout.runs.find((each) => each.runId === 'r2')!.loose).toBeNull()
  })

  it('draws nothing, and breaks nothing, for a job with no level', () => {
    expect(draw(buildDoc()).bays).toEqual([])
    expect(draw(buildDoc(buildLevel())).storeys).toHaveLength(1)
  })
})

describe('any house', () => {
  const house = fc.record({
    rooms: fc.array(fc.record({ level: fc.integer({ min: 0, max: 2 }), widthFt: fc.integer({ min: 4, max: 40 }), plates: fc.array(fc.integer({ min: 0, max: 4 }), { maxLength: 6 }) }), { minLength: 1, maxLength: 12 }),
    rackLevel: fc.integer({ min: 0, max: 2 }),
    rackAt: fc.integer({ min: 0, max: 12 }),
  })

  it('has no crossing and no tag on another', () => {
    fc.assert(
      fc.property(house, ({ rooms, rackLevel, rackAt }) => {
        const layout = draw(randomHouse(rooms, rackLevel, rackAt))
        expect(crossings(layout)).toEqual([])
        expect(overlappingTags(layout.tags)).toEqual([])
        expect(layout.tags).toHaveLength(layout.runs.length)
      }),
      { numRuns: 120 },
    )
  })
})

function randomHouse(rooms: readonly { level: number; widthFt: number; plates: readonly number[] }[], rackLevel: number, rackAt: number): JobDocument {
  const records: JobRecord[] = [0, 1, 2].map((n) => buildLevel({ id: `l${n}`, code: `L${n}`, name: `Level ${n}`, elevationMm: n * 3000 }))
  const at = [0, 0, 0]
  let serial = 0
  rooms.forEach(({ level, widthFt, plates }, r) => {
    records.push(buildRoom({ id: `m${r}`, levelId: `l${level}`, code: `R${r}`, name: `Room ${r}`, outline: rectangle(at[level]!, 0, widthFt * 305, 4000) }))
    at[level]! += widthFt * 305
    plates.forEach((jacks, p) => {
      const id = `p${r}-${p}`
      records.push(buildPlate({ id, roomId: `m${r}`, number: p + 1, alongMm: ((p + 1) * widthFt * 305) / 8, jacks: Array.from({ length: jacks }, (_, j) => ({ id: `j${j}`, position: j + 1, connector: 'speaker-pair' as const })) }))
      for (let j = 0; j < jacks; j++) records.push(buildRun({ id: `r${++serial}`, serial, label: `R${r}${p + 1}-S${j + 1}`, a: { rackId: 'rk1' }, b: { plateId: id, jackId: `j${j}` } }))
    })
  })
  records.push(buildRoom({ id: 'mch', levelId: `l${rackLevel}`, outline: rectangle(rackAt * 1500, 5000, 3000, 3000), code: 'MCH', name: 'Mechanical' }), buildRack({ at: { xMm: rackAt * 1500 + 1500, yMm: 6000 } }))
  const [type] = smallHouse().filter((record) => record.kind === 'cableType')
  return buildDoc(...records, type!)
}
