import { openDB, type DBSchema, type IDBPDatabase } from 'idb'
import type { Command } from '../../shared/commands/index.ts'

/** What was done and not yet acknowledged, on this device: it survives a reload, a crash and a session that ended. */
interface Kept {
  /** job and member, so that another member at the same screen neither sees nor sends it. */
  readonly owner: string
  readonly commandId: string
  /** Order of making, within an owner. */
  readonly order: number
  readonly command: Command
}

interface OutboxSchema extends DBSchema {
  commands: { key: [string, string]; value: Kept; indexes: { owner: string } }
}

const formatVersion = 1
let database: Promise<IDBPDatabase<OutboxSchema>> | undefined

const open = () =>
  (database ??= openDB<OutboxSchema>('mudring-outbox', formatVersion, {
    upgrade: (db) => db.createObjectStore('commands', { keyPath: ['owner', 'commandId'] }).createIndex('owner', 'owner'),
  }))

export interface OutboxDisk {
  readonly load: () => Promise<readonly Command[]>
  readonly add: (command: Command) => Promise<void>
  readonly remove: (ids: readonly string[]) => Promise<void>
}

/** The part of the disk that holds one member's queue for one job. */
export function outboxDisk(jobId: string, memberId: string): OutboxDisk {
  const owner = `${jobId}/${memberId}`
  let order = Date.now()
  return {
    load: async () => {
      const kept = await (await open()).getAllFromIndex('commands', 'owner', owner)
      return kept.sort((a, b) => a.order - b.order).map((each) => each.command)
    },
    add: async (command) => {
      await (await open()).put('commands', { owner, commandId: command.id, order: order++, command }, undefined)
    },
    remove: async (ids) => {
      const transaction = (await open()).transaction('commands', 'readwrite')
      await Promise.all([...ids.map((id) => transaction.store.delete([owner, id])), transaction.done])
    },
  }
}
