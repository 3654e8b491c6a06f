import type { Intent, Step } from '../../../../shared/commands/index.ts'
import { countKinds, removalOf, removableKinds, type Item } from '../../../../shared/commands/items.ts'
import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import { plateCode } from '../../../../shared/model/naming.ts'
import type { Kind } from '../../../../shared/model/record.ts'
import type { Plate } from '../../../../shared/model/place.ts'
import { takenPorts, takePort } from './freePorts.ts'
import { lengthOf, moveTo, type PlatePlace, type RoomPoint } from './roomPoint.ts'

export interface Chosen {
  readonly kind: Kind
  readonly id: string
}

/** What can be deleted of a selection. */
export const removable = (chosen: readonly Chosen[]): Item[] => chosen.filter((each): each is Item => (removableKinds as readonly string[]).includes(each.kind))

/** What deleting would do, in words, before it is done; or why it cannot be. */
export function removalWords(doc: JobDocument, items: readonly Item[]): { summary: string; hanging: string | null; refusal: string | null } {
  const there = items.filter((item) => find(doc, item.kind, item.id) !== undefined)
  const { gone, refusal } = removalOf(doc, there)
  const own = new Set(there.map((item) => item.id))
  const chosen = gone.filter((record) => own.has(record.id))
  const hanging = gone.filter((record) => !own.has(record.id))
  return { summary: countKinds(chosen), hanging: hanging.length ? countKinds(hanging) : null, refusal }
}

/** Plates moved together by one drag: each by as much, one command. */
export function planMoves(doc: JobDocument, moves: readonly { readonly plate: Plate; readonly to: RoomPoint; readonly from: RoomPoint | null }[]): Intent | null {
  const changed = moves.flatMap(({ plate, to, from }) => {
    const place = moveTo(doc, plate, to, from)
    return isElsewhere(plate, place) ? [{ id: plate.id, to: place }] : []
  })
  return changed.length ? { verb: 'plate.move', args: { moves: changed } } : null
}

const isElsewhere = (plate: Plate, place: PlatePlace) =>
  place.roomId !== plate.roomId || place.wall !== plate.wall || place.alongMm !== plate.alongMm || place.heightMm !== plate.heightMm || place.at?.xMm !== plate.at?.xMm || place.at?.yMm !== plate.at?.yMm

/** A second of each plate beside the first, with its devices' runs from the next free ports: one command. */
export function planDuplicate(doc: JobDocument, plateIds: readonly string[], newId: () => string): { intent: Intent; plateIds: string[] } | null {
  const plates = plateIds.flatMap((id) => find(doc, 'plate', id) ?? [])
  if (!plates.length) return null
  const taken = takenPorts(doc)
  const steps: Step[] = []
  const made: string[] = []
  for (const plate of plates) {
    const plateId = newId()
    made.push(plateId)
    const jackIds = new Map(plate.jacks.map((jack) => [jack.id, newId()]))
    const { kind: _kind, id: _id, number: _number, ...rest } = plate
    const beside = 450
    steps.push({
      verb: 'plate.add',
      args: { ...rest, id: plateId, jacks: plate.jacks.map((jack) => ({ ...jack, id: jackIds.get(jack.id)! })), alongMm: besideOnWall(doc, plate, beside), at: plate.at && { ...plate.at, xMm: plate.at.xMm + beside } },
    })
    steps.push(...copiedRuns(doc, plate, plateId, jackIds, taken, newId))
  }
  const [first] = plates
  return { plateIds: made, intent: { verb: 'batch', args: { label: plates.length === 1 ? `Duplicate ${plateCode(doc, first!)}` : `Duplicate ${plates.length} plates`, steps } } }
}

/** Further along the same wall, or before where the wall ends. */
function besideOnWall(doc: JobDocument, plate: Plate, by: number): number | null {
  const room = find(doc, 'room', plate.roomId)
  if (plate.alongMm === null || plate.wall === null || !room) return plate.alongMm
  return plate.alongMm + by <= lengthOf(room, plate.wall) ? plate.alongMm + by : Math.max(0, plate.alongMm - by)
}

function copiedRuns(doc: JobDocument, plate: Plate, plateId: string, jackIds: ReadonlyMap<string, string>, taken: Set<string>, newId: () => string): Step[] {
  return recordsOf(doc, 'run').flatMap((run): Step[] => {
    const side = run.b && 'plateId' in run.b && run.b.plateId === plate.id ? 'b' : run.a && 'plateId' in run.a && run.a.plateId === plate.id ? 'a' : null
    const end = side && run[side]
    if (!end || !('plateId' in end) || run.dropped !== null) return []
    const jack = plate.jacks.find((each) => each.id === end.jackId)
    const port = jack ? takePort(doc, plate.roomId, jack.connector, taken) : null
    const { cableTypeId, purpose, bundle, pathwayIds, route, slackAMm, slackBMm, loadJoin } = run
    return [{ verb: 'run.add', args: { id: newId(), cableTypeId, purpose, bundle, pathwayIds, route, slackAMm, slackBMm, loadJoin, a: port, b: { plateId, jackId: end.jackId === null ? null : (jackIds.get(end.jackId) ?? null) } } }]
  })
}
