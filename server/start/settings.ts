import { randomBytes } from 'node:crypto'
import { join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { z } from 'zod'
import { prepareDataFolder, sessionSecretOf } from './dataFolder.ts'

export const projectFolder = fileURLToPath(new URL('../..', import.meta.url))

const databaseUrlSchema = (name: string) =>
  z
    .string()
    .regex(/^(mysql|mariadb):\/\//, `${name} begins with mysql://`)
    .transform((url) => url.replace(/^mariadb:/, 'mysql:'))
const environmentSchema = z.object({
  PORT: z.coerce
    .number('PORT must be a number')
    .int('PORT must be a whole number')
    .min(1, 'PORT must be 1 to 65535')
    .max(65_535, 'PORT must be 1 to 65535')
    .default(4310),
  MUDRING_DATA: z.string().min(1).optional(),
  DATABASE_URL: databaseUrlSchema('DATABASE_URL').optional(),
  /** The same database as a user who may change its schema; DATABASE_URL's user where there is no other. */
  DATABASE_MIGRATION_URL: databaseUrlSchema('DATABASE_MIGRATION_URL').optional(),
  /** Set where a proxy in front speaks HTTPS. */
  MUDRING_SECURE: z.enum(['0', '1'], 'MUDRING_SECURE is 0 or 1').default('0'),
  LOG_LEVEL: z
    .enum(
      ['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent'],
      'LOG_LEVEL is one of trace, debug, info, warn, error, fatal, silent',
    )
    .default('warn'),
})

export interface DatabaseUrls {
  readonly url: string
  readonly migrationUrl: string
}

export interface Settings {
  readonly port: number
  /** Folder for the database and the secret. */
  readonly dataFolder: string
  /** A server that exists; undefined: one is started here. */
  readonly database: DatabaseUrls | undefined
  readonly secure: boolean
  readonly sessionSecret: string
  readonly logLevel: z.output<typeof environmentSchema>['LOG_LEVEL']
}

/** Reads the environment once and prepares the data folder. Throws an Error with a sentence for whoever started it. */
export function readSettings(environment: NodeJS.ProcessEnv = process.env): Settings {
  const parsed = environmentSchema.safeParse(environment)
  if (!parsed.success) throw new Error(parsed.error.issues.map((issue) => issue.message).join('. '))
  const { PORT, MUDRING_DATA, DATABASE_URL, DATABASE_MIGRATION_URL, MUDRING_SECURE, LOG_LEVEL } = parsed.data
  const dataFolder = resolve(MUDRING_DATA ?? join(projectFolder, '.mudring'))
  prepareDataFolder(dataFolder)
  return {
    port: PORT,
    dataFolder,
    database:
      DATABASE_URL === undefined
        ? undefined
        : { url: DATABASE_URL, migrationUrl: DATABASE_MIGRATION_URL ?? DATABASE_URL },
    secure: MUDRING_SECURE === '1',
    sessionSecret: sessionSecretOf(dataFolder, () => randomBytes(32).toString('hex')),
    logLevel: LOG_LEVEL,
  }
}
