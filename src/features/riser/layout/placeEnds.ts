import type { Column } from './columns.ts'
import { metrics } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { Exit } from './readTrips.ts'
import { onGable, type FixturePlace } from './strands.ts'

/** How far from the wall of the house the first thing on its outside hangs, by storey kind. */
const off = { roof: 9, crawl: 36, full: 9 } as const
const step = 24

/** Places what hangs under the roof, in the crawl and on the end walls: by its place on the plan, nothing over another. */
export function placeEnds(storeys: readonly Storey[], columns: readonly Column[], exits: ReadonlyMap<string, readonly Exit[]>, placing: Placing): void {
  for (const storey of storeys) {
    if (storey.kind === 'full') continue
    const edge = placing.edges[storey.index]!
    const places = storey.rooms.flatMap((room) => room.fixtures.map((fixture): FixturePlace => ({ storey, room, fixture })))
    for (const side of ['W', 'E'] as const)
      places
        .filter((place) => onGable(place) && place.fixture.side === side)
        .forEach(({ fixture }, index) => {
          const away = off[storey.kind] + index * step
          put(placing, fixture.key, exits.get(fixture.key) ?? [], side === 'W' ? edge.x0 - away : edge.x1 + away, 6)
        })
    const anchors = anchorsOf(storeys, columns, placing, edge)
    const inner = places
      .filter((place) => !onGable(place))
      .map(({ fixture, room }) => ({ fixture, own: exits.get(fixture.key) ?? [], x: along(anchors, room.minX + fixture.across * (room.maxX - room.minX)) }))
      .sort((a, b) => a.x - b.x)
    let last = -Infinity
    for (const each of inner) {
      const width = Math.max(26, each.own.length * metrics.slotPitch)
      const clear = clearOf(placing.gaps[storey.kind === 'roof' ? topFull(storeys) : storey.index] ?? [], each.x, width / 2 + 42)
      const x = Math.min(edge.x1 - 34, Math.max(edge.x0 + 34, clear, last + width / 2))
      last = x + width / 2
      put(placing, each.fixture.key, each.own, x, metrics.slotPitch)
    }
  }
}

const topFull = (storeys: readonly Storey[]) => storeys.findLastIndex((storey) => storey.kind === 'full')

/** Beside a column rather than on it. */
function clearOf(gaps: readonly { x0: number; x1: number }[], x: number, room: number): number {
  const gap = gaps.find((each) => x > each.x0 - room && x < each.x1 + room)
  if (!gap) return x
  return x < (gap.x0 + gap.x1) / 2 ? gap.x0 - room : gap.x1 + room
}

function put(placing: Placing, key: string, own: readonly Exit[], x: number, pitch: number): void {
  placing.centres.set(key, x)
  own.forEach((exit, index) => placing.slots.set(exit, x + (index - (own.length - 1) / 2) * pitch))
}

/** Pairs of plan x and drawing x: the ends of the house and its columns, so that nothing changes sides. */
function anchorsOf(storeys: readonly Storey[], columns: readonly Column[], placing: Placing, edge: { x0: number; x1: number }): [plan: number, x: number][] {
  const rooms = storeys.flatMap((storey) => storey.rooms.filter((room) => !room.isOutside))
  const min = Math.min(...rooms.map((room) => room.minX), 0)
  const max = Math.max(...rooms.map((room) => room.maxX), min + 1)
  const inner = columns.filter((column) => column.planX > min && column.planX < max).map((column): [number, number] => [column.planX, placing.columns[column.index]!])
  return [[min, edge.x0], ...inner, [max, edge.x1]]
}

function along(anchors: readonly (readonly [number, number])[], plan: number): number {
  for (let index = 1; index < anchors.length; index++) {
    const [p0, x0] = anchors[index - 1]!
    const [p1, x1] = anchors[index]!
    if (plan <= p1 || index === anchors.length - 1) return x0 + ((plan - p0) / Math.max(1, p1 - p0)) * (x1 - x0)
  }
  return anchors[0]?.[1] ?? 0
}
