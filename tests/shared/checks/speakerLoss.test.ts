import { describe, expect, it } from 'vitest'
import type { Limits } from '../../../shared/model/limits.ts'
import { defaultLimits } from '../../../shared/model/limits.ts'
import type { JobRecord } from '../../../shared/model/record.ts'
import { buildCableType, buildJob, smallHouse } from '../../support/build.ts'
import { changed, derive, foundBy, withRecords } from '../../support/derivedHouse.ts'
import { atPlate, cables, models, wiredHouse } from '../../support/wiredHouse.ts'

/** The small house with one 8 ohm speaker on 16/2 of 13.17 ohm/km, at a stated length. */
function house(lengthMm: number, limits: Partial<Limits> = {}, ...more: JobRecord[]): JobRecord[] {
  const base = withRecords(smallHouse(), buildJob({ limits: { ...defaultLimits, ...limits } }), ...Object.values(cables), ...Object.values(models), atPlate('s1', 'm-spk', 'pat1'), ...more)
  return withRecords(base, changed(base, 'run', 'r1', { statedLengthMm: lengthMm }))
}
const found = (...args: Parameters<typeof house>) => foundBy('speakerLoss', house(...args))

describe('speaker loss and gauge', () => {
  it('says the figure, the length, the load, the limit, and what would do', () => {
    // 2 x 25.298 m (83 ft) x 13.17 ohm/km = 0.66635 ohm; 20 log (1 + 0.66635/8) = 0.695 dB. 14 AWG of 8.285 ohm/km:
    // 8 x 0.059254 / (2 x 8.285e-3) = 28.608 m, 93.86 ft: a reach is written down to the whole foot.
    const [finding] = found(25_298)
    expect(finding).toMatchObject({
      severity: 'caution', tier: 'practice', aboutName: 'PAT1-S1', about: { kind: 'run', id: 'r1' },
      sentence: '16 AWG loses 0.69 dB at 83 ft into 8 ohm; the limit is 0.50 dB.',
      advice: '14 AWG stays under 0.50 dB up to 93 ft.',
      figure: { unit: 'dB', text: '0.69 dB' }, limit: { value: 0.5, text: '0.50 dB', setBy: 'default' },
      remedy: { label: 'Change to 14/2', intent: { verb: 'run.changeCable', args: { ids: ['r1'], cableTypeId: 'c-14-2' } } },
    })
    expect(finding!.basis).toBe('Rc = 2 × 25.3 m (stated) × 13.17 ohm/km (as its maker states, 20 °C) = 0.666 ohm; Z = 8.00 ohm (no cord drawn: the speaker at the plate is taken to be on it); level lost at the speaker: 20 log (1 + Rc/Z) = 0.69 dB')
  })
  it('passes at the limit itself: 5 % of 8 ohm is 0.4 ohm', () => {
    const strict: Partial<Limits> = { speakerLossConvention: 'impedance', speakerLossCaution: 5, speakerLossStop: 10 }
    // 0.4 ohm / (2 x 13.17 ohm/km) = 15.186 m.
    expect(found(15_186, strict)).toEqual([])
    expect(found(15_190, strict)).toHaveLength(1)
  })
  it('cautions over the first line and stops over the second, by the convention that is chosen', () => {
    const by = (speakerLossConvention: Limits['speakerLossConvention'], caution: number, stop: number, mm: number) => found(mm, { speakerLossConvention, speakerLossCaution: caution, speakerLossStop: stop }).map((finding) => [finding.severity, finding.figure!.text, finding.limit!.text])
    // 40 m: Rc/Z = 13.17 %, so 1.075 dB, 11.64 % of voltage, 21.92 % of power.
    expect(by('impedance', 10, 20, 40_000)).toEqual([['caution', '13.2 %', '10.0 %']])
    expect(by('impedance', 5, 10, 40_000)).toEqual([['stop', '13.2 %', '10.0 %']])
    expect(by('decibel', 0.5, 1, 40_000)).toEqual([['stop', '1.07 dB', '1.00 dB']])
    expect(by('voltage', 10, 12, 40_000)).toEqual([['caution', '11.6 %', '10.0 %']])
    expect(by('power', 25, 30, 40_000)).toEqual([])
  })
  it('takes the thinnest that holds, not the thickest', () => {
    expect(found(25_298)[0]!.remedy!.label).toBe('Change to 14/2')
    expect(found(40_000)[0]!.remedy!.label).toBe('Change to 12/2')
  })
  it('offers only cable for the same places and of as many conductors', () => {
    const outside = { wet: true, outdoor: true, buried: true } as const
    const buried = buildCableType({ ...cables.sixteen, ...outside })
    // The gauge alone is stranded copper, 1.03 times solid: 28.608 m / 1.03 = 27.775 m, 91.1 ft.
    expect(found(25_298, {}, buried)[0]).toMatchObject({ remedy: null, advice: '14 AWG stays under 0.50 dB up to 91 ft; no cable of that size is on the job.' })
    const better = buildCableType({ ...cables.fourteen, id: 'c-14-db', code: '14/2-DB', ...outside })
    expect(found(25_298, {}, buried, better)[0]!.remedy!.label).toBe('Change to 14/2-DB')
  })
  it('says when no usual gauge would do', () => {
    expect(found(150_000)[0]).toMatchObject({ severity: 'stop', remedy: null, advice: 'No usual gauge would do: move the amplifier nearer, or raise the load.' })
  })
  it('speaks metres and square millimetres where the job does', () => {
    const metric = house(25_298)
    const [finding] = foundBy('speakerLoss', withRecords(metric, buildJob({ lengthUnit: 'm', conductorUnit: 'mm2' })))
    expect(finding!.sentence).toBe('1.31 mm² loses 0.69 dB at 25 m into 8 ohm; the limit is 0.50 dB.')
    expect(finding!.advice).toBe('2.08 mm² stays under 0.50 dB up to 28 m.')
  })
  it('judges by what reaches the furthest speaker, and says both figures', () => {
    const wired = wiredHouse()
    const legs = withRecords(wired, changed(wired, 'run', 'home', { statedLengthMm: 16_000 }), changed(wired, 'run', 'to-left', { statedLengthMm: 1000 }), changed(wired, 'run', 'to-right', { statedLengthMm: 9000 }))
    const findings = foundBy('speakerLoss', legs)
    // 16 m is 0.4214 ohm, 0.446 dB, under 0.5; with 9 m more 0.6585 ohm, 0.687 dB. The leg by itself is 0.25 dB.
    expect(findings.map((finding) => [finding.aboutName, finding.severity, finding.sentence])).toEqual([['PAT1-S1', 'caution', '16 AWG loses 0.45 dB at 52 ft into 8 ohm, 0.69 dB with the legs after it; the limit is 0.50 dB.']])
  })
  it('blames the legs where they lose more than the limit by themselves', () => {
    const wired = wiredHouse()
    const legs = withRecords(wired, changed(wired, 'run', 'home', { statedLengthMm: 5000 }), changed(wired, 'run', 'to-left', { statedLengthMm: 1000 }), changed(wired, 'run', 'to-right', { statedLengthMm: 28_000 }))
    const [home, leg] = foundBy('speakerLoss', legs)
    expect([home!.aboutName, home!.remedy, home!.advice]).toEqual(['PAT1-S1', null, 'The legs after this run lose more than that by themselves: begin with those.'])
    expect([leg!.aboutName, leg!.remedy!.label]).toEqual(['PAT3-S1', 'Change to 14/2'])
  })
  it('says what is missing instead of a figure', () => {
    const mute = { ...models.speaker, terminals: models.speaker.terminals.map((each) => ({ ...each, ratings: {} })) }
    expect(found(25_298, {}, mute).map((finding) => [finding.severity, finding.sentence])).toEqual([['note', 'The loss of this run is not worked out: the load of s1 is not known.']])
    const unsized = buildCableType({ awg: null, resistanceOhmPerKm: null })
    expect(found(25_298, {}, unsized)[0]).toMatchObject({ severity: 'note', sentence: 'The loss of this run is not worked out: the conductor size of 16/2 is not known.' })
  })
  it('keeps an acceptance while its figures stay, and lets it lapse when they change', () => {
    const records = house(25_298)
    const [finding] = foundBy('speakerLoss', records)
    const accepted: JobRecord = { kind: 'acceptance', id: 'ok', at: '2026-12-01T10:00:00.000Z', byId: 'designer', check: 'speakerLoss', aboutKind: 'run', aboutId: 'r1', figures: finding!.figures, reason: 'short bursts only' }
    const state = (...more: JobRecord[]) => {
      const derived = derive(withRecords(records, ...more))
      return [derived.counts.caution, derived.findings[0]?.accepted?.reason]
    }
    expect(state()).toEqual([1, undefined])
    expect(state(accepted)).toEqual([0, 'short bursts only'])
    expect(state(accepted, changed(records, 'run', 'r1', { statedLengthMm: 27_000 }))).toEqual([1, undefined])
    expect(state(accepted, { kind: 'strike', id: 'x', at: accepted.at, byId: 'designer', targetKind: 'acceptance', targetId: 'ok', reason: '' })).toEqual([1, undefined])
    expect(state({ ...accepted, aboutId: 'another' })).toEqual([1, undefined])
  })
})
