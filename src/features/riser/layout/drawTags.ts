import type { Severity } from '../../../../shared/checks/finding.ts'
import { severities } from '../../../../shared/checks/finding.ts'
import { roofTagHeight, type Heights } from './heights.ts'
import type { Lanes } from './lanes.ts'
import { metrics, monoWidth } from './metrics.ts'
import type { Placing } from './placeRooms.ts'
import type { FoldTag, StoreyBox, TagBox, TrunkCount } from './riserLayout.ts'
import type { StoreySeats } from './seatStoreys.ts'
import { tagWidth, type TagSeat, type TagWish } from './tagRows.ts'

/** Boxes of all tags at their heights: in rows under the trunk, in the roof over it, and by the end walls. */
export function drawTags(seats: readonly StoreySeats[], heights: Heights, locals: readonly number[]): { tags: TagBox[]; closeTags: TagBox[] } {
  const rowY = (box: StoreyBox, index: number, row: number, scale = 1) => box.trunk + locals[index]! + metrics.tagOver + row * metrics.tag.rowHeight * scale
  const tags = seats.flatMap((each, index) => {
    const box = heights.storeys[index]!
    const trunkTop = box.top + metrics.voidTop + roofTagHeight(each)
    return [
      ...each.seats.map((seat) => boxOf(seat, rowY(box, index, seat.row), 1)),
      ...each.roof.map((seat) => boxOf(seat, trunkTop - (seat.row + 1) * metrics.tag.rowHeight, 1)),
      ...each.gable.map((wish, order) => gableTag(wish, box, order)),
    ]
  })
  const closeTags = seats.flatMap((each, index) => each.close.map((seat) => boxOf(seat, rowY(heights.storeys[index]!, index, seat.row, 0.5), 0.5)))
  return { tags, closeTags }
}

const boxOf = (seat: TagSeat, y: number, scale: number): TagBox => ({
  runId: seat.runId, text: seat.text, severity: seat.severity, cable: seat.x, flip: seat.flip, scale, x: seat.left, y, w: seat.width, h: metrics.tag.height * scale,
})

function gableTag(wish: TagWish & { isLeft: boolean }, box: StoreyBox, order: number): TagBox {
  const w = tagWidth(wish.text, wish.severity)
  const x = wish.isLeft ? wish.x + metrics.tag.reach - w : wish.x - metrics.tag.reach
  return { runId: wish.runId, text: wish.text, severity: wish.severity, cable: wish.x, flip: wish.isLeft, scale: 1, x, y: box.trunk + 1 - (order > 1 ? metrics.tag.rowHeight : 0), w, h: metrics.tag.height }
}

/** One count for each room of a folded storey, over the middle of its bay, with its worst finding. */
export function drawFolds(seats: readonly StoreySeats[], heights: Heights, roomOf: ReadonlyMap<string, string>, locals: readonly number[]): FoldTag[] {
  return seats.flatMap((each, index) => {
    const box = heights.storeys[index]!
    const byRoom = new Map<string, TagWish[]>()
    for (const wish of each.folded) {
      const roomId = roomOf.get(wish.runId)
      if (roomId) byRoom.set(roomId, [...(byRoom.get(roomId) ?? []), wish])
    }
    return [...byRoom].map(([roomId, wishes]): FoldTag => {
      const middle = (Math.min(...wishes.map((wish) => wish.x)) + Math.max(...wishes.map((wish) => wish.x))) / 2
      const severity = worst(wishes.map((wish) => wish.severity))
      const w = 12 + monoWidth(String(wishes.length), 10.5) + (severity ? 13 : 0)
      return { roomId, runIds: wishes.map((wish) => wish.runId), severity, x: middle - w / 2, y: box.trunk + locals[index]! + metrics.tagOver, w, h: 15 }
    })
  })
}

/** The gravest of several severities, or null. */
export const worst = (all: readonly (Severity | null)[]): Severity | null => severities.find((severity) => all.includes(severity)) ?? null

/** How many runs share a trunk, beside its column. */
export function drawCounts({ groups }: Lanes, heights: Heights, placing: Placing): TrunkCount[] {
  return groups.flatMap((group) => {
    if (group.lanes.length < 2) return []
    const overs = group.lanes.map((lane) => lane.over)
    const y = heights.storeys[group.corridor]!.trunk - (Math.min(...overs) + Math.max(...overs)) / 2
    const xs = group.lanes.map((lane) => lane.x)
    const far = group.lanes.at(-1)!.slot
    const isLeft = group.side === 'left'
    const gap = placing.gaps[group.corridor]!.find((each) => each.x0 <= Math.max(...xs) && each.x1 >= Math.min(...xs))
    const edge = isLeft ? Math.min(gap?.x0 ?? Infinity, ...xs) : Math.max(gap?.x1 ?? -Infinity, ...xs)
    const room = Math.abs(far - edge)
    return [{ x: edge + (isLeft ? -1 : 1) * Math.min(38, Math.max(16, room / 2)), y, runIds: group.lanes.map((lane) => lane.strand.trip.run.id) }]
  })
}
