import { describe, expect, it } from 'vitest'
import { deriveJob } from '../../../shared/derive/deriveJob.ts'
import { plan, type Intent } from '../../../shared/commands/index.ts'
import type { JobRecord } from '../../../shared/model/record.ts'
import { apply } from '../../../shared/sync/change.ts'
import { cableTotals } from '../../../shared/views/cableTotals.ts'
import { gaugeCurves } from '../../../shared/views/gaugeCurves.ts'
import { compareLabels, scheduleRows } from '../../../shared/views/scheduleRows.ts'
import { buildDoc, buildJob } from '../../support/build.ts'
import { asDesigner } from '../../support/checkCommand.ts'
import { changed, derive, withRecords } from '../../support/derivedHouse.ts'
import { wiredHouse } from '../../support/wiredHouse.ts'
import { defaultLimits } from '../../../shared/model/limits.ts'

const wired = wiredHouse()
const rowsOf = (records: readonly JobRecord[]) => {
  const { doc, runs } = derive(records)
  return scheduleRows(doc, runs)
}
const pull: JobRecord = { kind: 'pull', id: 'p', at: '2026-12-01T10:00:00.000Z', byId: 'lead', runId: 'data', markA: 1000, markB: 1068, markUnit: 'ft', spool: 'D6-04' }

describe('schedule rows', () => {
  it('carry every column of a run', () => {
    const row = rowsOf([...wired, pull]).find((each) => each.runId === 'data')
    expect(row).toMatchObject({
      label: 'STU1-D1', stage: 'pulled', cable: 'CAT6', family: 'twisted-pair', jacket: 'white', level: 'Level 2', room: 'Study', roomCode: 'STU', plate: 'STU1', rackPort: 'PP1-01', spool: 'D6-04',
      riseMm: 1498, alongMm: 14_243, dropMm: 2038, slackMm: 3048, lengthMm: 20_726, basis: 'pulled', pulledMm: 20_726, lossDb: null, printed: false, severity: null, findings: 0,
    })
  })
  it('stand in label order, numbers by value', () => {
    expect(rowsOf(wired).map((row) => row.label)).toEqual(['BAR1-S1', 'BAR2-S1', 'PAT1-S1', 'PAT2-S1', 'PAT3-S1', 'STU1-D1'])
    expect(['MED10', 'MED2', 'med1'].sort(compareLabels)).toEqual(['med1', 'MED2', 'MED10'])
  })
  it('count open findings, and leave accepted ones out', () => {
    const strict = withRecords(wired, changed(wired, 'run', 'data', { statedLengthMm: 95_000 }))
    expect(rowsOf(strict).find((row) => row.runId === 'data')).toMatchObject({ severity: 'stop', findings: 1 })
    const [finding] = derive(strict).runs.get('data')!.findings
    const ok: JobRecord = { kind: 'acceptance', id: 'ok', at: pull.at, byId: 'designer', check: finding!.check, aboutKind: 'run', aboutId: 'data', figures: finding!.figures, reason: 'a switch goes between' }
    expect(rowsOf([...strict, ok]).find((row) => row.runId === 'data')).toMatchObject({ severity: null, findings: 0 })
  })
  it('follow every name they show, edit by edit, as if made anew', () => {
    let derived = deriveJob(buildDoc(...wired))
    scheduleRows(derived.doc, derived.runs)
    const edits: Intent[] = [
      { verb: 'room.update', args: { ids: ['stu'], set: { name: 'Office' } } },
      { verb: 'level.update', args: { ids: ['l2'], set: { name: 'Upstairs' } } },
      { verb: 'plate.update', args: { ids: ['stu1'], set: { name: 'Desk', number: 4 } } },
      { verb: 'device.update', args: { ids: ['pp1'], set: { code: 'PPX' } } },
      { verb: 'cableType.update', args: { ids: ['c-cat6'], set: { jacketColour: 'blue' } } },
      { verb: 'pull.record', args: { pulls: [{ id: 'p', at: pull.at, runId: 'data', markUnit: 'ft', spool: 'D6-09' }] } },
      { verb: 'record.strike', args: { strikes: [{ id: 'x', at: pull.at, targetKind: 'pull', targetId: 'p', reason: 'wrong' }] } },
      { verb: 'run.setEnd', args: { id: 'data', end: 'a', to: { rackId: 'rk1' } } },
      { verb: 'rack.update', args: { ids: ['rk1'], set: { name: 'Main rack' } } },
    ]
    for (const intent of edits) {
      derived = deriveJob(apply(derived.doc, plan(derived.doc, intent, { ...asDesigner, actor: { id: 'o', role: 'owner' } })), derived)
      const anew = deriveJob(buildDoc(...Object.values(derived.doc.records).flatMap((map) => [...map.values()] as JobRecord[])))
      expect(scheduleRows(derived.doc, derived.runs), intent.verb).toEqual(scheduleRows(anew.doc, anew.runs))
    }
    expect(scheduleRows(derived.doc, derived.runs).find((row) => row.runId === 'data')).toMatchObject({ room: 'Office', level: 'Upstairs', rackPort: 'Main rack', jacket: 'blue', spool: '' })
  })
})

