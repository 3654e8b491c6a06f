import { deriveJob, type Derived } from '../../shared/derive/deriveJob.ts'
import type { Finding } from '../../shared/checks/finding.ts'
import type { JobRecord, Kind, RecordOf } from '../../shared/model/record.ts'
import { buildDoc } from './build.ts'

/** These records with some of them replaced or added, by id. */
export function withRecords(records: readonly JobRecord[], ...changed: readonly JobRecord[]): JobRecord[] {
  const byKey = new Map(records.map((record) => [`${record.kind}:${record.id}`, record]))
  for (const record of changed) byKey.set(`${record.kind}:${record.id}`, record)
  return [...byKey.values()]
}

/** One of these records with some fields set. Throws where there is none. */
export function changed<K extends Kind>(records: readonly JobRecord[], kind: K, id: string, set: Partial<RecordOf<K>>): JobRecord {
  const record = records.find((each) => each.kind === kind && each.id === id)
  if (!record) throw new Error(`No ${kind} ${id}`)
  return { ...record, ...set } as JobRecord
}

export const derive = (records: readonly JobRecord[]): Derived => deriveJob(buildDoc(...records))

/** What one check finds. */
export const foundBy = (check: string, records: readonly JobRecord[]): Finding[] => derive(records).findings.filter((finding) => finding.check === check)
