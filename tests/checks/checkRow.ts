import { readFileSync } from 'node:fs'
import { z } from 'zod'

/** One published value and how to ask for it. `fn: "fact"` is a table entry that `formula` and `inputs` name. */
export const checkRowSchema = z.object({
  id: z.string(),
  fn: z.string(),
  formula: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  expected: z.unknown(),
  unit: z.string().optional(),
  tolerance: z.number().nullish(),
  source: z.string(),
})
export type CheckRow = z.infer<typeof checkRowSchema>

/** The rows of a file; a file of another form is an error that says where. */
export const readCheckRows = (path: string): CheckRow[] =>
  z.array(checkRowSchema).parse(JSON.parse(readFileSync(path, 'utf8')))
