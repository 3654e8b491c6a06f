import { z } from 'zod'
import { AppError } from '../errors.ts'
import { acceptanceSchema, jacketMarkSchema, labelPrintSchema, pullSchema, strikeSchema, terminationSchema, testSchema } from '../model/fieldRecord.ts'
import { find, kindWord, need, type JobDocument } from '../model/jobDocument.ts'
import type { JobRecord } from '../model/record.ts'
import { adds, type Change } from '../sync/change.ts'
import { defineCommand, some } from './define.ts'

/** A list of things said, each about its own run. */
const list = <Schema extends z.ZodType>(schema: Schema) => z.array(schema).min(1).max(5000)
const labels = (doc: JobDocument, entries: readonly { runId: string }[]) => {
  const ids = [...new Set(entries.map((entry) => entry.runId))]
  return some(ids, (id) => find(doc, 'run', id)?.label ?? 'run', 'runs')
}

/** Adds records about runs that exist and are still to be pulled. */
function say(doc: JobDocument, records: readonly (JobRecord & { runId: string })[]): Change {
  for (const { runId } of records) {
    const run = need(doc, 'run', runId)
    if (run.dropped !== null) throw new AppError('refused', `${run.label} is not to be pulled: ${run.dropped}`)
  }
  return adds(...records)
}

export const fieldCommands = {
  'label.print': defineCommand({
    args: z.strictObject({ prints: list(labelPrintSchema.omit({ kind: true, byId: true, text: true })) }),
    describe: (doc, { prints }) => `Print labels of ${labels(doc, prints)}`,
    plan: (doc, { prints }, { actor }) => say(doc, prints.map((print) => ({ kind: 'labelPrint', ...print, text: need(doc, 'run', print.runId).label, byId: actor.id }))),
  }),
  'pull.record': defineCommand({
    args: z.strictObject({
      pulls: list(pullSchema.omit({ kind: true, byId: true }).extend({ markA: jacketMarkSchema.nullable().default(null), markB: jacketMarkSchema.nullable().default(null), spool: pullSchema.shape.spool.default(null) })),
    }),
    describe: (doc, { pulls }) => `Record ${labels(doc, pulls)} as pulled`,
    plan: (doc, { pulls }, { actor }) => say(doc, pulls.map((pull) => ({ kind: 'pull', ...pull, byId: actor.id }))),
  }),
  'termination.record': defineCommand({
    args: z.strictObject({ terminations: list(terminationSchema.omit({ kind: true, byId: true }).extend({ scheme: terminationSchema.shape.scheme.default('') })) }),
    describe: (doc, { terminations }) => `Record ends of ${labels(doc, terminations)} as on`,
    plan: (doc, { terminations }, { actor }) => say(doc, terminations.map((termination) => ({ kind: 'termination', ...termination, byId: actor.id }))),
  }),
  'test.record': defineCommand({
    args: z.strictObject({ tests: list(testSchema.omit({ kind: true, byId: true }).extend({ reading: testSchema.shape.reading.default('') })) }),
    describe: (doc, { tests }) => `Record ${tests.length === 1 ? 'a test' : 'tests'} of ${labels(doc, tests)}`,
    plan: (doc, { tests }, { actor }) => say(doc, tests.map((test) => ({ kind: 'test', ...test, byId: actor.id }))),
  }),
  'finding.accept': defineCommand({
    args: z.strictObject({ acceptances: list(acceptanceSchema.omit({ kind: true, byId: true })) }),
    describe: (_doc, { acceptances }) => `Accept ${acceptances.length === 1 ? 'a finding' : `${acceptances.length} findings`}`,
    plan: (_doc, { acceptances }, { actor }) => adds(...acceptances.map((acceptance) => ({ kind: 'acceptance' as const, ...acceptance, byId: actor.id }))),
  }),
  /** Says that an earlier record does not hold: a wrong pull, a print never used, an acceptance taken back. */
  'record.strike': defineCommand({
    args: z.strictObject({ strikes: list(strikeSchema.omit({ kind: true, byId: true }).extend({ reason: strikeSchema.shape.reason.default('') })) }),
    describe: (_doc, { strikes }) => `Strike out ${strikes.length === 1 ? `a ${kindWord(strikes[0]!.targetKind)}` : `${strikes.length} records`}`,
    plan: (doc, { strikes }, { actor }) => {
      for (const { targetKind, targetId } of strikes) need(doc, targetKind, targetId)
      return adds(...strikes.map((strike) => ({ kind: 'strike' as const, ...strike, byId: actor.id })))
    },
  }),
}
