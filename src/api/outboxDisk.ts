import { openDB, type DBSchema, type IDBPDatabase } from 'idb'
import { z } from 'zod'
import { commandSchema, type Command } from '../../shared/commands/index.ts'
import type { Change } from '../../shared/sync/change.ts'
import { adoptFromTabs, thisTab, type TabLocks } from './tabLocks.ts'

/** Why the server would not take a command. */
export interface KeptRefusal {
  readonly code: string
  readonly message: string
  readonly details: unknown
}

/** A command that waits for the server, or that it refused and nobody has seen yet. */
export interface Kept {
  readonly command: Command
  /** What it was called when it was made: its words need the job as it then was. */
  readonly words: string
  /** For an undo: what it turns round. Only the session that did it knew. */
  readonly undoes: Change | null
  readonly refusal: KeptRefusal | null
}

/** Counts up when a row can no longer be read the old way; rows of another format are left alone, never thrown away. */
const format = 1
const rowSchema = z.object({
  format: z.literal(format),
  owner: z.string(),
  commandId: z.string(),
  order: z.number(),
  tab: z.string(),
  words: z.string(),
  command: commandSchema,
  undoes: z.custom<Change>((value) => typeof value === 'object' && value !== null).nullable(),
  refusal: z.object({ code: z.string(), message: z.string(), details: z.unknown() }).nullable(),
})
interface Row extends Kept {
  readonly format: number
  /** Job and member, so that another member at the same screen neither sees nor sends it. */
  readonly owner: string
  readonly commandId: string
  /** Order of making. */
  readonly order: number
  /** The page that sends it. */
  readonly tab: string
}
interface OutboxSchema extends DBSchema {
  commands: { key: [string, string]; value: Row; indexes: { owner: string } }
}

let database: Promise<IDBPDatabase<OutboxSchema>> | undefined
let lastOrder = 0

function open(): Promise<IDBPDatabase<OutboxSchema>> {
  database ??= openDB<OutboxSchema>('mudring-outbox', 1, {
    upgrade: (db) => db.createObjectStore('commands', { keyPath: ['owner', 'commandId'] }).createIndex('owner', 'owner'),
    // A newer version of the program, in another tab, must not wait for this one.
    blocking: () => {
      void database?.then((db) => db.close())
      database = undefined
    },
    terminated: () => (database = undefined),
  }).catch((error: unknown) => {
    database = undefined
    throw error
  })
  return database
}

export interface Loaded {
  readonly kept: readonly Kept[]
  /** Rows that another version of the program wrote; they stay where they are. */
  readonly unreadable: number
}

export interface OutboxDisk {
  /** What this page has to send; what another page leaves behind when it is closed is told later. */
  readonly load: (onLeftBehind: (kept: readonly Kept[]) => void) => Promise<Loaded>
  readonly add: (kept: Kept) => Promise<void>
  readonly remove: (ids: readonly string[]) => Promise<void>
  /** Stops waiting for other pages. */
  readonly close: () => void
}

interface Page {
  readonly tab: string
  readonly locks: TabLocks | undefined
}

/** The part of the disk that holds one member's queue for one job. Each page sends its own rows and those of pages that are gone. */
export function outboxDisk(jobId: string, memberId: string, page: Page = thisTab()): OutboxDisk {
  const owner = ownerOf(jobId, memberId)
  const waiting = new AbortController()
  const rowsOf = async () => (await open()).getAllFromIndex('commands', 'owner', owner)

  /** Makes the rows of a page that is gone those of this one. */
  async function adopt(tab: string): Promise<readonly Kept[]> {
    const transaction = (await open()).transaction('commands', 'readwrite')
    const rows = (await transaction.store.index('owner').getAll(owner)).filter((row) => row.tab === tab)
    await Promise.all([...rows.map((row) => transaction.store.put({ ...row, tab: page.tab })), transaction.done])
    return readable(rows)
  }
  return {
    load: async (onLeftBehind) => {
      const tabs = new Set((await rowsOf()).map((row) => row.tab))
      tabs.delete(page.tab)
      await adoptFromTabs(page.locks, [...tabs], adopt, onLeftBehind, waiting.signal)
      const rows = await rowsOf()
      return { kept: readable(rows.filter((row) => row.tab === page.tab)), unreadable: rows.filter((row) => !rowSchema.safeParse(row).success).length }
    },
    add: async (kept) => {
      const order = (lastOrder = Math.max(Date.now(), lastOrder + 1))
      const transaction = (await open()).transaction('commands', 'readwrite')
      const before = await transaction.store.get([owner, kept.command.id])
      await transaction.store.put({ format, owner, commandId: kept.command.id, order: before?.order ?? order, tab: page.tab, ...kept })
      await transaction.done
    },
    remove: async (ids) => {
      const transaction = (await open()).transaction('commands', 'readwrite')
      await Promise.all([...ids.map((id) => transaction.store.delete([owner, id])), transaction.done])
    },
    close: () => waiting.abort(),
  }
}

/** How many commands of a member wait on this device, by job. */
export async function keptByJob(memberId: string): Promise<ReadonlyMap<string, number>> {
  const counts = new Map<string, number>()
  for (const { owner, refusal } of await (await open()).getAll('commands')) {
    const [jobId, member] = owner.split('/')
    if (jobId && member === memberId && refusal === null) counts.set(jobId, (counts.get(jobId) ?? 0) + 1)
  }
  return counts
}

const ownerOf = (jobId: string, memberId: string) => `${jobId}/${memberId}`

const readable = (rows: readonly Row[]): Kept[] =>
  [...rows]
    .sort((a, b) => a.order - b.order)
    .filter((row) => rowSchema.safeParse(row).success)
    .map(({ command, words, undoes, refusal }) => ({ command, words, undoes, refusal }))
