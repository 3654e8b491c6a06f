import { describe, expect, it } from 'vitest'
import { deriveJob, type Derived } from '../../../shared/derive/deriveJob.ts'
import { defaultLimits } from '../../../shared/model/limits.ts'
import { kinds, type JobRecord } from '../../../shared/model/record.ts'
import { buildCord, buildDoc, buildJob, buildPathway, buildPlate, buildRoom, buildRun } from '../../support/build.ts'
import { changed, withRecords } from '../../support/derivedHouse.ts'
import { everyFieldEdit, put } from '../../support/everyField.ts'
import { amplifier, atPlate, wiredHouse } from '../../support/wiredHouse.ts'

const said = { at: '2026-12-01T10:00:00.000Z', byId: 'lead' }

/** The wired house with records from the field, and with something wrong for every check to find. */
function troubledHouse(): JobRecord[] {
  const wired = wiredHouse()
  const records = withRecords(
    wired,
    buildJob({ limits: { ...defaultLimits, speakerLossCaution: 0.1, speakerLossStop: 0.4, occupancy: 'other', dataLinkCautionMm: 10_000, lineLoadShare: 10 } }),
    amplifier('m-amp', 2), buildRoom({ spaceClass: 'outdoor' }), buildPathway({ id: 'w2', name: 'Chase B', at: { xMm: 3000, yMm: 9000 } }),
    changed(wired, 'cableType', 'c-cat6', { jacketRating: 'CM' }), changed(wired, 'device', 'bar-b', { tapW: null }), changed(wired, 'run', 'data', { pathwayIds: ['w2'] }),
    buildPlate({ id: 'bar3', roomId: 'bar', number: 3, wall: 2, alongMm: 500, jacks: [{ id: 'bj1', position: 1, connector: 'speaker-pair' }, { id: 'bj2', position: 2, connector: 'speaker-pair' }] }),
    atPlate('extra', 'm-spk', 'bar3'), atPlate('extra2', 'm-spk', 'bar3'),
    buildRun({ id: 'x1', serial: 20, label: 'BAR3-S1', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'bar3', jackId: 'bj1' } }),
    buildRun({ id: 'x2', serial: 21, label: 'BAR3-S2', a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'bar3', jackId: 'bj2' } }),
    buildRun({ id: 'x3', serial: 22, label: 'bar3-s2', cableTypeId: 'c-cat6', a: { deviceId: 'sp1', terminal: 'p5' }, b: null, statedLengthMm: 400_000 }),
    buildCord({ id: 'k-two', a: { deviceId: 'sp1', terminal: 'p1' }, b: { deviceId: 'amp', terminal: 'ch2' } }), buildCord({ id: 'k-odd', a: { deviceId: 'amp', terminal: 'ch2' }, b: { deviceId: 'desk', terminal: 'net' } }),
    { kind: 'pull', id: 'p1', ...said, runId: 'data', markA: 100, markB: 900, markUnit: 'ft', spool: 'D-1' }, { kind: 'pull', id: 'p2', ...said, runId: 'home', markA: 100, markB: 170, markUnit: 'ft', spool: null },
    { kind: 'termination', id: 'ta', ...said, runId: 'data', end: 'a', scheme: '' }, { kind: 'termination', id: 'tb', ...said, runId: 'data', end: 'b', scheme: '' },
    { kind: 'test', id: 't1', ...said, runId: 'data', testKind: 'wire map', result: 'fail', reading: 'open' }, { kind: 'test', id: 't2', ...said, runId: 'data', testKind: 'wire map', result: 'pass', reading: '' },
    { kind: 'labelPrint', id: 'lp', ...said, runId: 'x3', end: 'a', text: 'bar3-s2', copies: 1, stock: 's' },
    { kind: 'strike', id: 's1', ...said, targetKind: 'pull', targetId: 'p1', reason: '' }, { kind: 'strike', id: 's2', ...said, targetKind: 'strike', targetId: 's1', reason: '' }, { kind: 'strike', id: 's3', ...said, targetKind: 'test', targetId: 't2', reason: '' },
  )
  const [finding] = deriveJob(buildDoc(...records)).findings
  return [...records, { kind: 'acceptance', id: 'ok', ...said, check: finding!.check, aboutKind: finding!.about.kind, aboutId: finding!.about.id, figures: finding!.figures, reason: 'my call' }]
}

function plain(derived: Derived) {
  const { doc, runs, findings, counts, progress } = derived
  return { runs: [...runs], findings, counts, progress, rooms: [...doc.records.room.keys()].map((id) => derived.progressOfRoom(id)), levels: [...doc.records.level.keys()].map((id) => derived.progressOfLevel(id)) }
}

describe.each([['the wired house', wiredHouse], ['a house with something wrong for every check', troubledHouse]])('%s', (_name, house) => {
  const doc = buildDoc(...house())
  it('every field of every record, changed and changed back, gives what it gives from scratch, and nothing breaks', () => {
    const first = deriveJob(doc)
    let derived = first
    let edits = 0
    for (const { name, record } of everyFieldEdit(doc)) {
      derived = deriveJob(put(derived.doc, record.kind, record.id, record), derived)
      const scratch = deriveJob(put(doc, record.kind, record.id, record))
      expect(plain(derived), name).toEqual(plain(scratch))
      expect(JSON.stringify(scratch.findings), name).not.toMatch(/NaN|Infinity|undefined|\[object/)
      derived = deriveJob(put(derived.doc, record.kind, record.id, doc.records[record.kind].get(record.id)), derived)
      edits++
    }
    expect(plain(derived)).toEqual(plain(first))
    expect(edits).toBeGreaterThan(1500)
  }, 60_000)
  it('every record, torn out with whatever hangs on it left behind, breaks nothing; put back, all is as it was', () => {
    for (const kind of kinds)
      for (const record of doc.records[kind].values() as Iterable<JobRecord>) {
        if (kind === 'job') continue
        const torn = put(doc, kind, record.id, undefined)
        const derived = deriveJob(torn, deriveJob(doc))
        expect(plain(derived), `${kind} ${record.id}`).toEqual(plain(deriveJob(torn)))
      }
  }, 30_000)
})

it('the troubled house meets every check', () => {
  const found = new Set(deriveJob(buildDoc(...troubledHouse())).findings.map((finding) => finding.check))
  expect([...found].sort()).toEqual(['amplifierLoad', 'channelBudget', 'cordMatch', 'cordUse', 'dataLength', 'jacketSpace', 'labelUse', 'lengthDoubt', 'portUse', 'pulledLength', 'runEnds', 'signalMatch', 'speakerLoss', 'testResult'])
})
