import { createPinia } from 'pinia'
import type { Role } from '../../shared/policy.ts'
import { NoConnection } from '../../src/api/request.ts'
import type { JobApi } from '../../src/features/job/jobApi.ts'
import { useJobStore } from '../../src/features/job/jobStore.ts'
import { FakeDisk, type FakeJobServer } from './fakeJobServer.ts'

export type JobStore = ReturnType<typeof useJobStore>

/** Somebody's page with a job open on it, and the line to the server, which can be cut. */
export interface JobClient {
  readonly store: JobStore
  readonly disk: FakeDisk
  readonly api: JobApi
  connected: boolean
  /** The server does it, and the answer never comes. */
  losesAnswers: boolean
  /** How often the server was asked to take commands. */
  pushes: number
  /** Leaves the page as a crash would, and opens the job again with what is on the disk. */
  readonly reload: () => Promise<void>
}

let counter = 0

/** Opens the server's job for a member. */
export async function jobClient(server: FakeJobServer, name: string, { role = 'designer', api: over }: { role?: Role; api?: Partial<JobApi> } = {}): Promise<JobClient> {
  const store = useJobStore(createPinia())
  const disk = new FakeDisk()
  const answer = <T>(work: () => T): Promise<T> => {
    if (!self.connected) return Promise.reject(new NoConnection('none'))
    try {
      const result = work()
      return self.losesAnswers ? Promise.reject(new NoConnection('lost')) : Promise.resolve(result)
    } catch (error) {
      return Promise.reject(error as Error)
    }
  }
  const api: JobApi = {
    open: () => answer(() => server.open()),
    push: (base, commands) => {
      self.pushes++
      return answer(() => server.push({ id: name, role }, base, commands))
    },
    since: (version) => answer(() => server.since(version)),
    ...over,
  }
  const open = (on: FakeDisk) => store.open({ jobId: 'job', actor: { id: name, role }, newId: () => `${name}-${counter++}`, now: () => '2026-12-01T10:00:00.000Z', disk: on, api })
  const self: JobClient = {
    store, disk, api, connected: true, losesAnswers: false, pushes: 0,
    reload: async () => {
      // What a page that is gone would still have sent or written never happens.
      const left = new Map(disk.rows)
      const was = self.connected
      self.connected = false
      store.close()
      await Promise.resolve()
      disk.rows = left
      self.connected = was
      await open(disk)
    },
  }
  await open(disk)
  return self
}
