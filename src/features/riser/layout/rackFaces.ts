import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Device } from '../../../../shared/model/device.ts'
import type { Column } from './columns.ts'
import type { Heights } from './heights.ts'
import { metrics } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { PortSpot, RackBox, RackUnit } from './riserLayout.ts'

const fullRow = 12
const mostStretch = 1.3

/** Devices of each rack, the highest first. */
export function devicesByRack(doc: JobDocument): Map<string, Device[]> {
  const byRack = new Map<string, Device[]>()
  for (const device of recordsOf(doc, 'device')) if (device.rackId) byRack.set(device.rackId, [...(byRack.get(device.rackId) ?? []), device])
  for (const devices of byRack.values()) devices.sort((a, b) => (b.unit ?? 0) - (a.unit ?? 0) || a.name.localeCompare(b.name))
  return byRack
}

/** Draws the racks: one row for each device, taller ones a little taller, with a mark for each port of a panel. */
export function drawRacks(doc: JobDocument, columns: readonly Column[], placing: Placing, heights: Heights, devices: ReadonlyMap<string, readonly Device[]>): RackBox[] {
  return columns.flatMap((column) =>
    column.racks.map(({ rack, storey }, index): RackBox => {
      const band = placing.bands[column.index]!.racks[index]!
      const box = heights.storeys[storey]!
      const x = placing.columns[column.index]! + band.offset - band.width / 2
      const y = box.ceiling + metrics.rack.over
      const h = box.floor - metrics.rack.under - y
      return { rack, storey, x, y, w: band.width, h, units: unitsOf(doc, devices.get(rack.id) ?? [], x, y, band.width, h) }
    }),
  )
}

function unitsOf(doc: JobDocument, devices: readonly Device[], x: number, y: number, w: number, h: number): RackUnit[] {
  const weights = devices.map((device) => {
    const model = find(doc, 'deviceModel', device.modelId)
    const base = 0.8 + 0.35 * (Math.max(1, model?.rackUnits ?? 1) - 1)
    return model?.category === 'panel' && model.terminals.length > 12 ? Math.max(1, base) : base
  })
  const space = h - 2 * metrics.rack.pad
  const row = Math.min(fullRow * mostStretch, space / Math.max(1, weights.reduce((sum, weight) => sum + weight, 0)))
  let at = y + metrics.rack.pad
  return devices.map((device, index) => {
    const height = row * weights[index]!
    const unit = unitOf(doc, device, { x: x + 5, y: at, w: w - 10, h: height - Math.min(1.5, height * 0.15) })
    at += height
    return unit
  })
}

function unitOf(doc: JobDocument, device: Device, box: { x: number; y: number; w: number; h: number }): RackUnit {
  const model = find(doc, 'deviceModel', device.modelId)
  const isPanel = model?.category === 'panel'
  const terminals = [...(model?.terminals ?? [])].sort((a, b) => a.position - b.position)
  const rows = terminals.length > 24 ? 2 : 1
  const each = Math.ceil(terminals.length / rows)
  const from = box.x + Math.min(27, box.w * 0.42)
  const step = (box.x + box.w - 3 - from) / Math.max(1, each)
  const ports = terminals.map((terminal, index): PortSpot => {
    const line = Math.floor(index / each)
    return { key: terminal.key, x: from + step * ((index % each) + 0.5), y: box.y + (box.h * (line + 0.5)) / rows }
  })
  return { ...box, device, text: device.code ?? device.name, isPanel, ports }
}
