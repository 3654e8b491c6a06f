import { AppError } from '../../../shared/errors.ts'
import { retried } from '../../db/transaction.ts'
import type { PublicContext, SignedIn } from '../../http/routeTable.ts'
import { countAttempt } from './attempts.ts'
import { passphraseFits } from './passphrase.ts'
import { deleteEndedSessions, findByEmail } from './sessionRepo.ts'

/**
 * The member whose e-mail and passphrase these are. Every failure is answered alike and takes as long, whether the
 * address is known or not. Throws AppError unauthenticated or too_many.
 */
export async function signIn(
  { db, deps, request }: PublicContext,
  { email, passphrase }: { readonly email: string; readonly passphrase: string },
): Promise<SignedIn> {
  const takeBack = await countAttempt(db, email, request.ip ?? '')
  const member = await findByEmail(db, email)
  const fits = await passphraseFits(passphrase, member?.passphraseHash, deps.bcryptCost)
  if (!member || !fits || member.disabled) {
    deps.log.info({ requestId: request.id }, 'a sign-in did not fit')
    throw new AppError('unauthenticated', 'That e-mail address and passphrase do not go together')
  }
  await takeBack()
  await retried(() => deleteEndedSessions(db, Date.now()))
  return { companyId: member.companyId, id: member.id, name: member.name, email: member.email, role: member.role }
}
