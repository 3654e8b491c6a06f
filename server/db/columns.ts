import { customType } from 'drizzle-orm/mysql-core'

/** An id or a key: plain ASCII compared byte by byte, so that two ids which differ in their capitals are two. */
export const idColumn = customType<{ data: string }>({
  dataType: () => 'varchar(64) character set ascii collate ascii_bin',
})

/** A short key inside a record, such as a terminal's: as an id. */
export const keyColumn = customType<{ data: string }>({
  dataType: () => 'varchar(24) character set ascii collate ascii_bin',
})

/**
 * A code or a label that must be unique whatever its capitals: plain ASCII. Wider than what people may write,
 * because a write that swaps two codes parks them under a longer one first.
 */
export const codeColumn = customType<{ data: string }>({
  dataType: () => 'varchar(32) character set ascii collate ascii_general_ci',
})

/**
 * A leaf value as JSON. MariaDB keeps JSON as text; whether the driver has parsed it depends on its version, so both
 * are taken.
 */
export const jsonColumn = <T>(name: string) =>
  customType<{ data: T; driverData: unknown }>({
    dataType: () => 'json',
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (value) => (typeof value === 'string' ? JSON.parse(value) : value) as T,
  })(name)
