import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import type { JobScope } from './documentRepo.ts'

/**
 * The last documents this process has read or made, so that one command does not read thousands of rows. A document is
 * only ever handed out for the version it has, which the caller has read from the database.
 */
export interface DocumentCache {
  readonly at: (scope: JobScope, version: number) => JobDocument | undefined
  /** Call it after the commit, never before: what was rolled back must not be found here. */
  readonly keep: (scope: JobScope, doc: JobDocument) => void
}

export function createDocumentCache(size = 32): DocumentCache {
  const kept = new Map<string, JobDocument>()
  return {
    at(scope, version) {
      const key = scopeKey(scope)
      const doc = kept.get(key)
      if (doc?.version !== version) return undefined
      kept.delete(key)
      kept.set(key, doc)
      return doc
    },
    keep(scope, doc) {
      const key = scopeKey(scope)
      const known = kept.get(key)
      if (known && known.version >= doc.version) return
      kept.delete(key)
      kept.set(key, doc)
      for (const oldest of kept.keys()) {
        if (kept.size <= size) break
        kept.delete(oldest)
      }
    },
  }
}

/** One string for one job of one company. */
export const scopeKey = ({ companyId, jobId }: JobScope): string => `${companyId}/${jobId}`
