import { find, recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Level } from '../../../../shared/model/place.ts'
import { extentOf } from '../layout/wallSpot.ts'

/** A code made of a name that no other has: "Great room" gives GRE, then GRE2. */
export function codeFrom(name: string, taken: ReadonlySet<string>): string {
  const base = name.normalize('NFD').toUpperCase().replace(/[^A-Z0-9]/g, '').slice(0, 3) || 'X'
  if (!taken.has(base)) return base
  for (let n = 2; ; n++) if (!taken.has(`${base}${n}`)) return `${base}${n}`
}

/** Letters or numbers counted on: the first of the candidates that nobody has. */
export function firstFree(taken: ReadonlySet<string>, candidate: (n: number) => string): string {
  for (let n = 1; ; n++) if (!taken.has(candidate(n))) return candidate(n)
}

const floorMm = 356
const usualCeilingMm = 2743

/** The level one would add next: over the highest. Floor of 356 mm between, ceiling of 2743 mm: common practice, no source. */
export function nextLevel(doc: JobDocument): Pick<Level, 'name' | 'code' | 'use' | 'elevationMm' | 'ceilingHeightMm'> {
  const levels = recordsOf(doc, 'level').filter((level) => level.use === 'living' || level.use === 'basement').sort((a, b) => a.elevationMm - b.elevationMm)
  const top = levels.at(-1)
  const living = levels.filter((level) => level.use === 'living').length
  const names = new Set(recordsOf(doc, 'level').map((level) => level.name))
  const codes = new Set(recordsOf(doc, 'level').map((level) => level.code))
  const n = Array.from({ length: 99 }, (_, index) => living + 1 + index).find((each) => !names.has(`Level ${each}`) && !codes.has(`L${each}`)) ?? living + 1
  return { name: `Level ${n}`, code: `L${n}`, use: 'living', elevationMm: top ? top.elevationMm + top.ceilingHeightMm + floorMm : 0, ceilingHeightMm: top?.ceilingHeightMm ?? usualCeilingMm }
}

/** Where the next room of a level begins: east of its last. */
export function nextRoomX(doc: JobDocument, levelId: string): number {
  const rooms = recordsOf(doc, 'room').filter((room) => room.levelId === levelId)
  return rooms.length ? Math.max(...rooms.map((room) => extentOf(room).maxX)) : 0
}

/** The level that a new room most likely belongs to: the one chosen, else that of the chosen room, else the one worked on last. */
export function likelyLevel(doc: JobDocument, chosen: { kind: string; id: string } | undefined): string {
  if (chosen?.kind === 'level') return chosen.id
  if (chosen?.kind === 'room') return find(doc, 'room', chosen.id)?.levelId ?? ''
  return recordsOf(doc, 'room').at(-1)?.levelId ?? recordsOf(doc, 'level').at(-1)?.id ?? ''
}
