import { getTableColumns, sql, type SQL } from 'drizzle-orm'
import { MySqlDouble, type MySqlColumn, type MySqlTable } from 'drizzle-orm/mysql-core'

/**
 * The columns of a table, to select. Figures come as text and are read here: the driver's own reading of a DOUBLE is
 * off by a few units in the last place when it has 16 digits, and a figure that comes back changed looks like somebody's edit.
 */
export function exactColumns<Table extends MySqlTable>(table: Table): Table['_']['columns'] {
  const columns = Object.entries(getTableColumns(table)).map(([name, column]): [string, MySqlColumn | SQL] => [name, column instanceof MySqlDouble ? sql`cast(${column} as char)`.mapWith(Number) : column])
  return Object.fromEntries(columns) as Table['_']['columns']
}
