import { z } from 'zod'
import { cableTypeSchema } from '../model/cableType.ts'
import { deviceDescriptionSchema, deviceModelSchema, deviceSchema } from '../model/device.ts'
import { idSchema } from '../model/fields.ts'
import { find, need } from '../model/jobDocument.ts'
import { adds } from '../sync/change.ts'
import { compose } from '../sync/compose.ts'
import { defineCommand, idsSchema, setMany, some } from './define.ts'
import { withLabels } from './labelling.ts'

const catalogued = { catalogId: cableTypeSchema.shape.catalogId.default(null), catalogVersion: cableTypeSchema.shape.catalogVersion.default(null) }
const place = deviceSchema.pick({ plateId: true, rackId: true, unit: true, roomId: true, at: true, heightMm: true }).partial()

export const deviceCommands = {
  /** Takes a cable type onto the job: the job's own copy of a catalogue entry. */
  'cableType.add': defineCommand({
    args: cableTypeSchema.omit({ kind: true }).extend(catalogued),
    describe: (_doc, type) => `Add cable type ${type.code}`,
    plan: (_doc, type) => adds({ kind: 'cableType', ...type }),
  }),
  'cableType.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: cableTypeSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'cableType', id)?.code ?? 'cable type', 'cable types')}`,
    plan: (doc, { ids, set }) => {
      const change = setMany(doc, 'cableType', ids, set)
      return set.labelKind === undefined && set.code === undefined ? change : withLabels(doc, change, (after) => [...after.records.run.values()].filter((run) => ids.includes(run.cableTypeId)).map((run) => run.id))
    },
  }),
  'deviceModel.add': defineCommand({
    args: deviceModelSchema.omit({ kind: true }).extend(catalogued),
    describe: (_doc, model) => `Add device model ${model.name}`,
    plan: (_doc, model) => {
      const { id: _id, catalogId: _catalogId, catalogVersion: _version, ...description } = model
      deviceDescriptionSchema.parse(description)
      return adds({ kind: 'deviceModel', ...model })
    },
  }),
  'deviceModel.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: deviceModelSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'deviceModel', id)?.name ?? 'device model', 'device models')}`,
    plan: (doc, { ids, set }) => {
      for (const id of ids) {
        const { kind: _kind, id: _id, catalogId: _catalogId, catalogVersion: _version, ...model } = need(doc, 'deviceModel', id)
        const { catalogId: _setId, catalogVersion: _setVersion, ...described } = set
        deviceDescriptionSchema.parse({ ...model, ...described })
      }
      return setMany(doc, 'deviceModel', ids, set)
    },
  }),
  'device.add': defineCommand({
    args: deviceSchema.omit({ kind: true }).extend({
      plateId: deviceSchema.shape.plateId.default(null),
      rackId: deviceSchema.shape.rackId.default(null),
      unit: deviceSchema.shape.unit.default(null),
      roomId: deviceSchema.shape.roomId.default(null),
      at: deviceSchema.shape.at.default(null),
      heightMm: deviceSchema.shape.heightMm.default(null),
      code: deviceSchema.shape.code.default(null),
      suppliedBy: deviceSchema.shape.suppliedBy.default('us'),
      loadOhm: deviceSchema.shape.loadOhm.default(null),
      tapW: deviceSchema.shape.tapW.default(null),
      videoFormat: deviceSchema.shape.videoFormat.default(null),
      zones: deviceSchema.shape.zones.default({}),
    }),
    describe: (_doc, device) => `Add ${device.name}`,
    plan: (doc, device) => {
      need(doc, 'deviceModel', device.modelId)
      return adds({ kind: 'device', ...device })
    },
  }),
  'device.update': defineCommand({
    args: z.strictObject({ ids: idsSchema, set: deviceSchema.omit({ kind: true, id: true }).partial() }),
    describe: (doc, { ids }) => `Change ${some(ids, (id) => find(doc, 'device', id)?.name ?? 'device', 'devices')}`,
    plan: (doc, { ids, set }) => setMany(doc, 'device', ids, set),
  }),
  'device.move': defineCommand({
    args: z.strictObject({ moves: z.array(z.strictObject({ id: idSchema, to: place })).min(1).max(1000) }),
    describe: (doc, { moves }) => `Move ${some(moves.map((move) => move.id), (id) => find(doc, 'device', id)?.name ?? 'device', 'devices')}`,
    plan: (doc, { moves }) => compose(moves.map(({ id, to }) => setMany(doc, 'device', [id], to))),
  }),
}
