import { addCableTypeSchema, addDeviceModelSchema, catalogParamsSchema, removeEntryQuerySchema, updateCableTypeSchema, updateDeviceModelSchema, type Catalog } from '../../../shared/api/catalog.ts'
import { defineRoute, noInput, type Route } from '../../http/routeTable.ts'
import { cableTypeStore, deviceModelStore } from './catalogRepo.ts'
import { addEntry, removeEntry, updateEntry } from './changeEntry.ts'

/** The company's cable types and device models. */
export const catalogRoutes: readonly Route[] = [
  defineRoute({
    method: 'get', path: '/api/catalog', action: 'catalog.read', params: noInput, query: noInput, body: noInput,
    handle: async ({ db, member }): Promise<Catalog> => {
      const [cableTypes, deviceModels] = await Promise.all([cableTypeStore.list(db, member.companyId), deviceModelStore.list(db, member.companyId)])
      return { cableTypes, deviceModels }
    },
  }),
  defineRoute({
    method: 'post', path: '/api/catalog/cable-types', action: 'catalog.update', params: noInput, query: noInput, body: addCableTypeSchema,
    handle: ({ db, member }, { body }) => addEntry(db, cableTypeStore, member.companyId, body.id, body.description),
  }),
  defineRoute({
    method: 'put', path: '/api/catalog/cable-types/:id', action: 'catalog.update', params: catalogParamsSchema, query: noInput, body: updateCableTypeSchema,
    handle: ({ db, member }, { params, body }) => updateEntry(db, cableTypeStore, member.companyId, params.id, body),
  }),
  defineRoute({
    method: 'delete', path: '/api/catalog/cable-types/:id', action: 'catalog.update', params: catalogParamsSchema, query: removeEntryQuerySchema, body: noInput,
    handle: ({ db, member }, { params, query }) => removeEntry(db, cableTypeStore, member.companyId, params.id, query.version),
  }),
  defineRoute({
    method: 'post', path: '/api/catalog/device-models', action: 'catalog.update', params: noInput, query: noInput, body: addDeviceModelSchema,
    handle: ({ db, member }, { body }) => addEntry(db, deviceModelStore, member.companyId, body.id, body.description),
  }),
  defineRoute({
    method: 'put', path: '/api/catalog/device-models/:id', action: 'catalog.update', params: catalogParamsSchema, query: noInput, body: updateDeviceModelSchema,
    handle: ({ db, member }, { params, body }) => updateEntry(db, deviceModelStore, member.companyId, params.id, body),
  }),
  defineRoute({
    method: 'delete', path: '/api/catalog/device-models/:id', action: 'catalog.update', params: catalogParamsSchema, query: removeEntryQuerySchema, body: noInput,
    handle: ({ db, member }, { params, query }) => removeEntry(db, deviceModelStore, member.companyId, params.id, query.version),
  }),
]
