import { z } from 'zod'

/** Several commands as one: an import, a paste, a drag that makes a plate and its run. Undone in one step. */
export const batchArgsSchema = z.strictObject({
  label: z.string().trim().min(1).max(120),
  steps: z.array(z.strictObject({ verb: z.string().max(40), args: z.unknown() })).min(1).max(5000),
})
