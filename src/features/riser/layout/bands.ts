import type { Column } from './columns.ts'
import { metrics } from './metrics.ts'
import type { Strand } from './strands.ts'

/** How wide a rack is drawn, and the lanes of its runs over it and under it. */
export interface RackBand {
  readonly rackId: string
  readonly storey: number
  readonly pitch: number
  readonly width: number
  /** From the middle of the column to the middle of the rack. */
  readonly offset: number
  readonly up: number
  readonly down: number
}

export interface ColumnBands {
  readonly racks: readonly RackBand[]
  /** Space for runs that change levels without touching a rack here. */
  readonly crossers: number
  readonly rackWidth: number
}

export function bandsOf(column: Column, strands: readonly Strand[], crossers: number, apart: boolean): ColumnBands {
  const sized = column.racks.map(({ rack, storey }) => {
    const own = strands.filter((strand) => strand.rackId === rack.id)
    const up = own.filter((strand) => strand.up).length
    const down = own.length - up
    const most = Math.max(up, down, 1)
    const pitch = Math.min(apart ? metrics.lane.apart : metrics.lane.bundled, (apart ? 2 : 1) * metrics.lane.mostWidth / most)
    return { rackId: rack.id, storey, pitch, up, down, width: Math.max(metrics.rack.width, most * pitch + 4) }
  })
  const total = sized.reduce((sum, each) => sum + each.width + metrics.rack.gap, -metrics.rack.gap)
  let at = -total / 2
  const racks = sized.map((each) => {
    const offset = at + each.width / 2
    at += each.width + metrics.rack.gap
    return { ...each, offset }
  })
  return { racks, crossers, rackWidth: Math.max(0, total) }
}

/** How far a column reaches left and right of its middle on a storey; nothing where nothing passes. */
export function reach(column: Column, bands: ColumnBands, strands: readonly Strand[], storey: number, crossed: boolean): { left: number; right: number } {
  const crossers = crossed && bands.crossers ? bands.rackWidth / 2 + 6 + bands.crossers * metrics.localLane + 4 : 0
  if (column.racks.some((rack) => rack.storey === storey)) return { left: bands.rackWidth / 2, right: Math.max(bands.rackWidth / 2 + 8, crossers) }
  let left = 0
  let right = crossers
  for (const band of bands.racks) {
    const own = strands.filter((strand) => strand.rackId === band.rackId && (storey > band.storey ? strand.up : !strand.up))
    const passing = own.filter((strand) => (storey > band.storey ? strand.corridor >= storey : strand.corridor <= storey))
    if (!passing.length) continue
    const gone = own.filter((strand) => !passing.includes(strand))
    const half = (own.length * band.pitch) / 2
    const goneLeft = gone.filter((strand) => strand.side === 'left').length * band.pitch
    const goneRight = gone.filter((strand) => strand.side === 'right').length * band.pitch
    left = Math.max(left, half - goneLeft - band.offset + 8)
    right = Math.max(right, half - goneRight + band.offset + 8)
  }
  return { left, right }
}
