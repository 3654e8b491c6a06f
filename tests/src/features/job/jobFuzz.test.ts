import { createPinia, setActivePinia } from 'pinia'
import { expect, it } from 'vitest'
import { allRecords, find, recordsOf } from '../../../../shared/model/jobDocument.ts'
import { referencesOf } from '../../../../shared/model/references.ts'
import { FakeJobServer } from '../../../support/fakeJobServer.ts'
import { jobClient } from '../../../support/jobClient.ts'
import { randomIntent, seeded } from '../../../support/randomIntents.ts'

/** Two members, one of them with two pages open, who edit, undo, redo, lose the connection, lose answers and load anew. */
const pages = ['me', 'me', 'you']
const seeds = 150

it(`comes to the server’s job on every page, with nothing waiting, dangling, double or swallowed, over ${seeds} seeds`, async () => {
  setActivePinia(createPinia())
  let [edits, refusals, reloads] = [0, 0, 0]
  for (let seed = 1; seed <= seeds; seed++) {
    const random = seeded(seed)
    const server = new FakeJobServer()
    server.most = 1 + Math.floor(random() * 6)
    const clients = await Promise.all(pages.map((name) => jobClient(server, name)))
    let made = 0
    const done = clients.map(() => new Set<string>())
    const undone = new Set<string>()
    const rootOf = new Map<string, string>()
    for (let step = 0; step < 60; step++) {
      const which = Math.floor(random() * clients.length)
      const self = clients[which]!
      const roll = random()
      if (roll < 0.08) self.connected = !self.connected
      else if (roll < 0.12) self.losesAnswers = !self.losesAnswers
      else if (roll < 0.15 && self.connected && !self.losesAnswers) {
        await self.reload()
        reloads++
      } else if (roll < 0.3) {
        const before = self.store.outbox.length
        if (roll < 0.24) self.store.undo()
        else self.store.redo()
        const last = self.store.outbox.at(-1)
        if (self.store.outbox.length > before && last?.verb === 'revert') {
          const root = rootOf.get(last.args.commandId) ?? last.args.commandId
          rootOf.set(last.id, root)
          if (!undone.delete(root)) undone.add(root)
        }
      } else if (roll < 0.42) {
        self.store.heard(server.doc.version)
        await self.store.sync()
      } else {
        const intent = randomIntent(self.store.doc, random, () => `x${seed}-${made++}`)
        const id = intent && self.store.edit(intent)
        if (id) done[which]!.add(id)
      }
    }
    for (const self of clients) Object.assign(self, { connected: true, losesAnswers: false })
    for (let round = 0; round < 3; round++)
      for (const self of clients) {
        self.store.heard(server.doc.version)
        await self.store.sync()
      }
    const accepted = new Set(server.log.map((entry) => entry.commandId))
    for (const [which, { store, disk }] of clients.entries()) {
      expect(store.trouble, `seed ${seed}`).toBe('none')
      expect(store.outbox, `seed ${seed}`).toEqual([])
      expect(store.doc.version, `seed ${seed}`).toBe(server.doc.version)
      expect(store.doc.records, `seed ${seed}`).toEqual(server.doc.records)
      expect([...disk.rows.keys()].sort(), `seed ${seed}: only what nobody has seen is left on the disk`).toEqual(store.refused.map((each) => each.command.id).sort())
      const shown = new Set(store.refused.map((each) => each.command.id))
      const swallowed = [...done[which]!].filter((id) => !accepted.has(id) && !shown.has(id))
      expect(swallowed.filter((id) => !undone.has(id)), `seed ${seed}: neither in the log, nor shown, nor undone by its author`).toEqual([])
      edits += done[which]!.size
      refusals += store.refused.length
    }
    for (const record of allRecords(server.doc)) for (const { kind, id } of referencesOf(record)) expect(find(server.doc, kind, id), `seed ${seed} ${record.kind}`).toBeDefined()
    const labels = recordsOf(server.doc, 'run').map((run) => run.label.toUpperCase())
    expect(new Set(labels).size, `seed ${seed}`).toBe(labels.length)
    const versions = server.log.map((entry) => entry.version)
    expect(versions, `seed ${seed}`).toEqual(versions.map((_version, index) => index + 1))
    for (const { store } of clients) store.close()

  }
  expect(edits).toBeGreaterThan(3000)
  expect(refusals, 'some were refused, and every refusal was shown').toBeGreaterThan(20)
  expect(reloads).toBeGreaterThan(100)
}, 60_000)
