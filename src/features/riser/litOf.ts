import type { Item } from '../../../shared/commands/items.ts'
import { find, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { rackIdOfEnd } from '../../../shared/model/naming.ts'
import type { Lit } from './riserScene.ts'

const add = (map: Map<string, Set<string>>, key: string, value: string) => map.set(key, (map.get(key) ?? new Set<string>()).add(value))

/** What lights with a selection: a run takes its plate, its jack and its port along; a cable type takes all its runs. */
export function litOf(doc: JobDocument, items: readonly Item[]): Lit {
  const runs = new Set<string>()
  const jacks = new Map<string, Set<string>>()
  const terminals = new Map<string, Set<string>>()
  const racks = new Set<string>()
  const chosen = new Set(items.map((item) => `${item.kind}:${item.id}`))
  for (const item of items) {
    if (item.kind === 'cableType') for (const run of doc.records.run.values()) if (run.cableTypeId === item.id) runs.add(run.id)
    if (item.kind !== 'run') continue
    const run = find(doc, 'run', item.id)
    if (!run) continue
    runs.add(run.id)
    for (const end of [run.a, run.b]) {
      if (!end) continue
      if ('plateId' in end) add(jacks, end.plateId, end.jackId ?? '')
      if ('deviceId' in end) add(terminals, end.deviceId, end.terminal ?? '')
      const rackId = rackIdOfEnd(doc, end)
      if (rackId) racks.add(rackId)
    }
  }
  return { runs, jacks, terminals, racks, chosen }
}

/** Jacks by id, and terminals as "device:terminal", that a run is on. */
export function landedOf(doc: JobDocument): Set<string> {
  const landed = new Set<string>()
  for (const run of doc.records.run.values())
    for (const end of [run.a, run.b]) {
      if (end && 'plateId' in end && end.jackId) landed.add(end.jackId)
      if (end && 'deviceId' in end && end.terminal) landed.add(`${end.deviceId}:${end.terminal}`)
    }
  return landed
}
