import { z } from 'zod'
import { idSchema, labelTextSchema, momentSchema, noteSchema } from './fields.ts'
import { endNames } from './run.ts'

/**
 * What people did, as they said it: only ever added, never changed, and struck out by a later record.
 * So two technicians without a connection cannot collide, and nothing said is lost.
 */
const said = { id: idSchema, at: momentSchema, byId: idSchema }

export const labelPrintSchema = z.strictObject({
  kind: z.literal('labelPrint'),
  ...said,
  runId: idSchema,
  end: z.enum(endNames),
  text: labelTextSchema,
  copies: z.int().min(1).max(20),
  stock: z.string().max(40),
})
export type LabelPrint = z.infer<typeof labelPrintSchema>

/** Jacket marks run from 0 to 99,999 and then begin again. */
export const jacketMarkSchema = z.int('A jacket mark is a whole number').min(0, 'A jacket mark is not negative').max(99_999, 'A jacket mark has at most five digits')

export const pullSchema = z.strictObject({
  kind: z.literal('pull'),
  ...said,
  runId: idSchema,
  /** Marks read off the jacket at end a and at end b; null: pulled without reading them. */
  markA: jacketMarkSchema.nullable(),
  markB: jacketMarkSchema.nullable(),
  markUnit: z.enum(['ft', 'm']),
  spool: z.string().trim().max(24).nullable(),
})
export type Pull = z.infer<typeof pullSchema>

export const terminationSchema = z.strictObject({
  kind: z.literal('termination'),
  ...said,
  runId: idSchema,
  end: z.enum(endNames),
  /** How it was put on: T568B, compression F, bare to binding post. */
  scheme: z.string().trim().max(40),
})
export type Termination = z.infer<typeof terminationSchema>

export const testKinds = ['wire map', 'qualification', 'certification', 'polarity', 'continuity', 'signal', 'loop resistance'] as const
export const testSchema = z.strictObject({
  kind: z.literal('test'),
  ...said,
  runId: idSchema,
  testKind: z.enum(testKinds),
  result: z.enum(['pass', 'fail']),
  /** A figure read off the tester with its unit, or what was seen. */
  reading: z.string().trim().max(80),
})
export type Test = z.infer<typeof testSchema>

/** Somebody takes a finding on, with a reason. It lapses when the figures under the finding change. */
export const acceptanceSchema = z.strictObject({
  kind: z.literal('acceptance'),
  ...said,
  check: z.string().max(40),
  aboutKind: z.string().max(20),
  aboutId: idSchema,
  figures: z.string().max(400),
  reason: noteSchema,
})
export type Acceptance = z.infer<typeof acceptanceSchema>

export const struckKinds = ['labelPrint', 'pull', 'termination', 'test', 'acceptance', 'strike'] as const
export type StruckKind = (typeof struckKinds)[number]
export const strikeSchema = z.strictObject({
  kind: z.literal('strike'),
  ...said,
  targetKind: z.enum(struckKinds),
  targetId: idSchema,
  reason: z.string().trim().max(200),
})
export type Strike = z.infer<typeof strikeSchema>
