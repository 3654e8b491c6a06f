import { z } from 'zod'

/** Identity of a record: made by whoever creates it, so that offline work and undo need no answer from a server. */
export const idSchema = z
  .string()
  .regex(/^[A-Za-z0-9_-]{1,64}$/, 'An id is 1 to 64 letters, digits, hyphens or underscores')
export type Id = z.infer<typeof idSchema>

/** A name a person reads: any script, trimmed, one line. */
export const nameSchema = z
  .string()
  .trim()
  .min(1, 'Give it a name')
  .max(80, 'A name has at most 80 characters')
  .regex(/^\P{Cc}*$/u, 'A name is a single line of plain text')

/** Free text of one or more lines, such as a reason. */
export const noteSchema = z.string().trim().min(1, 'Write a few words').max(500, 'At most 500 characters')

/** The short code that labels are made of: capitals and digits, so that it prints, scans and reads alike everywhere. */
export const codeSchema = z
  .string()
  .regex(/^[A-Z0-9]{1,8}$/, 'A code is 1 to 8 capital letters or digits, such as PAT or L2')

/** Text of a printed label: printable ASCII, because that is what a linear barcode carries. */
export const labelTextSchema = z
  .string()
  .regex(/^[\x21-\x7e]{1,24}$/, 'A label is 1 to 24 printable characters without spaces')

const limitMm = 3_000_000

/** A distance that may be nothing, in whole millimetres, up to 3 km. */
export const distanceMmSchema = z
  .int('A length is stored in whole millimetres')
  .min(0, 'A length cannot be negative')
  .max(limitMm, 'A length is at most 3 km')

/** A distance that must be something, in whole millimetres. */
export const extentMmSchema = distanceMmSchema.min(1, 'A length must be more than nothing')

/** A coordinate on a level or an elevation, in whole millimetres; east and south and up are positive. */
export const coordinateMmSchema = z
  .int('A position is stored in whole millimetres')
  .min(-limitMm, 'A position is within 3 km')
  .max(limitMm, 'A position is within 3 km')

/** A point on a level, in whole millimetres: x to the east, y to the south. */
export const pointSchema = z.strictObject({ xMm: coordinateMmSchema, yMm: coordinateMmSchema })
export type Point = z.infer<typeof pointSchema>

/** When something happened by the clock of whoever said so: a claim, in UTC to the millisecond; the order is always the log's. */
export const momentSchema = z.iso.datetime({ precision: 3, message: 'A moment is a UTC date and time to the millisecond' })

/** A position in a face or a sequence, from 1. */
export const positionSchema = z.int().min(1).max(999)
