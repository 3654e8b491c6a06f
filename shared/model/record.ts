import type { z } from 'zod'
import { cableTypeSchema } from './cableType.ts'
import { deviceModelSchema, deviceSchema } from './device.ts'
import { acceptanceSchema, labelPrintSchema, pullSchema, strikeSchema, terminationSchema, testSchema } from './fieldRecord.ts'
import { jobSchema } from './job.ts'
import { levelSchema, pathwaySchema, plateSchema, rackSchema, roomSchema } from './place.ts'
import { cordSchema, runSchema } from './run.ts'

/**
 * Every kind of record a job holds, parents before children: rows are written in this order and removed in reverse.
 */
export const recordSchemas = {
  job: jobSchema,
  level: levelSchema,
  room: roomSchema,
  plate: plateSchema,
  rack: rackSchema,
  pathway: pathwaySchema,
  cableType: cableTypeSchema,
  deviceModel: deviceModelSchema,
  device: deviceSchema,
  run: runSchema,
  cord: cordSchema,
  labelPrint: labelPrintSchema,
  pull: pullSchema,
  termination: terminationSchema,
  test: testSchema,
  acceptance: acceptanceSchema,
  strike: strikeSchema,
} as const

export type Kind = keyof typeof recordSchemas
export type RecordOf<K extends Kind> = z.infer<(typeof recordSchemas)[K]>
export type JobRecord = { [K in Kind]: RecordOf<K> }[Kind]

export const kinds = Object.keys(recordSchemas) as Kind[]

/** Kinds that are only ever added and struck out, never changed or removed. */
export const fieldKinds: ReadonlySet<Kind> = new Set<Kind>(['labelPrint', 'pull', 'termination', 'test', 'acceptance', 'strike'])

/** Checks a record of any kind against its schema. Throws a ZodError. */
export const parseRecord = (record: { kind: Kind }): JobRecord => recordSchemas[record.kind].parse(record)
