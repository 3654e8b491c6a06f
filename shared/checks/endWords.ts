import type { JobReader } from '../derive/jobReader.ts'
import { endLabel } from '../model/naming.ts'
import type { CordEnd, RunEnd } from '../model/run.ts'

/** An end as a person calls it; what its name is made of is noted as read. */
export function endWords(reader: JobReader, end: RunEnd | CordEnd | null): string {
  if (end && 'plateId' in end) reader.find('room', reader.find('plate', end.plateId)?.roomId)
  else if (end && 'deviceId' in end) reader.find('deviceModel', reader.find('device', end.deviceId)?.modelId)
  else if (end) reader.find('rack', end.rackId)
  return endLabel(reader.doc, end)
}
