import { z } from 'zod'
import { distanceMmSchema, extentMmSchema, idSchema, labelTextSchema } from './fields.ts'

/**
 * Where a run ends: at a plate (and a jack's back, once known), at a device or panel (and a terminal, once known),
 * or at a rack with the port still open. Null: no end yet.
 */
export const runEndSchema = z.union([
  z.strictObject({ plateId: idSchema, jackId: idSchema.nullable() }),
  z.strictObject({ deviceId: idSchema, terminal: z.string().max(24).nullable() }),
  z.strictObject({ rackId: idSchema }),
])
export type RunEnd = z.infer<typeof runEndSchema>
export const endNames = ['a', 'b'] as const
export type EndName = (typeof endNames)[number]

/** A cable in the building. End a is where it comes from (the rack, by custom), end b where it goes. */
export const runSchema = z.strictObject({
  kind: z.literal('run'),
  id: idSchema,
  /** Counts up through the job and is never used again; a plain-serial label is made of it. */
  serial: z.int().min(1).max(999_999),
  cableTypeId: idSchema,
  a: runEndSchema.nullable(),
  b: runEndSchema.nullable(),
  /** The identifier at both ends, assigned by the pattern; it no longer changes once printed. */
  label: labelTextSchema,
  purpose: z.string().trim().max(60),
  bundle: z.string().trim().max(12).nullable(),
  /** The chases it is told to take, in order; empty: the nearest. */
  pathwayIds: z.array(idSchema).max(12),
  /** Over the ceiling or under the floor of its level; null: by the kind of level. */
  route: z.enum(['overhead', 'underfloor']).nullable(),
  /** Slack at each end, mm; null: the job's rule for a rack or a plate. */
  slackAMm: distanceMmSchema.nullable(),
  slackBMm: distanceMmSchema.nullable(),
  /** A length somebody says, mm: it replaces the drawn one. */
  statedLengthMm: extentMmSchema.nullable(),
  /** How several loudspeakers on this run are joined. */
  loadJoin: z.enum(['parallel', 'series']),
  /** Why it is not to be pulled after all; null: it is. A dropped run stays on the job. */
  dropped: z.string().trim().min(1).max(200).nullable(),
})
export type Run = z.infer<typeof runSchema>

/** Where a cord plugs in: the front of a jack or of a panel port, or a terminal of a device. */
export const cordEndSchema = z.union([
  z.strictObject({ plateId: idSchema, jackId: idSchema }),
  z.strictObject({ deviceId: idSchema, terminal: z.string().max(24) }),
])
export type CordEnd = z.infer<typeof cordEndSchema>

export const cordSchema = z.strictObject({
  kind: z.literal('cord'),
  id: idSchema,
  a: cordEndSchema,
  b: cordEndSchema,
  form: z.enum(['patch cord', 'jumper', 'lead']),
  lengthMm: extentMmSchema.max(100_000, 'A cord is at most 100 m'),
})
export type Cord = z.infer<typeof cordSchema>
