import { z } from 'zod'
import { codeSchema, distanceMmSchema, idSchema, nameSchema, pointSchema, positionSchema } from './fields.ts'
import { categories } from './cableType.ts'
import { connectors } from './place.ts'

/** What travels through a terminal. A run may join only terminals of one signal. */
export const signals = ['speaker', 'speaker-line', 'line', 'ethernet', 'video', 'video-link', 'rf', 'usb', 'control', 'bus', 'sensor', 'power', 'fibre'] as const
export type Signal = (typeof signals)[number]
export const directions = ['in', 'out', 'both'] as const
export type Direction = (typeof directions)[number]

export const videoFormats = ['1080p60', '2160p30', '2160p60-420', '2160p60', '4320p60'] as const
export type VideoFormat = (typeof videoFormats)[number]
/** How a sender carries video over twisted pair; it decides the reach. */
export const linkClasses = ['compressed-1g', 'uncompressed-10g', 'passive-balun'] as const
export type LinkClass = (typeof linkClasses)[number]

export const ratingsSchema = z.strictObject({
  /** Nominal load of a loudspeaker, ohm. */
  loadOhm: z.number().positive().max(100_000).optional(),
  /** Lowest load an amplifier's channel may see, ohm. */
  minLoadOhm: z.number().positive().max(1000).optional(),
  powerW: z.number().positive().max(100_000).optional(),
  /** Transformer taps, W, on a constant-voltage line. */
  tapsW: z.array(z.number().positive().max(10_000)).max(16).optional(),
  lineVoltageV: z.number().positive().max(200).optional(),
  /** For video over twisted pair. */
  linkClass: z.enum(linkClasses).optional(),
  reachM: z.partialRecord(z.enum(categories), z.number().positive().max(1000)).optional(),
})
export type Ratings = z.infer<typeof ratingsSchema>

export const terminalSchema = z.strictObject({
  key: z.string().regex(/^[a-z0-9-]{1,24}$/, 'A terminal key is small letters, digits and hyphens'),
  name: nameSchema,
  position: positionSchema,
  signal: z.enum(signals),
  direction: z.enum(directions),
  connector: z.enum(connectors),
  ratings: ratingsSchema,
})
export type Terminal = z.infer<typeof terminalSchema>

export const deviceCategories = [
  'panel', 'amplifier', 'receiver', 'source', 'switch', 'speaker', 'subwoofer', 'display', 'extender', 'access-point',
  'camera', 'keypad', 'volume-control', 'sensor', 'shade', 'processor', 'service', 'other',
] as const
export type DeviceCategory = (typeof deviceCategories)[number]

const described = {
  name: nameSchema,
  category: z.enum(deviceCategories),
  /** Height in the rack; 0: not for a rack. */
  rackUnits: z.int().min(0).max(20),
  terminals: z.array(terminalSchema).min(1, 'A device model needs at least one terminal: without one, nothing can be joined to it').max(128),
  /** Terminals joined inside: a signal that enters one leaves by the other. */
  passes: z.array(z.strictObject({ from: z.string(), to: z.string() })).max(256),
  /** Power shared by all channels of an amplifier, W; null: each channel has its own. */
  sharedPowerW: z.number().positive().max(100_000).nullable(),
}

/** A kind of device as the company's catalogue describes it. A panel is a device whose terminals have a back and a front. */
export const deviceDescriptionSchema = z.strictObject(described).superRefine((model, context) => {
  const keys = model.terminals.map((terminal) => terminal.key)
  keys.forEach((key, index) => {
    if (keys.indexOf(key) !== index) context.addIssue({ code: 'custom', path: ['terminals', index, 'key'], message: `Two terminals are called ${key}` })
  })
  model.passes.forEach((pass, index) => {
    for (const end of [pass.from, pass.to])
      if (!keys.includes(end)) context.addIssue({ code: 'custom', path: ['passes', index], message: `There is no terminal ${end}` })
  })
})
export type DeviceDescription = z.infer<typeof deviceDescriptionSchema>

/** A job's own copy of a device model, with the catalogue entry and version it was taken from. */
export const deviceModelSchema = z.strictObject({
  kind: z.literal('deviceModel'),
  id: idSchema,
  catalogId: idSchema.nullable(),
  catalogVersion: z.int().min(1).nullable(),
  ...described,
})
export type DeviceModel = z.infer<typeof deviceModelSchema>

/** A device stands in exactly one place: at a plate, in a rack from a unit up, or somewhere in a room. */
export const deviceSchema = z.strictObject({
  kind: z.literal('device'),
  id: idSchema,
  modelId: idSchema,
  plateId: idSchema.nullable(),
  rackId: idSchema.nullable(),
  /** Lowest rack unit it fills, counted from 1 at the bottom. */
  unit: z.int().min(1).max(60).nullable(),
  roomId: idSchema.nullable(),
  /** Position on the level for a device in a room. */
  at: pointSchema.nullable(),
  heightMm: distanceMmSchema.max(30_000).nullable(),
  name: nameSchema,
  /** Short code for ports and labels: SP1, PP2, AMPA; null where nothing prints it. */
  code: codeSchema.nullable(),
  suppliedBy: z.enum(['us', 'owner', 'other']),
  /** Overrides the model's nominal load, ohm. */
  loadOhm: z.number().positive().max(100_000).nullable(),
  /** Chosen transformer tap, W; null: low impedance or no tap. */
  tapW: z.number().positive().max(10_000).nullable(),
  /** Highest video format it is meant to carry. */
  videoFormat: z.enum(videoFormats).nullable(),
  /** Zone that a terminal serves, by terminal key. */
  zones: z.record(z.string().max(24), z.string().trim().min(1).max(40)),
})
export type Device = z.infer<typeof deviceSchema>
