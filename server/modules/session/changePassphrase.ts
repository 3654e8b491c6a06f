import type { z } from 'zod'
import type { changePassphraseSchema } from '../../../shared/api/session.ts'
import { AppError } from '../../../shared/errors.ts'
import { inTransaction } from '../../db/transaction.ts'
import type { MemberContext } from '../../http/routeTable.ts'
import { countAttempt } from './attempts.ts'
import { hashPassphrase, passphraseFits } from './passphrase.ts'
import { deleteSessionsOf, findByEmail, writePassphraseHash } from './sessionRepo.ts'
import { startSession } from './startSession.ts'

/**
 * A member's own new passphrase, which takes the one they have now. Everywhere else they are signed out. Whoever finds
 * a screen left open gets no more guesses at it than at the sign-in.
 */
export async function changePassphrase(
  { db, deps, member, request }: MemberContext,
  { current, passphrase }: z.output<typeof changePassphraseSchema>,
): Promise<void> {
  const takeBack = await countAttempt(db, member.email, request.ip ?? '')
  const row = await findByEmail(db, member.email)
  if (!(await passphraseFits(current, row?.passphraseHash, deps.bcryptCost)))
    throw new AppError('refused', 'The passphrase you have now is another one. Nothing was changed')
  await takeBack()
  const passphraseHash = await hashPassphrase(passphrase, deps.bcryptCost)
  await inTransaction(db, async (tx) => {
    await writePassphraseHash(tx, member.companyId, member.id, passphraseHash)
    await deleteSessionsOf(tx, member.companyId, member.id)
  })
  await startSession(request, member)
}
