import { inject, provide, type ComputedRef, type InjectionKey, type Ref } from 'vue'
import type { Derived } from '../../../shared/derive/deriveJob.ts'
import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import type { RiserLayout } from './layout/riserLayout.ts'
import type { RiserSpots } from './layout/toNodes.ts'

/** What lights up with the selection: runs, jacks of plates, terminals of devices, and all that is chosen itself. */
export interface Lit {
  readonly runs: ReadonlySet<string>
  readonly jacks: ReadonlyMap<string, ReadonlySet<string>>
  readonly terminals: ReadonlyMap<string, ReadonlySet<string>>
  readonly racks: ReadonlySet<string>
  readonly chosen: ReadonlySet<string>
}

/** What every part of the drawing looks at. */
export interface RiserScene {
  readonly doc: ComputedRef<JobDocument>
  readonly derived: ComputedRef<Derived>
  readonly layout: ComputedRef<RiserLayout>
  readonly spots: ComputedRef<RiserSpots>
  readonly lit: ComputedRef<Lit>
  readonly canDesign: ComputedRef<boolean>
  readonly hovered: Ref<string | null>
  /** From which plate or rack row a run can be dragged just now: whatever the pointer is over. */
  readonly over: Ref<string | null>
  /** Jacks and terminals that a run is on already. */
  readonly landed: ComputedRef<ReadonlySet<string>>
}

const key: InjectionKey<RiserScene> = Symbol('riser')
export const provideScene = (scene: RiserScene) => provide(key, scene)
export function useScene(): RiserScene {
  const scene = inject(key)
  if (!scene) throw new Error('This belongs on the riser')
  return scene
}
