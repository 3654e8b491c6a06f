import { computed, ref, shallowRef, watch, type ComputedRef, type ShallowRef } from 'vue'
import type { Catalog } from '../../../shared/api/catalog.ts'
import type { Item } from '../../../shared/commands/items.ts'
import { find, jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { formatLength } from '../../../shared/units.ts'
import { useJobStore } from '../job/jobStore.ts'
import { useSelectionStore } from '../job/selectionStore.ts'
import { plateAt } from './layout/findAt.ts'
import type { RiserLayout, XY } from './layout/riserLayout.ts'
import { useRiserStore, type Tool } from './riserStore.ts'
import { connectorOf } from './tools/connectors.ts'
import { roomPointAt } from './tools/drawnPoint.ts'
import { planDevice } from './tools/planDevice.ts'
import { descriptionOf, planJackRun, planPlate, type Planned } from './tools/planPlate.ts'
import { presetFor } from './tools/platePresets.ts'
import { ceilingOf, isCeiling, moveTo, snapHeight, type RoomPoint } from './tools/roomPoint.ts'

/** What a click with the tool in hand does, and what it would do just here. */
export function useRiserTools(doc: ComputedRef<JobDocument>, layout: ComputedRef<RiserLayout>, catalog: ShallowRef<Catalog | null>) {
  const job = useJobStore()
  const selection = useSelectionStore()
  const riser = useRiserStore()
  const hint = shallowRef<{ text: string; screen: XY } | null>(null)
  const placed = ref(0)
  const hasTool = computed(() => riser.tool.kind !== 'select')
  watch(hasTool, () => (hint.value = null))

  return { hasTool, hint, placed, place, showHint }

  /** One click: a plate with its runs, a run to a plate that is there, a device. One command each. */
  function place(at: XY): void {
    const { tool } = riser
    const room = roomPointAt(doc.value, layout.value, at)
    if (!room) {
      riser.caution = 'Click in a room: runs and plates belong to rooms'
      return
    }
    const planned = planFor(tool, at, room)
    if (!planned) return
    if (!job.edit(planned.intent)) return
    placed.value++
    riser.caution = planned.caution ?? ''
    const items: Item[] = planned.runIds.length ? planned.runIds.map((id) => ({ kind: 'run', id })) : planned.plateId ? [{ kind: 'plate', id: planned.plateId }] : []
    if (items.length) selection.choose(...items)
  }

  function planFor(tool: Tool, at: XY, room: RoomPoint): Planned | null {
    const { newId } = job
    if (tool.kind === 'plate') return planPlate(doc.value, catalog.value, room, tool.preset, { withRuns: tool.withRuns, newId })
    if (tool.kind === 'device') return planDevice(doc.value, tool.entry, room, plateAt(layout.value, at)?.plate ?? null, newId)
    if (tool.kind !== 'run') return null
    const onPlate = plateAt(layout.value, at)
    if (onPlate) return planJackRun(doc.value, onPlate.plate, tool.cable, newId)
    return planPlate(doc.value, catalog.value, room, presetOf(tool, room), { withRuns: true, cable: tool.cable, newId })
  }
  function presetOf(tool: Tool & { kind: 'run' }, room: RoomPoint) {
    const type = descriptionOf(doc.value, tool.cable)!
    const isOutside = layout.value.bays.some((bay) => bay.roomId === room.roomId && bay.outside)
    const preset = presetFor(connectorOf(type), isCeiling(room) || (connectorOf(type) === 'speaker-pair' && room.up > 0.8), isOutside)
    // A run tool goes where one clicks: the height under the pointer counts, not the usual one.
    const ceilingMm = ceilingOf(doc.value, find(doc.value, 'room', room.roomId)!)
    return { ...preset, heightMm: preset.mounting === 'ceiling' ? null : snapHeight(room.up * ceilingMm, ceilingMm, jobOf(doc.value).lengthUnit) }
  }

  /** Says what a click or a drop here would mean: the room, the height. */
  function showHint(at: XY | null, screen: XY | null, dragging: string | null): void {
    const room = at && roomPointAt(doc.value, layout.value, at, dragging?.startsWith('plate:') ? dragging.slice(6) : null)
    if (!at || !screen || (!hasTool.value && !dragging)) hint.value = null
    else hint.value = { screen, text: room ? wordsFor(room, at, dragging) : 'Not in a room' }
  }
  function drawnAt(plateId: string): RoomPoint | null {
    const spot = layout.value.plates.find((each) => each.plate.id === plateId)
    return spot ? roomPointAt(doc.value, layout.value, spot, plateId) : null
  }
  function wordsFor(room: RoomPoint, at: XY, dragging: string | null): string {
    const record = find(doc.value, 'room', room.roomId)!
    const { lengthUnit } = jobOf(doc.value)
    const height = (mm: number) => `${formatLength(mm, lengthUnit, { as: 'exact' })} up`
    if (dragging) {
      const plate = dragging.startsWith('plate:') ? find(doc.value, 'plate', dragging.slice(6)) : undefined
      if (!plate) return record.name
      return plate.mounting === 'ceiling' ? `${record.name}, ceiling` : `${record.name}, ${height(moveTo(doc.value, plate, room, drawnAt(plate.id)).heightMm)}`
    }
    const { tool } = riser
    if (tool.kind === 'run') {
      const onPlate = plateAt(layout.value, at)
      if (onPlate) return `${tool.code} to ${onPlate.code}`
      const preset = presetOf(tool, room)
      return `${tool.code} to ${record.name}, ${preset.mounting === 'ceiling' ? 'ceiling' : height(preset.heightMm ?? 0)}`
    }
    if (tool.kind === 'plate') return `${tool.preset.label} in ${record.name}${tool.preset.heightMm === null ? ', ceiling' : `, ${height(tool.preset.heightMm)}`}`
    return tool.kind === 'device' ? `${tool.entry.description.name} in ${record.name}` : record.name
  }
}
