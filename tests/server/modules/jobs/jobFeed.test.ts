import { setTimeout as pause } from 'node:timers/promises'
import { describe, expect, it } from 'vitest'
import { startJobFeed } from '../../../../server/modules/jobs/jobFeed.ts'

const here = { companyId: 'c', jobId: 'j' }
const there = { companyId: 'other', jobId: 'j' }

/** A feed over versions that a test sets, which counts how often it asks. */
function start() {
  const versions = new Map<string, number>([['c/j', 3], ['other/j', 8]])
  const asked: string[][] = []
  const errors: unknown[] = []
  let broken = false
  const feed = startJobFeed({
    everyMs: 5,
    onError: (error) => errors.push(error),
    readVersions: async (scopes) => {
      asked.push(scopes.map((scope) => `${scope.companyId}/${scope.jobId}`))
      if (broken) throw new Error('the database is gone')
      return scopes.map((scope) => ({ ...scope, version: versions.get(`${scope.companyId}/${scope.jobId}`)! }))
    },
  })
  const heard: number[] = []
  let ended = 0
  return { feed, versions, asked, errors, heard, follower: { onVersion: (version: number) => heard.push(version), onEnd: () => ended++ }, ended: () => ended, break: (value: boolean) => (broken = value) }
}

describe('the feed of versions', () => {
  it('tells what another process wrote, once, and asks once a turn for all jobs', async () => {
    const { feed, versions, asked, heard, follower } = start()
    const stop = feed.follow(here, follower)
    const stopOther = feed.follow(there, { onVersion: () => undefined, onEnd: () => undefined })
    await pause(30)
    versions.set('c/j', 4)
    await pause(30)
    expect(heard).toEqual([3, 4])
    expect(asked[0]).toEqual(['c/j', 'other/j'])
    stop()
    stopOther()
    feed.close()
  })
  it('tells a commit of this process at once, and never an older version after it', async () => {
    const { feed, heard, follower } = start()
    feed.follow(here, follower)
    feed.announce(here, 9)
    feed.announce(here, 8)
    feed.announce(there, 20)
    await pause(20)
    expect(heard).toEqual([9])
    feed.close()
  })
  it('tells a follower who comes later what the others know already', () => {
    const { feed, heard, follower } = start()
    feed.follow(here, { onVersion: () => undefined, onEnd: () => undefined })
    feed.announce(here, 5)
    feed.follow(here, follower)
    expect(heard).toEqual([5])
    feed.close()
  })
  it('goes on after the database was gone', async () => {
    const { feed, errors, heard, follower, break: breaks } = start()
    breaks(true)
    feed.follow(here, follower)
    await pause(20)
    expect(errors.length).toBeGreaterThan(0)
    breaks(false)
    await pause(20)
    expect(heard).toEqual([3])
    feed.close()
  })
  it('asks nothing while nobody follows, nor after it is closed; closing ends everybody', async () => {
    const { feed, asked, follower, ended } = start()
    const stop = feed.follow(here, follower)
    await pause(20)
    stop()
    await pause(15)
    const before = asked.length
    await pause(25)
    expect(asked.length).toBe(before)
    feed.follow(here, follower)
    feed.close()
    const after = asked.length
    await pause(25)
    expect([asked.length, ended()]).toEqual([after, 1])
  })
})
