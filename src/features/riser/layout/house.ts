import type { Heights } from './heights.ts'
import { f2, metrics } from './metrics.ts'
import type { Box, HouseDrawing, StoreyBox } from './riserLayout.ts'
import type { PlacedBay } from './placeRooms.ts'

/** How far a lower storey must reach past the one over it to get a roof of its own. */
const leanTo = 12
const lip = 8
/** The ground goes on past the drawing, as far as anyone can see. */
const beyond = 5000

/** Draws the structure: one continuous body, the ground, slabs and posts outside, joist ends under the floors. */
export function drawHouse(heights: Heights, bays: readonly PlacedBay[], width: number): HouseDrawing {
  const full = heights.storeys.filter((storey) => storey.kind === 'full')
  const reachRight = full.map((storey) => Math.max(storey.x1, ...outsideBays(bays, heights, storey).filter((bay) => bay.x0 >= storey.x1 - 1).map((bay) => bay.x1)))
  const reachLeft = full.map((storey) => Math.min(storey.x0, ...outsideBays(bays, heights, storey).filter((bay) => bay.x1 <= storey.x0 + 1).map((bay) => bay.x0)))
  const base = full[0]
  if (!base) return { ground: '', groundLine: '', earth: '', body: '', voids: [], slabs: '', posts: '', joists: '' }
  const { ground, height } = heights
  const atGround = full.find((storey) => storey.top <= ground && storey.floor >= ground - 34) ?? base
  return {
    ground: `M${-beyond} ${ground}H${width + beyond}V${height + beyond}H${-beyond}Z`,
    groundLine: `M${-beyond} ${ground}H${f2(atGround.x0)}M${f2(atGround.x1)} ${ground}H${width + beyond}`,
    earth: earth(ground, atGround, width),
    body: body(heights, full, reachLeft, reachRight),
    voids: voids(heights),
    slabs: full.map((storey, index) => slab(storey, reachLeft[index]!, reachRight[index]!)).join(''),
    posts: full.map((storey, index) => post(storey, reachLeft[index]!, reachRight[index]!)).join(''),
    joists: joists(heights),
  }
}

const outsideBays = (bays: readonly PlacedBay[], heights: Heights, storey: StoreyBox) =>
  bays.filter((bay) => heights.storeys[bay.storey] === storey && (bay.x0 >= storey.x1 - 1 || bay.x1 <= storey.x0 + 1))

function body({ apex, eave, pitched, bottom, ground }: Heights, full: readonly StoreyBox[], lefts: readonly number[], rights: readonly number[]): string {
  const top = full.length - 1
  const roof = full[top]!
  const middle = (roof.x0 + roof.x1) / 2
  const right = sideOf(full, (storey, index) => ({ wall: storey.x1, reach: rights[index]! }), 1, ground)
  const left = sideOf(full, (storey, index) => ({ wall: storey.x0, reach: lefts[index]! }), -1, ground)
  const over = pitched
    ? `M${f2(roof.x0 - 10)} ${eave + 8}V${eave}L${f2(middle)} ${apex}L${f2(roof.x1 + 10)} ${eave}V${eave + 8}`
    : `M${f2(roof.x0 - 4)} ${eave + 8}V${eave - 8}H${f2(roof.x1 + 4)}V${eave + 8}`
  const under = `L${f2(full[0]!.x1)} ${bottom}L${f2(full[0]!.x0)} ${bottom}`
  return `${over}${right}${under}${reversed(left)}Z`
}

/** The outline of one side from the eave down to the foundation, as points. A storey that reaches out gets a roof of its own, unless it is in the ground. */
function sideOf(full: readonly StoreyBox[], at: (storey: StoreyBox, index: number) => { wall: number; reach: number }, way: 1 | -1, ground: number): string {
  const points: [number, number][] = []
  const outOf = (index: number) => (at(full[index]!, index).reach - at(full[index + 1]!, index + 1).wall) * way
  const isLean = (index: number) => index < full.length - 1 && outOf(index) > leanTo && full[index]!.top < ground - 40
  for (let index = full.length - 1; index >= 0; index--) {
    const storey = full[index]!
    const { wall, reach } = at(storey, index)
    const over = full[index + 1]
    if (isLean(index)) points.push([at(over!, index + 1).wall, storey.top + 6 - Math.min(30, outOf(index) * 0.45)], [reach + lip * way, storey.top + 6], [reach + lip * way, storey.top + 14])
    if (reach !== wall && !isLean(index)) points.push([reach + lip * way, storey.top + 2], [reach + lip * way, storey.top + 10])
    if (reach !== wall) points.push([reach, isLean(index) ? storey.top + 14 : storey.top + 10], [reach, storey.ceiling], [wall, storey.ceiling])
    else points.push([wall, isLean(index) ? storey.top + 14 : over ? storey.top : storey.top + 8])
    if (index === 0 || !isLean(index - 1)) points.push([wall, storey.floor])
  }
  return points.map(([x, y]) => `L${f2(x)} ${f2(y)}`).join('')
}

const reversed = (path: string) => path.split('L').filter(Boolean).reverse().map((point) => `L${point}`).join('')

function slab(storey: StoreyBox, left: number, right: number): string {
  const one = (from: number, to: number) => (to - from > 1 ? `M${f2(from)} ${storey.floor + 2}H${f2(to)}V${storey.floor + 12}H${f2(from)}Z` : '')
  return one(storey.x1, right) + one(left, storey.x0)
}

function post(storey: StoreyBox, left: number, right: number): string {
  const one = (x: number) => `M${f2(x)} ${storey.ceiling}V${storey.floor + 2}M${f2(x + 6)} ${storey.ceiling}V${storey.floor + 2}`
  return (right > storey.x1 + 1 ? one(right - 13) : '') + (left < storey.x0 - 1 ? one(left + 7) : '')
}

const voids = (heights: Heights): Box[] =>
  heights.storeys.filter((storey) => storey.kind === 'crawl').map((storey) => ({ x: storey.x0 + 6, y: storey.top, w: storey.x1 - storey.x0 - 12, h: storey.floor - storey.top }))

function joists(heights: Heights): string {
  let path = ''
  for (const storey of heights.storeys) {
    if (storey.kind !== 'full') continue
    for (let x = Math.ceil(storey.x0 / 22) * 22 + 11; x < storey.x1 - 8; x += 22) path += `M${x} ${storey.floor + 2}v6`
  }
  return path
}

function earth(ground: number, base: StoreyBox, width: number): string {
  let path = ''
  for (const [from, to] of [[4, base.x0 - 6], [base.x1 + 8, width - 4]] as const)
    for (let x = from; x < to - metrics.bayPad * 2.5; x += 30) path += `M${f2(x)} ${ground + 12}l9 -9M${f2(x + 5)} ${ground + 12}l9 -9M${f2(x + 10)} ${ground + 12}l9 -9`
  return path
}
