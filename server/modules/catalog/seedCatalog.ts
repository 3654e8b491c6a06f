import type { CableDescription } from '../../../shared/model/cableType.ts'
import type { DeviceDescription } from '../../../shared/model/device.ts'
import type { Tx } from '../../db/client.ts'
import { cableTypeStore, deviceModelStore } from './catalogRepo.ts'

export interface CatalogSeed {
  readonly cableTypes: readonly CableDescription[]
  /** By a key that becomes the entry's id. */
  readonly deviceModels: Readonly<Record<string, DeviceDescription>>
}

/** What a new company's catalogue begins with. */
export async function seedCatalog(tx: Tx, companyId: string, { cableTypes, deviceModels }: CatalogSeed): Promise<void> {
  await cableTypeStore.insert(tx, companyId, cableTypes.map((description) => ({ id: `cable-${description.code.replace(/[^A-Za-z0-9_-]/g, '-')}`, version: 1, description })))
  await deviceModelStore.insert(tx, companyId, Object.entries(deviceModels).map(([key, description]) => ({ id: key, version: 1, description })))
}
