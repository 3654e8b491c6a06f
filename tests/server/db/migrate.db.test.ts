import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import mysql from 'mysql2/promise'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { migrateDatabase } from '../../../server/db/migrate.ts'
import { readSteps, type Step } from '../../../server/db/migrations.ts'
import { makeSchema, type TestSchema } from '../../support/testSchema.ts'

const steps = readSteps()
const made: TestSchema[] = []
async function freshSchema(): Promise<TestSchema> {
  const schema = await makeSchema()
  made.push(schema)
  return schema
}
let clean: TestSchema
beforeAll(async () => {
  clean = await freshSchema()
  await migrateDatabase(clean.migrationUrl)
})
afterAll(() => Promise.all(made.map((schema) => schema.drop())))

async function ask(url: string, ...statements: string[]): Promise<mysql.RowDataPacket[]> {
  const connection = await mysql.createConnection({ uri: url })
  try {
    let rows: mysql.RowDataPacket[] = []
    for (const statement of statements) [rows] = await connection.query<mysql.RowDataPacket[]>(statement)
    return rows
  } finally {
    await connection.end()
  }
}

/** Every table as the server would write it down, and what has run. */
async function shapeOf({ migrationUrl }: TestSchema) {
  const tables = await ask(migrationUrl, 'SHOW TABLES')
  const shapes: Record<string, unknown> = {}
  for (const row of tables) {
    const name = String(Object.values(row)[0])
    shapes[name] = String((await ask(migrationUrl, `SHOW CREATE TABLE \`${name}\``))[0]!['Create Table']).replace(
      / AUTO_INCREMENT=\d+/,
      '',
    )
  }
  return { shapes, done: await ask(migrationUrl, 'SELECT * FROM schema_steps ORDER BY migration, position') }
}

describe('the migrations', () => {
  it('make a schema once; a second time they do nothing', async () => {
    const before = await shapeOf(clean)
    expect(Object.keys(before.shapes).length).toBeGreaterThan(15)
    expect(before.done).toHaveLength(steps.length)
    await migrateDatabase(clean.migrationUrl)
    expect(await shapeOf(clean)).toEqual(before)
  })

  it('go on after a process that died behind any of their statements', async () => {
    const schema = await freshSchema()
    for (const [index, step] of steps.entries()) {
      // The statement has run and committed; the process died before it was noted.
      await migrateDatabase(schema.migrationUrl, steps.slice(0, index))
      await ask(schema.migrationUrl, step.statement)
      await migrateDatabase(schema.migrationUrl, steps.slice(0, index + 1))
    }
    expect(await shapeOf(schema)).toEqual(await shapeOf(clean))
  }, 120_000)

  it('take turns when several processes start at once', async () => {
    const schema = await freshSchema()
    await Promise.all([1, 2, 3, 4].map(() => migrateDatabase(schema.migrationUrl)))
    expect(await shapeOf(schema)).toEqual(await shapeOf(clean))
  })

  it('stop at a statement that fails, say which, and go on from there when it is mended', async () => {
    const schema = await freshSchema()
    const step = (position: number, statement: string): Step => ({
      migration: '0000_probe',
      position,
      statement,
      digest: `${position}`.repeat(64),
    })
    const first = step(0, 'CREATE TABLE probe (id int PRIMARY KEY)')
    const bad = [first, step(1, 'ALTER TABLE nowhere ADD x int'), step(2, 'ALTER TABLE probe ADD y int')]
    await expect(migrateDatabase(schema.migrationUrl, bad)).rejects.toThrow(
      'The migration 0000_probe stopped at its statement 2',
    )
    const mended = [first, step(1, 'ALTER TABLE probe ADD x int'), step(2, 'ALTER TABLE probe ADD y int')]
    await migrateDatabase(schema.migrationUrl, mended)
    expect((await ask(schema.migrationUrl, 'SHOW COLUMNS FROM probe')).map((row) => row['Field'])).toEqual([
      'id',
      'x',
      'y',
    ])
  })

  it('never take what stands for their own work in mid-run', async () => {
    const schema = await freshSchema()
    await ask(schema.migrationUrl, 'CREATE TABLE second (other int)')
    const step = (position: number, table: string): Step => ({
      migration: '0000_probe',
      position,
      statement: `CREATE TABLE ${table} (id int)`,
      digest: `${position}`.repeat(64),
    })
    await expect(migrateDatabase(schema.migrationUrl, [step(0, 'first'), step(1, 'second')])).rejects.toThrow(
      'stopped at its statement 2',
    )
  })

  it('do not touch a database of a newer version', async () => {
    const schema = await freshSchema()
    const newer: Step = {
      migration: '9999_later',
      position: 0,
      statement: 'CREATE TABLE later (id int)',
      digest: 'f'.repeat(64),
    }
    await migrateDatabase(schema.migrationUrl, [...steps, newer])
    await expect(migrateDatabase(schema.migrationUrl)).rejects.toThrow('newer version of Mudring')
  })

  it('notice that one was edited after it ran', async () => {
    const edited = steps.map((step, index) => (index === 3 ? { ...step, digest: 'e'.repeat(64) } : step))
    await expect(migrateDatabase(clean.migrationUrl, edited)).rejects.toThrow('has been edited since it ran')
  })

  it('are read in the order of their journal', () => {
    const folder = mkdtempSync(join(tmpdir(), 'mudring-migrations-'))
    mkdirSync(join(folder, 'meta'))
    writeFileSync(
      join(folder, 'meta/_journal.json'),
      JSON.stringify({
        entries: [
          { idx: 1, tag: '0001_b' },
          { idx: 0, tag: '0000_a' },
        ],
      }),
    )
    writeFileSync(
      join(folder, '0000_a.sql'),
      'CREATE A;\n--> statement-breakpoint\nCREATE B;\n--> statement-breakpoint\n',
    )
    writeFileSync(join(folder, '0001_b.sql'), 'CREATE C;')
    expect(readSteps(folder).map((step) => [step.migration, step.position, step.statement])).toEqual([
      ['0000_a', 0, 'CREATE A;'],
      ['0000_a', 1, 'CREATE B;'],
      ['0001_b', 0, 'CREATE C;'],
    ])
    rmSync(folder, { recursive: true })
  })
})

describe('the application’s user', () => {
  it('reads and writes rows, and nothing else', async () => {
    await expect(ask(clean.url, 'SELECT * FROM companies')).resolves.toEqual([])
    for (const statement of [
      'CREATE TABLE mine (id int)',
      'DROP TABLE job_log',
      'ALTER TABLE members ADD x int',
      'SELECT * FROM mysql.global_priv',
      'GRANT ALL ON *.* TO CURRENT_USER',
      "SELECT 1 INTO OUTFILE '/tmp/mudring-x'",
      'SHUTDOWN',
    ])
      await expect(ask(clean.url, statement), statement).rejects.toThrow(/denied/)
  })
})
