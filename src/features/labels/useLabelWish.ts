import { ref, watch, type Ref } from 'vue'
import { labelSheetSchema, type LabelSheet } from '../../../shared/api/exports.ts'

const key = 'mudring.labels'
export type LabelWish = Omit<LabelSheet, 'runIds'>
const wishSchema = labelSheetSchema.omit({ runIds: true })

function remembered(): LabelWish {
  const first: LabelWish = { choice: 'letter-30', copiesAtRack: 2, copiesAtPlate: 2, startAt: 1, offsetXMm: 0, offsetYMm: 0 }
  try {
    const parsed = wishSchema.safeParse(JSON.parse(localStorage.getItem(key) ?? ''))
    return parsed.success ? { ...parsed.data, startAt: 1 } : first
  } catch {
    return first
  }
}

/** Stock, copies and what this printer sets off: remembered on this device, because they belong to its printer. */
export function useLabelWish(): Ref<LabelWish> {
  const wish = ref(remembered())
  watch(wish, (now) => localStorage.setItem(key, JSON.stringify(now)), { deep: true })
  return wish
}
