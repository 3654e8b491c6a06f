import { describe, expect, it } from 'vitest'
import { plan } from '../../../shared/commands/index.ts'
import { AppError } from '../../../shared/errors.ts'
import { find } from '../../../shared/model/jobDocument.ts'
import { apply, isEmpty, reverse, updates, type Change } from '../../../shared/sync/change.ts'
import { compose } from '../../../shared/sync/compose.ts'
import { assertSound } from '../../../shared/sync/soundness.ts'
import { buildDoc, buildRoom, smallHouse } from '../../support/build.ts'
import { asDesigner } from '../../support/checkCommand.ts'
import { randomIntent, seeded } from '../../support/randomIntents.ts'

describe('updates', () => {
  it('names only the fields that differ, whatever the order of keys', () => {
    const room = buildRoom()
    const change = updates<'room'>(room, { name: 'Terrace', outline: room.outline.map(({ xMm, yMm }) => ({ yMm, xMm })) })
    expect(change.updated[0]?.fields).toEqual({ name: ['Patio', 'Terrace'] })
    expect(isEmpty(updates<'room'>(room, { name: 'Patio' }))).toBe(true)
  })
})

describe('apply', () => {
  const doc = buildDoc(...smallHouse())
  it('refuses to write over what has moved on, and says what', () => {
    const stale: Change = { added: [], removed: [], updated: [{ kind: 'room', id: 'pat', fields: { name: ['Deck', 'Terrace'] } }] }
    expect(() => apply(doc, stale)).toThrow('Somebody has changed the name of that room since')
  })
  it('refuses to remove a record that has changed', () => {
    expect(() => apply(doc, { added: [], removed: [buildRoom({ name: 'Deck' })], updated: [] })).toThrow('Somebody has changed that room since')
  })
  it('refuses to add what is there', () => {
    expect(() => apply(doc, { added: [buildRoom()], removed: [], updated: [] })).toThrow('already on the job')
  })
  it('leaves the maps of kinds it does not touch as they were', () => {
    const after = apply(doc, updates<'room'>(find(doc, 'room', 'pat')!, { name: 'Terrace' }))
    expect(after.records.run).toBe(doc.records.run)
    expect(after.records.room).not.toBe(doc.records.room)
  })
})

/** A long seeded story: every sound change that random work made, in order. */
function story(seed: number, length: number) {
  const random = seeded(seed)
  let doc = buildDoc(...smallHouse())
  let id = 0
  const changes: Change[] = []
  const docs = [doc]
  let refused = 0
  while (changes.length < length) {
    const intent = randomIntent(doc, random, () => `n${id++}`)
    if (!intent) continue
    try {
      const change = plan(doc, intent, { ...asDesigner, commandId: `c${id++}` })
      const after = apply(doc, change)
      assertSound(after, change)
      doc = after
      changes.push(change)
      docs.push(doc)
    } catch (error) {
      if (!(error instanceof AppError)) throw error
      refused++
    }
  }
  return { docs, changes, refused }
}

describe('a change', () => {
  it('turns round exactly, over 40 stories of 60 changes', () => {
    let refusals = 0
    for (let seed = 1; seed <= 40; seed++) {
      const { docs, changes, refused } = story(seed, 60)
      refusals += refused
      changes.forEach((change, index) => expect(apply(docs[index + 1]!, reverse(change)).records, `seed ${seed} step ${index}`).toEqual(docs[index]!.records))
    }
    expect(refusals, 'the stories hold foolish commands too').toBeGreaterThan(50)
  })
  it('composes: several as one do what they do one after the other, and turn round as one', () => {
    for (let seed = 1; seed <= 40; seed++) {
      const { docs, changes } = story(seed, 30)
      for (let from = 0; from < 30; from += 7)
        for (const length of [2, 5, 9]) {
          const slice = changes.slice(from, from + length)
          const whole = compose(slice)
          const end = docs[Math.min(from + length, 30)]!
          expect(apply(docs[from]!, whole).records, `seed ${seed} from ${from} length ${length}`).toEqual(end.records)
          expect(apply(end, reverse(whole)).records).toEqual(docs[from]!.records)
        }
    }
  })
})
