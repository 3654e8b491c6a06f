import type { CatalogCableType, CatalogDeviceModel } from '../../../../shared/api/catalog.ts'
import type { Step } from '../../../../shared/commands/index.ts'
import { recordsOf, type JobDocument } from '../../../../shared/model/jobDocument.ts'

/** The job's own copy of a catalogue entry: the one it has, or a new one with the step that takes it. */
export interface Copy {
  readonly id: string
  readonly steps: readonly Step[]
}

export function copyOfCable(doc: JobDocument, entry: CatalogCableType, newId: () => string): Copy {
  const own = recordsOf(doc, 'cableType').find((type) => type.catalogId === entry.id || type.code === entry.description.code)
  if (own) return { id: own.id, steps: [] }
  const id = newId()
  return { id, steps: [{ verb: 'cableType.add', args: { id, catalogId: entry.id, catalogVersion: entry.version, ...entry.description } }] }
}

export function copyOfModel(doc: JobDocument, entry: CatalogDeviceModel, newId: () => string): Copy {
  const own = recordsOf(doc, 'deviceModel').find((model) => model.catalogId === entry.id)
  if (own) return { id: own.id, steps: [] }
  const id = newId()
  return { id, steps: [{ verb: 'deviceModel.add', args: { id, catalogId: entry.id, catalogVersion: entry.version, ...entry.description } }] }
}
