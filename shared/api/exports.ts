import { z } from 'zod'
import { labelChoiceIdSchema } from '../labels/stocks.ts'
import { idSchema } from '../model/fields.ts'

/** What labels are wanted, and where on the sheets they go. */
export const labelSheetSchema = z.strictObject({
  runIds: z.array(idSchema).min(1, 'Choose at least one run').max(5000),
  copiesAtRack: z.int().min(0).max(6),
  copiesAtPlate: z.int().min(0).max(6),
  choice: labelChoiceIdSchema,
  /** Place of the first label on the first sheet, from 1. */
  startAt: z.int().min(1).max(200),
  /** What this printer sets off, mm. */
  offsetXMm: z.number().min(-10).max(10),
  offsetYMm: z.number().min(-10).max(10),
})
export type LabelSheet = z.infer<typeof labelSheetSchema>
