import { mount } from '@vue/test-utils'
import { computed, defineComponent, h, shallowRef } from 'vue'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { heronPoint } from '../../../../fixtures/jobs/heronPoint.ts'
import { find } from '../../../../shared/model/jobDocument.ts'
import { useShortcuts } from '../../../../src/app/shortcuts.ts'
import { useSelectionStore } from '../../../../src/features/job/selectionStore.ts'
import { keepSame } from '../../../../src/features/riser/layout/keepSame.ts'
import { layoutRiser } from '../../../../src/features/riser/layout/layoutRiser.ts'
import { toNodes } from '../../../../src/features/riser/layout/toNodes.ts'
import { litOf } from '../../../../src/features/riser/litOf.ts'
import { placeOf } from '../../../../src/features/riser/placeOf.ts'
import { riserShortcuts } from '../../../../src/features/riser/riserShortcuts.ts'
import { useRiserStore } from '../../../../src/features/riser/riserStore.ts'
import { runWords } from '../../../../src/features/riser/runWords.ts'
import { startSteps } from '../../../../src/features/riser/startSteps.ts'
import { useRiserEdits } from '../../../../src/features/riser/useRiserEdits.ts'
import { useRiserLayout } from '../../../../src/features/riser/useRiserLayout.ts'
import { useRiserTools } from '../../../../src/features/riser/useRiserTools.ts'
import { useRiserWalk } from '../../../../src/features/riser/useRiserWalk.ts'
import { platePresets } from '../../../../src/features/riser/tools/platePresets.ts'
import { buildDoc, buildLevel, buildRoom, smallHouse } from '../../../support/build.ts'
import { openJob } from '../../../support/riserMount.ts'
import { playFixture } from '../../../support/playFixture.ts'

const cleanUps: (() => void)[] = []
afterEach(() => cleanUps.splice(0).forEach((clean) => clean()))

async function atTheRiser(doc = buildDoc(...smallHouse()), role: 'designer' | 'technician' = 'designer') {
  const job = await openJob(doc, role)
  const selection = useSelectionStore()
  const riser = useRiserStore()
  const view = { fit: vi.fn(), stepZoom: vi.fn(), focus: vi.fn() }
  const host = defineComponent({
    setup() {
      const now = computed(() => job.doc)
      const layout = useRiserLayout(now, computed(() => job.derived!), () => riser.tagMode, () => riser.isApart)
      const edits = useRiserEdits(now, layout, shallowRef(null))
      const tools = useRiserTools(now, layout, shallowRef(null))
      const walk = useRiserWalk(layout)
      useShortcuts(() => riserShortcuts({ canDesign: role === 'designer', riser, selection, edits, walk, view }))
      return { layout, edits, tools }
    },
    render: () => h('div'),
  })
  const wrapper = mount(host, { attachTo: document.body })
  cleanUps.push(() => wrapper.unmount())
  const press = (key: string, more: KeyboardEventInit = {}) => window.dispatchEvent(new KeyboardEvent('keydown', { key, cancelable: true, ...more }))
  return { job, selection, riser, view, press, vm: wrapper.vm }
}

describe('the keys of the riser', () => {
  it('walk along a trunk by exit, and from one trunk to the next', async () => {
    const { selection, press, vm } = await atTheRiser(playFixture(heronPoint()))
    const x = () => vm.layout.runs.find((run) => run.runId === selection.runIds[0])!.exit.x
    press('ArrowRight')
    expect(selection.runIds).toHaveLength(1)
    const first = x()
    press('ArrowRight')
    expect(x()).toBeGreaterThan(first)
    press('ArrowLeft')
    expect(x()).toBe(first)
    const storey = () => vm.layout.runs.find((run) => run.runId === selection.runIds[0])!.storey
    const high = storey()
    press('ArrowDown')
    expect(storey()).toBeLessThan(high)
    press('ArrowUp')
    expect(storey()).toBe(high)
  })

  it('fit, open the inspector, put the tool down and then choose nothing', async () => {
    const { selection, riser, view, press } = await atTheRiser()
    press('f')
    expect(view.fit).toHaveBeenCalledOnce()
    selection.choose({ kind: 'run', id: 'r1' })
    riser.isInspectorOpen = false
    press('Enter')
    expect(riser.isInspectorOpen).toBe(true)
    riser.take({ kind: 'plate', preset: platePresets[0]!, withRuns: true })
    press('Escape')
    expect(riser.tool.kind).toBe('select')
    expect(selection.items).toHaveLength(1)
    press('Escape')
    expect(selection.items).toHaveLength(0)
  })

  it('ask before deleting, and duplicate with one command', async () => {
    const { job, selection, riser, press } = await atTheRiser()
    selection.choose({ kind: 'plate', id: 'pat1' })
    press('d', { ctrlKey: true })
    expect(job.outbox).toHaveLength(1)
    expect(job.doc.records.run.size).toBe(2)
    expect(find(job.doc, 'plate', selection.only?.id)?.number).toBe(2)
    press('Delete')
    expect(riser.dialog).toBe('remove')
    expect(job.outbox).toHaveLength(1)
  })

  it('leave a form that is open alone', async () => {
    const { selection, riser, press } = await atTheRiser()
    selection.choose({ kind: 'run', id: 'r1' })
    riser.dialog = 'room'
    press('Escape')
    press('ArrowRight')
    expect(selection.runIds).toEqual(['r1'])
  })

  it('change nothing for whoever may not design', async () => {
    const { job, selection, riser, press } = await atTheRiser(undefined, 'technician')
    selection.choose({ kind: 'plate', id: 'pat1' })
    press('d', { ctrlKey: true })
    press('Delete')
    press('l')
    expect(job.outbox).toHaveLength(0)
    expect(riser.dialog).toBeNull()
  })
})

