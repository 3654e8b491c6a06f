import { sql } from 'drizzle-orm'
import type { Db } from './client.ts'

/** What the server must promise so that nothing acknowledged is lost when the power goes. */
const wanted: Record<string, (value: string) => boolean> = {
  innodb_flush_log_at_trx_commit: (value) => value === '1',
  innodb_doublewrite: (value) => value !== 'OFF',
  innodb_rollback_on_timeout: (value) => value === 'ON',
  sql_mode: (value) => value.includes('STRICT_TRANS_TABLES') || value.includes('STRICT_ALL_TABLES'),
}

/** The settings of the database that do not keep that promise, as sentences. */
export async function durabilityFaults(db: Db): Promise<string[]> {
  const faults: string[] = []
  for (const [name, good] of Object.entries(wanted)) {
    const [rows] = (await db.execute(sql.raw(`SELECT @@GLOBAL.${name} AS value`))) as unknown as [{ value: unknown }[]]
    const value = String(rows[0]?.value)
    const shown = value === '1' && name !== 'innodb_flush_log_at_trx_commit' ? 'ON' : value === '0' && name !== 'innodb_flush_log_at_trx_commit' ? 'OFF' : value
    if (!good(shown)) faults.push(`${name} is ${shown}`)
  }
  return faults
}
