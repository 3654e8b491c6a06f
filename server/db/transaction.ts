import { setTimeout as pause } from 'node:timers/promises'
import type { Db, Tx } from './client.ts'
import { isTransient } from './errors.ts'

const mostTries = 5

/** Runs work in one transaction, and again when another transaction was in the way. All of it is kept, or none. */
export async function inTransaction<T>(db: Db, work: (tx: Tx) => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries++) {
    try {
      return await db.transaction(work)
    } catch (error) {
      if (tries >= mostTries || !isTransient(error)) throw error
      await pause(10 * 2 ** tries * (0.5 + Math.random()))
    }
  }
}
