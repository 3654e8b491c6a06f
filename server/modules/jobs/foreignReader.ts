import { foreignWrites, type ForeignWrites, type LoggedChange } from '../../../shared/sync/conflict.ts'
import type { Tx } from '../../db/client.ts'
import type { JobScope } from './documentRepo.ts'
import { othersSince } from './logRepo.ts'

/** Reads, under the job's lock, what others have written between the version a command was made at and now. */
export type ForeignReader = (tx: Tx, madeAt: number, version: number) => Promise<(since: number) => ForeignWrites>

/** One for each push: the commands of a queue look at the same stretch of the log, so it is read once and then continued. */
export function foreignReader(scope: JobScope, actorId: string): ForeignReader {
  let entries: LoggedChange[] = []
  let from: number | undefined
  let upTo = 0
  return async (tx, madeAt, version) => {
    if (madeAt < version) {
      if (from === undefined || madeAt < from) {
        entries = await othersSince(tx, scope, actorId, madeAt, version)
        from = madeAt
      } else if (upTo < version) entries = [...entries, ...(await othersSince(tx, scope, actorId, upTo, version))]
      upTo = version
    }
    return (since) => foreignWrites(entries.filter((entry) => entry.version > since), actorId)
  }
}
