import { openDatabase, type Database } from '../../server/db/client.ts'

export interface Breakable {
  readonly database: Database
  readonly breakAt: (statement: number) => void
  readonly mend: () => void
  /** Whether a statement failed since it was last told to break. */
  readonly broke: () => boolean
}

/** A database whose statements inside transactions fail from the n-th on, until it is mended. */
export function breakable(url: string): Breakable {
  const database = openDatabase(url, 2)
  let left = Number.POSITIVE_INFINITY
  let broke = false
  const take = database.pool.getConnection.bind(database.pool)
  database.pool.getConnection = async () => {
    const connection = await take()
    const ask = connection.query.bind(connection) as (...args: unknown[]) => Promise<unknown>
    connection.query = (async (...args: unknown[]) => {
      if (--left > 0 || JSON.stringify(args[0]).includes('rollback')) return ask(...args)
      broke = true
      throw new Error('the disk is gone')
    }) as typeof connection.query
    return connection
  }
  return { database, breakAt: (statement) => ((left = statement), (broke = false)), mend: () => (left = Number.POSITIVE_INFINITY), broke: () => broke }
}
