import { z } from 'zod'
import { AppError } from '../errors.ts'
import { idSchema } from '../model/fields.ts'
import { find, kindWord, need, type JobDocument } from '../model/jobDocument.ts'
import { fieldKinds, type JobRecord, type Kind } from '../model/record.ts'
import { dependentsOf, type Reference } from '../model/references.ts'
import { noChange, removes, updates } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { defineCommand } from './define.ts'

export const removableKinds = ['level', 'room', 'plate', 'rack', 'pathway', 'cableType', 'deviceModel', 'device', 'run', 'cord'] as const
const itemSchema = z.strictObject({ kind: z.enum(removableKinds), id: idSchema })
export type Item = z.infer<typeof itemSchema>

export interface Removal {
  /** Everything that goes, the chosen ones included, parents first. */
  readonly gone: readonly JobRecord[]
  /** Why it cannot go, as a sentence; null: it can. */
  readonly refusal: string | null
}

/** What removing these would take along, so that it can be said before it is done. */
export function removalOf(doc: JobDocument, items: readonly Item[]): Removal {
  const chosen = items.map((item) => need(doc, item.kind, item.id)) as JobRecord[]
  const keys = new Set(chosen.map((record) => record.id))
  const hanging = dependentsOf(doc, items as readonly Reference[]).filter((record) => !keys.has(record.id))
  const gone = [...chosen, ...hanging]
  return { gone, refusal: refusalOf(doc, chosen, hanging) }
}

function refusalOf(doc: JobDocument, chosen: readonly JobRecord[], hanging: readonly JobRecord[]): string | null {
  const worked = new Set(hanging.filter((record) => fieldKinds.has(record.kind) && 'runId' in record).map((record) => (record as { runId: string }).runId))
  if (worked.size) {
    const labels = [...worked].map((id) => find(doc, 'run', id)?.label ?? id)
    return `${labels.slice(0, 3).join(', ')}${labels.length > 3 ? ` and ${labels.length - 3} more` : ''} ${labels.length === 1 ? 'is' : 'are'} printed or worked on. Drop ${labels.length === 1 ? 'it' : 'them'} with a reason instead: a cable in the wall is never forgotten`
  }
  for (const record of chosen)
    if (record.kind === 'cableType' || record.kind === 'deviceModel') {
      const uses = hanging.filter((each) => each.kind === 'run' || each.kind === 'device').length
      if (uses) return `${uses} ${record.kind === 'cableType' ? 'runs' : 'devices'} use this ${kindWord(record.kind)}`
    }
  return null
}

/** "1 room, 3 plates, 5 runs" */
export function countKinds(records: readonly JobRecord[]): string {
  const counts = new Map<Kind, number>()
  for (const { kind } of records) counts.set(kind, (counts.get(kind) ?? 0) + 1)
  return [...counts].map(([kind, count]) => `${count} ${kindWord(kind)}${count === 1 ? '' : 's'}`).join(', ')
}

export const itemCommands = {
  /** Removes what is chosen and all that hangs on it. */
  'items.remove': defineCommand({
    args: z.strictObject({ items: z.array(itemSchema).min(1, 'Choose at least one').max(5000) }),
    describe: (doc, { items }) => `Delete ${items.length === 1 ? kindWord(items[0]!.kind) : countKinds(items.flatMap((item) => find(doc, item.kind, item.id) ?? []))}`,
    plan: (doc, { items }) => {
      const { gone, refusal } = removalOf(doc, items)
      if (refusal) throw new AppError('refused', refusal)
      const paths = new Set(gone.filter((record) => record.kind === 'pathway').map((record) => record.id))
      const goneRuns = new Set(gone.filter((record) => record.kind === 'run').map((record) => record.id))
      const rerouted = [...doc.records.run.values()]
        .filter((run) => !goneRuns.has(run.id) && run.pathwayIds.some((id) => paths.has(id)))
        .map((run) => updates<'run'>(run, { pathwayIds: run.pathwayIds.filter((id) => !paths.has(id)) }))
      return compose([paths.size ? compose(rerouted) : noChange, removes(...gone)])
    },
  }),
}
