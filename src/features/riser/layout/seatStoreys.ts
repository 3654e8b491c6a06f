import { metrics } from './metrics.ts'
import type { Lanes } from './lanes.ts'
import type { LocalTrip } from './localLanes.ts'
import type { Placing } from './placeRooms.ts'
import type { Storey } from './readHouse.ts'
import type { RunMark } from './riserLayout.ts'
import { seatTags, tagRows, type TagSeat, type TagWish } from './tagRows.ts'
import type { FixturePlace } from './strands.ts'

/** Tags of one storey's trunk, and of what leaves it upward or down the end wall. */
export interface StoreySeats {
  readonly seats: readonly TagSeat[]
  readonly close: readonly TagSeat[]
  readonly rows: number
  readonly roof: readonly TagSeat[]
  readonly roofRows: number
  readonly gable: readonly (TagWish & { readonly isLeft: boolean })[]
  /** Runs whose tag is folded into their room's count. */
  readonly folded: readonly TagWish[]
}

type Kind = 'down' | 'roof' | 'gable'

/** Seats the tags of every storey between its columns. */
export function seatStoreys(storeys: readonly Storey[], placing: Placing, { lanes }: Lanes, locals: readonly LocalTrip[], places: ReadonlyMap<string, FixturePlace>, mark: (runId: string) => RunMark | undefined): StoreySeats[] {
  const wishes = storeys.map((): Record<Kind, TagWish[]> => ({ down: [], roof: [], gable: [] }))
  const want = (corridor: number, kind: Kind, runId: string, x: number) => {
    const text = mark(runId)
    if (text) wishes[corridor]![kind].push({ runId, x, text: text.text, severity: text.severity })
  }
  for (const { strand, slot } of lanes) want(strand.corridor, strand.leaves === 'up' ? 'roof' : strand.leaves === 'gable' ? 'gable' : 'down', strand.trip.run.id, slot)
  for (const { trip, exits } of locals) {
    const last = exits.at(-1)!
    want(last.corridor, places.get(last.exit.key)?.storey.kind === 'roof' ? 'roof' : 'down', trip.run.id, last.x)
  }
  return storeys.map((storey, index) => {
    const { down, roof, gable } = wishes[index]!
    const folds = placing.folded[index]!
    const stretches = stretchesOf(placing, storey, gable.length > 0)
    const inEach = (all: readonly TagWish[], rows: number, scale = 1) => {
      const isOver = (wish: TagWish) => placing.gaps[index]!.some((gap) => wish.x > gap.x0 && wish.x < gap.x1)
      const own = stretches.flatMap(({ from, to, limit }) => seatTags(all.filter((wish) => wish.x >= from && wish.x < to && !isOver(wish)), rows, limit, scale).seats)
      return [...own, ...seatTags(all.filter(isOver), rows, { left: 4, right: placing.width }, scale, own).seats]
    }
    const seats = folds ? [] : inEach(down, tagRows(storeys, lanes.length) + metrics.tag.more)
    const up = inEach(roof, 3)
    const middle = (placing.edges[index]!.x0 + placing.edges[index]!.x1) / 2
    return {
      seats,
      close: folds ? inEach(down, metrics.tag.rows, 0.5) : [],
      rows: folds ? 1 : Math.max(storey.kind === 'crawl' ? 0 : 1, ...seats.map((seat) => seat.row + 1)),
      roof: up,
      roofRows: Math.max(0, ...up.map((seat) => seat.row + 1)),
      gable: gable.map((wish) => ({ ...wish, isLeft: wish.x < middle })),
      folded: folds ? down : [],
    }
  })
}

/** The stretches between the columns of a storey, with how far a tag in each may reach. */
function stretchesOf(placing: Placing, { index: storey, kind }: Storey, hasGable: boolean) {
  const gaps = placing.gaps[storey]!
  const bays = placing.bays.filter((bay) => bay.storey === storey)
  const edge = kind === 'full' ? placing.edges[storey]! : { x0: 4, x1: placing.width }
  const left = hasGable ? edge.x0 : Math.min(edge.x0, ...bays.map((bay) => bay.x0)) - 30
  const right = hasGable ? edge.x1 : Math.max(edge.x1, ...bays.map((bay) => bay.x1)) + 6
  return [...gaps, null].map((gap, index) => {
    const before = index === 0 ? null : gaps[index - 1]!
    const from = before ? (before.x0 + before.x1) / 2 : -Infinity
    const to = gap ? (gap.x0 + gap.x1) / 2 : Infinity
    return { from, to, limit: { left: before ? before.x1 - 4 : Math.max(4, left), right: gap ? gap.x0 + 4 : Math.min(placing.width - 2, right) } }
  })
}
