import { expect } from 'vitest'
import { plan, type Intent, type PlanContext } from '../../shared/commands/index.ts'
import type { JobDocument } from '../../shared/model/jobDocument.ts'
import { apply, reverse, type Change } from '../../shared/sync/change.ts'
import { assertSound } from '../../shared/sync/soundness.ts'
import { deepFreeze } from './build.ts'

export const asDesigner: PlanContext = { actor: { id: 'designer', role: 'designer' }, commandId: 'c1', changeOf: () => undefined }

/**
 * Every command's test passes through here: it changes nothing in place, its change is sound, it can be turned round,
 * and it does the same after a journey as JSON. Returns the job afterwards.
 */
export function checkCommand(before: JobDocument, intent: Intent, context = asDesigner): { after: JobDocument; change: Change } {
  deepFreeze(before.records)
  const change = plan(before, deepFreeze(intent), context)
  const after = apply(before, change)
  assertSound(after, change)
  expect(apply(after, reverse(change)).records).toEqual(before.records)
  expect(reverse(reverse(change))).toEqual(change)
  const wire = JSON.parse(JSON.stringify({ intent, change })) as { intent: Intent; change: Change }
  expect(plan(before, wire.intent, context)).toEqual(change)
  expect(apply(before, wire.change).records).toEqual(after.records)
  return { after, change }
}
