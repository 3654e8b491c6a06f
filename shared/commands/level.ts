import { z } from 'zod'
import { levelSchema } from '../model/place.ts'
import { find, need } from '../model/jobDocument.ts'
import { roomOfEnd } from '../model/naming.ts'
import { adds } from '../sync/change.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'
import { withLabels } from './labelling.ts'

export const levelCommands = {
  'level.add': defineCommand({
    args: levelSchema.omit({ kind: true }),
    describe: (_doc, level) => `Add level ${level.name}`,
    plan: (_doc, level) => adds({ kind: 'level', ...level }),
  }),
  'level.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: levelSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'level', id)?.name ?? 'level', 'levels')}`,
    plan: (doc, { ids, set }) => {
      for (const id of ids) need(doc, 'level', id)
      const change = setMany(doc, 'level', ids, set)
      if (set.code === undefined) return change
      return withLabels(doc, change, (after) => [...after.records.run.values()].filter((run) => [run.a, run.b].some((end) => ids.includes(roomOfEnd(after, end)?.levelId ?? ''))).map((run) => run.id))
    },
  }),
}
