import { userInfo } from 'node:os'
import type { Connection } from 'mysql2/promise'

export const schema = 'mudring'
/** Reads and writes rows. What the application runs as. */
export const applicationUser = 'mudring'
/** May also change the schema. Used by migrations, and by tests to make schemas of their own. */
export const migrationUser = 'mudring_schema'

/**
 * The account of the data folder's owner: made by mariadb-install-db for whoever ran it, let in by the socket alone.
 */
export const ownerAccount = () => userInfo().username

/** Makes the schema and the two users, each with no more than it needs, on schemas of that name and no others. */
export async function prepareUsers(
  owner: Connection,
  passwords: { readonly application: string; readonly migration: string },
): Promise<void> {
  await owner.query(`CREATE DATABASE IF NOT EXISTS ${schema} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`)
  await prepare(owner, applicationUser, passwords.application, 'SELECT, INSERT, UPDATE, DELETE')
  await prepare(owner, migrationUser, passwords.migration, 'ALL PRIVILEGES')
}

async function prepare(owner: Connection, user: string, password: string, rights: string) {
  await owner.query(`CREATE OR REPLACE USER '${user}'@'127.0.0.1' IDENTIFIED BY ${owner.escape(password)}`)
  await owner.query(`GRANT ${rights} ON \`${schema}%\`.* TO '${user}'@'127.0.0.1'`)
}
