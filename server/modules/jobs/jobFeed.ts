import { scopeKey } from './documentCache.ts'
import type { JobScope } from './documentRepo.ts'

/** Tells whoever follows a job that it has a new version, whichever process wrote it. */
export interface JobFeed {
  /** Returns the function that ends it. */
  readonly follow: (scope: JobScope, follower: Follower) => () => void
  /** A commit of this process: its followers hear of it at once. */
  readonly announce: (scope: JobScope, version: number) => void
  /** Ends the loop and everybody's following. */
  readonly close: () => void
}

export interface Follower {
  readonly onVersion: (version: number) => void
  /** The feed has closed, and this is the last it says. */
  readonly onEnd: () => void
}

interface Followed {
  readonly scope: JobScope
  version: number
  readonly followers: Set<Follower>
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

  function follow(scope: JobScope, follower: Follower) {
    const key = scopeKey(scope)
    const entry = followed.get(key) ?? { scope, version: -1, followers: new Set() }
    entry.followers.add(follower)
    followed.set(key, entry)
    // Told already to others, maybe after this follower last asked: so it is told again.
    if (entry.version >= 0) follower.onVersion(entry.version)
    schedule()
    return () => {
      entry.followers.delete(follower)
      if (!entry.followers.size && followed.get(key) === entry) followed.delete(key)
    }
  }
  function announce(scope: JobScope, version: number) {
    const entry = followed.get(scopeKey(scope))
    if (!entry || version <= entry.version) return
    entry.version = version
    for (const { onVersion } of entry.followers) onVersion(version)
  }
  function close() {
    closed = true
    clearTimeout(timer)
    const all = [...followed.values()].flatMap((entry) => [...entry.followers])
    followed.clear()
    for (const { onEnd } of all) onEnd()
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
