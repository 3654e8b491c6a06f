import { and, asc, eq, inArray, sql, type SQL } from 'drizzle-orm'
import type { MySqlColumn, MySqlTable } from 'drizzle-orm/mysql-core'
import { find, type JobDocument, type Records } from '../../../shared/model/jobDocument.ts'
import { kinds, type JobRecord, type Kind } from '../../../shared/model/record.ts'
import type { Change } from '../../../shared/sync/change.ts'
import type { Tx } from '../../db/client.ts'
import { exactColumns } from '../../db/exactColumns.ts'
import { jobRowMappers } from '../../db/rows/jobRowMappers.ts'
import { jobRecordOf, jobRow } from '../../db/rows/jobRows.ts'
import type { PartMapper, Row, RowMapper } from '../../db/rows/rowMapper.ts'
import { jobs } from '../../db/tables/jobs.ts'
import { keysToPark, type Parked } from './keysToPark.ts'
import { editsOf, type Edit } from './rowEdits.ts'

/** Whose job, and which. Every statement about a job names both. */
export interface JobScope {
  readonly companyId: string
  readonly jobId: string
}

type OwnedKind = Exclude<Kind, 'job'>
const ownedKinds = kinds.filter((kind): kind is OwnedKind => kind !== 'job')
/** Rows or ids per statement: device models are the heaviest, and stay far below the server's largest packet. */
const perStatement = 200

/**
 * A job whole, or undefined. Always the same number of statements, whatever it holds. Call it inside a transaction:
 * only then do its statements see one moment.
 */
export async function loadJob(tx: Tx, scope: JobScope): Promise<JobDocument | undefined> {
  const [row] = await tx.select().from(jobs).where(and(eq(jobs.companyId, scope.companyId), eq(jobs.id, scope.jobId)))
  if (!row) return undefined
  const loaded = await Promise.all(ownedKinds.map(async (kind) => [kind, await loadKind(tx, scope, jobRowMappers[kind])] as const))
  const records = Object.fromEntries([['job', new Map([[row.id, jobRecordOf(row)]])], ...loaded])
  return { id: row.id, version: row.version, records: records as unknown as Records }
}

async function loadKind(tx: Tx, scope: JobScope, mapper: RowMapper): Promise<ReadonlyMap<string, JobRecord>> {
  const { table, part } = mapper
  const [rows, parts] = await Promise.all([
    tx.select(exactColumns(table as MySqlTable)).from(table as MySqlTable).where(within(scope, table)).orderBy(asc(table.seq)) as Promise<Row[]>,
    part ? (tx.select().from(part.table as MySqlTable).where(within(scope, part.table)).orderBy(asc(part.owner), asc(part.table.ordinal)) as Promise<Row[]>) : [],
  ])
  const partsOf = new Map<unknown, Row[]>()
  for (const row of parts) {
    const owner = row[part!.ownerName]
    const known = partsOf.get(owner)
    if (known) known.push(row)
    else partsOf.set(owner, [row])
  }
  return new Map(rows.map((row) => [row['id'] as string, mapper.fromRow(row, partsOf.get(row['id']) ?? []) as unknown as JobRecord]))
}

/**
 * Writes what a change did; `after` is the job it led to. Keys that change hands are parked first, then parents are
 * added before children, fields change, and at last children go before parents: the database refuses any other order.
 */
export async function writeChange(tx: Tx, scope: JobScope, change: Change, after: JobDocument): Promise<void> {
  const parked = keysToPark(after, change)
  for (const kind of ownedKinds) await park(tx, scope, kind, parked.get(kind))
  for (const kind of ownedKinds) await add(tx, scope, kind, change)
  await writeJobRecord(tx, scope, change, after)
  for (const kind of ownedKinds) await edit(tx, scope, kind, editsOf(jobRowMappers[kind], after, change, parked.get(kind)))
  for (const kind of ownedKinds.toReversed()) await remove(tx, scope, kind, change)
}

async function park(tx: Tx, scope: JobScope, kind: OwnedKind, parked: Parked | undefined): Promise<void> {
  if (!parked) return
  const { table } = jobRowMappers[kind]
  const aside: Record<string, SQL> = {}
  for (const column of parked.columns) aside[column] = parked.isText(column) ? sql`concat('~', ${table.seq})` : sql`-cast(${table.seq} as signed)`
  for (const ids of slices([...parked.ids])) await tx.update(table as MySqlTable).set(aside).where(and(within(scope, table), inArray(table.id, ids)))
}

async function add(tx: Tx, scope: JobScope, kind: OwnedKind, change: Change): Promise<void> {
  const mapper = jobRowMappers[kind]
  const added = change.added.filter((record) => record.kind === kind)
  await insert(tx, scope, mapper.table, added.map((record) => mapper.toRow(record as unknown as Row)))
  if (!mapper.part) return
  await insert(tx, scope, mapper.part.table, added.flatMap((record) => mapper.part!.toRows(record as unknown as Row)))
  for (const { record } of partEdits(mapper.part, kind, change)) await replaceParts(tx, scope, mapper.part, record)
}

