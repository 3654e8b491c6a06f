import type { JobDocument } from '../../../shared/model/jobDocument.ts'
import type { DialogKind } from './riserStore.ts'

export interface StartStep {
  readonly key: 'level' | 'room' | 'rack' | 'panel' | 'run'
  readonly title: string
  readonly why: string
  /** What the button says. */
  readonly act: string
  readonly done: boolean
}

/** The way from an empty job to its first run, one step after the other. */
export function startSteps(doc: JobDocument): StartStep[] {
  const { level, room, rack, device, deviceModel, run } = doc.records
  const hasPanel = [...device.values()].some((each) => each.rackId !== null && deviceModel.get(each.modelId)?.category === 'panel')
  return [
    { key: 'level', title: 'A level', why: 'The section is drawn level by level', act: 'Add a level', done: level.size > 0 },
    { key: 'room', title: 'Rooms', why: 'Labels are made of their codes', act: 'Add rooms', done: room.size > 0 },
    { key: 'rack', title: 'A rack', why: 'Where the runs come from', act: 'Add a rack', done: rack.size > 0 },
    { key: 'panel', title: 'Panels in it', why: 'Each run lands on a port', act: 'Fill the rack', done: hasPanel },
    { key: 'run', title: 'The first run', why: 'Take a cable, then click in a room: plate, run and label in one go', act: 'Take a cable', done: run.size > 0 },
  ]
}

/** The form that a step opens; the last one is a tool, not a form. */
export const dialogOf = (step: StartStep): DialogKind | null => (step.key === 'run' ? null : step.key)
