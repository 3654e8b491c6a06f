import { endKey } from '../derive/jobIndex.ts'
import type { Device } from '../model/device.ts'
import type { Pull } from '../model/fieldRecord.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import type { Cord, CordEnd, EndName, Run } from '../model/run.ts'
import { isStruck } from '../model/struck.ts'

/** Records grouped by a key, remembered by the identity of the map they were read from. */
function grouped<R, G>(spread: (record: R) => readonly (readonly [key: string, entry: G])[]): (records: ReadonlyMap<string, R>) => ReadonlyMap<string, readonly G[]> {
  const remembered = new WeakMap<ReadonlyMap<string, R>, ReadonlyMap<string, readonly G[]>>()
  return (records) => {
    const known = remembered.get(records)
    if (known) return known
    const groups = new Map<string, G[]>()
    for (const record of records.values())
      for (const [key, entry] of spread(record)) {
        const group = groups.get(key)
        if (group) group.push(entry)
        else groups.set(key, [entry])
      }
    remembered.set(records, groups)
    return groups
  }
}

export interface RunHere {
  readonly run: Run
  readonly end: EndName
}
export interface CordHere {
  readonly cord: Cord
  readonly far: CordEnd
}

const runsByEnd = grouped<Run, RunHere>((run) => (run.dropped === null ? (['a', 'b'] as const).flatMap((end) => (run[end] ? [[endKey(run[end]), { run, end }] as const] : [])) : []))
const runsByPlate = grouped<Run, RunHere>((run) => (run.dropped === null ? (['a', 'b'] as const).flatMap((end) => { const at = run[end]; return at && 'plateId' in at ? [[at.plateId, { run, end }] as const] : [] }) : []))
const cordsByEnd = grouped<Cord, CordHere>((cord) => [[endKey(cord.a), { cord, far: cord.b }], [endKey(cord.b), { cord, far: cord.a }]])
const devicesByPlate = grouped<Device, Device>((device) => (device.plateId === null ? [] : [[device.plateId, device]]))
const pullsByRun = grouped<Pull, Pull>((pull) => [[pull.runId, pull]])

/** Runs that end exactly here; dropped ones are not there. */
export const runsHere = (doc: JobDocument, key: string): readonly RunHere[] => runsByEnd(doc.records.run).get(key) ?? []
/** Runs that end on any jack of a plate, or on the plate without one. */
export const runsAtPlate = (doc: JobDocument, plateId: string): readonly RunHere[] => runsByPlate(doc.records.run).get(plateId) ?? []
/** Cords plugged in exactly here. */
export const cordsHere = (doc: JobDocument, key: string): readonly CordHere[] => cordsByEnd(doc.records.cord).get(key) ?? []
export const devicesAt = (doc: JobDocument, plateId: string): readonly Device[] => devicesByPlate(doc.records.device).get(plateId) ?? []
/** Pulls of a run that stand, in the order they were said. */
export const pullsOf = (doc: JobDocument, runId: string): readonly Pull[] => (pullsByRun(doc.records.pull).get(runId) ?? []).filter((pull) => !isStruck(doc, 'pull', pull.id))
