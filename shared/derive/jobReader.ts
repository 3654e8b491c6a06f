import type { Job } from '../model/job.ts'
import type { JobDocument } from '../model/jobDocument.ts'
import type { JobRecord, Kind, RecordOf } from '../model/record.ts'
import type { Cells, Source } from './cells.ts'
import type { JobIndex } from './jobIndex.ts'

/**
 * A job as the derivations read it: each thing they look at is noted, so that an edit can tell what it reached.
 * They must look at nothing else.
 */
export interface JobReader {
  /** The document itself; whoever reads it directly must note what was read. */
  readonly doc: JobDocument
  readonly job: () => Job
  readonly find: <K extends Kind>(kind: K, id: string | null | undefined) => RecordOf<K> | undefined
  /** Every record of a kind; noted as a whole. */
  readonly all: <K extends Kind>(kind: K) => readonly RecordOf<K>[]
  /** The records under a key of the index. */
  readonly under: <R extends JobRecord>(key: string) => readonly R[]
  /** A result remembered under a name: what it is, and of which record. */
  readonly remember: <T>(what: string, id: string, work: () => T) => T
}

export function readJob(doc: JobDocument, index: JobIndex, cells: Cells): JobReader {
  const find = <K extends Kind>(kind: K, id: string | null | undefined): RecordOf<K> | undefined => {
    if (!id) return undefined
    cells.note(index.place(kind, id))
    return (doc.records[kind] as ReadonlyMap<string, RecordOf<K>>).get(id)
  }
  const note = (source: Source) => cells.note(source)
  return {
    doc,
    find,
    job: () => {
      const job = find('job', doc.id)
      if (!job) throw new Error('A job without its own record')
      return job
    },
    all: (kind) => {
      cells.note(index.whole(kind))
      return [...doc.records[kind].values()] as RecordOf<typeof kind>[]
    },
    under: (key) => index.ask(key, note),
    remember: (what, id, work) => cells.get(what, id, work),
  }
}
