import { z } from 'zod'

const bytesOf = (point: number) => (point < 0x80 ? 1 : point < 0x800 ? 2 : point < 0x10000 ? 3 : 4)

/** Bytes of a text in UTF-8; half a surrogate pair counts as the mark that stands for it, three. */
const utf8Bytes = (text: string) =>
  [...text].reduce((bytes, character) => bytes + bytesOf(character.codePointAt(0) ?? 0), 0)

/**
 * Fifteen characters at least, because the passphrase is the only factor (NIST SP 800-63B-4); 72 bytes at most,
 * because bcrypt reads no more.
 */
export const passphraseSchema = z
  .string()
  .min(15, 'A passphrase has at least 15 characters: four or five words are easy to keep')
  .refine((text) => utf8Bytes(text) <= 72, 'A passphrase has at most 72 bytes')
