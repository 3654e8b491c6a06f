import { mmPerFoot } from '../../../../shared/units.ts'
import { glyphSize } from './glyphs.ts'
import { metrics, monoWidth } from './metrics.ts'
import type { Fixture, HouseRoom } from './readHouse.ts'
import type { Exit } from './readTrips.ts'
import type { Glyph } from './riserLayout.ts'

/** What a room needs in width, and what of it each fixture takes. */
export interface RoomNeed {
  readonly room: HouseRoom
  readonly blocks: readonly { readonly fixture: Fixture; readonly exits: readonly Exit[]; readonly width: number }[]
  readonly pitch: number
  readonly width: number
  /** What goes to its racks, at the east end of the bay. */
  readonly rackWidth: number
}

export interface Contents {
  readonly exits: ReadonlyMap<string, readonly Exit[]>
  readonly glyphs: ReadonlyMap<string, Glyph | null>
}

export function roomNeed(room: HouseRoom, { exits, glyphs }: Contents, pitch: number, isDense: boolean, rackWidth: number): RoomNeed {
  const pad = room.isOutside ? metrics.outsidePad : metrics.bayPad
  const blocks = room.fixtures.map((fixture): { fixture: Fixture; exits: readonly Exit[]; width: number } => {
    const own = exits.get(fixture.key) ?? []
    const glyph = glyphs.get(fixture.key)
    const face = isDense ? 12 : 21
    const picture = glyph && !isDense ? Math.min(36, glyphSize(glyph, own.length)[0]) : 0
    return { fixture, exits: own, width: Math.max(own.length * pitch, own.length ? 0 : face, picture && picture > pitch * 1.6 ? picture : 0, isDense ? 0 : Math.min(face, pitch)) }
  })
  if (!isDense) giveNeighboursRoom(room.room.code, blocks)
  const content = 2 * pad + blocks.reduce((sum, block) => sum + block.width, 0)
  const nameWidth = 44 + Math.min(room.room.name.length, isDense ? 9 : 13) * 6.3
  const drawn = Math.min(isDense ? 130 : 240, Math.max(56, ((room.maxX - room.minX) / mmPerFoot) * metrics.planPxPerFoot * (isDense ? 0.6 : 1)))
  const own = rackWidth ? Math.max(content, 52) : Math.max(content, nameWidth, drawn)
  return { room, blocks, pitch, width: own, rackWidth }
}

/** Two plates about as high as each other stand far enough apart for both codes. */
function giveNeighboursRoom(code: string, blocks: { fixture: Fixture; width: number }[]): void {
  blocks.forEach((block, index) => {
    const next = blocks[index + 1]
    if (!next?.fixture.plate || !block.fixture.plate || Math.abs(block.fixture.up - next.fixture.up) > 0.16) return
    const codes = [block, next].map(({ fixture }) => monoWidth(`${code}${fixture.plate?.number ?? ''}`, codeFont))
    const missing = Math.max(codeRoom, (codes[0]! + codes[1]!) / 2 + 4) - (block.width + next.width) / 2
    if (missing <= 0) return
    block.width += missing
    next.width += missing
  })
}
const codeRoom = 24
const codeFont = 8.5

/** Where each run comes down and where each fixture hangs, in a bay from x0 to x1. Extra width goes between fixtures. */
export function spreadRoom(need: RoomNeed, x0: number, x1: number, slots: Map<Exit, number>, centres: Map<string, number>): void {
  const pad = need.room.isOutside ? metrics.outsidePad : metrics.bayPad
  const inner = x1 - x0 - 2 * pad
  const spare = Math.max(0, inner - need.blocks.reduce((sum, block) => sum + block.width, 0))
  const gap = need.blocks.length ? spare / need.blocks.length : 0
  let at = x0 + pad
  for (const block of need.blocks) {
    at += gap / 2
    const middle = at + block.width / 2
    const step = block.exits.length ? Math.min(block.width / block.exits.length, Math.max(need.pitch, 20)) : 0
    block.exits.forEach((exit, index) => slots.set(exit, middle + (index - (block.exits.length - 1) / 2) * step))
    centres.set(block.fixture.key, middle)
    at += block.width + gap / 2
  }
}
