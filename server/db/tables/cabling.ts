import { sql } from 'drizzle-orm'
import { bigint, check, double, foreignKey, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar, type AnyMySqlColumn } from 'drizzle-orm/mysql-core'
import { videoFormats } from '../../../shared/model/device.ts'
import { codeColumn, idColumn, jsonColumn, keyColumn } from '../columns.ts'
import { cableTypes, deviceModels } from './models.ts'
import { owned } from './owned.ts'
import { pathways, plateJacks, plates, racks, rooms } from './places.ts'

type OwnedTable = Record<'companyId' | 'jobId' | 'id', AnyMySqlColumn>
/** A link inside one job: company and job are part of the key, so that nothing can point across. */
const link = (name: string, from: { companyId: AnyMySqlColumn; jobId: AnyMySqlColumn }, column: AnyMySqlColumn, to: OwnedTable) =>
  foreignKey({ name, columns: [from.companyId, from.jobId, column], foreignColumns: [to.companyId, to.jobId, to.id] })
const linkToJack = (name: string, from: { companyId: AnyMySqlColumn; jobId: AnyMySqlColumn }, plate: AnyMySqlColumn, jack: AnyMySqlColumn) =>
  foreignKey({ name, columns: [from.companyId, from.jobId, plate, jack], foreignColumns: [plateJacks.companyId, plateJacks.jobId, plateJacks.plateId, plateJacks.id] })

export const devices = mysqlTable(
  'devices',
  {
    ...owned(),
    modelId: idColumn('model_id').notNull(),
    plateId: idColumn('plate_id'),
    rackId: idColumn('rack_id'),
    unit: int('unit'),
    roomId: idColumn('room_id'),
    atXMm: int('at_x_mm'),
    atYMm: int('at_y_mm'),
    heightMm: int('height_mm'),
    name: varchar('name', { length: 80 }).notNull(),
    code: codeColumn('code'),
    suppliedBy: mysqlEnum('supplied_by', ['us', 'owner', 'other']).notNull(),
    loadOhm: double('load_ohm'),
    tapW: double('tap_w'),
    videoFormat: mysqlEnum('video_format', videoFormats),
    zones: jsonColumn<Record<string, string>>('zones').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('devices_seq').on(table.seq),
    unique('devices_code').on(table.companyId, table.jobId, table.code),
    link('devices_model', table, table.modelId, deviceModels),
    link('devices_plate', table, table.plateId, plates),
    link('devices_rack', table, table.rackId, racks),
    link('devices_room', table, table.roomId, rooms),
    check('devices_one_place', sql`(${table.plateId} is not null) + (${table.rackId} is not null) + (${table.roomId} is not null) = 1`),
  ],
)

export const runs = mysqlTable(
  'runs',
  {
    ...owned(),
    serial: bigint('serial', { mode: 'number' }).notNull(),
    cableTypeId: idColumn('cable_type_id').notNull(),
    aPlateId: idColumn('a_plate_id'),
    aJackId: idColumn('a_jack_id'),
    aDeviceId: idColumn('a_device_id'),
    aTerminal: keyColumn('a_terminal'),
    aRackId: idColumn('a_rack_id'),
    bPlateId: idColumn('b_plate_id'),
    bJackId: idColumn('b_jack_id'),
    bDeviceId: idColumn('b_device_id'),
    bTerminal: keyColumn('b_terminal'),
    bRackId: idColumn('b_rack_id'),
    label: codeColumn('label').notNull(),
    purpose: varchar('purpose', { length: 60 }).notNull(),
    bundle: varchar('bundle', { length: 12 }),
    route: mysqlEnum('route', ['overhead', 'underfloor']),
    slackAMm: int('slack_a_mm'),
    slackBMm: int('slack_b_mm'),
    statedLengthMm: int('stated_length_mm'),
    loadJoin: mysqlEnum('load_join', ['parallel', 'series']).notNull(),
    dropped: varchar('dropped', { length: 200 }),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('runs_seq').on(table.seq),
    unique('runs_label').on(table.companyId, table.jobId, table.label),
    unique('runs_serial').on(table.companyId, table.jobId, table.serial),
    link('runs_cable_type', table, table.cableTypeId, cableTypes),
    link('runs_a_plate', table, table.aPlateId, plates),
    linkToJack('runs_a_jack', table, table.aPlateId, table.aJackId),
    link('runs_a_device', table, table.aDeviceId, devices),
    link('runs_a_rack', table, table.aRackId, racks),
    link('runs_b_plate', table, table.bPlateId, plates),
    linkToJack('runs_b_jack', table, table.bPlateId, table.bJackId),
    link('runs_b_device', table, table.bDeviceId, devices),
    link('runs_b_rack', table, table.bRackId, racks),
    check('runs_a_one_end', sql`(${table.aPlateId} is not null) + (${table.aDeviceId} is not null) + (${table.aRackId} is not null) <= 1`),
    check('runs_b_one_end', sql`(${table.bPlateId} is not null) + (${table.bDeviceId} is not null) + (${table.bRackId} is not null) <= 1`),
  ],
)

/** The chases a run is told to take, in order. */
export const runPathways = mysqlTable(
  'run_pathways',
  {
    companyId: idColumn('company_id').notNull(),
    jobId: idColumn('job_id').notNull(),
    runId: idColumn('run_id').notNull(),
    ordinal: int('ordinal').notNull(),
    pathwayId: idColumn('pathway_id').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.runId, table.ordinal] }),
    link('run_pathways_run', table, table.runId, runs),
    link('run_pathways_pathway', table, table.pathwayId, pathways),
  ],
)

export const cords = mysqlTable(
  'cords',
  {
    ...owned(),
    aPlateId: idColumn('a_plate_id'),
    aJackId: idColumn('a_jack_id'),
    aDeviceId: idColumn('a_device_id'),
    aTerminal: keyColumn('a_terminal'),
    bPlateId: idColumn('b_plate_id'),
    bJackId: idColumn('b_jack_id'),
    bDeviceId: idColumn('b_device_id'),
    bTerminal: keyColumn('b_terminal'),
    form: mysqlEnum('form', ['patch cord', 'jumper', 'lead']).notNull(),
    lengthMm: int('length_mm').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.companyId, table.jobId, table.id] }),
    unique('cords_seq').on(table.seq),
    linkToJack('cords_a_jack', table, table.aPlateId, table.aJackId),
    link('cords_a_device', table, table.aDeviceId, devices),
    linkToJack('cords_b_jack', table, table.bPlateId, table.bJackId),
    link('cords_b_device', table, table.bDeviceId, devices),
    check('cords_a_one_end', sql`(${table.aJackId} is not null) + (${table.aDeviceId} is not null) = 1`),
    check('cords_b_one_end', sql`(${table.bJackId} is not null) + (${table.bDeviceId} is not null) = 1`),
  ],
)
