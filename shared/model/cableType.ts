import { z } from 'zod'
import { extentMmSchema, idSchema, nameSchema } from './fields.ts'

export const cableFamilies = ['speaker', 'twisted-pair', 'coax', 'line', 'control', 'fibre', 'video', 'usb'] as const
export type CableFamily = (typeof cableFamilies)[number]

export const jacketColours = ['white', 'slate', 'black', 'blue', 'yellow', 'aqua', 'grey', 'beige', 'brown', 'green', 'orange', 'purple'] as const
export type JacketColour = (typeof jacketColours)[number]

/** Twisted-pair categories, from the least. */
export const categories = ['5e', '6', '6A', '7A', '8'] as const
export type Category = (typeof categories)[number]

/** Fire ratings as printed on the jacket (NEC names), by family of listing. */
export const jacketRatings = [
  'CMP', 'CMR', 'CMG', 'CM', 'CMX',
  'CL3P', 'CL3R', 'CL3', 'CL3X', 'CL2P', 'CL2R', 'CL2', 'CL2X',
  'CATVP', 'CATVR', 'CATV', 'CATVX',
  'OFNP', 'OFNR', 'OFNG', 'OFN', 'OFCP', 'OFCR', 'OFCG', 'OFC',
  'FPLP', 'FPLR', 'FPL', 'none',
] as const
export type JacketRating = (typeof jacketRatings)[number]

export const strandings = ['solid', 'stranded', 'class5'] as const
export const conductorMaterials = ['copper', 'cca'] as const

export const putUpSchema = z.strictObject({ form: z.enum(['box', 'spool', 'reel']), lengthMm: extentMmSchema })

const described = {
  /** What crews call it: 16/2, CAT6, RG6. */
  code: z.string().trim().regex(/^[\x21-\x7e][\x20-\x7e]{0,15}$/, 'A cable code is 1 to 16 plain characters, such as 16/2 or CAT6'),
  name: nameSchema,
  family: z.enum(cableFamilies),
  /** The letter that stands for this cable in a label: S, D, V, C, P, F. */
  labelKind: z.string().regex(/^[A-Z]{1,2}$/, 'One or two capital letters'),
  conductors: z.int().min(1).max(100),
  /** Conductor gauge; 0, -1, -2, -3 are 1/0 to 4/0. */
  awg: z.number().min(-3).max(40).nullable(),
  /** Conductor area in mm2 where the cable is sold by area. */
  areaMm2: z.number().positive().max(300).nullable(),
  stranding: z.enum(strandings),
  material: z.enum(conductorMaterials),
  /** Resistance of one conductor at 20 °C as its maker states it, ohm per km; null: by standard from the size. */
  resistanceOhmPerKm: z.number().positive().max(10_000).nullable(),
  category: z.enum(categories).nullable(),
  jacketRating: z.enum(jacketRatings),
  /** Fit for wet places, sunlight, or direct burial by its maker's word. */
  wet: z.boolean(),
  outdoor: z.boolean(),
  buried: z.boolean(),
  /** Outer diameter in micrometres: 6.9 mm is 6900. */
  outerDiameterUm: z.int().min(500, 'A cable is at least 0.5 mm thick').max(100_000, 'A cable is at most 100 mm thick'),
  jacketColour: z.enum(jacketColours),
  putUps: z.array(putUpSchema).min(1, 'Say at least one length it is sold in').max(12),
}

/** A kind of cable as the company's catalogue describes it. */
export const cableDescriptionSchema = z.strictObject(described)
export type CableDescription = z.infer<typeof cableDescriptionSchema>

/** A job's own copy of a cable type, with the catalogue entry and version it was taken from. */
export const cableTypeSchema = z.strictObject({
  kind: z.literal('cableType'),
  id: idSchema,
  catalogId: idSchema.nullable(),
  catalogVersion: z.int().min(1).nullable(),
  ...described,
})
export type CableType = z.infer<typeof cableTypeSchema>
