import { z } from 'zod'
import { AppError } from '../errors.ts'
import type { Strike, StruckKind } from '../model/fieldRecord.ts'
import { idSchema, momentSchema } from '../model/fields.ts'
import { fieldKinds, type JobRecord } from '../model/record.ts'
import { reverse, type Change } from '../sync/change.ts'
import { defineCommand } from './define.ts'

export const revertCommands = {
  /**
   * Undo and redo: turns an earlier command of the same member around. What people said in the field is not
   * unsaid but struck out, so that the record of it stays.
   */
  revert: defineCommand({
    args: z.strictObject({ commandId: idSchema, at: momentSchema }),
    describe: () => 'Undo',
    plan: (_doc, { commandId, at }, context) => {
      const change = context.changeOf(commandId)
      if (!change) throw new AppError('not_found', 'There is nothing to undo here')
      return struckInstead(reverse(change), at, context.actor.id, context.commandId)
    },
  }),
}

function struckInstead(change: Change, at: string, byId: string, commandId: string): Change {
  const said = change.removed.filter((record) => fieldKinds.has(record.kind))
  if (!said.length) return change
  const strikes = said.map((record, index): Strike => strikeOf(record, `${commandId.slice(0, 56)}-${index}`, at, byId))
  return { ...change, removed: change.removed.filter((record) => !fieldKinds.has(record.kind)), added: [...change.added, ...strikes] }
}

const strikeOf = (record: JobRecord, id: string, at: string, byId: string): Strike => ({
  kind: 'strike',
  id,
  at,
  byId,
  targetKind: record.kind as StruckKind,
  targetId: record.id,
  reason: 'undone',
})
