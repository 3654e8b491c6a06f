import { createHash } from 'node:crypto'
import { AppError } from '../../../shared/errors.ts'
import type { PublicContext, SignedIn } from '../../http/routeTable.ts'
import { passphraseFits } from './passphrase.ts'
import { clearAttempts, deleteEndedSessions, findByEmail, giveBackAttempt, takeAttempt } from './sessionRepo.ts'

const windowMs = 15 * 60 * 1000
/** Attempts that do not fit within the window, before one has to wait. */
export const mostAttempts = {
  /** With one e-mail from one address: somebody guessing, or somebody who forgot. */
  pair: 10,
  /** From one address with any e-mail: an office shares one. */
  address: 60,
  /** With one e-mail from anywhere: many who guess together. Far above the pair's, so that one guesser cannot keep the owner out. */
  email: 100,
}

/**
 * The member whose e-mail and passphrase these are. Every failure is answered alike and takes as long, whether the
 * address is known or not. Throws AppError unauthenticated or too_many.
 */
export async function signIn({ db, deps, request }: PublicContext, { email, passphrase }: { email: string; passphrase: string }): Promise<SignedIn> {
  const now = Date.now()
  const address = request.ip ?? ''
  const subjects = { pair: subjectOf('pair', `${email} ${address}`), address: subjectOf('address', address), email: subjectOf('email', email) }
  for (const kind of ['pair', 'address', 'email'] as const) {
    const { attempts, windowEnds } = await takeAttempt(db, subjects[kind], now, windowMs)
    if (attempts > mostAttempts[kind]) throw new AppError('too_many', 'Too many attempts that did not fit. Wait a while, then try again', { retryAfterSeconds: Math.max(1, Math.ceil((windowEnds - now) / 1000)) })
  }
  const member = await findByEmail(db, email)
  const fits = await passphraseFits(passphrase, member?.passphraseHash, deps.bcryptCost)
  if (!member || !fits || member.disabled) throw new AppError('unauthenticated', 'That e-mail address and passphrase do not go together')
  await clearAttempts(db, subjects.pair)
  await giveBackAttempt(db, subjects.address)
  await giveBackAttempt(db, subjects.email)
  await deleteEndedSessions(db, now)
  return { companyId: member.companyId, id: member.id, name: member.name, email: member.email, role: member.role }
}

/** Counted by hash: the table of attempts names nobody. */
const subjectOf = (kind: string, value: string) => `${kind}:${createHash('sha256').update(value).digest('base64url')}`
