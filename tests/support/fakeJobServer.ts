import type { Changes, JobOpened, LogEntry, PushAnswer } from '../../shared/api/jobs.ts'
import type { Command } from '../../shared/commands/index.ts'
import { allRecords, type JobDocument } from '../../shared/model/jobDocument.ts'
import type { Role } from '../../shared/policy.ts'
import { foreignWrites } from '../../shared/sync/conflict.ts'
import { replay } from '../../shared/sync/replay.ts'
import type { Kept, OutboxDisk } from '../../src/api/outboxDisk.ts'
import { buildDoc, smallHouse } from './build.ts'

/** What JSON leaves of a value: nothing is shared between the two sides. */
export const wire = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T

/** A server in memory that judges with the shared code, as the real one does. */
export class FakeJobServer {
  doc: JobDocument = buildDoc(...smallHouse())
  log: LogEntry[] = []
  /** Most entries an answer carries; whoever is further behind asks again. */
  most = 400

  open(): JobOpened {
    return wire({ version: this.doc.version, records: [...allRecords(this.doc)], members: [{ id: 'me', name: 'Mara', role: 'designer' as const }, { id: 'you', name: 'Yorick', role: 'designer' as const }] })
  }
  push(actor: { id: string; role: Role }, baseVersion: number, commands: readonly Command[]): PushAnswer {
    const refused: PushAnswer['refused'][number][] = []
    const accepted: PushAnswer['accepted'][number][] = []
    for (const command of wire(commands)) {
      const known = this.log.find((entry) => entry.commandId === command.id)
      if (known) {
        accepted.push({ commandId: command.id, version: known.version })
        continue
      }
      const changeOf = (id: string) => this.log.find((entry) => entry.commandId === id && entry.actorId === actor.id)?.change
      const played = replay(this.doc, [command], { actor, changeOf, foreignSince: (madeAt) => foreignWrites(this.log.filter((entry) => entry.version > madeAt), actor.id) })
      const [refusal] = played.refused
      const change = played.changes.get(command.id)
      if (refusal || !change) {
        refused.push({ commandId: command.id, code: refusal?.error.code ?? 'refused', message: refusal?.error.message ?? '', details: refusal?.error.details ?? null })
        continue
      }
      const version = this.doc.version + 1
      this.doc = { ...played.doc, version }
      this.log.push({ version, commandId: command.id, actorId: actor.id, verb: command.verb, label: '', at: '', change })
      accepted.push({ commandId: command.id, version })
    }
    return wire({ ...this.since(baseVersion), accepted, refused })
  }
  since(version: number): Changes {
    return wire({ version: this.doc.version, since: this.log.filter((entry) => entry.version > version).slice(0, this.most) })
  }
  /** Goes back to how it was at a version, as after a backup was put back. */
  restore(version: number, doc: JobDocument) {
    this.doc = doc
    this.log = this.log.filter((entry) => entry.version <= version)
  }
}

/** A disk that outlives the page it was written by. */
export class FakeDisk implements OutboxDisk {
  rows = new Map<string, Kept>()
  load = () => Promise.resolve({ kept: wire([...this.rows.values()]), unreadable: 0 })
  add = (kept: Kept) => {
    this.rows.set(kept.command.id, wire(kept))
    return Promise.resolve()
  }
  remove = (ids: readonly string[]) => {
    for (const id of ids) this.rows.delete(id)
    return Promise.resolve()
  }
  close = () => undefined
}
