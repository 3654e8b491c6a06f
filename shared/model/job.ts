import { z } from 'zod'
import { labelPatternSchema } from '../labels/pattern.ts'
import { distanceMmSchema, idSchema, nameSchema } from './fields.ts'
import { limitsSchema } from './limits.ts'

export const lengthUnits = ['ft', 'm'] as const
export const conductorUnits = ['awg', 'mm2'] as const

/** What a company decides once and every new job begins with. */
export const workingRulesSchema = z.strictObject({
  lengthUnit: z.enum(lengthUnits),
  conductorUnit: z.enum(conductorUnits),
  labelPattern: labelPatternSchema,
  /** Slack left at the rack and at a plate, mm. */
  slackRackMm: distanceMmSchema,
  slackPlateMm: distanceMmSchema,
  limits: limitsSchema,
})
export type WorkingRules = z.infer<typeof workingRulesSchema>
export type LengthUnit = WorkingRules['lengthUnit']
export type ConductorUnit = WorkingRules['conductorUnit']

/** The job itself: one record, whose id is the job's. It keeps its own copy of the company's rules. */
export const jobSchema = workingRulesSchema.extend({
  kind: z.literal('job'),
  id: idSchema,
  name: nameSchema,
  client: z.string().trim().max(80),
  address: z.string().trim().max(160),
})
export type Job = z.infer<typeof jobSchema>