describe('cable totals', () => {
  it('add up length and what is pulled, by type', () => {
    const { doc, runs } = derive([...wired, pull])
    const totals = cableTotals(doc, runs).map((total) => [total.type.code, total.runs, total.lengthMm, total.pulledRuns, total.pulledMm])
    expect(totals.find(([code]) => code === 'CAT6')).toEqual(['CAT6', 1, 20_726, 1, 20_726])
    expect(totals.map(([code, count]) => [code, count])).toEqual([['16/2', 4], ['16/4', 1], ['CAT6', 1]])
  })
  it('leave out dropped runs, and count those whose length is not known', () => {
    const { doc, runs } = derive(withRecords(wired, changed(wired, 'run', 'data', { dropped: 'CO-2' }), changed(wired, 'run', 'hop', { b: null })))
    expect(cableTotals(doc, runs).map(({ type, runs: count, unknown }) => [type.code, count, unknown])).toEqual([['16/2', 4, 1], ['16/4', 1, 0]])
  })
})

describe('loss against length for each gauge', () => {
  const stated = withRecords(wired, changed(wired, 'run', 'to-left', { statedLengthMm: 25_298 }))
  const curves = gaugeCurves(derive(stated), 'to-left')!
  it('one curve a size, thickest first, the run’s own among them with its point on it', () => {
    expect(curves.curves.map(({ name, isOwn, cableTypeId }) => [name, isOwn, cableTypeId])).toEqual([['12 AWG', false, 'c-12-2'], ['14 AWG', false, 'c-14-2'], ['16 AWG', true, 'c-16-2'], ['18 AWG', false, null]])
    // 2 x 25.298 m x 13.17 ohm/km into 8 ohm: 0.695 dB.
    expect(curves.own).toEqual({ lengthMm: 25_298, loss: expect.closeTo(0.6949, 3) as number })
    expect(curves).toMatchObject({ convention: 'decibel', unit: 'dB', caution: 0.5, stop: 1, longestMm: 37_947 })
  })
  it('says how far each goes: 16 AWG 18.0 m and 14 AWG 28.6 m within 0.5 dB', () => {
    // 8 x (10^(0.5/20) - 1) = 0.47403 ohm over 2 x 13.17 and 2 x 8.285 ohm/km.
    expect(curves.curves.map((curve) => curve.cautionMm).slice(1, 3)).toEqual([28_607, 17_996])
    expect(curves.curves.every((curve) => curve.stopMm > curve.cautionMm)).toBe(true)
  })
  it('grows with length and with thinner wire, from nothing', () => {
    for (const { points } of curves.curves) {
      expect(points[0]).toEqual({ lengthMm: 0, loss: 0 })
      expect(points.every((point, i) => i === 0 || point.loss > points[i - 1]!.loss)).toBe(true)
    }
    const ends = curves.curves.map((curve) => curve.points.at(-1)!.loss)
    expect(ends).toEqual([...ends].sort((a, b) => a - b))
  })
  it('counts the legs after a run in, so that its point and its reach are those it is judged by', () => {
    const legs = withRecords(wired, changed(wired, 'run', 'home', { statedLengthMm: 16_000 }), changed(wired, 'run', 'to-right', { statedLengthMm: 9000 }))
    const home = gaugeCurves(derive(legs), 'home')!
    expect(home.own.loss).toBeCloseTo(20 * Math.log10(1 + (0.42144 + 0.23706) / 8), 3)
    // 0.47403 ohm less the leg's 0.23706 leaves 0.23697 ohm: 8.997 m of 13.17 ohm/km.
    expect(home.curves.find((curve) => curve.isOwn)!.cautionMm / 1000).toBeCloseTo(8.997, 2)
  })
  it('is nothing for a run without a loss', () => {
    expect(gaugeCurves(derive(wired), 'data')).toBeNull()
    expect(gaugeCurves(derive(wired), 'gone')).toBeNull()
  })
  it('goes by the convention and the temperature of the job', () => {
    const job = buildJob({ limits: { ...defaultLimits, speakerLossConvention: 'impedance', speakerLossCaution: 5, speakerLossStop: 10, conductorTemperatureC: 50 } })
    const warm = gaugeCurves(derive(withRecords(stated, job)), 'to-left')!
    // 8.3294 % at 20 °C, 1.1179 times that at 50 °C.
    expect(warm).toMatchObject({ unit: '%', own: { loss: expect.closeTo(9.3114, 3) as number } })
  })
})
