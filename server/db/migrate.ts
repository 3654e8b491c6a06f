import { fileURLToPath } from 'node:url'
import { drizzle } from 'drizzle-orm/mysql2'
import { migrate } from 'drizzle-orm/mysql2/migrator'
import mysql from 'mysql2/promise'

const folder = fileURLToPath(new URL('../../drizzle', import.meta.url))

/** Brings the schema up to this version. Two processes that start together take turns by a lock in the database. */
export async function migrateDatabase(url: string): Promise<void> {
  const connection = await mysql.createConnection({ uri: url, timezone: 'Z', charset: 'utf8mb4' })
  try {
    const [rows] = await connection.query<mysql.RowDataPacket[]>("SELECT GET_LOCK(CONCAT(DATABASE(), '.migrate'), 60) AS got")
    if (rows[0]?.['got'] !== 1) throw new Error('Another process is migrating the database and did not finish within a minute')
    await migrate(drizzle(connection), { migrationsFolder: folder })
  } finally {
    await connection.end()
  }
}
