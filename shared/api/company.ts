import { z } from 'zod'
import { nameSchema } from '../model/fields.ts'
import { workingRulesSchema, type WorkingRules } from '../model/job.ts'

/** PATCH /api/company: what is to change, and the version it was read at. */
export const updateCompanySchema = workingRulesSchema
  .extend({ name: nameSchema })
  .partial()
  .extend({ version: z.int().min(1) })
export type UpdateCompany = z.input<typeof updateCompanySchema>

/** GET /api/company */
export interface CompanyAnswer extends WorkingRules {
  readonly id: string
  readonly name: string
  readonly version: number
}
