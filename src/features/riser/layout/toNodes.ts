import type { RiserLayout } from './riserLayout.ts'

/** A node for the canvas: a place, a size, and what it stands for. */
export interface RiserNode {
  readonly id: string
  readonly type: 'level' | 'bay' | 'plate' | 'device' | 'rack' | 'pathway'
  readonly position: { x: number; y: number }
  readonly size: { readonly w: number; readonly h: number }
  readonly index: number
  readonly zIndex: number
  readonly draggable: boolean
}

/** How nodes and layers of the drawing lie over each other. */
export const layers = { house: -1, bay: 1, rack: 2, lit: 3, device: 4, plate: 5, pathway: 6, tags: 7, level: 1 } as const

/** The drawing as few nodes: levels, bays, plates, devices, racks, chases. Runs are no nodes. */
export function toNodes(layout: RiserLayout, canDesign: boolean): RiserNode[] {
  return [
    ...layout.captions.map((caption, index): RiserNode => node('level', caption.levelId, index, { x: caption.x - 4, y: caption.y, w: 88, h: caption.small ? 28 : 60 }, layers.level, false)),
    ...layout.bays.map((bay, index): RiserNode => node('bay', bay.roomId, index, bay, layers.bay, false)),
    ...layout.racks.map((box, index): RiserNode => node('rack', box.rack.id, index, box, layers.rack, canDesign)),
    ...layout.devices.map((spot, index): RiserNode => node('device', spot.device.id, index, spot, layers.device, canDesign && spot.device.roomId !== null)),
    ...layout.plates.map((spot, index): RiserNode => node('plate', spot.plate.id, index, { x: spot.x - spot.w / 2, y: spot.y - spot.h / 2, w: spot.w, h: spot.h }, layers.plate, canDesign)),
    ...layout.chases.map((box, index): RiserNode => node('pathway', box.pathwayIds[0]!, index, { x: box.note.x - 38, y: box.note.y - 20, w: 76, h: 40 }, layers.pathway, false)),
  ]
}

const node = (type: RiserNode['type'], id: string, index: number, box: { x: number; y: number; w: number; h: number }, zIndex: number, draggable: boolean): RiserNode => ({
  id: `${type}:${id}`, type, index, position: { x: box.x, y: box.y }, size: { w: box.w, h: box.h }, zIndex, draggable,
})
