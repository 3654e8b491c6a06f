import { AppError } from '../errors.ts'
import { kindWord } from '../model/jobDocument.ts'
import type { JobRecord, Kind } from '../model/record.ts'
import { can, type Action, type Role } from '../policy.ts'
import type { Change } from './change.ts'

/** What it takes to touch a kind. Judged on the change, so undo, bulk edits and every future verb pass the same gate. */
const actionOf: Record<Kind, Action> = {
  job: 'job.settings',
  level: 'job.design',
  room: 'job.design',
  plate: 'job.design',
  rack: 'job.design',
  pathway: 'job.design',
  cableType: 'job.design',
  deviceModel: 'job.design',
  device: 'job.design',
  run: 'job.design',
  cord: 'job.design',
  labelPrint: 'label.print',
  pull: 'job.record',
  termination: 'job.record',
  test: 'job.record',
  acceptance: 'finding.accept',
  strike: 'job.record',
}

const actionFor = (record: JobRecord): Action =>
  record.kind === 'strike' && record.targetKind !== 'strike' ? actionOf[record.targetKind] : actionOf[record.kind]

/** Refuses a change that touches what the role may not. Throws AppError forbidden. */
export function authorize(role: Role, change: Change): void {
  for (const record of [...change.added, ...change.removed]) demand(role, actionFor(record), record.kind)
  for (const { kind } of change.updated) demand(role, actionOf[kind], kind)
}

function demand(role: Role, action: Action, kind: Kind) {
  if (!can(role, action)) throw new AppError('forbidden', `A ${role} may not change a ${kindWord(kind)}. Ask a designer or the owner`, { action, kind })
}
