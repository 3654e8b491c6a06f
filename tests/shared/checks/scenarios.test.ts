import { describe, expect, it } from 'vitest'
import { deviceModelFixtures } from '../../../fixtures/catalog/deviceModels.ts'
import { alderStreet } from '../../../fixtures/jobs/alderStreet.ts'
import { bistroMarrow } from '../../../fixtures/jobs/bistroMarrow.ts'
import { harrowLane } from '../../../fixtures/jobs/harrowLane.ts'
import { heronPoint } from '../../../fixtures/jobs/heronPoint.ts'
import { thornbury } from '../../../fixtures/jobs/thornbury.ts'
import { cableTypeFixtures } from '../../../fixtures/catalog/cableTypes.ts'
import type { Intent, Step } from '../../../shared/commands/index.ts'
import { deriveJob } from '../../../shared/derive/deriveJob.ts'
import { jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { traceOf } from '../../../shared/trace/traceOf.ts'
import { feetToMm } from '../../../shared/units.ts'
import { checkCommand } from '../../support/checkCommand.ts'
import { playFixture } from '../../support/playFixture.ts'

/** The job after some edits, and what is found. */
function after(doc: JobDocument, ...intents: Intent[]) {
  const edited = intents.reduce((current, intent) => checkCommand(current, intent).after, doc)
  return deriveJob(edited)
}
const find = (derived: ReturnType<typeof deriveJob>, check: string) => derived.findings.filter((finding) => finding.check === check)
const batch = (...steps: Step[]): Intent => ({ verb: 'batch', args: { label: 'edit', steps } })
const cable = (code: string): Step => ({ verb: 'cableType.add', args: { id: `added-${code.replace(/[^A-Za-z0-9]/g, '-')}`, ...cableTypeFixtures.find((each) => each.code === code)! } })
const limits = (doc: JobDocument, set: object): Intent => ({ verb: 'job.update', args: { set: { limits: { ...jobOf(doc).limits, ...set } } } })

describe('Alder Street, one media room and a patio zone', () => {
  const doc = playFixture(alderStreet())
  const patio = ['run-P1', 'run-P2']
  it('is clean as planned', () => {
    expect(deriveJob(doc).findings).toEqual([])
  })
  it('warns of 16/2 to the patio: 13.1 and 13.9 % of the load, 1.1 dB', () => {
    // 2 x 130 ft x 4.016 ohm/kft = 1.044 ohm of 8 ohm; 2 x 138 ft = 1.108 ohm. One metre more or less of stated rounding is 0.01 %.
    const derived = after(doc, batch(cable('16/2-DB'), { verb: 'run.changeCable', args: { ids: patio, cableTypeId: 'added-16-2-DB' } }))
    const found = find(derived, 'speakerLoss')
    expect(found.map((finding) => [finding.severity, finding.figure?.value.toFixed(1)])).toEqual([['caution', '13.1'], ['caution', '13.9']])
    expect(derived.runs.get('run-P1')!.speaker!.loopResistanceOhm).toBeCloseTo(1.044, 2)
    expect(derived.runs.get('run-P2')!.speaker!.lossDb).toBeCloseTo(1.13, 2)
    expect(found.every((finding) => finding.remedy?.label === 'Change to 12/2-DB')).toBe(true)
    expect(found[0]!.sentence).toContain('the limit is 10.0 % of the load')
  })
  it('says that 12/2 is just over a strict 5 % line: 5.2 and 5.5 %', () => {
    const derived = after(doc, limits(doc, { speakerLossCaution: 5 }))
    const figures = find(derived, 'speakerLoss').filter((finding) => patio.includes(finding.about.id)).map((finding) => finding.figure!.value.toFixed(1))
    expect(figures).toEqual(['5.2', '5.5'])
  })
  it('passes 7 + 2 on nine channels, and names the patio when the room goes to four overheads', () => {
    const add = (i: number): Step[] => [
      { verb: 'plate.add', args: { id: `x${i}`, roomId: 'room-MED', form: 'ceiling-opening', mounting: 'ceiling', at: { xMm: 1000 * i, yMm: 1000 }, heightMm: 2438, jacks: [{ id: `xj${i}`, position: 1, connector: 'speaker-pair' }] } },
      { verb: 'device.add', args: { id: `xd${i}`, modelId: 'model-speaker-in-ceiling-8', name: `Overhead ${i}`, plateId: `x${i}` } },
      { verb: 'run.add', args: { id: `xr${i}`, cableTypeId: 'cable-16-2', a: { deviceId: 'device-SP1', terminal: `p${9 + i}` }, b: { plateId: `x${i}`, jackId: `xj${i}` } } },
    ]
    const [found] = find(after(doc, batch(...add(1), ...add(2))), 'channelBudget')
    expect(found).toMatchObject({ severity: 'stop', figure: { value: 11 }, limit: { value: 9 } })
    expect(found!.sentence).toContain('Left silent: PAT1-S1, PAT2-S1')
  })
})

describe('Harrow Lane, a builder’s package', () => {
  const doc = playFixture(harrowLane())
  it('is clean as planned', () => {
    expect(deriveJob(doc).findings).toEqual([])
  })
  it('keeps every identifier when a bedroom is sold as an office after labels are printed', () => {
    const at = '2026-05-19T13:00:00.000Z'
    const ids = ['run-BED1-D1', 'run-BED1-D2', 'run-BED1-V1', 'run-BED2-D1', 'run-BED2-D2']
    const derived = after(
      doc,
      { verb: 'label.print', args: { prints: ids.map((runId, i) => ({ id: `p${i}`, at, runId, end: 'b', copies: 2, stock: 'letter-30' })) } },
      { verb: 'room.update', args: { ids: ['room-BED'], set: { name: 'Office', code: 'OFC' } } },
    )
    expect(ids.map((id) => derived.runs.get(id)!.run.label)).toEqual(['BED1-D1', 'BED1-D2', 'BED1-V1', 'BED2-D1', 'BED2-D2'])
    expect(derived.doc.records.room.get('room-BED')).toMatchObject({ name: 'Office', aliases: ['Bedroom 2'] })
  })
  it('traces from the rack to the volume control and on to both speakers', () => {
    const { stops } = traceOf(deriveJob(doc), 'run-PAT1-S1')!
    const parts = stops.find((stop) => stop.branches)!.branches!
    expect(parts.map((branch) => branch.map((stop) => stop.title))).toEqual([['Patio speaker, left', 'PAT2-S1'], ['Patio speaker, right', 'PAT3-S1']])
    expect(stops.map((stop) => stop.title)).toEqual(['2 ways on', 'Volume control', 'PAT1-S1', 'SP1-06', 'no cord from SP1-06 yet'])
    const back = traceOf(deriveJob(doc), 'run-PAT3-S1')!.stops.map((stop) => stop.title)
    expect(back).toEqual(['Patio speaker, right', 'PAT3-S1', 'Volume control', 'PAT1-S1', 'SP1-06', 'no cord from SP1-06 yet'])
  })
  it('sets the loft’s runs to not pulled, never silently gone, and they no longer count', () => {
    const derived = after(doc, { verb: 'run.drop', args: { ids: ['run-LOF1-D1', 'run-LOF1-D2', 'run-LOF1-V1'], reason: 'CO-2' } })
    expect(derived.runs.get('run-LOF1-D1')).toMatchObject({ dropped: 'CO-2' })
    expect([derived.runs.size, derived.progress.total]).toEqual([40, 37])
  })
})

describe('Thornbury, 400 runs and two head ends', () => {
  const doc = playFixture(thornbury())
  const clean = deriveJob(doc)
  it('finds the far camera and the terraces, and nothing else', () => {
    expect(find(clean, 'dataLength').map((finding) => [finding.aboutName, finding.severity, finding.figure!.text])).toEqual([['GTE90-D1', 'stop', '355 ft']])
    expect(find(clean, 'speakerLoss').map((finding) => finding.figure!.text)).toEqual(Array(8).fill('11.9 %'))
    expect(clean.findings).toHaveLength(9)
  })
  it('sees 4 ohm at a terrace of two 8 ohm speakers in parallel: 0.48 ohm on 150 ft of 12/2', () => {
    const run = [...clean.runs.values()].find(({ run }) => run.purpose.startsWith('Terrace'))!
    expect(run.speaker).toMatchObject({ loadOhm: 4 })
    expect(run.speaker!.loopResistanceOhm).toBeCloseTo(0.476, 3)
  })
  it('has channels for exactly its zones, and lists those left silent when an amplifier goes', () => {
    expect(find(clean, 'channelBudget')).toEqual([])
    const [found] = find(after(doc, { verb: 'items.remove', args: { items: [{ kind: 'device', id: 'device-AMP4' }] } }), 'channelBudget')
    expect(found!.figure!.value - found!.limit!.value).toBe(12)
    expect(found!.sentence.split('Left silent: ')[1]!.split(',').length).toBeGreaterThanOrEqual(6)
  })
  it('refuses a garage-loft pair beyond the last channel', () => {
    const [found] = find(
      after(doc, batch(
        { verb: 'plate.add', args: { id: 'x', roomId: 'room-GAR', form: 'ceiling-opening', mounting: 'ceiling', at: { xMm: feetToMm(75), yMm: feetToMm(5) }, heightMm: 3048, jacks: [{ id: 'xj', position: 1, connector: 'speaker-pair' }] } },
        { verb: 'device.add', args: { id: 'xd1', modelId: 'model-speaker-in-ceiling-8', name: 'Loft left', plateId: 'x' } },
        { verb: 'device.add', args: { id: 'xd2', modelId: 'model-speaker-in-ceiling-8', name: 'Loft right', plateId: 'x' } },
        { verb: 'run.add', args: { id: 'xr', cableTypeId: 'cable-16-4', a: { deviceId: 'device-SP3', terminal: 'p24' }, b: { plateId: 'x', jackId: 'xj' } } },
      )),
      'channelBudget',
    )
    expect(found!.figure!.value - found!.limit!.value).toBe(2)
  })
  it('refuses four terrace speakers on one channel: 2 ohm', () => {
    const terraces = [...clean.runs.values()].filter(({ run }) => run.purpose.startsWith('Terrace')).slice(0, 2)
    const cords: Step[] = terraces.map(({ run }, i) => ({ verb: 'cord.add', args: { id: `c${i}`, a: run.a as { deviceId: string; terminal: string }, b: { deviceId: 'device-AMP1', terminal: 'ch1' } } }))
    const [found] = find(after(doc, batch(...cords)), 'amplifierLoad')
    expect(found).toMatchObject({ severity: 'stop', figure: { text: '2 ohm' }, limit: { text: '4 ohm' } })
  })
})

describe('Bistro Marrow, 70 V lines under a plenum', () => {
  const doc = playFixture(bistroMarrow())
  it('is clean as planned: 187.5 W on 240 W is 78 %', () => {
    expect(deriveJob(doc).findings).toEqual([])
  })
  const more = (count: number): Step[] =>
    Array.from({ length: count }, (_, i): Step[] => [
      { verb: 'plate.add', args: { id: `x${i}`, roomId: 'room-PAT', form: 'exterior-box', mounting: 'outside', wall: 0, alongMm: 9000 + i * 900, heightMm: 2540 } },
      { verb: 'device.add', args: { id: `xd${i}`, modelId: 'model-speaker-line-outdoor', name: `Patio speaker ${5 + i}`, plateId: `x${i}`, tapW: 15 } },
      { verb: 'run.add', args: { id: `xr${i}`, cableTypeId: 'cable-16-2-DB', a: { deviceId: i === 0 ? 'device-PAT4' : `xd${i - 1}`, terminal: 'thru' }, b: { deviceId: `xd${i}`, terminal: 'in' } } },
    ]).flat()
  it('warns at 217.5 W, 91 %, when the owner adds two patio speakers', () => {
    const [found] = find(after(doc, batch(...more(2))), 'amplifierLoad')
    expect(found).toMatchObject({ severity: 'caution', figure: { text: '91 %' }, limit: { text: '80 %' } })
    expect(found!.sentence).toContain('217.5 W')
  })
  it('takes the exact boundary of 80 %', () => {
    const taps: Step[] = [{ verb: 'device.update', args: { ids: ['device-ENT1', 'device-ENT2'], set: { tapW: 6 } } }]
    // 60 + 60 + 60 + 12 = 192 W of 240 W is exactly 80 %.
    expect(find(after(doc, batch(...taps)), 'amplifierLoad')).toEqual([])
  })
  it('loses 3.0 % of the line’s load over 310 ft to 60 W, and 4.5 % to 90 W', () => {
    // 2 x 310 ft x 4.016 ohm/kft = 2.49 ohm; 5000/60 = 83.3 ohm; 5000/90 = 55.6 ohm.
    expect(deriveJob(doc).runs.get('run-PAT1-S1')!.speaker!.impedancePercent).toBeCloseTo(2.99, 2)
    expect(after(doc, batch(...more(2))).runs.get('run-PAT1-S1')!.speaker!.impedancePercent).toBeCloseTo(4.48, 2)
  })
  it('refuses a speaker left on its 8 ohm setting', () => {
    const [found] = find(after(doc, { verb: 'device.update', args: { ids: ['device-DIN3'], set: { tapW: null } } }), 'amplifierLoad')
    expect(found).toMatchObject({ severity: 'stop' })
    expect(found!.sentence).toContain('shorts the line')
  })
  it('refuses riser cable in the plenum and offers the plenum one', () => {
    const [found] = find(after(doc, batch(cable('16/2'), { verb: 'run.changeCable', args: { ids: ['run-DIN1-S1'], cableTypeId: 'added-16-2' } })), 'jacketSpace')
    expect(found).toMatchObject({ severity: 'stop', tier: 'code', remedy: { label: 'Change to 16/2-P' } })
  })
})

describe('Heron Point, partly pulled', () => {
  const doc = playFixture(heronPoint())
  it('holds the findings that are there on purpose, each with its remedy', () => {
    expect(deriveJob(doc).findings.map((finding) => [finding.check, finding.aboutName, finding.remedy?.label])).toEqual([
      ['portUse', 'GRT1-D2', 'Move to PP1-17'],
      ['speakerLoss', 'PAT1-S1', 'Change to 14/2'],
      ['speakerLoss', 'PAT2-S1', 'Change to 14/2'],
    ])
  })
  it('is all clear when every remedy is taken', () => {
    const derived = deriveJob(doc)
    expect(after(doc, ...derived.findings.map((finding) => finding.remedy!.intent)).findings).toEqual([])
  })
  it('an acceptance holds until the figures under it change', () => {
    const [finding] = find(deriveJob(doc), 'speakerLoss')
    const accept: Intent = { verb: 'finding.accept', args: { acceptances: [{ id: 'ok', at: '2026-05-19T13:00:00.000Z', check: finding!.check, aboutKind: 'run', aboutId: finding!.about.id, figures: finding!.figures, reason: 'short bursts only' }] } }
    const accepted = after(doc, accept)
    expect(accepted.counts.caution).toBe(1)
    expect(find(accepted, 'speakerLoss')[0]!.accepted).toMatchObject({ reason: 'short bursts only' })
    const longer = after(doc, accept, { verb: 'run.update', args: { ids: [finding!.about.id], set: { statedLengthMm: feetToMm(95) } } })
    expect(longer.counts.caution).toBe(2)
  })
  it('doubts jacket marks that make 4,000 ft', () => {
    const derived = after(doc, { verb: 'pull.record', args: { pulls: [{ id: 'far', at: '2026-05-19T13:00:00.000Z', runId: 'run-PAT1-1', markA: 1000, markB: 5000, markUnit: 'ft' }] } })
    expect(find(derived, 'pulledLength')[0]).toMatchObject({ severity: 'caution', aboutName: 'PAT1-S1' })
  })
  it('the models it is built of have terminals', () => {
    for (const model of Object.values(deviceModelFixtures)) expect(model.terminals.length).toBeGreaterThan(0)
  })
})
