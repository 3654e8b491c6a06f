import { createHash } from 'node:crypto'
import { AppError } from '../../../shared/errors.ts'
import type { PublicContext, SignedIn } from '../../http/routeTable.ts'
import { passphraseFits } from './passphrase.ts'
import { clearFailures, countFailure, deleteEndedSessions, findByEmail, readFailures } from './sessionRepo.ts'

const windowMs = 15 * 60 * 1000
export const failuresPerEmail = 10
export const failuresPerAddress = 60

/**
 * The member whose e-mail and passphrase these are. Every failure is answered alike and takes as long, whether the
 * address is known or not. Throws AppError unauthenticated or too_many.
 */
export async function signIn({ db, request }: PublicContext, { email, passphrase }: { email: string; passphrase: string }): Promise<SignedIn> {
  const now = Date.now()
  const subjects = [
    { subject: subjectOf('email', email), most: failuresPerEmail },
    { subject: subjectOf('address', request.ip ?? ''), most: failuresPerAddress },
  ]
  for (const { subject, most } of subjects) {
    const { failures, windowEnds } = await readFailures(db, subject, now)
    if (failures >= most) throw new AppError('too_many', 'Too many attempts that did not fit. Wait a while, then try again', { retryAfterSeconds: Math.ceil((windowEnds - now) / 1000) })
  }
  const member = await findByEmail(db, email)
  const fits = await passphraseFits(passphrase, member?.passphraseHash)
  if (!member || !fits || member.disabled) {
    for (const { subject } of subjects) await countFailure(db, subject, now, windowMs)
    throw new AppError('unauthenticated', 'That e-mail address and passphrase do not go together')
  }
  await clearFailures(db, subjects[0]!.subject)
  await deleteEndedSessions(db, now)
  return { companyId: member.companyId, id: member.id, name: member.name, email: member.email, role: member.role }
}

/** Counted by hash: the table of failures names nobody. */
const subjectOf = (kind: string, value: string) => `${kind}:${createHash('sha256').update(value).digest('base64url')}`
