import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { z } from 'zod'

/** Where the generated migrations lie: beside the server's code, in the order of their journal. */
export const migrationsFolder = fileURLToPath(new URL('../../drizzle', import.meta.url))

const journalSchema = z.object({ entries: z.array(z.object({ idx: z.int(), tag: z.string() })) })

/** One statement of one migration. */
export interface Step {
  readonly migration: string
  readonly position: number
  readonly statement: string
  /** Of the statement: a migration that was edited after it ran is noticed by it. */
  readonly digest: string
}

/** Every statement of every migration, in order. */
export function readSteps(folder: string = migrationsFolder): Step[] {
  const { entries } = journalSchema.parse(JSON.parse(readFileSync(join(folder, 'meta/_journal.json'), 'utf8')))
  return entries
    .sort((a, b) => a.idx - b.idx)
    .flatMap(({ tag }) =>
      readFileSync(join(folder, `${tag}.sql`), 'utf8')
        .split('--> statement-breakpoint')
        .map((statement) => statement.trim())
        .filter((statement) => statement !== '')
        .map((statement, position) => ({
          migration: tag,
          position,
          statement,
          digest: createHash('sha256').update(statement).digest('hex'),
        })),
    )
}
