import {
  boolean,
  datetime,
  foreignKey,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core'
import { conductorUnits, lengthUnits } from '../../../shared/model/job.ts'
import type { Limits } from '../../../shared/model/limits.ts'
import { roles } from '../../../shared/policy.ts'
import { idColumn, jsonColumn } from '../columns.ts'

/** A company and its working rules, which every new job begins with. */
export const companies = mysqlTable('companies', {
  id: idColumn('id').primaryKey(),
  name: varchar('name', { length: 80 }).notNull(),
  version: int('version').notNull().default(1),
  lengthUnit: mysqlEnum('length_unit', lengthUnits).notNull(),
  conductorUnit: mysqlEnum('conductor_unit', conductorUnits).notNull(),
  labelPattern: varchar('label_pattern', { length: 60 }).notNull(),
  slackRackMm: int('slack_rack_mm').notNull(),
  slackPlateMm: int('slack_plate_mm').notNull(),
  limits: jsonColumn<Limits>('limits').notNull(),
})

/**
 * A person in a company. An address signs in to one company only. A member who leaves is disabled, since records bear
 * the name.
 */
export const members = mysqlTable(
  'members',
  {
    companyId: idColumn('company_id').notNull(),
    id: idColumn('id').notNull(),
    name: varchar('name', { length: 80 }).notNull(),
    email: varchar('email', { length: 200 }).notNull(),
    role: mysqlEnum('role', roles).notNull(),
    passphraseHash: varchar('passphrase_hash', { length: 80 }).notNull(),
    disabled: boolean('disabled').notNull().default(false),
    createdAt: datetime('created_at', { mode: 'string', fsp: 3 }).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.id] }),
    unique('members_email').on(table.email),
    foreignKey({ name: 'members_company', columns: [table.companyId], foreignColumns: [companies.id] }),
  ],
)
