import type { JobStanding } from '../../../shared/api/jobs.ts'
import { scopeKey } from './documentCache.ts'
import type { JobScope } from './documentRepo.ts'

/** What was worked out for the list of jobs, by job and version: a few numbers each, so all of them are kept. */
export interface StandingCache {
  readonly at: (scope: JobScope, version: number) => JobStanding | undefined
  readonly keep: (scope: JobScope, version: number, standing: JobStanding) => void
}

export function createStandingCache(): StandingCache {
  const kept = new Map<string, { readonly version: number; readonly standing: JobStanding }>()
  return {
    at(scope, version) {
      const known = kept.get(scopeKey(scope))
      return known?.version === version ? known.standing : undefined
    },
    keep(scope, version, standing) {
      kept.set(scopeKey(scope), { version, standing })
    },
  }
}
