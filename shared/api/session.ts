import { z } from 'zod'
import type { WorkingRules } from '../model/job.ts'
import type { Action, Role } from '../policy.ts'
import { passphraseSchema } from './passphrase.ts'

/** POST /api/session */
export const signInSchema = z.strictObject({
  email: z
    .string()
    .trim()
    .toLowerCase()
    .min(3, 'Type your e-mail address')
    .max(200)
    .regex(/^[^\s@]+@[^\s@]+$/, 'That does not look like an e-mail address'),
  passphrase: z.string().min(1, 'Type your passphrase').max(300),
})
export type SignIn = z.input<typeof signInSchema>

/** PUT /api/session/passphrase: one's own. */
export const changePassphraseSchema = z.strictObject({
  current: signInSchema.shape.passphrase,
  passphrase: passphraseSchema,
})
export type ChangePassphrase = z.input<typeof changePassphraseSchema>

/** Who is signed in, where, and what they may do. */
export interface SessionAnswer {
  readonly member: { readonly id: string; readonly name: string; readonly email: string; readonly role: Role }
  readonly company: WorkingRules & { readonly id: string; readonly name: string }
  readonly can: readonly Action[]
}
