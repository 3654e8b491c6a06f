import { defineStore } from 'pinia'
import { computed, shallowRef } from 'vue'
import type { Item } from '../../../shared/commands/items.ts'

/** What is chosen, shared by riser, schedule and inspector. It is nobody else's business and never saved. */
export const useSelectionStore = defineStore('selection', () => {
  const items = shallowRef<readonly Item[]>([])
  const only = computed(() => (items.value.length === 1 ? items.value[0] : undefined))
  const runIds = computed(() => items.value.filter((item) => item.kind === 'run').map((item) => item.id))
  const has = (kind: Item['kind'], id: string) => items.value.some((item) => item.kind === kind && item.id === id)

  function choose(...next: readonly Item[]) {
    items.value = next
  }
  function toggle(item: Item) {
    items.value = has(item.kind, item.id) ? items.value.filter((each) => each.kind !== item.kind || each.id !== item.id) : [...items.value, item]
  }
  function clear() {
    items.value = []
  }
  return { items, only, runIds, has, choose, toggle, clear }
})
