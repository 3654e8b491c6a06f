import { z } from 'zod'

/**
 * How a loudspeaker line's loss is judged. One cable has four different figures, so the convention is always said.
 * impedance: loop resistance as a share of the load, percent. decibel: level lost at the load, dB.
 * voltage: share of the amplifier's output spent in the cable, percent. power: power missing at the load, percent.
 */
export const lossConventions = ['impedance', 'decibel', 'voltage', 'power'] as const
export const lossConventionSchema = z.enum(lossConventions)
export type LossConvention = z.infer<typeof lossConventionSchema>

const share = z.number().min(0).max(100)

/** The lines a company or a job judges by. Every field has a default, so that a new limit needs no migration. */
export const limitsSchema = z.strictObject({
  speakerLossConvention: lossConventionSchema.default('decibel'),
  /** Above this a caution, in the convention's unit. */
  speakerLossCaution: share.default(0.5),
  /** Above this a stop, in the convention's unit. */
  speakerLossStop: share.default(1),
  /** Conductor temperature for resistance, degrees Celsius. */
  conductorTemperatureC: z.number().min(-40).max(90).default(20),
  /** Permanent link of a twisted-pair run, mm: above the first a caution, above the second a stop. */
  dataLinkCautionMm: z.int().min(1000).max(200_000).default(79_248),
  dataLinkMm: z.int().min(1000).max(200_000).default(90_000),
  /** Channel of a twisted-pair run with its cords, mm. */
  dataChannelMm: z.int().min(1000).max(200_000).default(100_000),
  /** Share of an amplifier's power that constant-voltage taps may add up to, percent. */
  lineLoadShare: share.default(80),
  /** What kind of building it is: dwellings for one or two families are let off some jacket rules. */
  occupancy: z.enum(['one or two family', 'multifamily', 'other']).default('one or two family'),
})
export type Limits = z.infer<typeof limitsSchema>

export const defaultLimits: Limits = limitsSchema.parse({})
