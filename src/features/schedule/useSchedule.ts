import { computed, ref } from 'vue'
import type { Severity } from '../../../shared/checks/finding.ts'
import type { Stage } from '../../../shared/derive/facts.ts'
import { compareLabels, scheduleRows, type ScheduleRow } from '../../../shared/views/scheduleRows.ts'
import { useJobStore } from '../job/jobStore.ts'
import { scheduleColumns } from './scheduleColumns.ts'

export const groupings = ['room', 'level', 'cable', 'bundle', 'stage', 'none'] as const
export type Grouping = (typeof groupings)[number]

export interface ScheduleFilter {
  text: string
  level: string
  room: string
  cable: string
  stage: Stage | ''
  bundle: string
  finding: Severity | 'any' | ''
}

export interface ScheduleGroup {
  readonly key: string
  readonly name: string
  readonly about: string
  readonly rows: readonly ScheduleRow[]
}

/** A line of the list: the head of a group, or a run. */
export type ScheduleLine = { readonly group: ScheduleGroup } | { readonly row: ScheduleRow }

const noFilter = (): ScheduleFilter => ({ text: '', level: '', room: '', cable: '', stage: '', bundle: '', finding: '' })

/** The schedule as somebody looks at it: filtered, sorted, grouped. */
export function useSchedule() {
  const store = useJobStore()
  const filter = ref(noFilter())
  const grouping = ref<Grouping>('room')
  const sortBy = ref('label')
  const descending = ref(false)
  const folded = ref<ReadonlySet<string>>(new Set())
  const columns = computed(() => scheduleColumns(store.job.lengthUnit))
  const all = computed(() => (store.derived ? scheduleRows(store.doc, store.derived.runs) : []))
  const rows = computed(() => sorted(all.value.filter(passes)))
  const groups = computed(() => grouped(rows.value))
  const lines = computed<ScheduleLine[]>(() =>
    groups.value.flatMap((group) => [...(grouping.value === 'none' ? [] : [{ group }]), ...(folded.value.has(group.key) ? [] : group.rows.map((row) => ({ row })))]),
  )
  const isFiltered = computed(() => Object.values(filter.value).some(Boolean))
  return { filter, grouping, sortBy, descending, folded, columns, all, rows, groups, lines, isFiltered, clear, sort, fold }

  function clear() {
    filter.value = noFilter()
  }
  function sort(id: string) {
    descending.value = sortBy.value === id ? !descending.value : false
    sortBy.value = id
  }
  function fold(key: string) {
    const next = new Set(folded.value)
    if (!next.delete(key)) next.add(key)
    folded.value = next
  }

  function passes(row: ScheduleRow): boolean {
    const text = filter.value.text.trim().toLowerCase()
    return (
      (!text || [row.label, row.cable, row.room, row.plate, row.device, row.rackPort, row.bundle].some((each) => each.toLowerCase().includes(text))) &&
      (!filter.value.level || row.level === filter.value.level) && (!filter.value.room || row.room === filter.value.room) && (!filter.value.cable || row.cable === filter.value.cable) &&
      (!filter.value.stage || row.stage === filter.value.stage) && (!filter.value.bundle || row.bundle === filter.value.bundle) &&
      (!filter.value.finding || (filter.value.finding === 'any' ? row.severity !== null : row.severity === filter.value.finding))
    )
  }
  function sorted(list: ScheduleRow[]): ScheduleRow[] {
    const column = columns.value.find((each) => each.id === sortBy.value) ?? columns.value[0]!
    const sign = descending.value ? -1 : 1
    return [...list].sort((a, b) => {
      const [x, y] = [column.sort(a), column.sort(b)]
      return sign * (typeof x === 'number' && typeof y === 'number' ? x - y : compareLabels(String(x), String(y))) || compareLabels(a.label, b.label)
    })
  }
  function grouped(list: readonly ScheduleRow[]): ScheduleGroup[] {
    if (grouping.value === 'none') return [{ key: '', name: '', about: '', rows: list }]
    const by = new Map<string, ScheduleRow[]>()
    for (const row of list) {
      const key = { room: row.roomId ?? '', level: row.levelId ?? '', cable: row.cable, bundle: row.bundle, stage: row.stage }[grouping.value]
      by.set(key, [...(by.get(key) ?? []), row])
    }
    return [...by].map(([key, members]) => {
      const first = members[0]!
      const name = { room: first.room, level: first.level || 'No level yet', cable: first.cable, bundle: first.bundle || 'No bundle', stage: first.stage }[grouping.value as Exclude<Grouping, 'none'>]
      const pulled = members.filter((row) => row.stage !== 'planned').length
      return { key, name, about: `${grouping.value === 'room' ? `${first.level} · ` : ''}${pulled} of ${members.length} pulled`, rows: members }
    })
  }
}
