import { sql } from 'drizzle-orm'
import type { Db } from './client.ts'

/**
 * What the server must promise so that nothing acknowledged is lost when the power goes (MariaDB's documentation of
 * these variables).
 */
const wanted: Record<string, { readonly good: (value: string) => boolean; readonly need: string }> = {
  '@@GLOBAL.innodb_flush_log_at_trx_commit': { good: (value) => value === '1', need: '1' },
  '@@GLOBAL.innodb_doublewrite': { good: (value) => isOn(value) || value === 'fast', need: 'ON' },
  '@@GLOBAL.innodb_rollback_on_timeout': { good: isOn, need: 'ON' },
  'IF(@@GLOBAL.log_bin, @@GLOBAL.sync_binlog, 1)': { good: (value) => value === '1', need: '1' },
  '@@SESSION.innodb_snapshot_isolation': { good: isOn, need: 'ON' },
  '@@SESSION.sql_mode': { good: (value) => /STRICT_(TRANS|ALL)_TABLES/.test(value), need: 'strict' },
  '@@character_set_database': { good: (value) => value === 'utf8mb4', need: 'utf8mb4' },
}

function isOn(value: string): boolean {
  return value === '1' || value === 'ON'
}

/** The settings of the database that do not keep the promise, as sentences; none: it keeps what it acknowledges. */
export async function durabilityFaults(db: Db): Promise<string[]> {
  const columns = Object.keys(wanted).map((name, index) => `${name} AS v${index}`)
  const [rows] = (await db.execute(sql.raw(`SELECT ${columns.join(', ')}`))) as unknown as [Record<string, unknown>[]]
  return Object.entries(wanted).flatMap(([name, { good, need }], index) => {
    const value = String(rows[0]?.[`v${index}`])
    return good(value)
      ? []
      : [`${name.replace(/^@@(GLOBAL|SESSION)?\.?/, '').replace(/^IF.*/, 'sync_binlog')} is ${value}, not ${need}`]
  })
}
