import mysql from 'mysql2/promise'
import { errnoOf } from './errors.ts'
import { readSteps, type Step } from './migrations.ts'

/**
 * Errors of a statement whose work stands already: table, column, key, foreign key or check there; column or key gone.
 */
const doneAlready = new Set([1050, 1060, 1061, 1826, 1051, 1091])
/**
 * MariaDB says of a foreign key that is there only that the table cannot be made, and InnoDB's number for a duplicate.
 */
const cannotCreate = 1005
const isDoneAlready = (error: unknown) => {
  const errno = errnoOf(error) ?? 0
  return doneAlready.has(errno) || (errno === cannotCreate && String(error).includes('errno: 121'))
}

/**
 * Brings the schema up to this version and no further. What has run is noted statement by statement, so that a
 * migration that was killed half-way goes on where it stopped. Two processes that start together take turns by a lock
 * in the database. Throws an Error with a sentence when the schema is a newer version's or a migration was edited.
 */
export async function migrateDatabase(url: string, steps: readonly Step[] = readSteps()): Promise<void> {
  const connection = await mysql.createConnection({ uri: url, timezone: 'Z', charset: 'utf8mb4' })
  try {
    await takeTurn(connection)
    await connection.query(
      `CREATE TABLE IF NOT EXISTS schema_steps (
        migration varchar(100) NOT NULL,
        position int NOT NULL,
        digest char(64) NOT NULL,
        PRIMARY KEY (migration, position)
      )`,
    )
    const done = await readDone(connection)
    const pending = steps.filter((step) => !done.has(keyOf(step)))
    assertSameHistory(steps, done)
    for (const [index, step] of pending.entries()) await run(connection, step, index === 0)
  } finally {
    await connection.end()
  }
}

const keyOf = ({ migration, position }: Pick<Step, 'migration' | 'position'>) => `${migration}/${position}`

async function takeTurn(connection: mysql.Connection) {
  const [rows] = await connection.query<mysql.RowDataPacket[]>(
    "SELECT GET_LOCK(CONCAT(DATABASE(), '.migrate'), 60) AS got",
  )
  if (rows[0]?.['got'] !== 1)
    throw new Error('Another process is migrating the database and did not finish within a minute')
}

async function readDone(connection: mysql.Connection): Promise<Map<string, string>> {
  const [rows] = await connection.query<mysql.RowDataPacket[]>('SELECT migration, position, digest FROM schema_steps')
  return new Map(
    rows.map((row) => [
      keyOf({ migration: String(row['migration']), position: Number(row['position']) }),
      String(row['digest']),
    ]),
  )
}

function assertSameHistory(steps: readonly Step[], done: ReadonlyMap<string, string>) {
  const known = new Map(steps.map((step) => [keyOf(step), step.digest]))
  for (const [key, digest] of done) {
    const migration = key.split('/')[0]
    if (!known.has(key)) throw new Error(`${newer} (it knows the migration ${migration}). ${orRestore}`)
    if (known.get(key) !== digest) throw new Error(`The migration ${migration} ${edited}. ${orEmpty}`)
  }
}

const newer = 'The database has been brought up to a newer version of Mudring than this one'
const orRestore = 'Start that version, or restore an older backup'
const edited = 'has been edited since it ran on this database'
const orEmpty = 'Migrations are added, never edited; start with an empty data folder if nothing in it is to be kept'

/**
 * Runs a statement and notes it in one transaction. A statement that changes the schema commits by itself; if the
 * process died between the two, the first statement of the next run finds its work done.
 */
async function run(connection: mysql.Connection, { migration, position, statement, digest }: Step, isFirst: boolean) {
  await connection.beginTransaction()
  try {
    await connection.query(statement)
  } catch (error) {
    if (!(isFirst && isDoneAlready(error)))
      throw new Error(`The migration ${migration} stopped at its statement ${position + 1}`, { cause: error })
  }
  await connection.query('INSERT INTO schema_steps (migration, position, digest) VALUES (?, ?, ?)', [
    migration,
    position,
    digest,
  ])
  await connection.commit()
}
