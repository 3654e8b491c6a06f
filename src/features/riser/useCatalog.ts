import { onMounted, shallowRef, type ShallowRef } from 'vue'
import type { Catalog } from '../../../shared/api/catalog.ts'
import { request } from '../../api/request.ts'

let kept: Catalog | null = null

/** The company's catalogue, fetched when a riser opens; without a connection, what the job has itself is all there is. */
export function useCatalog(): ShallowRef<Catalog | null> {
  const catalog = shallowRef<Catalog | null>(kept)
  onMounted(async () => {
    try {
      catalog.value = kept = await request<Catalog>('GET', '/api/catalog')
    } catch {
      catalog.value = kept
    }
  })
  return catalog
}
