import type { Severity } from '../../../../shared/checks/finding.ts'
import { metrics, monoWidth } from './metrics.ts'
import type { Storey } from './readHouse.ts'

export interface TagWish {
  readonly runId: string
  /** x of its cable. */
  readonly x: number
  readonly text: string
  readonly severity: Severity | null
}

export interface TagSeat extends TagWish {
  readonly left: number
  readonly width: number
  readonly row: number
  readonly flip: boolean
}

/** Rows of tags over a level: more where there is only one with many runs, which is wide and has all the height. */
export const tagRows = (storeys: readonly Storey[], exits: number): number =>
  storeys.filter((storey) => storey.kind === 'full').length === 1 && exits > metrics.tag.aloneOver ? metrics.tag.rowsAlone : metrics.tag.rows

/** Width of a tag: the ring, the text, and the shape of its worst finding. */
export const tagWidth = (text: string, severity: Severity | null): number =>
  metrics.tag.lead + monoWidth(text) + metrics.tag.tail + (severity ? metrics.tag.shape : 0)

/**
 * Seats tags in rows, the lowest free row first. A tag's ring stays on its own cable and its text runs to the right, or
 * to the left where the right is taken or out of bounds. Tags that find no seat come back as left over.
 */
export function seatTags<W extends TagWish>(wishes: readonly W[], rows: number, limit: { left: number; right: number }, scale = 1, taken: readonly TagSeat[] = []): { seats: (W & TagSeat)[]; over: W[] } {
  const inRow: TagSeat[][] = Array.from({ length: rows }, (_, row) => taken.filter((seat) => seat.row === row))
  const seats: (W & TagSeat)[] = []
  const over: W[] = []
  const reach = metrics.tag.reach * scale
  const gap = metrics.tag.gap * scale
  for (const wish of [...wishes].sort((a, b) => a.x - b.x || (a.runId < b.runId ? -1 : 1))) {
    const width = tagWidth(wish.text, wish.severity) * scale
    let seat: { left: number; row: number; flip: boolean } | null = null
    for (const flip of [false, true]) {
      const left = flip ? wish.x + reach - width : wish.x - reach
      if (left < limit.left || left + width > limit.right) continue
      const row = inRow.findIndex((own) => isFree(own, left - gap, left + width + gap))
      if (row < 0) continue
      seat = { left, row, flip }
      break
    }
    if (!seat) {
      over.push(wish)
      continue
    }
    const made = { ...wish, ...seat, width }
    inRow[seat.row]!.push(made)
    seats.push(made)
  }
  return { seats, over }
}

function isFree(row: readonly TagSeat[], from: number, to: number): boolean {
  for (let index = row.length - 1; index >= 0; index--) {
    const seat = row[index]!
    if (seat.left < to && seat.left + seat.width > from) return false
  }
  return true
}
