import { z } from 'zod'
import { idSchema } from '../model/fields.ts'
import { find, need, recordsOf, type JobDocument } from '../model/jobDocument.ts'
import { plateCode } from '../model/naming.ts'
import { plateSchema } from '../model/place.ts'
import { adds, updates } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'
import { runsAtPlate, withLabels } from './labelling.ts'

const name = (doc: JobDocument, id: string) => {
  const plate = find(doc, 'plate', id)
  return plate ? plateCode(doc, plate) : 'plate'
}

/** The next free number of a plate in a room. */
export function nextPlateNumber(doc: JobDocument, roomId: string): number {
  const numbers = new Set(recordsOf(doc, 'plate').filter((plate) => plate.roomId === roomId).map((plate) => plate.number))
  let number = 1
  while (numbers.has(number)) number++
  return number
}

const place = plateSchema.pick({ roomId: true, mounting: true, wall: true, alongMm: true, at: true, heightMm: true, heightTo: true }).partial()

export const plateCommands = {
  'plate.add': defineCommand({
    args: plateSchema.omit({ kind: true }).extend({
      number: plateSchema.shape.number.optional(),
      name: plateSchema.shape.name.default(''),
      wall: plateSchema.shape.wall.default(null),
      alongMm: plateSchema.shape.alongMm.default(null),
      at: plateSchema.shape.at.default(null),
      heightTo: plateSchema.shape.heightTo.default('centre'),
      gangs: plateSchema.shape.gangs.default(1),
      jacks: plateSchema.shape.jacks.default([]),
    }),
    describe: (doc, { roomId }) => `Add a plate in ${find(doc, 'room', roomId)?.name ?? 'the room'}`,
    plan: (doc, { number, ...plate }) => {
      need(doc, 'room', plate.roomId)
      return adds({ kind: 'plate', ...plate, number: number ?? nextPlateNumber(doc, plate.roomId) })
    },
  }),
  'plate.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: plateSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => name(doc, id), 'plates')}`,
    plan: (doc, { ids, set }) => {
      const change = setMany(doc, 'plate', ids, set)
      return set.number === undefined && set.roomId === undefined ? change : withLabels(doc, change, (after) => ids.flatMap((id) => runsAtPlate(after, id)))
    },
  }),
  /** Moves plates, each to its own place; a plate that changes room takes the next free number there. */
  'plate.move': defineCommand({
    args: z.strictObject({ moves: z.array(z.strictObject({ id: idSchema, to: place })).min(1).max(1000) }),
    describe: (doc, { moves }) => `Move ${some(moves.map((move) => move.id), (id) => name(doc, id), 'plates')}`,
    plan: (doc, { moves }) => {
      const changes = moves.map(({ id, to }) => {
        const plate = need(doc, 'plate', id)
        const elsewhere = to.roomId !== undefined && to.roomId !== plate.roomId
        if (elsewhere) need(doc, 'room', to.roomId!)
        return compose([setMany(doc, 'plate', [id], to), elsewhere ? updates<'plate'>(plate, { number: nextPlateNumber(doc, to.roomId!) }) : { added: [], removed: [], updated: [] }])
      })
      const change = compose(changes)
      return moves.some((move) => move.to.roomId) ? withLabels(doc, change, (after) => moves.flatMap(({ id }) => runsAtPlate(after, id))) : change
    },
  }),
}
