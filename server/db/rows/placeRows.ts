import { levels, pathways, plateJacks, plates, racks, rooms } from '../tables/places.ts'
import { maybePointColumns, maybePointOf, pointColumns, pointOf } from './leafs.ts'
import { defineRows } from './rowMapper.ts'

export const levelRows = defineRows({
  kind: 'level',
  table: levels,
  toRow: ({ kind: _kind, ...level }) => level,
  fromRow: ({ id, name, code, use, elevationMm, ceilingHeightMm }) => ({ kind: 'level', id, name, code, use, elevationMm, ceilingHeightMm }),
})

export const roomRows = defineRows({
  kind: 'room',
  table: rooms,
  toRow: ({ kind: _kind, ...room }) => room,
  fromRow: ({ id, levelId, name, code, aliases, outline, ceilingHeightMm, spaceClass }) => ({ kind: 'room', id, levelId, name, code, aliases, outline, ceilingHeightMm, spaceClass }),
})

export const plateRows = defineRows({
  kind: 'plate',
  table: plates,
  toRow: ({ kind: _kind, at, jacks: _jacks, ...plate }) => ({ ...plate, ...maybePointColumns(at) }),
  fromRow: ({ id, roomId, number, name, form, mounting, wall, alongMm, heightMm, heightTo, gangs, ...at }, jacks) => ({
    kind: 'plate', id, roomId, number, name, form, mounting, wall, alongMm, at: maybePointOf(at), heightMm, heightTo, gangs,
    jacks: jacks.map((jack) => ({ id: jack.id, position: jack.position, connector: jack.connector })),
  }),
  part: {
    table: plateJacks,
    owner: 'plateId',
    key: 'id',
    field: 'jacks',
    toRows: (plate) => plate.jacks.map((jack, ordinal) => ({ plateId: plate.id, ordinal, ...jack })),
  },
})

export const rackRows = defineRows({
  kind: 'rack',
  table: racks,
  toRow: ({ kind: _kind, at, ...rack }) => ({ ...rack, ...pointColumns(at) }),
  fromRow: ({ id, roomId, name, code, units, ...at }) => ({ kind: 'rack', id, roomId, name, code, units, at: pointOf(at) }),
})

export const pathwayRows = defineRows({
  kind: 'pathway',
  table: pathways,
  toRow: ({ kind: _kind, at, ...pathway }) => ({ ...pathway, ...pointColumns(at) }),
  fromRow: ({ id, name, form, bottomLevelId, topLevelId, ...at }) => ({ kind: 'pathway', id, name, form, at: pointOf(at), bottomLevelId, topLevelId }),
})
