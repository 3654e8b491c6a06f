import type { Changes, JobOpened, PushAnswer } from '../../../shared/api/jobs.ts'
import type { Command } from '../../../shared/commands/index.ts'
import { request } from '../../api/request.ts'

/** What the open job asks of the server; a test gives another. */
export interface JobApi {
  readonly open: () => Promise<JobOpened>
  readonly push: (baseVersion: number, commands: readonly Command[]) => Promise<PushAnswer>
  readonly since: (version: number) => Promise<Changes>
}

export function jobApi(jobId: string): JobApi {
  const path = `/api/jobs/${encodeURIComponent(jobId)}`
  return {
    open: () => request<JobOpened>('GET', path),
    push: (baseVersion, commands) => request<PushAnswer>('POST', `${path}/commands`, { baseVersion, commands }),
    since: (version) => request<Changes>('GET', `${path}/changes?since=${version}`),
  }
}
