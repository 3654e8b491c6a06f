import { z } from 'zod'
import { idSchema, nameSchema } from '../model/fields.ts'
import { roles, type Role } from '../policy.ts'
import { signInSchema } from './session.ts'

const utf8Bytes = (text: string) => encodeURIComponent(text).replace(/%[0-9A-F]{2}/g, 'x').length

/** Fifteen characters at least, because the passphrase is the only factor (NIST SP 800-63B-4); 72 bytes at most, because bcrypt reads no more. */
export const passphraseSchema = z
  .string()
  .min(15, 'A passphrase has at least 15 characters: four or five words are easy to keep')
  .refine((text) => utf8Bytes(text) <= 72, 'A passphrase has at most 72 bytes')

/** POST /api/members */
export const addMemberSchema = z.strictObject({ id: idSchema, name: nameSchema, email: signInSchema.shape.email, role: z.enum(roles), passphrase: passphraseSchema })
export type AddMember = z.input<typeof addMemberSchema>

/** PATCH /api/members/:memberId */
export const updateMemberSchema = z.strictObject({ name: nameSchema.optional(), role: z.enum(roles).optional(), disabled: z.boolean().optional(), passphrase: passphraseSchema.optional() })
export type UpdateMember = z.input<typeof updateMemberSchema>
export const memberParamsSchema = z.strictObject({ memberId: idSchema })

export interface MemberAnswer {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly disabled: boolean
}
