import type { ComputedRef, ShallowRef } from 'vue'
import type { Catalog } from '../../../shared/api/catalog.ts'
import type { Step } from '../../../shared/commands/index.ts'
import type { Item } from '../../../shared/commands/items.ts'
import { find, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { useJobStore } from '../job/jobStore.ts'
import { useSelectionStore } from '../job/selectionStore.ts'
import { deviceAt, plateAt, rackAt } from './layout/findAt.ts'
import type { RiserLayout, XY } from './layout/riserLayout.ts'
import { useRiserStore } from './riserStore.ts'
import { roomPointAt } from './tools/drawnPoint.ts'
import { isCordWay, planCord, planRun, type Landing } from './tools/planConnect.ts'
import { planDuplicate, planMoves, removable } from './tools/planEdits.ts'
import { placeAt } from './tools/roomPoint.ts'

/** What a drag, a drop and a key do to the job: one command each. */
export function useRiserEdits(doc: ComputedRef<JobDocument>, layout: ComputedRef<RiserLayout>, catalog: ShallowRef<Catalog | null>) {
  const job = useJobStore()
  const selection = useSelectionStore()
  const riser = useRiserStore()
  return { move, join, duplicate, askRemove, chooseAll, landingAt }

  /** Things dropped somewhere else: plates, devices that stand in rooms, racks. */
  function move(moves: readonly { item: Item; at: XY }[]): void {
    const plates = moves.flatMap(({ item, at }) => {
      const plate = item.kind === 'plate' ? find(doc.value, 'plate', item.id) : undefined
      const to = plate && roomPointAt(doc.value, layout.value, at, plate.id)
      const spot = layout.value.plates.find((each) => each.plate.id === item.id)
      const from = spot ? roomPointAt(doc.value, layout.value, spot, item.id) : null
      return plate && to ? [{ plate, to, from }] : []
    })
    const steps = moves.flatMap(({ item, at }) => otherMove(item, at))
    const plateMove = planMoves(doc.value, plates)
    if (plateMove && !steps.length) job.edit(plateMove)
    else if (plateMove && plateMove.verb === 'plate.move') job.edit({ verb: 'batch', args: { label: 'Move what is chosen', steps: [{ verb: plateMove.verb, args: plateMove.args }, ...steps] } })
    else if (steps.length === 1) job.edit(steps[0]!)
    else if (steps.length) job.edit({ verb: 'batch', args: { label: 'Move what is chosen', steps } })
  }
  function otherMove(item: Item, at: XY): Step[] {
    const to = roomPointAt(doc.value, layout.value, at)
    if (!to) return []
    const place = placeAt(doc.value, to, 'wall')
    const point = placeAt(doc.value, to, 'ceiling').at!
    if (item.kind === 'device' && find(doc.value, 'device', item.id)?.roomId) return [{ verb: 'device.move', args: { moves: [{ id: item.id, to: { roomId: to.roomId, at: point, heightMm: place.heightMm } }] } }]
    const rack = item.kind === 'rack' ? find(doc.value, 'rack', item.id) : undefined
    return rack && rack.roomId !== to.roomId ? [{ verb: 'rack.update', args: { ids: [rack.id], set: { roomId: to.roomId, at: point } } }] : []
  }

  /** What one can land on at a point of the drawing: the nearest jack of a plate, a port, a device, a rack. */
  function landingAt(at: XY): Landing | null {
    const spot = plateAt(layout.value, at, 6)
    if (spot) return { kind: 'plate', plateId: spot.plate.id }
    const rack = rackAt(layout.value, at)
    if (rack?.unit) return { kind: 'device', deviceId: rack.unit.device.id }
    if (rack) return { kind: 'rack', rackId: rack.rack.rack.id }
    const device = deviceAt(layout.value, at)
    return device ? { kind: 'device', deviceId: device.device.id } : null
  }

  /** A drag from a jack or a port to somewhere: a run, or a cord where both are in the rack, or where Alt is held. */
  function join(from: { nodeId: string; handleId: string }, at: XY, asCord: boolean): void {
    const start = startOf(from)
    const end = landingAt(at)
    if (!start || !end) {
      riser.caution = 'Let go over a plate, a port or a device to join them'
      return
    }
    if (('plateId' in start && 'plateId' in end && start.plateId === end.plateId) || ('deviceId' in start && 'deviceId' in end && start.deviceId === end.deviceId)) return
    const cable = riser.tool.kind === 'run' ? riser.tool.cable : undefined
    const joined = asCord || isCordWay(doc.value, start, end) ? planCord(doc.value, start, end, job.newId) : planRun(doc.value, catalog.value, start, end, { cable, newId: job.newId })
    if ('refusal' in joined) riser.caution = joined.refusal
    else if (job.edit(joined.intent)) {
      riser.caution = ''
      if (joined.runId) selection.choose({ kind: 'run', id: joined.runId })
    }
  }
  function startOf({ nodeId, handleId }: { nodeId: string; handleId: string }): Landing | null {
    if (nodeId.startsWith('plate:')) return { kind: 'jack', plateId: nodeId.slice(6), jackId: handleId }
    const [deviceId, terminal] = handleId.split('/')
    return deviceId && terminal ? { kind: 'port', deviceId, terminal } : null
  }

  /** Plates with their runs to the next free ports; a chosen run stands for its plate. */
  function duplicate(): void {
    const plateIds = new Set<string>()
    for (const item of selection.items) {
      if (item.kind === 'plate') plateIds.add(item.id)
      const run = item.kind === 'run' ? find(doc.value, 'run', item.id) : undefined
      const end = run?.b && 'plateId' in run.b ? run.b : run?.a && 'plateId' in run.a ? run.a : null
      if (end) plateIds.add(end.plateId)
    }
    const planned = planDuplicate(doc.value, [...plateIds], job.newId)
    if (planned && job.edit(planned.intent)) selection.choose(...planned.plateIds.map((id): Item => ({ kind: 'plate', id })))
  }

  /** Deleting says first what goes along. */
  function askRemove(): void {
    if (removable(selection.items).length) riser.dialog = 'remove'
  }

  function chooseAll(): void {
    selection.choose(...layout.value.runs.map((run): Item => ({ kind: 'run', id: run.runId })))
  }
}
