import { metrics } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { Strand } from './strands.ts'

/** Where a strand rises and which lane of its trunk it takes: height over the lowest lane, in units. */
export interface Lane {
  readonly strand: Strand
  readonly x: number
  readonly over: number
  readonly slot: number
}

export interface Lanes {
  readonly lanes: readonly Lane[]
  /** Height of the trunk over its lowest lane, by storey. */
  readonly heights: readonly number[]
  /** Runs of each trunk on one side of a rack, nearest exit first. */
  readonly groups: readonly { readonly rackId: string; readonly corridor: number; readonly side: 'left' | 'right'; readonly up: boolean; readonly lanes: readonly Lane[] }[]
}

/**
 * The lane order. Upward: the nearest exit takes the lowest lane and the outermost place over the rack, so that nothing
 * crosses; what leaves upward again takes the top lanes, the nearest highest. Downward: the farthest takes the top lane
 * and the outermost place.
 */
export function orderLanes(strands: readonly Strand[], placing: Placing, storeyCount: number, apart: boolean): Lanes {
  const racks = new Map(placing.bands.flatMap((bands, column) => bands.racks.map((band) => [band.rackId, { band, middle: placing.columns[column]! + band.offset }] as const)))
  const looseCount = new Map<string, number>()
  const slotOf = (strand: Strand): number => {
    if (strand.exit) return placing.slots.get(strand.exit) ?? 0
    const own = racks.get(strand.rackId)!
    const count = looseCount.get(strand.leaves + strand.rackId) ?? 0
    looseCount.set(strand.leaves + strand.rackId, count + 1)
    if (strand.leaves === 'rack' && strand.trip.kind === 'racks') {
      const target = racks.get(strand.trip.toRackId)!
      return target.middle + target.band.width / 2 - 4 - count * 3
    }
    return own.middle + own.band.width / 2 + 16 + count * 18
  }
  const slots = new Map(strands.map((strand) => [strand, slotOf(strand)]))
  const lanes: Lane[] = []
  const groups: Lanes['groups'][number][] = []
  for (const [rackId, { band, middle }] of racks)
    for (const up of [true, false]) {
      const own = strands.filter((strand) => strand.rackId === rackId && strand.up === up)
      const half = (own.length * band.pitch) / 2
      for (const side of ['left', 'right'] as const) {
        const ordered = outerFirst(own.filter((strand) => strand.side === side), slots, middle, up)
        ordered.forEach((group) => {
          const pitch = Math.min(apart ? metrics.lane.apart : metrics.lane.bundled, ((apart ? 3 : 1) * metrics.lane.mostHeight) / Math.max(1, group.strands.length))
          const made = group.strands.map((strand, index): Lane => {
            const place = (group.before + index + 0.5) * band.pitch
            const over = (up ? index : group.strands.length - 1 - index) * pitch
            return { strand, x: side === 'left' ? middle - half + place : middle + half - place, over, slot: slots.get(strand)! }
          })
          groups.push({ rackId, corridor: group.corridor, side, up, lanes: made })
        })
      }
    }
  const heights = stackGroups(groups, storeyCount, lanes)
  return { lanes, heights, groups: lanesByExit(groups, lanes) }
}

/** Strands of one side by trunk, outermost over the rack first. */
function outerFirst(own: readonly Strand[], slots: ReadonlyMap<Strand, number>, middle: number, up: boolean) {
  const away = (strand: Strand) => Math.abs(slots.get(strand)! - middle)
  const corridors = [...new Set(own.map((strand) => strand.corridor))].sort((a, b) => (up ? a - b : b - a))
  let before = 0
  return corridors.map((corridor) => {
    const here = own.filter((strand) => strand.corridor === corridor)
    const down = here.filter((strand) => strand.leaves !== 'up').sort((a, b) => (up ? away(a) - away(b) : away(b) - away(a)))
    const rising = here.filter((strand) => strand.leaves === 'up').sort((a, b) => away(b) - away(a))
    const group = { corridor, strands: [...down, ...rising], before }
    before += here.length
    return group
  })
}

/** Where trunks of several racks run side by side, each takes its own band, the largest lowest. */
function stackGroups(groups: readonly Lanes['groups'][number][], storeyCount: number, lanes: Lane[]): number[] {
  const heights = Array.from({ length: storeyCount }, () => 0)
  for (let corridor = 0; corridor < storeyCount; corridor++) {
    const placed: { from: number; to: number; top: number }[] = []
    for (const group of groups.filter((each) => each.corridor === corridor).sort((a, b) => b.lanes.length - a.lanes.length)) {
      const xs = group.lanes.flatMap((lane) => [lane.x, lane.slot])
      const from = Math.min(...xs)
      const to = Math.max(...xs)
      const base = Math.max(0, ...placed.filter((each) => each.from < to && each.to > from).map((each) => each.top + 3))
      const top = base + Math.max(...group.lanes.map((lane) => lane.over))
      placed.push({ from, to, top })
      heights[corridor] = Math.max(heights[corridor]!, top)
      for (const lane of group.lanes) lanes.push({ ...lane, over: lane.over + base })
    }
  }
  return heights
}

function lanesByExit(groups: readonly Lanes['groups'][number][], lanes: readonly Lane[]): Lanes['groups'] {
  const final = new Map(lanes.map((lane) => [lane.strand, lane]))
  return groups
    .filter((group) => group.lanes.length)
    .map((group) => ({ ...group, lanes: group.lanes.map((lane) => final.get(lane.strand)!).sort((a, b) => Math.abs(a.slot - a.x) - Math.abs(b.slot - b.x)) }))
}