async function insert(tx: Tx, scope: JobScope, table: MySqlTable, rows: readonly Row[]): Promise<void> {
  for (const some of slices(rows)) await tx.insert(table).values(some.map((row) => ({ ...row, ...scope })))
}

/** Puts the parts a record now has in place; those it no longer has go in `remove`, when nothing can point at them any more. */
async function replaceParts(tx: Tx, scope: JobScope, part: PartMapper, record: Row): Promise<void> {
  const rows = part.toRows(record)
  const names = Object.keys(rows[0] ?? {}).filter((name) => name !== part.ownerName && name !== part.keyName)
  const set = Object.fromEntries(names.map((name) => [name, sql`values(${sql.identifier(columnOf(part.table, name).name)})`]))
  for (const some of slices(rows)) await tx.insert(part.table as MySqlTable).values(some.map((row) => ({ ...row, ...scope }))).onDuplicateKeyUpdate({ set })
}

async function writeJobRecord(tx: Tx, scope: JobScope, change: Change, after: JobDocument): Promise<void> {
  if (!change.updated.some((update) => update.kind === 'job')) return
  const { id: _id, ...row } = jobRow(find(after, 'job', scope.jobId)!)
  await tx.update(jobs).set(row).where(and(eq(jobs.companyId, scope.companyId), eq(jobs.id, scope.jobId)))
}

/** Records whose same columns change go in one statement: all to one value, or each to its own. */
async function edit(tx: Tx, scope: JobScope, kind: OwnedKind, edits: readonly Edit[]): Promise<void> {
  const { table } = jobRowMappers[kind]
  const alike = new Map<string, Edit[]>()
  for (const each of edits) {
    const names = Object.keys(each.columns).sort().join()
    alike.set(names, [...(alike.get(names) ?? []), each])
  }
  for (const group of alike.values())
    for (const some of slices(group)) {
      const names = Object.keys(some[0]!.columns)
      const set = Object.fromEntries(names.map((name) => [name, valueFor(table, name, some)]))
      await tx.update(table as MySqlTable).set(set).where(and(within(scope, table), inArray(table.id, some.map(({ id }) => id))))
    }
}

function valueFor(table: RowMapper['table'], name: string, edits: readonly Edit[]): SQL {
  const column = columnOf(table, name)
  const values = edits.map(({ id, columns }) => [id, sql.param(columns[name], column)] as const)
  const [first] = edits
  if (edits.every(({ columns }) => columns[name] === first!.columns[name])) return sql`${values[0]![1]}`
  return sql`case ${table.id} ${sql.join(values.map(([id, value]) => sql`when ${id} then ${value}`), sql` `)} end`
}

async function remove(tx: Tx, scope: JobScope, kind: OwnedKind, change: Change): Promise<void> {
  const { table, part } = jobRowMappers[kind]
  if (part)
    for (const { id, gone } of partEdits(part, kind, change))
      for (const keys of slices(gone)) await tx.delete(part.table as MySqlTable).where(and(within(scope, part.table), eq(part.owner, id), inArray(part.key, keys)))
  const ids = change.removed.filter((record) => record.kind === kind).map((record) => record.id)
  for (const some of slices(ids)) {
    if (part) await tx.delete(part.table as MySqlTable).where(and(within(scope, part.table), inArray(part.owner, some)))
    await tx.delete(table as MySqlTable).where(and(within(scope, table), inArray(table.id, some)))
  }
}

/** Records whose list of parts changed: the record as it is now as far as its parts go, and the keys of parts that went. */
function partEdits(part: PartMapper, kind: OwnedKind, change: Change): { id: string; record: Row; gone: unknown[] }[] {
  return change.updated
    .filter((update) => update.kind === kind && part.field in update.fields)
    .map(({ id, fields }) => {
      const [before, now] = fields[part.field]!.map((list) => ({ id, [part.field]: list }))
      const kept = new Set(part.toRows(now!).map((row) => row[part.keyName]))
      return { id, record: now!, gone: part.toRows(before!).map((row) => row[part.keyName]).filter((key) => !kept.has(key)) }
    })
}

const within = (scope: JobScope, table: Record<'companyId' | 'jobId', MySqlColumn>) => and(eq(table.companyId, scope.companyId), eq(table.jobId, scope.jobId))
const columnOf = (table: MySqlTable, name: string) => (table as unknown as Record<string, MySqlColumn>)[name]!

function* slices<T>(all: readonly T[]): Generator<T[]> {
  for (let from = 0; from < all.length; from += perStatement) yield all.slice(from, from + perStatement)
}
