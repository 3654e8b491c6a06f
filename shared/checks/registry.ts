import type { JobReader } from '../derive/jobReader.ts'
import type { JobRecord } from '../model/record.ts'
import { amplifierLoad } from './amplifierLoad.ts'
import { channelBudget } from './channelBudget.ts'
import { dataLength } from './dataLength.ts'
import { findingsOf, type Check, type CheckedKind } from './define.ts'
import type { Finding } from './finding.ts'
import { jacketSpace } from './jacketSpace.ts'
import { lengthDoubt } from './lengthDoubt.ts'
import { labelUse } from './labelUse.ts'
import { cordUse, portUse } from './portUse.ts'
import { pulledLength } from './pulledLength.ts'
import { runEnds } from './runEnds.ts'
import { cordMatch, signalMatch } from './signalMatch.ts'
import { speakerLoss } from './speakerLoss.ts'
import { testResult } from './testResult.ts'
import { videoReach } from './videoReach.ts'

/** Every check, by what it looks at. A new one is a file here and a line. */
const byKind: { readonly [K in CheckedKind]: readonly Check<K>[] } = {
  run: [speakerLoss, dataLength, videoReach, jacketSpace, portUse, labelUse, signalMatch, pulledLength, lengthDoubt, runEnds, testResult],
  cord: [cordUse, cordMatch],
  device: [amplifierLoad],
  room: [channelBudget],
}

/** What is said about a check, without what it does: for the list of what is checked. */
export const allChecks: readonly Omit<Check, 'look'>[] = [...byKind.run, ...byKind.device, ...byKind.room, ...byKind.cord]

/** All findings about one record. A dropped run has none. */
export function findAbout(reader: JobReader, record: JobRecord): Finding[] {
  switch (record.kind) {
    case 'run':
      return record.dropped === null ? byKind.run.flatMap((check) => findingsOf(check, reader, record)) : []
    case 'cord':
      return byKind.cord.flatMap((check) => findingsOf(check, reader, record))
    case 'device':
      return byKind.device.flatMap((check) => findingsOf(check, reader, record))
    case 'room':
      return byKind.room.flatMap((check) => findingsOf(check, reader, record))
    default:
      return []
  }
}
