import { createHash } from 'node:crypto'
import { AppError } from '../../../shared/errors.ts'
import type { Db } from '../../db/client.ts'
import { retried } from '../../db/transaction.ts'
import { clearAttempts, giveBackAttempt, takeAttempt } from './sessionRepo.ts'

const windowMs = 15 * 60 * 1000

/** Attempts that do not fit within the window, before one has to wait. */
export const mostAttempts = {
  /** With one e-mail from one address: somebody guessing, or somebody who forgot. */
  pair: 10,
  /** From one address with any e-mail: an office shares one. */
  address: 60,
  /**
   * With one e-mail from anywhere: many who guess together. Far above the pair's, so that one guesser cannot keep the
   * owner out.
   */
  email: 100,
}

/**
 * Counts an attempt before it is made, in the database, so that it holds for all processes and across restarts.
 * Returns what takes it back when the passphrase fitted. Throws AppError too_many with the seconds to wait.
 */
export async function countAttempt(db: Db, email: string, address: string): Promise<() => Promise<void>> {
  const now = Date.now()
  const subjects = {
    pair: subjectOf('pair', `${email} ${address}`),
    address: subjectOf('address', address),
    email: subjectOf('email', email),
  }
  for (const kind of ['pair', 'address', 'email'] as const) {
    const { attempts, windowEnds } = await retried(() => takeAttempt(db, subjects[kind], now, windowMs))
    if (attempts > mostAttempts[kind]) throw tooMany(Math.max(1, Math.ceil((windowEnds - now) / 1000)))
  }
  return async () => {
    await retried(() => clearAttempts(db, subjects.pair))
    await retried(() => giveBackAttempt(db, subjects.address))
    await retried(() => giveBackAttempt(db, subjects.email))
  }
}

/** Counted by hash: the table of attempts names nobody. */
const subjectOf = (kind: string, value: string) => `${kind}:${createHash('sha256').update(value).digest('base64url')}`

const tooMany = (retryAfterSeconds: number) =>
  new AppError('too_many', `Too many attempts that did not fit. Wait ${minutes(retryAfterSeconds)}, then try again`, {
    retryAfterSeconds,
  })

const minutes = (seconds: number) => (seconds <= 60 ? 'a minute' : `${Math.ceil(seconds / 60)} minutes`)
