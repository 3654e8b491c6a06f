import { find, type JobDocument } from '../../../shared/model/jobDocument.ts'
import type { JobRecord } from '../../../shared/model/record.ts'
import type { Change } from '../../../shared/sync/change.ts'
import { same } from '../../../shared/sync/same.ts'
import type { Row, RowMapper } from '../../db/rows/rowMapper.ts'
import { recordBefore, type Parked } from './keysToPark.ts'

/** The columns of one row that get new values. */
export interface Edit {
  readonly id: string
  readonly columns: Row
}

/** What the updates of a change mean for the rows of one kind. A parked key is always written back. */
export function editsOf(mapper: RowMapper, after: JobDocument, change: Change, parked: Parked | undefined): Edit[] {
  return change.updated
    .filter((update) => update.kind === mapper.kind)
    .map((update) => {
      const record = find(after, mapper.kind, update.id)! as JobRecord
      const now = mapper.toRow(record as unknown as Row)
      const before = mapper.toRow(recordBefore(record, update) as unknown as Row)
      const back = parked?.ids.has(update.id) ? parked.columns : []
      return { id: update.id, columns: Object.fromEntries(Object.entries(now).filter(([name, value]) => back.includes(name) || !same(before[name], value))) }
    })
    .filter(({ columns }) => Object.keys(columns).length)
}
