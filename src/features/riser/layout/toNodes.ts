import type { BayBox, ChaseBox, DeviceSpot, LevelCaption, PlateSpot, RackBox, RiserLayout } from './riserLayout.ts'

/** A node for the canvas: a place, a size, and what it stands for. */
export interface RiserNode {
  readonly id: string
  readonly type: 'level' | 'bay' | 'plate' | 'device' | 'rack' | 'pathway'
  readonly position: { x: number; y: number }
  readonly size: { readonly w: number; readonly h: number }
  /** What it stands for. */
  readonly itemId: string
  readonly zIndex: number
  readonly draggable: boolean
}

/** How nodes and layers of the drawing lie over each other. */
export const layers = { house: -1, bay: 1, rack: 2, lit: 3, device: 4, plate: 5, pathway: 6, tags: 7, level: 1 } as const

/** The drawing as few nodes: levels, bays, plates, devices, racks, chases. Runs are no nodes. */
export function toNodes(layout: RiserLayout, canDesign: boolean): RiserNode[] {
  return [
    ...layout.captions.map((caption): RiserNode => node('level', caption.levelId, { x: caption.x - 4, y: caption.y, w: 88, h: caption.small ? 28 : 60 }, layers.level, false)),
    ...layout.bays.map((bay): RiserNode => node('bay', bay.roomId, bay, layers.bay, false)),
    ...layout.racks.map((box): RiserNode => node('rack', box.rack.id, box, layers.rack, canDesign)),
    ...layout.devices.map((spot): RiserNode => node('device', spot.device.id, spot, layers.device, canDesign && spot.device.roomId !== null)),
    ...layout.plates.map((spot): RiserNode => node('plate', spot.plate.id, { x: spot.x - spot.w / 2, y: spot.y - spot.h / 2, w: spot.w, h: spot.h }, layers.plate, canDesign)),
    ...layout.chases.map((box): RiserNode => node('pathway', box.pathwayIds[0]!, { x: box.note.x - 38, y: box.note.y - 20, w: 76, h: 40 }, layers.pathway, false)),
  ]
}

const node = (type: RiserNode['type'], itemId: string, box: { x: number; y: number; w: number; h: number }, zIndex: number, draggable: boolean): RiserNode => ({
  id: `${type}:${itemId}`, type, itemId, position: { x: box.x, y: box.y }, size: { w: box.w, h: box.h }, zIndex, draggable,
})

/** Everything with a node, by the id of what it stands for. */
export interface RiserSpots {
  readonly captions: ReadonlyMap<string, LevelCaption>
  readonly bays: ReadonlyMap<string, BayBox>
  readonly racks: ReadonlyMap<string, RackBox>
  readonly devices: ReadonlyMap<string, DeviceSpot>
  readonly plates: ReadonlyMap<string, PlateSpot>
  readonly chases: ReadonlyMap<string, ChaseBox>
}

export const toSpots = (layout: RiserLayout): RiserSpots => ({
  captions: new Map(layout.captions.map((each) => [each.levelId, each])),
  bays: new Map(layout.bays.map((each) => [each.roomId, each])),
  racks: new Map(layout.racks.map((each) => [each.rack.id, each])),
  devices: new Map(layout.devices.map((each) => [each.device.id, each])),
  plates: new Map(layout.plates.map((each) => [each.plate.id, each])),
  chases: new Map(layout.chases.map((each) => [each.pathwayIds[0]!, each])),
})
