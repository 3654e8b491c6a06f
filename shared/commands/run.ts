import { z } from 'zod'
import { AppError } from '../errors.ts'
import { idSchema } from '../model/fields.ts'
import { find, need, type JobDocument } from '../model/jobDocument.ts'
import { cordSchema, endNames, runSchema, type Run } from '../model/run.ts'
import { adds, noChange, updates } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { same } from '../sync/same.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'
import { assignLabel, isPrinted, labelsTaken, nextSerial, withLabels } from './labelling.ts'

const theRuns = (doc: JobDocument, ids: readonly string[]) => some(ids, (id) => find(doc, 'run', id)?.label ?? 'run', 'runs')
const settable = runSchema.omit({ kind: true, id: true, serial: true, label: true, a: true, b: true, cableTypeId: true, dropped: true })

export const runCommands = {
  /** Lays a run between two ends. Its serial number and label are assigned where the command lands. */
  'run.add': defineCommand({
    args: z.strictObject({
      id: idSchema,
      cableTypeId: idSchema,
      a: runSchema.shape.a,
      b: runSchema.shape.b,
      purpose: runSchema.shape.purpose.default(''),
      bundle: runSchema.shape.bundle.default(null),
      pathwayIds: runSchema.shape.pathwayIds.default([]),
      route: runSchema.shape.route.default(null),
      slackAMm: runSchema.shape.slackAMm.default(null),
      slackBMm: runSchema.shape.slackBMm.default(null),
      statedLengthMm: runSchema.shape.statedLengthMm.default(null),
      loadJoin: runSchema.shape.loadJoin.default('parallel'),
    }),
    describe: (doc, { cableTypeId }) => `Lay a ${find(doc, 'cableType', cableTypeId)?.code ?? ''} run`,
    plan: (doc, args) => {
      need(doc, 'cableType', args.cableTypeId)
      if (args.a && args.b && same(args.a, args.b)) throw new AppError('refused', 'A run needs two different ends')
      const run: Run = { kind: 'run', ...args, serial: nextSerial(doc), label: 'X', dropped: null }
      return adds({ ...run, label: assignLabel(doc, run, labelsTaken(doc)) })
    },
  }),
  'run.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: settable.partial() }),
    describe: (doc, { ids, set }) => {
      const field = Object.keys(set)
      const word = field.every((each) => each.startsWith('slack')) ? 'Set the slack of' : field.includes('statedLengthMm') ? 'State the length of' : 'Change'
      return `${word} ${theRuns(doc, ids)}`
    },
    plan: (doc, { ids, set }) => setMany(doc, 'run', ids, set),
  }),
  'run.changeCable': defineCommand({
    args: z.strictObject({ ids: idsSchema, cableTypeId: idSchema }),
    describe: (doc, { ids, cableTypeId }) => `Change ${theRuns(doc, ids)} to ${find(doc, 'cableType', cableTypeId)?.code ?? 'another cable'}`,
    plan: (doc, { ids, cableTypeId }) => {
      const type = need(doc, 'cableType', cableTypeId)
      const change = setMany(doc, 'run', ids, { cableTypeId })
      const kindChanges = ids.filter((id) => find(doc, 'cableType', find(doc, 'run', id)?.cableTypeId)?.labelKind !== type.labelKind)
      return withLabels(doc, change, () => kindChanges)
    },
  }),
  /** Puts one end somewhere else, or nowhere yet. */
  'run.setEnd': defineCommand({
    args: z.strictObject({ id: idSchema, end: z.enum(endNames), to: runSchema.shape.a }),
    describe: (doc, { id, to }) => `${to ? 'Move an end of' : 'Take an end off'} ${find(doc, 'run', id)?.label ?? 'run'}`,
    plan: (doc, { id, end, to }) => {
      const run = need(doc, 'run', id)
      const other = end === 'a' ? run.b : run.a
      if (to && other && same(to, other)) throw new AppError('refused', `${run.label} cannot have both ends in one place`)
      return withLabels(doc, updates<'run'>(run, { [end]: to }), () => [id])
    },
  }),
  /** Writes a label by hand; refused once one was printed. */
  'run.setLabel': defineCommand({
    args: z.strictObject({ id: idSchema, label: runSchema.shape.label }),
    describe: (doc, { id, label }) => `Label ${find(doc, 'run', id)?.label ?? 'run'} ${label}`,
    plan: (doc, { id, label }) => {
      const run = need(doc, 'run', id)
      if (label !== run.label && isPrinted(doc, id)) throw new AppError('refused', `${run.label} is printed, so it stays. Strike out the print first if the labels were never used`)
      if (labelsTaken(doc, new Set([id])).has(label.toUpperCase())) throw new AppError('refused', `Label ${label} is on another run already. A label names one cable`)
      return updates<'run'>(run, { label })
    },
  }),
  /** Labels runs anew by the job's pattern; printed ones keep theirs. */
  'run.relabel': defineCommand({
    args: z.strictObject({ ids: idsSchema }),
    describe: (doc, { ids }) => `Label ${theRuns(doc, ids)} by the pattern`,
    plan: (doc, { ids }) => {
      for (const id of ids) need(doc, 'run', id)
      return withLabels(doc, noChange, () => ids)
    },
  }),
  /** Says that runs are not to be pulled, and why; null takes that back. A dropped run stays visible. */
  'run.drop': defineCommand({
    args: z.strictObject({ ids: idsSchema, reason: runSchema.shape.dropped }),
    describe: (doc, { ids, reason }) => `${reason === null ? 'Take up' : 'Drop'} ${theRuns(doc, ids)}`,
    plan: (doc, { ids, reason }) => setMany(doc, 'run', ids, { dropped: reason }),
  }),
  'cord.add': defineCommand({
    args: cordSchema.omit({ kind: true }).extend({ form: cordSchema.shape.form.default('patch cord'), lengthMm: cordSchema.shape.lengthMm.default(1000) }),
    describe: (_doc, { form }) => `Add a ${form}`,
    plan: (_doc, cord) => {
      if (same(cord.a, cord.b)) throw new AppError('refused', 'A cord needs two different ends')
      return adds({ kind: 'cord', ...cord })
    },
  }),
  'cord.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: cordSchema.omit({ kind: true, id: true }).partial() }),
    describe: (_doc, { ids }) => `Change ${some(ids, () => 'a cord', 'cords')}`,
    plan: (doc, { ids, set }) => compose([setMany(doc, 'cord', ids, set)]),
  }),
}
