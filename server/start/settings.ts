import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { z } from 'zod'

export const projectFolder = fileURLToPath(new URL('../..', import.meta.url))

const environmentSchema = z.object({
  PORT: z.coerce.number('PORT must be a number').int().min(1, 'PORT must be 1 to 65535').max(65_535, 'PORT must be 1 to 65535').default(4310),
  MUDRING_DATA: z.string().min(1).optional(),
  DATABASE_URL: z.string().regex(/^(mysql|mariadb):\/\//, 'DATABASE_URL begins with mysql://').optional(),
  /** Set where a proxy in front speaks HTTPS. */
  MUDRING_SECURE: z.enum(['0', '1']).default('0'),
})

export interface Settings {
  readonly port: number
  /** Folder for the database, the files and the secret. */
  readonly dataFolder: string
  /** A server that exists; undefined: one is started here. */
  readonly databaseUrl: string | undefined
  readonly secure: boolean
  readonly sessionSecret: string
}

/** Reads the environment once. Throws an Error with a sentence for whoever started it. */
export function readSettings(environment: NodeJS.ProcessEnv = process.env): Settings {
  const parsed = environmentSchema.safeParse(environment)
  if (!parsed.success) throw new Error(parsed.error.issues.map((issue) => issue.message).join('. '))
  const { PORT, MUDRING_DATA, DATABASE_URL, MUDRING_SECURE } = parsed.data
  const dataFolder = resolve(MUDRING_DATA ?? join(projectFolder, '.mudring'))
  mkdirSync(dataFolder, { recursive: true, mode: 0o700 })
  return { port: PORT, dataFolder, databaseUrl: DATABASE_URL?.replace(/^mariadb:/, 'mysql:'), secure: MUDRING_SECURE === '1', sessionSecret: secretOf(dataFolder) }
}

function secretOf(folder: string): string {
  const file = join(folder, 'session-secret')
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 })
  return readFileSync(file, 'utf8').trim()
}
