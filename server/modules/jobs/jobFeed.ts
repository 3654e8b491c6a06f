import { scopeKey } from './documentCache.ts'
import type { JobScope } from './documentRepo.ts'

/** Tells whoever follows a job that it has a new version, whichever process wrote it. */
export interface JobFeed {
  /** Returns the function that ends it. */
  readonly follow: (scope: JobScope, onVersion: (version: number) => void) => () => void
  /** A commit of this process: its followers hear of it at once. */
  readonly announce: (scope: JobScope, version: number) => void
  /** Ends the loop; nobody is told anything any more. */
  readonly close: () => void
}

interface Followed {
  readonly scope: JobScope
  version: number
  readonly listeners: Set<(version: number) => void>
}

export interface JobFeedOptions {
  readonly readVersions: (scopes: readonly JobScope[]) => Promise<readonly (JobScope & { readonly version: number })[]>
  readonly onError: (error: unknown) => void
  readonly everyMs?: number
}

/**
 * One question to the database per turn for all jobs that are followed here; none while nobody follows. The event is
 * only a number, so a turn that failed or a version that was skipped costs nothing.
 */
export function startJobFeed({ readVersions, onError, everyMs = 400 }: JobFeedOptions): JobFeed {
  const followed = new Map<string, Followed>()
  let timer: NodeJS.Timeout | undefined
  let closed = false

  return { follow, announce, close }

  function follow(scope: JobScope, onVersion: (version: number) => void) {
    const key = scopeKey(scope)
    const entry = followed.get(key) ?? { scope, version: -1, listeners: new Set() }
    entry.listeners.add(onVersion)
    followed.set(key, entry)
    schedule()
    return () => {
      entry.listeners.delete(onVersion)
      if (!entry.listeners.size && followed.get(key) === entry) followed.delete(key)
    }
  }
  function announce(scope: JobScope, version: number) {
    const entry = followed.get(scopeKey(scope))
    if (!entry || version <= entry.version) return
    entry.version = version
    for (const listener of entry.listeners) listener(version)
  }
  function close() {
    closed = true
    clearTimeout(timer)
    followed.clear()
  }
  function schedule() {
    if (timer || closed || !followed.size) return
    timer = setTimeout(() => void turn(), everyMs)
    timer.unref()
  }
  async function turn() {
    try {
      for (const { version, ...scope } of await readVersions([...followed.values()].map((entry) => entry.scope))) announce(scope, version)
    } catch (error) {
      onError(error)
    }
    timer = undefined
    schedule()
  }
}
