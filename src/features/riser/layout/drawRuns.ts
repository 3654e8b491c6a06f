import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Run } from '../../../../shared/model/run.ts'
import type { Hanging } from './hang.ts'
import type { Heights } from './heights.ts'
import type { Lane, Lanes } from './lanes.ts'
import type { LocalTrip } from './localLanes.ts'
import { metrics } from './metrics.ts'
import { roundedPath, squarePath, toward } from './paths.ts'
import type { Exit } from './readTrips.ts'
import type { RackBox, RunLine, XY } from './riserLayout.ts'

interface Drawn {
  readonly doc: JobDocument
  readonly heights: Heights
  readonly hanging: Hanging
  readonly racks: ReadonlyMap<string, RackBox>
  readonly exits: ReadonlyMap<string, readonly Exit[]>
}

const looseDrop = 13
const jackStep = 6

/** Every run as paths: out of the rack, up or down, along its lane, and off to what it serves. */
export function drawRuns(drawn: Drawn, { lanes }: Lanes, locals: readonly LocalTrip[]): RunLine[] {
  return [...lanes.map((lane) => drawLane(drawn, lane)), ...locals.map((local) => drawLocal(drawn, local))]
}

function drawLane(drawn: Drawn, lane: Lane): RunLine {
  const { strand, x, slot } = lane
  const { trip } = strand
  const rack = drawn.racks.get(strand.rackId)!
  const box = drawn.heights.storeys[strand.corridor]!
  const y = box.trunk - lane.over
  const out: XY = { x, y: strand.up ? rack.y : rack.y + rack.h }
  const turn: XY = { x, y }
  const corner: XY = { x: slot, y }
  const tail = tailOf(drawn, lane)
  const deviceId = 'deviceId' in trip ? trip.deviceId : null
  const unit = rack.units.find((each) => each.device.id === deviceId)
  const inside: XY[] = unit ? [{ x, y: unit.y + unit.h / 2 }] : []
  const loose = strand.leaves === 'loose' ? tail.at(-1)! : null
  return finish(drawn, trip.run, { trunk: [out, turn, corner], tails: [[corner, ...tail]], whole: [...inside, out, turn, corner, ...tail], storey: strand.corridor, exit: corner, loose })
}

function tailOf(drawn: Drawn, { strand, slot, over }: Lane): XY[] {
  const y = drawn.heights.storeys[strand.corridor]!.trunk - over
  if (strand.leaves === 'loose') return [{ x: slot, y: drawn.heights.storeys[strand.corridor]!.trunk + looseDrop }]
  if (strand.leaves === 'rack' && strand.trip.kind === 'racks') return [{ x: slot, y: drawn.racks.get(strand.trip.toRackId)?.y ?? y }]
  return strand.exit ? into(drawn, strand.exit, slot, y) : []
}

/** From a point over or under a fixture into its jack: straight, or drawn together just before a face with several. */
function into(drawn: Drawn, exit: Exit, x: number, from: number): XY[] {
  const hung = drawn.hanging.hung.get(exit.key)
  if (!hung) return [{ x, y: from + looseDrop }]
  const all = drawn.exits.get(exit.key) ?? [exit]
  const index = Math.max(0, all.indexOf(exit))
  const middle = (all.length - 1) / 2
  const step = Math.min(jackStep, (hung.w * 0.72) / Math.max(1, all.length - 1))
  const jackX = hung.x + hung.w / 2 + (index - middle) * step
  const below = from < hung.y
  const edge = below ? hung.y + 1 : hung.y + hung.h - 1
  if (Math.abs(jackX - x) < 0.6) return [{ x, y: edge }]
  const jog = edge - (below ? 1 : -1) * (6 + 3.6 * (middle - Math.abs(index - middle)))
  return [{ x, y: jog }, { x: jackX, y: jog }, { x: jackX, y: edge }]
}

function drawLocal(drawn: Drawn, { trip, exits, legs, cross }: LocalTrip): RunLine {
  const yOf = (index: number) => drawn.heights.storeys[legs[index]!.corridor]!.trunk + legs[index]!.under
  const [first, second] = exits
  const start: XY = { x: first!.x, y: yOf(0) }
  const head = into(drawn, first!.exit, first!.x, start.y).reverse()
  if (!second) {
    const end: XY = { x: legs[0]!.to, y: start.y }
    return finish(drawn, trip.run, { trunk: [start, end], tails: [[...head, start]], whole: [...head, start, end], storey: first!.corridor, exit: start, loose: end })
  }
  const end: XY = { x: second.x, y: yOf(legs.length - 1) }
  const middle: XY[] = cross === null ? [] : [{ x: cross, y: start.y }, { x: cross, y: end.y }]
  const tail = into(drawn, second.exit, second.x, end.y)
  return finish(drawn, trip.run, { trunk: [start, ...middle, end], tails: [[...head, start], [end, ...tail]], whole: [...head, start, ...middle, end, ...tail], storey: second.corridor, exit: end, loose: null })
}

interface Ways {
  readonly trunk: readonly XY[]
  readonly tails: readonly (readonly XY[])[]
  readonly whole: readonly XY[]
  readonly storey: number
  readonly exit: XY
  readonly loose: XY | null
}

function finish({ doc }: Drawn, run: Run, ways: Ways): RunLine {
  const trunk = shortened(ways.trunk)
  return {
    runId: run.id,
    jacket: find(doc, 'cableType', run.cableTypeId)?.jacketColour ?? 'grey',
    trunk: squarePath(trunk),
    drop: ways.tails.map((tail) => roundedPath(led(tail, ways.trunk))).join(''),
    whole: roundedPath(ways.whole),
    points: ways.whole,
    exit: ways.exit,
    storey: ways.storey,
    dropped: run.dropped !== null,
    loose: ways.loose,
    stretch: longest(ways.trunk),
  }
}

/** The trunk stops where the round corner begins. */
function shortened(points: readonly XY[]): XY[] {
  const last = points.at(-1)!
  const before = points.at(-2)!
  const room = Math.abs(last.x - before.x) + Math.abs(last.y - before.y)
  return [...points.slice(0, -1), toward(last, before, Math.min(metrics.corner, room / 2))]
}

/** A tail with a bit of its trunk, so that the corner between them is round. */
function led(tail: readonly XY[], trunk: readonly XY[]): XY[] {
  const joins = (a: XY, b: XY) => a.x === b.x && a.y === b.y
  const before = trunk.at(-2)!
  const first = tail[0]!
  if (joins(first, trunk.at(-1)!)) return [toward(first, before, Math.min(metrics.corner, (Math.abs(first.x - before.x) + Math.abs(first.y - before.y)) / 2)), ...tail]
  const last = tail.at(-1)!
  return joins(last, trunk[0]!) ? [...tail, toward(last, trunk[1]!, metrics.corner)] : [...tail]
}

function longest(points: readonly XY[]): RunLine['stretch'] {
  let best = { x0: points[0]!.x, x1: points[0]!.x, y: points[0]!.y }
  for (let index = 1; index < points.length; index++) {
    const [a, b] = [points[index - 1]!, points[index]!]
    if (a.y === b.y && Math.abs(a.x - b.x) > best.x1 - best.x0) best = { x0: Math.min(a.x, b.x), x1: Math.max(a.x, b.x), y: a.y }
  }
  return best
}
