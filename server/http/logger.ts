import pino, { type DestinationStream, type Logger } from 'pino'

/** Never in a log: what signs a request in. */
export const redactedPaths = ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]']

/** One JSON line an event, with everything about a fault except what people typed. */
export const createLogger = (level: string, destination?: DestinationStream): Logger =>
  pino({ level, redact: redactedPaths, serializers: { err: describeError } }, destination ?? pino.destination(2))

/**
 * A fault with its cause and stack. Drizzle and the driver put the values of a statement into their errors, and those
 * hold passphrase hashes and clients' names: the statement stays, the values go.
 */
export function describeError(error: unknown): unknown {
  if (!(error instanceof Error)) return String(error)
  const { code, errno, query, cause } = error as Error & { code?: unknown; errno?: unknown; query?: unknown }
  return {
    type: error.name,
    message: withoutValues(error.message),
    stack: withoutValues(error.stack ?? ''),
    ...(code === undefined ? {} : { code }),
    ...(errno === undefined ? {} : { errno }),
    ...(typeof query === 'string' ? { query } : {}),
    ...(cause === undefined ? {} : { cause: describeError(cause) }),
  }
}

/**
 * Drizzle's message ends with the values, over as many lines as they have; the stack goes on behind. MariaDB quotes a
 * value that is a duplicate.
 */
const withoutValues = (text: string) =>
  text
    .replace(/\nparams: [\s\S]*?(?=\n {4}at |$)/, '\nparams: left out')
    .replace(/Duplicate entry '[\s\S]*' for key/, 'Duplicate entry for key')
    .replace(/(Incorrect|Truncated incorrect) (\w+) value: '[\s\S]*' for/, '$1 $2 value for')
