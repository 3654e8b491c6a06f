import { setTimeout as pause } from 'node:timers/promises'
import type { Db, Tx } from './client.ts'
import { isTransient } from './errors.ts'

const mostTries = 5

/** Runs work in one transaction, and again when another transaction was in the way. All of it is kept, or none. */
export const inTransaction = <T>(db: Db, work: (tx: Tx) => Promise<T>): Promise<T> =>
  retried(() => db.transaction(work))

/** Runs one statement, which is a transaction of its own, and again when another transaction was in the way. */
export async function retried<T>(work: () => Promise<T>): Promise<T> {
  for (let tries = 1; ; tries++) {
    try {
      return await work()
    } catch (error) {
      if (tries >= mostTries || !isTransient(error)) throw error
      await pause(10 * 2 ** tries * (0.5 + Math.random()))
    }
  }
}
