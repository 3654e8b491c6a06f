import type { Strike, StruckKind } from '../../../shared/model/fieldRecord.ts'
import { acceptances, labelPrints, pulls, strikes, terminations, tests } from '../tables/records.ts'
import { momentColumn, momentOf } from './leafs.ts'
import { defineRows, type ContentOf } from './rowMapper.ts'

export const labelPrintRows = defineRows({
  kind: 'labelPrint',
  table: labelPrints,
  toRow: ({ kind: _kind, at, ...print }) => ({ ...print, at: momentColumn(at) }),
  fromRow: ({ id, at, byId, runId, end, text, copies, stock }) => ({ kind: 'labelPrint', id, at: momentOf(at), byId, runId, end, text, copies, stock }),
})

export const pullRows = defineRows({
  kind: 'pull',
  table: pulls,
  toRow: ({ kind: _kind, at, ...pull }) => ({ ...pull, at: momentColumn(at) }),
  fromRow: ({ id, at, byId, runId, markA, markB, markUnit, spool }) => ({ kind: 'pull', id, at: momentOf(at), byId, runId, markA, markB, markUnit, spool }),
})

export const terminationRows = defineRows({
  kind: 'termination',
  table: terminations,
  toRow: ({ kind: _kind, at, ...termination }) => ({ ...termination, at: momentColumn(at) }),
  fromRow: ({ id, at, byId, runId, end, scheme }) => ({ kind: 'termination', id, at: momentOf(at), byId, runId, end, scheme }),
})

export const testRows = defineRows({
  kind: 'test',
  table: tests,
  toRow: ({ kind: _kind, at, ...test }) => ({ ...test, at: momentColumn(at) }),
  fromRow: ({ id, at, byId, runId, testKind, result, reading }) => ({ kind: 'test', id, at: momentOf(at), byId, runId, testKind, result, reading }),
})

export const acceptanceRows = defineRows({
  kind: 'acceptance',
  table: acceptances,
  toRow: ({ kind: _kind, at, ...acceptance }) => ({ ...acceptance, at: momentColumn(at) }),
  fromRow: ({ id, at, byId, check, aboutKind, aboutId, figures, reason }) => ({ kind: 'acceptance', id, at: momentOf(at), byId, check, aboutKind, aboutId, figures, reason }),
})

type StrikeRow = ContentOf<typeof strikes>
type TargetColumn = Exclude<keyof StrikeRow, 'id' | 'at' | 'byId' | 'reason'>
/** The column that names the target, by what kind of record the target is. */
const targetColumns: Record<StruckKind, TargetColumn> = {
  labelPrint: 'labelPrintId', pull: 'pullId', termination: 'terminationId', test: 'testId', acceptance: 'acceptanceId', strike: 'strikeId',
}
const noTarget: Pick<StrikeRow, TargetColumn> = { labelPrintId: null, pullId: null, terminationId: null, testId: null, acceptanceId: null, strikeId: null }

function targetOf(row: StrikeRow): Pick<Strike, 'targetKind' | 'targetId'> {
  for (const targetKind of Object.keys(targetColumns) as StruckKind[]) {
    const targetId = row[targetColumns[targetKind]]
    if (targetId !== null) return { targetKind, targetId }
  }
  throw new Error('A strike in the database strikes nothing')
}

export const strikeRows = defineRows({
  kind: 'strike',
  table: strikes,
  toRow: ({ id, at, byId, targetKind, targetId, reason }) => ({ ...noTarget, id, at: momentColumn(at), byId, reason, [targetColumns[targetKind]]: targetId }),
  fromRow: (row) => ({ kind: 'strike', id: row.id, at: momentOf(row.at), byId: row.byId, ...targetOf(row), reason: row.reason }),
})
