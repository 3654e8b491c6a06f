import { ref, shallowRef } from 'vue'
import type { Catalog, CatalogCableType, CatalogDeviceModel } from '../../../shared/api/catalog.ts'
import type { CableDescription } from '../../../shared/model/cableType.ts'
import type { DeviceDescription } from '../../../shared/model/device.ts'
import { ApiProblem, request, sentenceOf } from '../../api/request.ts'

export interface EntryDraft<Description> {
  /** Null: a new entry. */
  readonly id: string | null
  readonly version: number
  readonly description: Description
}

/** The company's catalogue, as it is read and changed here. */
export function useCatalog() {
  const cableTypes = shallowRef<readonly CatalogCableType[]>([])
  const deviceModels = shallowRef<readonly CatalogDeviceModel[]>([])
  const isLoaded = ref(false)
  const fault = ref('')
  return { cableTypes, deviceModels, isLoaded, fault, load, save, remove }

  async function load() {
    try {
      const answer = await request<Catalog>('GET', '/api/catalog')
      cableTypes.value = [...answer.cableTypes].sort((a, b) => a.description.code.localeCompare(b.description.code, 'en', { numeric: true }))
      deviceModels.value = [...answer.deviceModels].sort((a, b) => a.description.category.localeCompare(b.description.category) || a.description.name.localeCompare(b.description.name))
      isLoaded.value = true
      fault.value = ''
    } catch (error) {
      fault.value = sentenceOf(error)
    }
  }
  /** Returns a sentence when it was not saved; what was typed is then still with the caller. */
  async function save(kind: 'cable-types' | 'device-models', { id, version, description }: EntryDraft<CableDescription | DeviceDescription>): Promise<string> {
    try {
      if (id === null) await request('POST', `/api/catalog/${kind}`, { id: crypto.randomUUID(), description })
      else await request('PUT', `/api/catalog/${kind}/${encodeURIComponent(id)}`, { version, description })
      await load()
      return ''
    } catch (error) {
      if (error instanceof ApiProblem && error.status === 409) await load()
      return sentenceOf(error)
    }
  }
  async function remove(kind: 'cable-types' | 'device-models', entry: { readonly id: string; readonly version: number }): Promise<string> {
    try {
      await request('DELETE', `/api/catalog/${kind}/${encodeURIComponent(entry.id)}?version=${entry.version}`)
      await load()
      return ''
    } catch (error) {
      return sentenceOf(error)
    }
  }
}
