import { maxCommandsPerPush } from '../../../shared/api/jobs.ts'
import type { Kept, OutboxDisk } from '../../api/outboxDisk.ts'
import type { JobApi } from './jobApi.ts'

/** The last push of a job that is being left. Whatever comes of it is on the disk, where the next opening finds it. */
export function sendBehind(api: JobApi, disk: OutboxDisk, version: number, waiting: readonly Kept[]): void {
  const sent = waiting.slice(0, maxCommandsPerPush)
  void api
    .push(version, sent.map((kept) => kept.command))
    .then(async ({ accepted, refused }) => {
      await disk.remove(accepted.map((each) => each.commandId))
      for (const { commandId, code, message, details } of refused) {
        const kept = sent.find((each) => each.command.id === commandId)
        if (kept) await disk.add({ ...kept, refusal: { code, message, details } })
      }
    })
    // Nobody answered: it is all still on the disk.
    .catch(() => undefined)
}
