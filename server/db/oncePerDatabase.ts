import type { Session } from './client.ts'

/**
 * Makes something once for each database and keeps it: a prepared statement, say, whose text need not be put together
 * at every request.
 */
export function oncePerDatabase<T>(make: (db: Session) => T): (db: Session) => T {
  const kept = new WeakMap<Session, T>()
  return (db) => {
    const known = kept.get(db)
    if (known !== undefined) return known
    const made = make(db)
    kept.set(db, made)
    return made
  }
}
