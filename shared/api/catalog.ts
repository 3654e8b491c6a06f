import { z } from 'zod'
import { cableDescriptionSchema, type CableDescription } from '../model/cableType.ts'
import { deviceDescriptionSchema, type DeviceDescription } from '../model/device.ts'
import { idSchema } from '../model/fields.ts'

/** An entry of the company's catalogue. Its version counts up with each change, and a job's copy remembers which it took. */
export interface CatalogEntry<Description> {
  readonly id: string
  readonly version: number
  readonly description: Description
}
export type CatalogCableType = CatalogEntry<CableDescription>
export type CatalogDeviceModel = CatalogEntry<DeviceDescription>

/** GET /api/catalog */
export interface Catalog {
  readonly cableTypes: readonly CatalogCableType[]
  readonly deviceModels: readonly CatalogDeviceModel[]
}

export const catalogParamsSchema = z.strictObject({ id: idSchema })

/** POST /api/catalog/cable-types: the id comes from the client, so that a repeated request does no harm. */
export const addCableTypeSchema = z.strictObject({ id: idSchema, description: cableDescriptionSchema })
/** PUT /api/catalog/cable-types/:id: whole, over the version its author was looking at; 409 with both where it moved on. */
export const updateCableTypeSchema = z.strictObject({ version: z.int().min(1), description: cableDescriptionSchema })
export const addDeviceModelSchema = z.strictObject({ id: idSchema, description: deviceDescriptionSchema })
export const updateDeviceModelSchema = z.strictObject({ version: z.int().min(1), description: deviceDescriptionSchema })
/** DELETE /api/catalog/cable-types/:id?version=3 */
export const removeEntryQuerySchema = z.strictObject({ version: z.coerce.number().int().min(1).max(Number.MAX_SAFE_INTEGER) })

/** Details of the 409 when an entry has changed or gone since: what was sent, and what stands (null: removed). */
export interface CatalogConflict<Description> {
  readonly mine: Description | null
  readonly theirs: CatalogEntry<Description> | null
}
