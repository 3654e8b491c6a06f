import { mount, type VueWrapper } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { computed, defineComponent, h, ref, type Component } from 'vue'
import { createMemoryHistory, createRouter } from 'vue-router'
import type { Command } from '../../shared/commands/index.ts'
import type { JobDocument } from '../../shared/model/jobDocument.ts'
import { allRecords } from '../../shared/model/jobDocument.ts'
import { actionsOf, type Role } from '../../shared/policy.ts'
import { useJobStore } from '../../src/features/job/jobStore.ts'
import { useSelectionStore } from '../../src/features/job/selectionStore.ts'
import { useSessionStore } from '../../src/features/session/sessionStore.ts'
import { layoutRiser } from '../../src/features/riser/layout/layoutRiser.ts'
import { toSpots } from '../../src/features/riser/layout/toNodes.ts'
import { landedOf, litOf } from '../../src/features/riser/litOf.ts'
import { provideScene, type RiserScene } from '../../src/features/riser/riserScene.ts'
import { marksOf } from '../../src/features/riser/useRiserLayout.ts'

/** An open job that keeps every edit to itself: nothing is sent anywhere. */
export async function openJob(doc: JobDocument, role: Role = 'designer') {
  setActivePinia(createPinia())
  const session = useSessionStore()
  session.session = { member: { id: 'me', name: 'Mara', email: 'mara@example.test', role }, company: { id: 'co', name: 'Co', lengthUnit: 'ft', conductorUnit: 'awg' }, can: actionsOf(role) } as unknown as NonNullable<typeof session.session>
  const job = useJobStore()
  let n = 0
  const never = () => new Promise<never>(() => undefined)
  await job.open({ jobId: doc.id, actor: { id: 'me', role }, newId: () => `id-${++n}`, now: () => '2026-05-19T12:00:00.000Z', api: { open: () => Promise.resolve({ version: doc.version, records: [...allRecords(doc)], members: [{ id: 'me', name: 'Mara', role }] }), push: never, since: never } })
  return job
}

/** The last edit as it was sent, without what identifies it. */
export function lastEdit(job: { outbox: readonly Command[] }): { verb: string; args: unknown } | undefined {
  const command = job.outbox.at(-1)
  return command && { verb: command.verb, args: command.args }
}

/** Mounts a part of the riser over the open job. */
export function mountOnRiser(part: Component, props: Record<string, unknown>): VueWrapper {
  const job = useJobStore()
  const selection = useSelectionStore()
  const session = useSessionStore()
  const host = defineComponent({
    setup() {
      const doc = computed(() => job.doc)
      const derived = computed(() => job.derived!)
      const layout = computed(() => {
        const marks = marksOf(doc.value, derived.value, 'label')
        return layoutRiser(doc.value, { apart: false, mark: (id) => marks.get(id) })
      })
      const scene: RiserScene = {
        doc, derived, layout, spots: computed(() => toSpots(layout.value)), lit: computed(() => litOf(doc.value, selection.items)), canDesign: computed(() => session.can('job.design')),
        hovered: ref<string | null>(null), over: ref<string | null>(null), landed: computed(() => landedOf(doc.value)),
      }
      provideScene(scene)
      return () => h(part, props)
    },
  })
  const router = createRouter({ history: createMemoryHistory(), routes: [{ path: '/:rest(.*)*', component: { render: () => null } }] })
  return mount(host, { global: { plugins: [router] }, attachTo: document.body })
}
