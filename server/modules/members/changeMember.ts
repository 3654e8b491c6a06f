import type { z } from 'zod'
import type { addMemberSchema, MemberAnswer, updateMemberSchema } from '../../../shared/api/members.ts'
import { AppError } from '../../../shared/errors.ts'
import { dbErrno, errnoOf } from '../../db/errors.ts'
import { inTransaction } from '../../db/transaction.ts'
import type { MemberContext } from '../../http/routeTable.ts'
import { hashPassphrase } from '../session/passphrase.ts'
import { deleteSessionsOf } from '../session/sessionRepo.ts'
import { insertMember, lockOwners, readMember, updateMember } from './memberRepo.ts'

export async function addMember(
  { db, deps, member }: MemberContext,
  { passphrase, ...added }: z.output<typeof addMemberSchema>,
): Promise<MemberAnswer> {
  const passphraseHash = await hashPassphrase(passphrase, deps.bcryptCost)
  try {
    await insertMember(db, {
      ...added,
      companyId: member.companyId,
      passphraseHash,
      createdAt: new Date().toISOString().slice(0, 23).replace('T', ' '),
    })
  } catch (error) {
    if (errnoOf(error) === dbErrno.duplicate)
      throw new AppError('refused', 'That e-mail address cannot be added. It may be in use already')
    throw error
  }
  return { ...added, disabled: false }
}

/** Changes a member. A company always keeps an owner; a member who is disabled is signed out at once. */
export async function changeMember(
  { db, deps, member }: MemberContext,
  id: string,
  { passphrase, ...given }: z.output<typeof updateMemberSchema>,
): Promise<MemberAnswer> {
  const set = Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined)) as Partial<
    Pick<MemberAnswer, 'name' | 'role' | 'disabled'>
  >
  const hash = passphrase === undefined ? {} : { passphraseHash: await hashPassphrase(passphrase, deps.bcryptCost) }
  return inTransaction(db, async (tx) => {
    const owners = await lockOwners(tx, member.companyId)
    const before = await readMember(tx, member.companyId, id)
    if (!before) throw new AppError('not_found', 'There is nothing at this address')
    const after = { ...before, ...set }
    const staysOwner = after.role === 'owner' && !after.disabled
    if (!staysOwner && !owners.some((owner) => owner.id !== id && !owner.disabled) && before.role === 'owner')
      throw new AppError('refused', `${before.name} is the only owner. Make somebody else an owner first`)
    await updateMember(tx, member.companyId, id, { ...set, ...hash })
    if (after.disabled || passphrase !== undefined) await deleteSessionsOf(tx, member.companyId, id)
    return after
  })
}
