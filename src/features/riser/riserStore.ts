import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { CatalogDeviceModel } from '../../../shared/api/catalog.ts'
import type { CableChoice } from './tools/planPlate.ts'
import type { PlatePreset } from './tools/platePresets.ts'

/** What a click on the drawing does. */
export type Tool =
  | { readonly kind: 'select' }
  | { readonly kind: 'plate'; readonly preset: PlatePreset; readonly withRuns: boolean }
  | { readonly kind: 'run'; readonly cable: CableChoice; readonly code: string }
  | { readonly kind: 'device'; readonly entry: CatalogDeviceModel }

export type TagMode = 'label' | 'cable' | 'length'
export type DialogKind = 'level' | 'room' | 'rack' | 'panel' | 'pathway' | 'plate' | 'run' | 'remove' | 'drop'

/** Whether there is room for the drawing and the inspector side by side from the start. */
export const isWide = (): boolean => window.innerWidth >= 1100

/** How this person looks at the riser just now. Nothing of it is saved with the job. */
export const useRiserStore = defineStore('riser', () => {
  const tool = shallowRef<Tool>({ kind: 'select' })
  const tagMode = ref<TagMode>('label')
  const isApart = ref(false)
  const dialog = shallowRef<DialogKind | null>(null)
  const isInspectorOpen = ref(isWide())
  const zoom = ref(1)
  /** Said once after an edit: what a quick run could not do. */
  const caution = ref('')

  function take(next: Tool) {
    tool.value = next
    caution.value = ''
  }
  function putDown() {
    tool.value = { kind: 'select' }
  }
  return { tool, tagMode, isApart, dialog, isInspectorOpen, zoom, caution, take, putDown }
})
