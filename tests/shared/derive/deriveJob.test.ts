import { describe, expect, it } from 'vitest'
import { heronPoint } from '../../../fixtures/jobs/heronPoint.ts'
import { plan, type Intent } from '../../../shared/commands/index.ts'
import { deriveJob, type Derived } from '../../../shared/derive/deriveJob.ts'
import { AppError } from '../../../shared/errors.ts'
import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import { apply, reverse, type Change } from '../../../shared/sync/change.ts'
import { assertSound } from '../../../shared/sync/soundness.ts'
import { buildDoc, smallHouse } from '../../support/build.ts'
import { asDesigner } from '../../support/checkCommand.ts'
import { playFixture } from '../../support/playFixture.ts'
import { randomIntent, seeded } from '../../support/randomIntents.ts'
import { randomWiring } from '../../support/randomWiring.ts'
import { wiredHouse } from '../../support/wiredHouse.ts'

/** All that a derivation says, in a form that compares. */
function plain(derived: Derived) {
  const { doc, runs, findings, counts, progress } = derived
  const checked = (['run', 'cord', 'device', 'room'] as const).flatMap((kind) => [...doc.records[kind].keys()].map((id) => [kind, id, derived.findingsAbout(kind, id)] as const)).filter((each) => each[2].length)
  return {
    runs: [...runs], findings, counts, progress, checked,
    rooms: [...doc.records.room.keys()].map((id) => derived.progressOfRoom(id)),
    levels: [...doc.records.level.keys()].map((id) => derived.progressOfLevel(id)),
  }
}

/** The job after an intent, or undefined where it is refused. */
function attempt(doc: JobDocument, intent: Intent | undefined, commandId: string): { after: JobDocument; change: Change } | undefined {
  if (!intent) return undefined
  try {
    const change = plan(doc, intent, { ...asDesigner, commandId })
    const after = apply(doc, change)
    assertSound(after, change)
    return { after, change }
  } catch (error) {
    if (error instanceof AppError) return undefined
    throw error
  }
}

/** Plays a story and holds every step of the derivation that goes along against one from scratch. Returns what happened. */
function playStory(seed: number, steps: number, start: JobDocument): { done: number; found: ReadonlySet<string> } {
  const random = seeded(seed)
  const found = new Set<string>()
  let doc = start
  let derived = deriveJob(doc)
  let [done, id] = [0, 0]
  const newId = () => `n${id++}`
  let last: Change | undefined
  for (let step = 0; step < steps; step++) {
    const undo = last && random() < 0.15 && !last.added.some((record) => 'byId' in record) ? last : undefined
    const intent = random() < 0.4 ? randomIntent(doc, random, newId) : randomWiring(doc, derived.findings, random, newId)
    const next = undo ? { after: apply(doc, reverse(undo)), change: undefined } : attempt(doc, intent, newId())
    if (!next) continue
    last = next.change
    doc = next.after
    derived = deriveJob(doc, derived)
    done++
    expect(JSON.stringify([derived.findings, ...derived.runs.values()])).not.toMatch(/NaN|Infinity|undefined|\[object/)
    for (const finding of derived.findings) found.add(finding.accepted ? `${finding.check}, accepted` : finding.check)
    expect(plain(derived), `seed ${seed} step ${step} ${undo ? 'undo' : (intent?.verb ?? '')}`).toEqual(plain(deriveJob(doc)))
  }
  return { done, found }
}

describe('deriveJob', () => {
  it('gives after an edit exactly what it gives from scratch: small house', () => {
    let done = 0
    for (let seed = 1; seed <= 12; seed++) done += playStory(seed, 60, buildDoc(...smallHouse())).done
    expect(done).toBeGreaterThan(300)
  })
  it('gives after an edit exactly what it gives from scratch: hops, controls, cords, chases, limits, acceptances', () => {
    let done = 0
    const found = new Set<string>()
    for (let seed = 100; seed < 108; seed++) {
      const story = playStory(seed, 90, buildDoc(...wiredHouse()))
      done += story.done
      for (const check of story.found) found.add(check)
    }
    expect(done).toBeGreaterThan(350)
    // The stories must have met the checks, or they would prove nothing about them.
    expect([...found]).toEqual(expect.arrayContaining(['speakerLoss', 'amplifierLoad', 'channelBudget', 'jacketSpace', 'portUse', 'cordUse', 'signalMatch', 'runEnds', 'pulledLength', 'dataLength', 'runEnds, accepted']))
  }, 30_000)
  it('keeps the facts of runs that an edit did not reach', () => {
    const doc = playFixture(heronPoint())
    const before = deriveJob(doc)
    const change = plan(doc, { verb: 'run.update', args: { ids: ['run-PAT1-1'], set: { statedLengthMm: 9000 } } }, asDesigner)
    const after = deriveJob(apply(doc, change), before)
    const kept = [...after.runs].filter(([id, facts]) => facts === before.runs.get(id)).length
    expect(kept).toBe(59)
    expect(after.runs.get('run-PAT1-1')?.length).toMatchObject({ basis: 'stated', totalMm: 9000 })
  })
  it('gives the very same lists where an edit reached none of them', () => {
    const doc = playFixture(heronPoint())
    const before = deriveJob(doc)
    const after = deriveJob(apply(doc, plan(doc, { verb: 'job.update', args: { set: { client: 'Another' } } }, asDesigner)), before)
    expect(after.findings).toEqual(before.findings)
    const device = deriveJob(apply(after.doc, plan(after.doc, { verb: 'device.update', args: { ids: ['device-SW1'], set: { name: 'Switch A' } } }, asDesigner)), after)
    expect(device.findings).toBe(after.findings)
  })
  it('answers a what-if without disturbing what it was asked from', () => {
    const doc = playFixture(heronPoint())
    const before = deriveJob(doc)
    const snapshot = structuredClone(plain(before))
    const change = plan(doc, { verb: 'items.remove', args: { items: [{ kind: 'plate', id: 'plate-PAT1' }] } }, asDesigner)
    const branch = deriveJob(apply(doc, change), before)
    const again = deriveJob(doc, before)
    expect(branch.runs.size).toBe(59)
    expect(again).toBe(before)
    expect(plain(before)).toEqual(snapshot)
    const other = deriveJob(apply(doc, plan(doc, { verb: 'room.update', args: { ids: ['room-PAT'], set: { code: 'TER' } } }, asDesigner)), before)
    expect(other.runs.size).toBe(60)
  })
})
