/** Every way the product can say no. Callers switch on the code, never on the text. */
export const ErrorCode = {
  invalid: 'invalid',
  unauthenticated: 'unauthenticated',
  forbidden: 'forbidden',
  notFound: 'not_found',
  conflict: 'conflict',
  refused: 'refused',
  commandIdReused: 'command_id_reused',
  mediaType: 'media_type',
  tooLarge: 'too_large',
  tooMany: 'too_many',
  unavailable: 'unavailable',
} as const
export type ErrorCode = (typeof ErrorCode)[keyof typeof ErrorCode]

/**
 * An error the product expects: a code to act on, a sentence for a person, and details for the program.
 * `message` is shown as it is, so it names the thing, the figure and what to do.
 */
export class AppError extends Error {
  override name = 'AppError'
  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly details?: unknown,
  ) {
    super(message)
  }
}

/** Fails to compile when a closed union has a case that was not handled. */
export function unreachable(value: never): never {
  throw new Error(`Unhandled case ${String(value)}`)
}
