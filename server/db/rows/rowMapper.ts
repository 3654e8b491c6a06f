import type { MySqlTable, MySqlColumn } from 'drizzle-orm/mysql-core'
import type { Kind, RecordOf } from '../../../shared/model/record.ts'

export type Row = Record<string, unknown>

/** The columns every row of a job has, which no record speaks of. */
type Scope = 'companyId' | 'jobId' | 'seq'
/** What a table says of a record: every column is named, so that a forgotten one does not compile. */
export type ContentOf<Table extends MySqlTable> = Omit<Table['$inferSelect'], Scope>

type OwnedTable = MySqlTable & Record<'companyId' | 'jobId' | 'id' | 'seq', MySqlColumn>

/** A list inside a record that lies in a table of its own: the jacks of a plate, the chases of a run. */
export interface PartMapper {
  readonly table: MySqlTable & Record<'companyId' | 'jobId' | 'ordinal', MySqlColumn>
  /** Whose part it is, and what tells two parts of one owner apart. */
  readonly owner: MySqlColumn
  readonly key: MySqlColumn
  readonly ownerName: string
  readonly keyName: string
  readonly field: string
  readonly toRows: (record: Row) => Row[]
}

/** How records of one kind lie in tables, both ways. */
export interface RowMapper {
  readonly kind: Kind
  readonly table: OwnedTable
  readonly toRow: (record: Row) => Row
  /** `parts` are the rows of the part table that belong to this record, in order. */
  readonly fromRow: (row: Row, parts: readonly Row[]) => Row
  readonly part?: PartMapper
}

/**
 * States a mapper with the types of its own kind and table, and hands it on as one of many. The one place where
 * those types are let go.
 */
export function defineRows<K extends Kind, Table extends OwnedTable, PartTable extends PartMapper['table'] = never>(mapper: {
  readonly kind: K
  readonly table: Table
  readonly toRow: (record: RecordOf<K>) => ContentOf<Table>
  readonly fromRow: (row: ContentOf<Table>, parts: readonly PartTable['$inferSelect'][]) => RecordOf<K>
  readonly part?: {
    readonly table: PartTable
    readonly owner: keyof PartTable['$inferSelect'] & keyof PartTable & string
    readonly key: keyof PartTable['$inferSelect'] & keyof PartTable & string
    readonly field: keyof RecordOf<K> & string
    readonly toRows: (record: RecordOf<K>) => Omit<PartTable['$inferSelect'], 'companyId' | 'jobId'>[]
  }
}): RowMapper {
  const { part, ...whole } = mapper
  const column = (name: keyof PartTable & string) => part!.table[name] as unknown as MySqlColumn
  const erased = part && { table: part.table, owner: column(part.owner), key: column(part.key), ownerName: part.owner, keyName: part.key, field: part.field, toRows: part.toRows }
  return { ...whole, ...(erased ? { part: erased } : {}) } as unknown as RowMapper
}
