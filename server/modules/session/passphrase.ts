import bcrypt from 'bcryptjs'
import { AppError } from '../../../shared/errors.ts'

/** bcrypt reads no more than this; a longer passphrase would be cut in silence, so it is refused. */
export const longestPassphraseBytes = 72

/** At most two at a time: hashing is slow on purpose, and a crowd that signs in must not stop everybody's work. */
let running = 0
const waiting: (() => void)[] = []
async function taken<T>(work: () => Promise<T>): Promise<T> {
  if (running >= 2) await new Promise<void>((go) => waiting.push(go))
  running++
  try {
    return await work()
  } finally {
    running--
    waiting.shift()?.()
  }
}

/** A salted bcrypt hash. Throws AppError invalid for a passphrase over 72 bytes. */
export function hashPassphrase(passphrase: string, cost: number): Promise<string> {
  if (bcrypt.truncates(passphrase)) throw new AppError('invalid', `A passphrase has at most ${longestPassphraseBytes} bytes`)
  return taken(() => bcrypt.hash(passphrase, cost))
}

// A hash of nothing anybody knows: an unknown address takes as long as a known one.
const nobody = bcrypt.hashSync(String(Math.random()), 12)

/** Whether a passphrase fits a hash; with no hash the same time passes and the answer is no. */
export async function passphraseFits(passphrase: string, hash: string | undefined): Promise<boolean> {
  const fits = await taken(() => bcrypt.compare(passphrase, hash ?? nobody))
  return hash !== undefined && fits && !bcrypt.truncates(passphrase)
}
