import { and, asc, eq } from 'drizzle-orm'
import type { CatalogEntry } from '../../../shared/api/catalog.ts'
import type { CableDescription } from '../../../shared/model/cableType.ts'
import type { DeviceDescription } from '../../../shared/model/device.ts'
import type { Session, Tx } from '../../db/client.ts'
import { exactColumns } from '../../db/exactColumns.ts'
import { cableDescriptionOf, deviceDescriptionOf } from '../../db/rows/descriptions.ts'
import { catalogCableTypes as cables, catalogDeviceModels as models } from '../../db/tables/models.ts'

/** Where one kind of entry is kept. */
export interface CatalogStore<Description> {
  /** What a person calls such an entry. */
  readonly word: string
  readonly list: (db: Session, companyId: string) => Promise<CatalogEntry<Description>[]>
  /** The entry, locked until the transaction ends, or undefined. */
  readonly lock: (tx: Tx, companyId: string, id: string) => Promise<CatalogEntry<Description> | undefined>
  readonly insert: (tx: Tx, companyId: string, entries: readonly CatalogEntry<Description>[]) => Promise<void>
  readonly update: (tx: Tx, companyId: string, entry: CatalogEntry<Description>) => Promise<void>
  readonly remove: (tx: Tx, companyId: string, id: string) => Promise<void>
}

const cableEntry = (row: typeof cables.$inferSelect): CatalogEntry<CableDescription> => ({ id: row.id, version: row.version, description: cableDescriptionOf(row) })
const isCable = (companyId: string, id: string) => and(eq(cables.companyId, companyId), eq(cables.id, id))

export const cableTypeStore: CatalogStore<CableDescription> = {
  word: 'cable type',
  list: async (db, companyId) => (await db.select(exactColumns(cables)).from(cables).where(eq(cables.companyId, companyId)).orderBy(asc(cables.code))).map(cableEntry),
  lock: async (tx, companyId, id) => (await tx.select(exactColumns(cables)).from(cables).where(isCable(companyId, id)).for('update')).map(cableEntry)[0],
  insert: async (tx, companyId, entries) => {
    if (entries.length) await tx.insert(cables).values(entries.map(({ id, version, description }) => ({ companyId, id, version, ...description })))
  },
  update: async (tx, companyId, { id, version, description }) => {
    await tx.update(cables).set({ version, ...description }).where(isCable(companyId, id))
  },
  remove: async (tx, companyId, id) => {
    await tx.delete(cables).where(isCable(companyId, id))
  },
}

const modelEntry = (row: typeof models.$inferSelect): CatalogEntry<DeviceDescription> => ({ id: row.id, version: row.version, description: deviceDescriptionOf(row) })
const isModel = (companyId: string, id: string) => and(eq(models.companyId, companyId), eq(models.id, id))

export const deviceModelStore: CatalogStore<DeviceDescription> = {
  word: 'device model',
  list: async (db, companyId) => (await db.select(exactColumns(models)).from(models).where(eq(models.companyId, companyId)).orderBy(asc(models.category), asc(models.name), asc(models.id))).map(modelEntry),
  lock: async (tx, companyId, id) => (await tx.select(exactColumns(models)).from(models).where(isModel(companyId, id)).for('update')).map(modelEntry)[0],
  insert: async (tx, companyId, entries) => {
    if (entries.length) await tx.insert(models).values(entries.map(({ id, version, description }) => ({ companyId, id, version, ...description })))
  },
  update: async (tx, companyId, { id, version, description }) => {
    await tx.update(models).set({ version, ...description }).where(isModel(companyId, id))
  },
  remove: async (tx, companyId, id) => {
    await tx.delete(models).where(isModel(companyId, id))
  },
}
