import { z } from 'zod'
import { find, need } from '../model/jobDocument.ts'
import { pathwaySchema, rackSchema } from '../model/place.ts'
import { adds } from '../sync/change.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'

export const rackCommands = {
  'rack.add': defineCommand({
    args: rackSchema.omit({ kind: true }),
    describe: (_doc, rack) => `Add rack ${rack.name}`,
    plan: (doc, rack) => {
      need(doc, 'room', rack.roomId)
      return adds({ kind: 'rack', ...rack })
    },
  }),
  'rack.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: rackSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'rack', id)?.name ?? 'rack', 'racks')}`,
    plan: (doc, { ids, set }) => setMany(doc, 'rack', ids, set),
  }),
  'pathway.add': defineCommand({
    args: pathwaySchema.omit({ kind: true }),
    describe: (_doc, pathway) => `Add chase ${pathway.name}`,
    plan: (doc, pathway) => {
      need(doc, 'level', pathway.bottomLevelId)
      need(doc, 'level', pathway.topLevelId)
      return adds({ kind: 'pathway', ...pathway })
    },
  }),
  'pathway.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: pathwaySchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'pathway', id)?.name ?? 'chase', 'chases')}`,
    plan: (doc, { ids, set }) => setMany(doc, 'pathway', ids, set),
  }),
}
