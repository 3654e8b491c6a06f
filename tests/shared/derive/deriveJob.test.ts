import { describe, expect, it } from 'vitest'
import { heronPoint } from '../../../fixtures/jobs/heronPoint.ts'
import { plan } from '../../../shared/commands/index.ts'
import { deriveJob, type Derived } from '../../../shared/derive/deriveJob.ts'
import { AppError } from '../../../shared/errors.ts'
import { apply } from '../../../shared/sync/change.ts'
import { assertSound } from '../../../shared/sync/soundness.ts'
import { buildDoc, smallHouse } from '../../support/build.ts'
import { asDesigner } from '../../support/checkCommand.ts'
import { playFixture } from '../../support/playFixture.ts'
import { randomIntent, seeded } from '../../support/randomIntents.ts'

const plain = (derived: Derived) => ({ runs: [...derived.runs.entries()].sort(), findings: derived.findings, counts: derived.counts, progress: derived.progress })

describe('deriveJob', () => {
  it('gives after an edit exactly what it gives from scratch, over 30 stories of 80 edits', () => {
    let steps = 0
    for (let seed = 1; seed <= 30; seed++) {
      const random = seeded(seed)
      let doc = buildDoc(...smallHouse())
      let derived = deriveJob(doc)
      let id = 0
      for (let step = 0; step < 80; step++) {
        const intent = randomIntent(doc, random, () => `n${id++}`)
        if (!intent) continue
        try {
          const change = plan(doc, intent, { ...asDesigner, commandId: `c${id++}` })
          const after = apply(doc, change)
          assertSound(after, change)
          doc = after
        } catch (error) {
          if (!(error instanceof AppError)) throw error
          continue
        }
        derived = deriveJob(doc, derived)
        steps++
        expect(plain(derived), `seed ${seed} step ${step} ${intent.verb}`).toEqual(plain(deriveJob(doc)))
      }
    }
    expect(steps).toBeGreaterThan(1000)
  })
  it('keeps the facts of runs that an edit did not reach', () => {
    const doc = playFixture(heronPoint())
    const before = deriveJob(doc)
    const change = plan(doc, { verb: 'run.update', args: { ids: ['run-PAT1-1'], set: { statedLengthMm: 9000 } } }, asDesigner)
    const after = deriveJob(apply(doc, change), before)
    const kept = [...after.runs].filter(([id, facts]) => facts === before.runs.get(id)).length
    expect(kept).toBe(59)
    expect(after.runs.get('run-PAT1-1')?.length).toMatchObject({ basis: 'stated', totalMm: 9000 })
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
