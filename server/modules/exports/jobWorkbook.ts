import type { Writable } from 'node:stream'
import ExcelJS from 'exceljs'
import type { Finding } from '../../../shared/checks/finding.ts'
import type { RunFacts } from '../../../shared/derive/facts.ts'
import { printCounts } from '../../../shared/labels/labelItems.ts'
import type { Pull } from '../../../shared/model/fieldRecord.ts'
import { jobOf, type JobDocument } from '../../../shared/model/jobDocument.ts'
import { endLabel } from '../../../shared/model/naming.ts'
import { mmPerFoot, mmPerMetre, type LengthUnit } from '../../../shared/units.ts'
import { cableTotals, type CableTotal } from '../../../shared/views/cableTotals.ts'
import { compareLabels, lastPulls, scheduleRows, type ScheduleRow } from '../../../shared/views/scheduleRows.ts'
import { writeSheet, type Column } from './sheet.ts'

export interface WorkbookSource {
  readonly doc: JobDocument
  readonly runs: ReadonlyMap<string, RunFacts>
  readonly findings: readonly Finding[]
  readonly day: string
}

/** A length as the screen shows it: whole feet, or metres with one decimal; a real number. */
const figure = (unit: LengthUnit) => (mm: number | null) => (mm === null ? null : unit === 'm' ? Math.round(mm / (mmPerMetre / 10)) / 10 : Math.round(mm / mmPerFoot))
const lengthFormat = (unit: LengthUnit) => (unit === 'm' ? '#,##0.0' : '#,##0')

/** Streams the whole job as a workbook of six sheets. Resolves when the last byte is handed to `out`. */
export async function writeJobWorkbook(out: Writable, { doc, runs, findings, day }: WorkbookSource): Promise<void> {
  const workbook = new ExcelJS.stream.xlsx.WorkbookWriter({ stream: out, useStyles: true, useSharedStrings: false })
  workbook.creator = 'Mudring'
  const job = jobOf(doc)
  const title = { job: job.name, day }
  const rows = scheduleRows(doc, runs)
  writeSheet(workbook, 'Schedule', title, scheduleColumns(job.lengthUnit), rows)
  writeSheet(workbook, 'By room', title, roomColumns(job.lengthUnit), byRoom(rows), { isGroup: (row) => 'runs' in row })
  writeSheet(workbook, 'Pull sheet', title, pullColumns(doc, job.lengthUnit), pullOrder(rows))
  writeSheet(workbook, 'Cable totals', title, totalColumns(job.lengthUnit), cableTotals(doc, runs), { landscape: false })
  writeSheet(workbook, 'Findings', title, findingColumns, findings)
  writeSheet(workbook, 'Labels', title, labelColumns, labelRows(doc, rows), { landscape: false })
  await workbook.commit()
}

function scheduleColumns(unit: LengthUnit): Column<ScheduleRow>[] {
  const length = figure(unit)
  const mm = (head: string, value: (row: ScheduleRow) => number | null): Column<ScheduleRow> => ({ head: `${head}, ${unit}`, width: 10, format: lengthFormat(unit), value: (row) => length(value(row)) })
  return [
    { head: 'Run', width: 16, value: (row) => row.label },
    { head: 'Stage', width: 12, value: (row) => (row.dropped === null ? row.stage : `not pulled: ${row.dropped}`) },
    { head: 'Cable', width: 11, value: (row) => row.cable },
    { head: 'Jacket', width: 9, value: (row) => row.jacket },
    { head: 'Level', width: 14, value: (row) => row.level },
    { head: 'Room', width: 20, value: (row) => row.room },
    { head: 'Plate', width: 10, value: (row) => row.plate },
    { head: 'For', width: 26, value: (row) => row.device },
    { head: 'Rack port', width: 16, value: (row) => row.rackPort },
    { head: 'Bundle', width: 8, value: (row) => row.bundle },
    { head: 'Spool', width: 9, value: (row) => row.spool },
    mm('Rise', (row) => row.riseMm),
    mm('Along', (row) => row.alongMm),
    mm('Drop', (row) => row.dropMm),
    mm('Slack', (row) => row.slackMm),
    mm('Length', (row) => row.lengthMm),
    { head: 'Length is', width: 9, value: (row) => row.basis },
    mm('Pulled', (row) => row.pulledMm),
    { head: 'Loss, dB', width: 9, format: '0.00', value: (row) => (row.lossDb === null ? null : Math.round(row.lossDb * 100) / 100) },
    { head: 'Finding', width: 9, value: (row) => row.severity },
  ]
}

interface RoomHead {
  readonly runs: number
  readonly room: string
  readonly level: string
  readonly lengthMm: number
}

function* byRoom(rows: readonly ScheduleRow[]): Generator<RoomHead | ScheduleRow> {
  const rooms = groupBy(rows, (row) => row.room)
  for (const [room, inRoom] of [...rooms].sort(([a], [b]) => a.localeCompare(b))) {
    yield { runs: inRoom.length, room, level: inRoom[0]?.level ?? '', lengthMm: inRoom.reduce((sum, row) => sum + (row.dropped === null ? (row.lengthMm ?? 0) : 0), 0) }
    yield* inRoom
  }
}

// Map.groupBy is not in Node 20.
function groupBy<T, K>(items: readonly T[], key: (item: T) => K): Map<K, T[]> {
  const groups = new Map<K, T[]>()
  for (const item of items) {
    const group = groups.get(key(item))
    if (group) group.push(item)
    else groups.set(key(item), [item])
  }
  return groups
}

