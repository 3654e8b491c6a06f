/** Numbers of MariaDB's errors that the program acts on. */
export const dbErrno = {
  duplicate: 1062,
  reference: 1452,
  referenced: 1451,
  check: 4025,
  tooLong: 1406,
  outOfRange: 1264,
  lockWait: 1205,
  deadlock: 1213,
  snapshotConflict: 1020,
  statementTimeout: 1969,
  shuttingDown: 1053,
  tooManyConnections: 1040,
  connectionKilled: 1927,
} as const

/** The database cannot do it now and may in a moment. */
const passing: ReadonlySet<number> = new Set([
  dbErrno.statementTimeout,
  dbErrno.shuttingDown,
  dbErrno.tooManyConnections,
  dbErrno.connectionKilled,
])

const lost = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'PROTOCOL_CONNECTION_LOST',
  'ETIMEDOUT',
  'EPIPE',
  'ENOTFOUND',
  'PROTOCOL_SEQUENCE_TIMEOUT',
  'ER_SERVER_SHUTDOWN',
  'EAI_AGAIN',
])

interface DriverError {
  readonly errno?: number
  readonly code?: string
  readonly message?: string
}

/** The driver's own error under whatever Drizzle has wrapped round it. */
function driverError(error: unknown): DriverError {
  let current: unknown = error
  for (let depth = 0; depth < 5 && current instanceof Error; depth++) {
    if ('errno' in current || ('code' in current && typeof current.code === 'string' && lost.has(current.code)))
      return current as DriverError
    current = current.cause
  }
  return {}
}

export const errnoOf = (error: unknown): number | undefined => driverError(error).errno

/** Whether doing the same again may work: another transaction was in the way. */
export const isTransient = (error: unknown): boolean => {
  const errno = errnoOf(error)
  return errno === dbErrno.deadlock || errno === dbErrno.lockWait || errno === dbErrno.snapshotConflict
}

const wall: ReadonlySet<number> = new Set([
  dbErrno.duplicate,
  dbErrno.reference,
  dbErrno.referenced,
  dbErrno.check,
  dbErrno.tooLong,
  dbErrno.outOfRange,
])
/** Whether a row did not fit the tables' own rules; doing the same again will not work. */
export const isRefusedByTables = (error: unknown): boolean => wall.has(errnoOf(error) ?? 0)

/** Whether the database could not be reached or did not answer in time. */
export function isUnavailable(error: unknown): boolean {
  const { code, errno } = driverError(error)
  if (code !== undefined && lost.has(code)) return true
  if (errno !== undefined && passing.has(errno)) return true
  return (
    error instanceof Error &&
    /queue limit reached|pool is closed|connection is in closed state/i.test(
      `${error.message} ${error.cause instanceof Error ? error.cause.message : ''}`,
    )
  )
}
