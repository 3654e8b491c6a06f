import type { PlateSpot, RackBox, RackUnit, RiserLayout, RunLine, XY } from './riserLayout.ts'

/** The run nearest to a point, within reach. */
export function runAt(layout: RiserLayout, at: XY, reach: number): RunLine | undefined {
  let best: RunLine | undefined
  let least = reach
  for (const run of layout.runs)
    for (let index = 1; index < run.points.length; index++) {
      const distance = toSegment(at, run.points[index - 1]!, run.points[index]!)
      if (distance < least) {
        least = distance
        best = run
      }
    }
  return best
}

function toSegment({ x, y }: XY, a: XY, b: XY): number {
  const dx = Math.max(Math.min(a.x, b.x) - x, 0, x - Math.max(a.x, b.x))
  const dy = Math.max(Math.min(a.y, b.y) - y, 0, y - Math.max(a.y, b.y))
  return Math.hypot(dx, dy)
}

const inside = (at: XY, box: { x: number; y: number; w: number; h: number }, slack = 0) =>
  at.x >= box.x - slack && at.x <= box.x + box.w + slack && at.y >= box.y - slack && at.y <= box.y + box.h + slack

/** The plate under a point, its middle being its place. */
export const plateAt = (layout: RiserLayout, at: XY, slack = 3): PlateSpot | undefined =>
  layout.plates.find((spot) => inside(at, { x: spot.x - spot.w / 2, y: spot.y - spot.h / 2, w: spot.w, h: spot.h }, slack))

/** The device's picture under a point. */
export const deviceAt = (layout: RiserLayout, at: XY) => layout.devices.find((spot) => inside(at, spot, 2))

/** The rack under a point, and the row of it. */
export function rackAt(layout: RiserLayout, at: XY): { rack: RackBox; unit: RackUnit | undefined } | undefined {
  const rack = layout.racks.find((box) => inside(at, box, 2))
  return rack && { rack, unit: rack.units.find((unit) => inside(at, unit)) }
}

/** The bay under a point. */
export const bayAt = (layout: RiserLayout, at: XY) => layout.bays.find((bay) => inside(at, bay))
