import bcrypt from 'bcryptjs'
import { AppError } from '../../../shared/errors.ts'
import { askThread } from './passphraseThreads.ts'

/** bcrypt reads no more than this; a longer passphrase would be cut in silence, so it is refused. */
export const longestPassphraseBytes = 72

/** A salted bcrypt hash. Throws AppError invalid for a passphrase over 72 bytes. */
export async function hashPassphrase(passphrase: string, cost: number): Promise<string> {
  if (bcrypt.truncates(passphrase))
    throw new AppError('invalid', `A passphrase has at most ${longestPassphraseBytes} bytes`)
  return (await askThread({ passphrase, cost })) as string
}

/** The form of a hash whose passphrase nobody knows: its salt and digest were drawn at random. */
const nobody = (cost: number) =>
  `$2b$${String(cost).padStart(2, '0')}$kz0m5gJtq2CwqT7n8yVb1uGd3RrXoE4sLhP9aQfWcNvYjUxIi6KZe`

/** Whether a passphrase fits a hash; with no hash the same time passes and the answer is no. */
export async function passphraseFits(passphrase: string, hash: string | undefined, cost: number): Promise<boolean> {
  const fits = await askThread({ passphrase, hash: hash ?? nobody(cost) })
  return hash !== undefined && fits === true && !bcrypt.truncates(passphrase)
}
