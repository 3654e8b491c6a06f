import { z } from 'zod'
import { idSchema, nameSchema } from '../model/fields.ts'
import { roles, type Role } from '../policy.ts'
import { passphraseSchema } from './passphrase.ts'
import { signInSchema } from './session.ts'

/** POST /api/members */
export const addMemberSchema = z.strictObject({
  id: idSchema,
  name: nameSchema,
  email: signInSchema.shape.email,
  role: z.enum(roles),
  passphrase: passphraseSchema,
})
export type AddMember = z.input<typeof addMemberSchema>

/** PATCH /api/members/:memberId */
export const updateMemberSchema = z.strictObject({
  name: nameSchema.optional(),
  role: z.enum(roles).optional(),
  disabled: z.boolean().optional(),
  passphrase: passphraseSchema.optional(),
})
export type UpdateMember = z.input<typeof updateMemberSchema>
export const memberParamsSchema = z.strictObject({ memberId: idSchema })

export interface MemberAnswer {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly disabled: boolean
}
