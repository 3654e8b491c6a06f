import type { ComputedRef } from 'vue'
import { useSelectionStore } from '../job/selectionStore.ts'
import type { RiserLayout } from './layout/riserLayout.ts'

/** Arrow keys: left and right walk along a trunk by exit, up and down go to the trunk over and under. */
export function useRiserWalk(layout: ComputedRef<RiserLayout>) {
  const selection = useSelectionStore()
  return { step, change }

  function exitX(runId: string): number {
    return layout.value.runs.find((run) => run.runId === runId)?.exit.x ?? 0
  }
  /** Runs of a storey's trunks from left to right, storeys from the top down. */
  function lines(): string[][] {
    const byStorey = new Map<number, string[]>()
    for (const run of layout.value.runs) byStorey.set(run.storey, [...(byStorey.get(run.storey) ?? []), run.runId])
    return [...byStorey].sort((a, b) => b[0] - a[0]).map(([, ids]) => ids.sort((a, b) => exitX(a) - exitX(b)))
  }
  function current(): { line: number; at: number; all: string[][] } {
    const all = lines()
    const id = selection.runIds.at(-1)
    const line = all.findIndex((ids) => id !== undefined && ids.includes(id))
    return { line, at: line < 0 || id === undefined ? -1 : all[line]!.indexOf(id), all }
  }
  function choose(id: string | undefined): void {
    if (id) selection.choose({ kind: 'run', id })
  }
  function step(by: 1 | -1): void {
    const { line, at, all } = current()
    choose(line < 0 ? all[0]?.[0] : all[line]?.[at + by])
  }
  function change(by: 1 | -1): void {
    const { line, at, all } = current()
    if (line < 0) return choose(all[0]?.[0])
    const x = exitX(all[line]![at]!)
    const next = all[line + by]
    choose(next && [...next].sort((a, b) => Math.abs(exitX(a) - x) - Math.abs(exitX(b) - x))[0])
  }
}