function roomColumns(unit: LengthUnit): Column<RoomHead | ScheduleRow>[] {
  const length = figure(unit)
  const only = (value: (row: ScheduleRow) => string | number | null) => (row: RoomHead | ScheduleRow) => ('runs' in row ? null : value(row))
  return [
    { head: 'Room', width: 22, value: (row) => row.room },
    { head: 'Level', width: 14, value: (row) => row.level },
    { head: 'Runs', width: 7, value: (row) => ('runs' in row ? row.runs : null) },
    { head: 'Run', width: 16, value: only((row) => row.label) },
    { head: 'Cable', width: 11, value: only((row) => row.cable) },
    { head: 'Plate', width: 10, value: only((row) => row.plate) },
    { head: 'For', width: 26, value: only((row) => row.device) },
    { head: 'Rack port', width: 16, value: only((row) => row.rackPort) },
    { head: 'Stage', width: 12, value: only((row) => row.stage) },
    { head: `Length, ${unit}`, width: 10, format: lengthFormat(unit), value: (row) => length(row.lengthMm) },
  ]
}

/** Bundle by bundle, longest first, as a crew pulls; dropped runs are left out. */
const pullOrder = (rows: readonly ScheduleRow[]) =>
  rows.filter((row) => row.dropped === null).sort((a, b) => compareLabels(a.bundle || '~', b.bundle || '~') || (b.lengthMm ?? 0) - (a.lengthMm ?? 0) || compareLabels(a.label, b.label))

/** At most seven columns, and room to write the marks: what a crew carries. */
function pullColumns(doc: JobDocument, unit: LengthUnit): Column<ScheduleRow>[] {
  const length = figure(unit)
  const pulls = lastPulls(doc)
  return [
    { head: 'Run, both ends', width: 16, value: (row) => row.label },
    { head: 'Cable, jacket', width: 18, value: (row) => [row.cable, row.jacket].filter(Boolean).join(' ') },
    { head: 'Bundle', width: 8, value: (row) => row.bundle },
    { head: 'To', width: 30, value: (row) => [row.room, row.plate].join(', ') },
    { head: 'For', width: 26, value: (row) => row.device },
    { head: `Plan, ${unit}`, width: 9, format: lengthFormat(unit), value: (row) => length(row.lengthMm) },
    { head: 'Jacket marks: rack, plate', width: 24, value: (row) => marksOf(pulls.get(row.runId)) },
  ]
}

const marksOf = (pull: Pull | undefined) => (pull && pull.markA !== null && pull.markB !== null ? `${pull.markA} to ${pull.markB} ${pull.markUnit}` : '')

function totalColumns(unit: LengthUnit): Column<CableTotal>[] {
  const length = figure(unit)
  return [
    { head: 'Cable', width: 12, value: ({ type }) => type.code },
    { head: 'Name', width: 30, value: ({ type }) => type.name },
    { head: 'Jacket', width: 10, value: ({ type }) => type.jacketColour },
    { head: 'Runs', width: 8, format: '#,##0', value: ({ runs }) => runs },
    { head: `Length, ${unit}`, width: 12, format: lengthFormat(unit), value: ({ lengthMm }) => length(lengthMm) },
    { head: 'Runs pulled', width: 8, format: '#,##0', value: ({ pulledRuns }) => pulledRuns },
    { head: `Pulled, ${unit}`, width: 12, format: lengthFormat(unit), value: ({ pulledMm }) => length(pulledMm) },
    { head: 'Length not known', width: 10, format: '#,##0', value: ({ unknown }) => unknown },
  ]
}

const findingColumns: Column<Finding>[] = [
  { head: 'What', width: 16, value: ({ aboutName }) => aboutName },
  { head: 'Severity', width: 10, value: ({ severity }) => severity },
  { head: 'Check', width: 20, value: ({ title }) => title },
  { head: 'Finding', width: 70, value: ({ sentence }) => sentence },
  { head: 'What would help', width: 40, value: ({ advice }) => advice },
  { head: 'Figure', width: 12, value: ({ figure: each }) => each?.text ?? null },
  { head: 'Limit', width: 12, value: ({ limit }) => limit?.text ?? null },
  { head: 'Source', width: 40, value: ({ source }) => source },
  { head: 'Accepted because', width: 40, value: ({ accepted }) => accepted?.reason ?? null },
]

interface LabelRow {
  readonly label: string
  readonly end: string
  readonly at: string
  readonly printed: number
}

function* labelRows(doc: JobDocument, rows: readonly ScheduleRow[]): Generator<LabelRow> {
  const counts = printCounts(doc)
  for (const row of rows) {
    if (row.dropped !== null) continue
    const run = doc.records.run.get(row.runId)
    if (run) for (const end of ['a', 'b'] as const) yield { label: row.label, end, at: endLabel(doc, run[end]), printed: counts.get(`${row.runId}:${end}`) ?? 0 }
  }
}

const labelColumns: Column<LabelRow>[] = [
  { head: 'Label', width: 18, value: ({ label }) => label },
  { head: 'End', width: 6, value: ({ end }) => end },
  { head: 'At', width: 30, value: ({ at }) => at },
  { head: 'Printed, times', width: 10, format: '0', value: ({ printed }) => printed },
]
