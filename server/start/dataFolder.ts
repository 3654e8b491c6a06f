import {
  chmodSync,
  closeSync,
  existsSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeSync,
} from 'node:fs'
import { join } from 'node:path'
import { z } from 'zod'

const secretFile = 'session-secret'

/**
 * Makes the private folder, or takes one that is Mudring's already. Throws an Error rather than move in with other
 * files.
 */
export function prepareDataFolder(folder: string): void {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const inside = readdirSync(folder)
  if (inside.length && !inside.includes(secretFile) && !inside.includes('database.json'))
    throw new Error(`${folder} holds other files and no data of Mudring. Set MUDRING_DATA to a folder of its own`)
  chmodSync(folder, 0o700)
}

/** Writes a file whole or not at all, for its owner's eyes. */
export function writePrivately(file: string, text: string): void {
  const draft = `${file}.${process.pid}.new`
  const descriptor = openSync(draft, 'w', 0o600)
  writeSync(descriptor, text)
  fsyncSync(descriptor)
  closeSync(descriptor)
  renameSync(draft, file)
}

/** The secret that session cookies are signed with; made once. */
export function sessionSecretOf(folder: string, make: () => string): string {
  const file = join(folder, secretFile)
  if (!existsSync(file)) writePrivately(file, make())
  return readFileSync(file, 'utf8').trim()
}

const holderSchema = z.object({ pid: z.int(), since: z.string() })

/**
 * Holds a data folder for this process: a second server on it would stop the first one's database. What a killed
 * process left is taken over. Returns what lets go of it. Throws an Error when another process holds it.
 */
export function holdDataFolder(folder: string): () => void {
  const file = join(folder, 'running.json')
  const holder = existsSync(file) ? readHolder(file) : undefined
  if (holder && holder.pid !== process.pid && startOf(holder.pid) === holder.since)
    throw new Error(
      `Mudring is running already on ${folder} (process ${holder.pid}). ` +
        'Stop it first, or set MUDRING_DATA to another folder',
    )
  writePrivately(file, JSON.stringify({ pid: process.pid, since: startOf(process.pid) ?? '' }))
  return () => rmSync(file, { force: true })
}

function readHolder(file: string): z.output<typeof holderSchema> | undefined {
  try {
    return holderSchema.parse(JSON.parse(readFileSync(file, 'utf8')))
  } catch {
    return undefined
  }
}

/** When a process began, in ticks since the machine did; a number that was used again names another process. */
function startOf(pid: number): string | undefined {
  const file = `/proc/${pid}/stat`
  if (!existsSync(file)) return undefined
  const stat = readFileSync(file, 'utf8')
  return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19]
}
