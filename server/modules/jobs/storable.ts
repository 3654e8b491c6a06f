import { AppError } from '../../../shared/errors.ts'

/**
 * Refuses text that UTF-8 cannot carry (half of a surrogate pair): the database would keep something else than what the
 * document says. Throws AppError invalid.
 */
export function assertStorable(value: unknown): void {
  if (typeof value === 'string') {
    if (/\p{Surrogate}/u.test(value)) throw new AppError('invalid', 'Some of that text is damaged. Type it again')
  } else if (typeof value === 'object' && value !== null)
    for (const [key, each] of Object.entries(value)) {
      assertStorable(key)
      assertStorable(each)
    }
}
