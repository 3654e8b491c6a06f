import { z } from 'zod'
import { codeSchema, coordinateMmSchema, distanceMmSchema, extentMmSchema, idSchema, nameSchema, pointSchema, positionSchema } from './fields.ts'

export const levelUses = ['living', 'attic', 'crawl', 'basement', 'outside'] as const
export const levelSchema = z.strictObject({
  kind: z.literal('level'),
  id: idSchema,
  name: nameSchema,
  code: codeSchema,
  use: z.enum(levelUses),
  /** Height of the finished floor over the job's datum, mm. */
  elevationMm: coordinateMmSchema,
  ceilingHeightMm: extentMmSchema.max(30_000, 'A ceiling is at most 30 m high'),
})
export type Level = z.infer<typeof levelSchema>

/** Where a cable lies, which decides what jacket it must have. */
export const spaceClasses = ['general', 'riser', 'plenum', 'wet', 'outdoor', 'buried'] as const
export type SpaceClass = (typeof spaceClasses)[number]

/** Corners of a room in order, clockwise on the drawing (x east, y south): wall i goes from corner i to the next. */
export const outlineSchema = z.array(pointSchema).min(3, 'A room has at least three corners').max(64)
export type Outline = z.infer<typeof outlineSchema>

export const roomSchema = z.strictObject({
  kind: z.literal('room'),
  id: idSchema,
  levelId: idSchema,
  name: nameSchema,
  code: codeSchema,
  /** Earlier or other people's names; a label never changes with them. */
  aliases: z.array(nameSchema).max(20),
  outline: outlineSchema,
  /** Null: the level's. */
  ceilingHeightMm: extentMmSchema.max(30_000).nullable(),
  spaceClass: z.enum(spaceClasses),
})
export type Room = z.infer<typeof roomSchema>

export const plateForms = ['wall-box', 'ceiling-opening', 'floor-box', 'exterior-box', 'stub'] as const
export type PlateForm = (typeof plateForms)[number]
export const mountings = ['wall', 'ceiling', 'floor', 'outside'] as const
export type Mounting = (typeof mountings)[number]

/** What a jack or a terminal looks like and takes. */
export const connectors = ['modular', 'coax', 'speaker-pair', 'fibre', 'control', 'power', 'keypad', 'line', 'hdmi', 'usb', 'bare'] as const
export type Connector = (typeof connectors)[number]

export const jackSchema = z.strictObject({ id: idSchema, position: positionSchema, connector: z.enum(connectors) })
export type Jack = z.infer<typeof jackSchema>

export const plateSchema = z.strictObject({
  kind: z.literal('plate'),
  id: idSchema,
  roomId: idSchema,
  /** Unique in the room; with the room's code it is the plate's own code (PAT1). */
  number: positionSchema,
  name: z.string().trim().max(80),
  form: z.enum(plateForms),
  mounting: z.enum(mountings),
  /** Which wall of the room's outline, counted from 0; null for a ceiling or floor. */
  wall: z.int().min(0).max(63).nullable(),
  /** Distance from the wall's left end as one faces it from inside, mm; null for a ceiling or floor. */
  alongMm: distanceMmSchema.nullable(),
  /** Position on the level for a ceiling or floor; null on a wall (the wall decides). */
  at: pointSchema.nullable(),
  /** Height above the finished floor, mm, measured to heightTo. */
  heightMm: distanceMmSchema.max(30_000),
  heightTo: z.enum(['centre', 'bottom']),
  gangs: z.int().min(1).max(6),
  jacks: z.array(jackSchema).max(48, 'A plate has at most 48 jacks'),
})
export type Plate = z.infer<typeof plateSchema>

export const rackSchema = z.strictObject({
  kind: z.literal('rack'),
  id: idSchema,
  roomId: idSchema,
  name: nameSchema,
  code: codeSchema,
  units: z.int().min(1).max(60),
  at: pointSchema,
})
export type Rack = z.infer<typeof rackSchema>

/** A way through the building that cables share. Here a chase: it stands at a point and joins two levels. */
export const pathwaySchema = z.strictObject({
  kind: z.literal('pathway'),
  id: idSchema,
  name: nameSchema,
  form: z.enum(['chase']),
  at: pointSchema,
  bottomLevelId: idSchema,
  topLevelId: idSchema,
})
export type Pathway = z.infer<typeof pathwaySchema>
