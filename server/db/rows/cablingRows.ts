import { cords, devices, runPathways, runs } from '../tables/cabling.ts'
import { cableTypes, deviceModels } from '../tables/models.ts'
import { cordEndOf, endColumns, maybePointColumns, maybePointOf, runEndOf } from './leafs.ts'
import { cableDescriptionOf, deviceDescriptionOf } from './descriptions.ts'
import { defineRows } from './rowMapper.ts'

export const cableTypeRows = defineRows({
  kind: 'cableType',
  table: cableTypes,
  toRow: ({ kind: _kind, ...type }) => type,
  fromRow: (row) => ({ kind: 'cableType', id: row.id, catalogId: row.catalogId, catalogVersion: row.catalogVersion, ...cableDescriptionOf(row) }),
})

export const deviceModelRows = defineRows({
  kind: 'deviceModel',
  table: deviceModels,
  toRow: ({ kind: _kind, ...model }) => model,
  fromRow: (row) => ({ kind: 'deviceModel', id: row.id, catalogId: row.catalogId, catalogVersion: row.catalogVersion, ...deviceDescriptionOf(row) }),
})

export const deviceRows = defineRows({
  kind: 'device',
  table: devices,
  toRow: ({ kind: _kind, at, ...device }) => ({ ...device, ...maybePointColumns(at) }),
  fromRow: ({ id, modelId, plateId, rackId, unit, roomId, heightMm, name, code, suppliedBy, loadOhm, tapW, videoFormat, zones, ...at }) => ({
    kind: 'device', id, modelId, plateId, rackId, unit, roomId, at: maybePointOf(at), heightMm, name, code, suppliedBy, loadOhm, tapW, videoFormat, zones,
  }),
})

export const runRows = defineRows({
  kind: 'run',
  table: runs,
  toRow: ({ kind: _kind, a, b, pathwayIds: _pathwayIds, ...run }) => {
    const [endA, endB] = [endColumns(a), endColumns(b)]
    return {
      ...run,
      aPlateId: endA.plateId, aJackId: endA.jackId, aDeviceId: endA.deviceId, aTerminal: endA.terminal, aRackId: endA.rackId,
      bPlateId: endB.plateId, bJackId: endB.jackId, bDeviceId: endB.deviceId, bTerminal: endB.terminal, bRackId: endB.rackId,
    }
  },
  fromRow: (row, pathways) => ({
    kind: 'run', id: row.id, serial: row.serial, cableTypeId: row.cableTypeId,
    a: runEndOf({ plateId: row.aPlateId, jackId: row.aJackId, deviceId: row.aDeviceId, terminal: row.aTerminal, rackId: row.aRackId }),
    b: runEndOf({ plateId: row.bPlateId, jackId: row.bJackId, deviceId: row.bDeviceId, terminal: row.bTerminal, rackId: row.bRackId }),
    label: row.label, purpose: row.purpose, bundle: row.bundle, pathwayIds: pathways.map((each) => each.pathwayId), route: row.route,
    slackAMm: row.slackAMm, slackBMm: row.slackBMm, statedLengthMm: row.statedLengthMm, loadJoin: row.loadJoin, dropped: row.dropped,
  }),
  part: {
    table: runPathways,
    owner: 'runId',
    key: 'ordinal',
    field: 'pathwayIds',
    toRows: (run) => run.pathwayIds.map((pathwayId, ordinal) => ({ runId: run.id, ordinal, pathwayId })),
  },
})

export const cordRows = defineRows({
  kind: 'cord',
  table: cords,
  toRow: ({ kind: _kind, a, b, ...cord }) => {
    const [endA, endB] = [endColumns(a), endColumns(b)]
    return {
      ...cord,
      aPlateId: endA.plateId, aJackId: endA.jackId, aDeviceId: endA.deviceId, aTerminal: endA.terminal,
      bPlateId: endB.plateId, bJackId: endB.jackId, bDeviceId: endB.deviceId, bTerminal: endB.terminal,
    }
  },
  fromRow: (row) => ({
    kind: 'cord', id: row.id,
    a: cordEndOf({ plateId: row.aPlateId, jackId: row.aJackId, deviceId: row.aDeviceId, terminal: row.aTerminal }),
    b: cordEndOf({ plateId: row.bPlateId, jackId: row.bJackId, deviceId: row.bDeviceId, terminal: row.bTerminal }),
    form: row.form, lengthMm: row.lengthMm,
  }),
})
