import type { CatalogConflict, CatalogEntry } from '../../../shared/api/catalog.ts'
import { AppError } from '../../../shared/errors.ts'
import { same } from '../../../shared/sync/same.ts'
import type { Db } from '../../db/client.ts'
import { dbErrno, errnoOf } from '../../db/errors.ts'
import { inTransaction } from '../../db/transaction.ts'
import type { CatalogStore } from './catalogRepo.ts'

/** Adds an entry under the id its author gave it. Sent twice, it is added once. */
export function addEntry<Description extends object>(db: Db, store: CatalogStore<Description>, companyId: string, id: string, description: Description): Promise<CatalogEntry<Description>> {
  return refusingDoubles(store.word, description, () =>
    inTransaction(db, async (tx) => {
      const standing = await store.lock(tx, companyId, id)
      if (standing && !same(standing.description, description)) throw conflict(store.word, description, standing)
      const entry = standing ?? { id, version: 1, description }
      if (!standing) await store.insert(tx, companyId, [entry])
      return entry
    }),
  )
}

/** Changes an entry its author saw at `version`. Throws AppError conflict with both when it has changed or gone since. */
export function updateEntry<Description extends object>(
  db: Db,
  store: CatalogStore<Description>,
  companyId: string,
  id: string,
  { version, description }: { readonly version: number; readonly description: Description },
): Promise<CatalogEntry<Description>> {
  return refusingDoubles(store.word, description, () =>
    inTransaction(db, async (tx) => {
      const standing = await store.lock(tx, companyId, id)
      if (!standing) throw noSuchEntry(store.word)
      // An answer that was lost is asked for again with the same content: that is not a conflict.
      if (standing.version === version + 1 && same(standing.description, description)) return standing
      if (standing.version !== version) throw conflict(store.word, description, standing)
      const entry = { id, version: version + 1, description }
      await store.update(tx, companyId, entry)
      return entry
    }),
  )
}

/** Takes an entry out of the catalogue; jobs keep their own copies. Removed already is as good. */
export function removeEntry<Description>(db: Db, store: CatalogStore<Description>, companyId: string, id: string, version: number): Promise<void> {
  return inTransaction(db, async (tx) => {
    const standing = await store.lock(tx, companyId, id)
    if (!standing) return
    if (standing.version !== version) throw conflict(store.word, null, standing)
    await store.remove(tx, companyId, id)
  })
}

/** Two cable types of one company with one code: the table refuses the second, and a person is told why. */
async function refusingDoubles<T>(word: string, description: object, work: () => Promise<T>): Promise<T> {
  try {
    return await work()
  } catch (error) {
    if (errnoOf(error) !== dbErrno.duplicate) throw error
    throw new AppError('refused', `There is a ${word} ${'code' in description ? String(description.code) : 'like that'} in the catalogue already`)
  }
}

const noSuchEntry = (word: string) => new AppError('not_found', `There is no such ${word} in the catalogue`)

const conflict = <Description>(word: string, mine: Description | null, theirs: CatalogEntry<Description>) =>
  new AppError('conflict', `Somebody has changed this ${word} since you opened it`, { mine, theirs } satisfies CatalogConflict<Description>)
