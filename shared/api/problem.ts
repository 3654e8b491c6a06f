import { z } from 'zod'

/**
 * Every answer that is not a success: problem details (RFC 9457) with the code of shared/errors.ts as the type's last
 * part.
 */
export const problemSchema = z.object({
  /** "/problems/not-found" and so on. */
  type: z.string(),
  /** The kind of problem in a few words. */
  title: z.string(),
  status: z.int(),
  /** A sentence for a person. */
  detail: z.string(),
  /** To find the matter in the server's log. */
  requestId: z.string(),
  /** Where input was not valid: at most ten places, such as "body.name". */
  errors: z.array(z.strictObject({ where: z.string(), message: z.string() })).optional(),
  /** What the program needs to go on: both values of a conflict, seconds to wait. */
  details: z.unknown().optional(),
})
export type Problem = z.output<typeof problemSchema>
