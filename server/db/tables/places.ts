import { bigint, foreignKey, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar } from 'drizzle-orm/mysql-core'
import { connectors, levelUses, mountings, plateForms, spaceClasses, type Outline } from '../../../shared/model/place.ts'
import { codeColumn, idColumn, jsonColumn } from '../columns.ts'
import { jobs } from './jobs.ts'
import { owned } from './owned.ts'

export const levels = mysqlTable(
  'levels',
  {
    ...owned(),
    name: varchar('name', { length: 80 }).notNull(),
    code: codeColumn('code').notNull(),
    use: mysqlEnum('use', levelUses).notNull(),
    elevationMm: int('elevation_mm').notNull(),
    ceilingHeightMm: int('ceiling_height_mm').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('levels_seq').on(table.seq),
    unique('levels_code').on(table.companyId, table.jobId, table.code),
    foreignKey({ name: 'levels_job', columns: [table.companyId, table.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
  ],
)

export const rooms = mysqlTable(
  'rooms',
  {
    ...owned(),
    levelId: idColumn('level_id').notNull(),
    name: varchar('name', { length: 80 }).notNull(),
    code: codeColumn('code').notNull(),
    aliases: jsonColumn<string[]>('aliases').notNull(),
    outline: jsonColumn<Outline>('outline').notNull(),
    ceilingHeightMm: int('ceiling_height_mm'),
    spaceClass: mysqlEnum('space_class', spaceClasses).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('rooms_seq').on(table.seq),
    unique('rooms_code').on(table.companyId, table.jobId, table.code),
    foreignKey({ name: 'rooms_level', columns: [table.companyId, table.jobId, table.levelId], foreignColumns: [levels.companyId, levels.jobId, levels.id] }),
  ],
)

export const plates = mysqlTable(
  'plates',
  {
    ...owned(),
    roomId: idColumn('room_id').notNull(),
    number: bigint('number', { mode: 'number' }).notNull(),
    name: varchar('name', { length: 80 }).notNull(),
    form: mysqlEnum('form', plateForms).notNull(),
    mounting: mysqlEnum('mounting', mountings).notNull(),
    wall: int('wall'),
    alongMm: int('along_mm'),
    atXMm: int('at_x_mm'),
    atYMm: int('at_y_mm'),
    heightMm: int('height_mm').notNull(),
    heightTo: mysqlEnum('height_to', ['centre', 'bottom']).notNull(),
    gangs: int('gangs').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('plates_seq').on(table.seq),
    unique('plates_number').on(table.companyId, table.jobId, table.roomId, table.number),
    foreignKey({ name: 'plates_room', columns: [table.companyId, table.jobId, table.roomId], foreignColumns: [rooms.companyId, rooms.jobId, rooms.id] }),
  ],
)

/** A jack belongs to its plate: the end of a run names both, so that it cannot name another plate's jack. */
export const plateJacks = mysqlTable(
  'plate_jacks',
  {
    companyId: idColumn('company_id').notNull(),
    jobId: idColumn('job_id').notNull(),
    plateId: idColumn('plate_id').notNull(),
    id: idColumn('id').notNull(),
    /** Its place in the plate's list. */
    ordinal: int('ordinal').notNull(),
    position: int('position').notNull(),
    connector: mysqlEnum('connector', connectors).notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.plateId, table.id] }),
    foreignKey({ name: 'plate_jacks_plate', columns: [table.companyId, table.jobId, table.plateId], foreignColumns: [plates.companyId, plates.jobId, plates.id] }),
  ],
)

export const racks = mysqlTable(
  'racks',
  {
    ...owned(),
    roomId: idColumn('room_id').notNull(),
    name: varchar('name', { length: 80 }).notNull(),
    code: codeColumn('code').notNull(),
    units: int('units').notNull(),
    atXMm: int('at_x_mm').notNull(),
    atYMm: int('at_y_mm').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('racks_seq').on(table.seq),
    unique('racks_code').on(table.companyId, table.jobId, table.code),
    foreignKey({ name: 'racks_room', columns: [table.companyId, table.jobId, table.roomId], foreignColumns: [rooms.companyId, rooms.jobId, rooms.id] }),
  ],
)

export const pathways = mysqlTable(
  'pathways',
  {
    ...owned(),
    name: varchar('name', { length: 80 }).notNull(),
    form: mysqlEnum('form', ['chase']).notNull(),
    atXMm: int('at_x_mm').notNull(),
    atYMm: int('at_y_mm').notNull(),
    bottomLevelId: idColumn('bottom_level_id').notNull(),
    topLevelId: idColumn('top_level_id').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('pathways_seq').on(table.seq),
    foreignKey({ name: 'pathways_bottom', columns: [table.companyId, table.jobId, table.bottomLevelId], foreignColumns: [levels.companyId, levels.jobId, levels.id] }),
    foreignKey({ name: 'pathways_top', columns: [table.companyId, table.jobId, table.topLevelId], foreignColumns: [levels.companyId, levels.jobId, levels.id] }),
  ],
)
