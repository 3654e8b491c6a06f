import { boolean, double, foreignKey, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar } from 'drizzle-orm/mysql-core'
import { cableFamilies, categories, conductorMaterials, jacketColours, jacketRatings, strandings, type CableDescription } from '../../../shared/model/cableType.ts'
import { deviceCategories, type DeviceDescription } from '../../../shared/model/device.ts'
import { codeColumn, idColumn, jsonColumn } from '../columns.ts'
import { companies } from './companies.ts'
import { jobs } from './jobs.ts'
import { owned } from './owned.ts'

/** What describes a kind of cable: the same columns in the company's catalogue and in a job's own copy. */
const cableDescription = () => ({
  code: codeColumn('code').notNull(),
  name: varchar('name', { length: 80 }).notNull(),
  family: mysqlEnum('family', cableFamilies).notNull(),
  labelKind: varchar('label_kind', { length: 2 }).notNull(),
  conductors: int('conductors').notNull(),
  awg: double('awg'),
  areaMm2: double('area_mm2'),
  stranding: mysqlEnum('stranding', strandings).notNull(),
  material: mysqlEnum('material', conductorMaterials).notNull(),
  resistanceOhmPerKm: double('resistance_ohm_per_km'),
  category: mysqlEnum('category', categories),
  jacketRating: mysqlEnum('jacket_rating', jacketRatings).notNull(),
  wet: boolean('wet').notNull(),
  outdoor: boolean('outdoor').notNull(),
  buried: boolean('buried').notNull(),
  outerDiameterUm: int('outer_diameter_um').notNull(),
  jacketColour: mysqlEnum('jacket_colour', jacketColours).notNull(),
  putUps: jsonColumn<CableDescription['putUps']>('put_ups').notNull(),
})

/** What describes a kind of device, likewise. */
const deviceDescription = () => ({
  name: varchar('name', { length: 80 }).notNull(),
  category: mysqlEnum('category', deviceCategories).notNull(),
  rackUnits: int('rack_units').notNull(),
  terminals: jsonColumn<DeviceDescription['terminals']>('terminals').notNull(),
  passes: jsonColumn<DeviceDescription['passes']>('passes').notNull(),
  sharedPowerW: double('shared_power_w'),
})

/** The entry and the version a copy was taken from: a memory only, since an entry may be removed. */
const takenFrom = () => ({ catalogId: idColumn('catalog_id'), catalogVersion: int('catalog_version') })

export const catalogCableTypes = mysqlTable(
  'catalog_cable_types',
  { companyId: idColumn('company_id').notNull(), id: idColumn('id').notNull(), version: int('version').notNull(), ...cableDescription() },
  (table) => [
    primaryKey({ columns: [table.companyId, table.id] }),
    unique('catalog_cable_types_code').on(table.companyId, table.code),
    foreignKey({ name: 'catalog_cable_types_company', columns: [table.companyId], foreignColumns: [companies.id] }),
  ],
)

export const catalogDeviceModels = mysqlTable(
  'catalog_device_models',
  { companyId: idColumn('company_id').notNull(), id: idColumn('id').notNull(), version: int('version').notNull(), ...deviceDescription() },
  (table) => [
    primaryKey({ columns: [table.companyId, table.id] }),
    foreignKey({ name: 'catalog_device_models_company', columns: [table.companyId], foreignColumns: [companies.id] }),
  ],
)

export const cableTypes = mysqlTable(
  'cable_types',
  { ...owned(), ...takenFrom(), ...cableDescription() },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('cable_types_seq').on(table.seq),
    unique('cable_types_code').on(table.companyId, table.jobId, table.code),
    foreignKey({ name: 'cable_types_job', columns: [table.companyId, table.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
  ],
)

export const deviceModels = mysqlTable(
  'device_models',
  { ...owned(), ...takenFrom(), ...deviceDescription() },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('device_models_seq').on(table.seq),
    foreignKey({ name: 'device_models_job', columns: [table.companyId, table.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
  ],
)
