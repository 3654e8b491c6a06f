import { z } from 'zod'
import { roomSchema } from '../model/place.ts'
import { find, need, recordsOf } from '../model/jobDocument.ts'
import { AppError } from '../errors.ts'
import { adds, updates } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'
import { runsInRoom, withLabels } from './labelling.ts'
import type { JobDocument } from '../model/jobDocument.ts'

/** A code that another room has is refused here, with the name of that room. */
function assertCodeFree(doc: JobDocument, code: string, except?: string) {
  const other = recordsOf(doc, 'room').find((room) => room.code === code && room.id !== except)
  if (other) throw new AppError('refused', `Code ${code} is taken by ${other.name}. Give each room its own code, because labels are made of it`, { kind: 'room', other: other.id })
}

export const roomCommands = {
  'room.add': defineCommand({
    args: roomSchema.omit({ kind: true }).extend({
      aliases: roomSchema.shape.aliases.default([]),
      ceilingHeightMm: roomSchema.shape.ceilingHeightMm.default(null),
      spaceClass: roomSchema.shape.spaceClass.default('general'),
    }),
    describe: (_doc, room) => `Add room ${room.name}`,
    plan: (doc, room) => {
      need(doc, 'level', room.levelId)
      assertCodeFree(doc, room.code)
      return adds({ kind: 'room', ...room })
    },
  }),
  /** A new name keeps the old one as an alias; a new code gives new labels only to what was never printed. */
  'room.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: roomSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids, set }) => `${set.name && ids.length === 1 ? 'Rename' : 'Change'} ${some(ids, (id) => find(doc, 'room', id)?.name ?? 'room', 'rooms')}`,
    plan: (doc, { ids, set }) => {
      if (set.code !== undefined) for (const id of ids) assertCodeFree(doc, set.code, id)
      const renamed = ids.map((id) => {
        const room = need(doc, 'room', id)
        const isNew = set.name !== undefined && set.name !== room.name && set.aliases === undefined && !room.aliases.includes(room.name)
        return isNew ? updates<'room'>(room, { aliases: [...room.aliases, room.name].slice(-20) }) : { added: [], removed: [], updated: [] }
      })
      const change = compose([setMany(doc, 'room', ids, set), ...renamed])
      return set.code === undefined && set.levelId === undefined ? change : withLabels(doc, change, (after) => ids.flatMap((id) => runsInRoom(after, id)))
    },
  }),
}