describe('a click with a tool', () => {
  it('is one command for plate, run and label, and chooses the run', async () => {
    const { job, selection, riser, vm } = await atTheRiser()
    riser.take({ kind: 'run', cable: { cableTypeId: 'c-16-2' }, code: '16/2' })
    const bay = vm.layout.bays.find((each) => each.roomId === 'mch')!
    vm.tools.place({ x: bay.x + 12, y: bay.y + bay.h * 0.5 })
    expect(job.outbox).toHaveLength(1)
    expect(find(job.doc, 'run', selection.only?.id)?.label).toBe('MCH1-S1')
    job.undo()
    expect(job.doc.records.run.size).toBe(1)
    expect(job.doc.records.plate.size).toBe(1)
  })

  it('beside the house does nothing but say where to click', async () => {
    const { job, riser, vm } = await atTheRiser()
    riser.take({ kind: 'run', cable: { cableTypeId: 'c-16-2' }, code: '16/2' })
    vm.tools.place({ x: 1, y: 1 })
    expect(job.outbox).toHaveLength(0)
    expect(riser.caution).toContain('room')
  })
})

describe('what the drawing shows', () => {
  it('is drawn anew only where an edit shows', async () => {
    const { job, vm } = await atTheRiser()
    const before = vm.layout
    job.edit({ verb: 'run.update', args: { ids: ['r1'], set: { bundle: 'B1' } } })
    expect(vm.layout).toBe(before)
    job.edit({ verb: 'plate.update', args: { ids: ['pat1'], set: { heightMm: 2000 } } })
    expect(vm.layout).not.toBe(before)
    expect(vm.layout.bays).toBe(before.bays)
  })

  it('keeps equal parts as they were', () => {
    const before = { a: [{ x: 1 }, { x: 2 }], b: 'c' }
    const next = keepSame(before, { a: [{ x: 1 }, { x: 3 }], b: 'c' })
    expect(next).toEqual({ a: [{ x: 1 }, { x: 3 }], b: 'c' })
    expect(next.a[0]).toBe(before.a[0])
    expect(next.a[1]).not.toBe(before.a[1])
    expect(keepSame(before, structuredClone(before))).toBe(before)
    expect(keepSame([1, 2], [1])).toEqual([1])
  })

  it('is few nodes, one for each place and thing, none for a run', () => {
    const doc = playFixture(heronPoint())
    const layout = layoutRiser(doc, { apart: false, mark: () => undefined })
    const nodes = toNodes(layout, true)
    expect(new Set(nodes.map((node) => node.id)).size).toBe(nodes.length)
    expect(nodes.filter((node) => node.type === 'plate')).toHaveLength(45)
    expect(nodes.length).toBeLessThan(130)
    expect(toNodes(layout, false).some((node) => node.draggable)).toBe(false)
  })

  it('lights a run with its jack, its port and its rack', () => {
    const lit = litOf(buildDoc(...smallHouse()), [{ kind: 'run', id: 'r1' }])
    expect([...lit.runs]).toEqual(['r1'])
    expect([...lit.jacks.get('pat1')!]).toEqual(['j1'])
    expect([...lit.terminals.get('sp1')!]).toEqual(['p1'])
    expect([...lit.racks]).toEqual(['rk1'])
  })

  it('knows where everything is that can be found', () => {
    const doc = playFixture(heronPoint())
    const layout = layoutRiser(doc, { apart: false, mark: (id) => ({ text: find(doc, 'run', id)!.label, severity: null }) })
    const bay = layout.bays.find((each) => each.roomId === 'room-KIT')!
    expect(placeOf(layout, { kind: 'plate', id: 'plate-KIT3' })!.x).toBeGreaterThan(bay.x)
    expect(placeOf(layout, { kind: 'run', id: 'run-KIT3-1' })).not.toBeNull()
    expect(placeOf(layout, { kind: 'device', id: 'device-SP1' })!.x).toBeGreaterThan(layout.racks[0]!.x)
    expect(placeOf(layout, { kind: 'run', id: 'gone' })).toBeNull()
  })

  it('says a run in one breath', async () => {
    const { job } = await atTheRiser()
    expect(runWords(job.doc, job.derived!, 'r1')).toMatch(/^PAT1-S1, 16\/2 white, \d+ ft, planned/)
  })
})

describe('an empty riser', () => {
  const next = (...records: Parameters<typeof buildDoc>) => startSteps(buildDoc(...records)).find((step) => !step.done)?.key
  it('leads from level to room to rack to panel to the first run', () => {
    expect(next()).toBe('level')
    expect(next(buildLevel())).toBe('room')
    expect(next(buildLevel(), buildRoom())).toBe('rack')
    const house = smallHouse()
    expect(next(...house.filter((record) => record.kind !== 'device' && record.kind !== 'run'))).toBe('panel')
    expect(next(...house.filter((record) => record.kind !== 'run'))).toBe('run')
    expect(next(...house)).toBeUndefined()
  })
})
