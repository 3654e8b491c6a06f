import type { Column } from './columns.ts'
import type { Storey } from './readHouse.ts'
import type { RoomNeed } from './roomWidths.ts'

/** The rooms of a storey from west to east, parted at its columns, each with the width it needs. */
export interface Row {
  /** The columns that part this storey: those that stand on it or pass it. */
  readonly parts: readonly number[]
  readonly inside: readonly (readonly RoomNeed[])[]
  readonly outsideLeft: readonly RoomNeed[]
  readonly outsideRight: readonly RoomNeed[]
}

/** Thickness of an outer wall on the drawing. */
export const wall = 6
export const widthOf = (needs: readonly RoomNeed[]): number => needs.reduce((sum, need) => sum + need.width, 0)

/** The middle of each column: as far west as all storeys that it parts allow. */
export function solveColumns(rows: readonly Row[], reaches: readonly (readonly { left: number; right: number }[])[], outer: readonly { left: number }[], count: number, margin: number): number[] {
  const centres: number[] = []
  for (let index = 0; index < count; index++) {
    const needs = rows.flatMap((row, storey) => {
      const at = row.parts.indexOf(index)
      if (at < 0) return []
      const before = row.parts[at - 1]
      const from = before === undefined ? margin + widthOf(row.outsideLeft) + wall : centres[before]! + reaches[storey]![before]!.right
      return [from + Math.max(widthOf(row.inside[at] ?? []), before === undefined ? outer[storey]!.left : 0) + reaches[storey]![index]!.left]
    })
    centres.push(Math.max(margin, index ? centres[index - 1]! + 8 : 0, ...needs))
  }
  return centres
}

/** How wide the outermost stretches are drawn: as the plan has them beside the widest storey, and never under their need. */
export function outerWidths(storeys: readonly Storey[], rows: readonly Row[], columns: readonly Column[]): { left: number; right: number }[] {
  const extents = storeys.map((storey, index) => {
    const rooms = storey.rooms.filter((room) => !room.isOutside)
    const min = Math.min(...rooms.map((room) => room.minX))
    const max = Math.max(...rooms.map((room) => room.maxX))
    const [first, last] = [rows[index]!.parts[0], rows[index]!.parts.at(-1)]
    return { left: first === undefined ? 0 : columns[first]!.planX - min, right: max - (last === undefined ? min : columns[last]!.planX) }
  })
  const side = (end: 'left' | 'right') => {
    const needs = rows.map((row) => (end === 'right' ? widthOf(row.inside.at(-1) ?? []) : row.parts.length ? widthOf(row.inside[0] ?? []) : 0))
    const widest = Math.max(...needs)
    const reference = Math.max(...extents.map((extent, index) => (needs[index] ? extent[end] : 0)))
    return needs.map((need, index) => {
      if (!need) return 0
      const wanted = reference > 0 ? widest * Math.min(1, Math.max(0, extents[index]![end]) / reference) : need
      const width = Math.max(need, wanted)
      return widest - width < 30 ? widest : width
    })
  }
  const left = side('left')
  const right = side('right')
  return storeys.map((_, index) => ({ left: left[index]!, right: right[index]! }))
}
