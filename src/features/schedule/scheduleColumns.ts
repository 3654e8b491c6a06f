import { formatLengthFigure, formatNumber, type LengthUnit } from '../../../shared/units.ts'
import type { ScheduleRow } from '../../../shared/views/scheduleRows.ts'

export interface ScheduleColumn {
  readonly id: string
  readonly head: string
  readonly width: string
  readonly isNumber?: true
  readonly text: (row: ScheduleRow) => string
  readonly sort: (row: ScheduleRow) => string | number
  /** The field of a run that is edited in place here. */
  readonly edits?: 'purpose' | 'bundle' | 'statedLengthMm'
}

/** The columns of the schedule, in order; lengths in the job's unit with the unit in the head. */
export function scheduleColumns(unit: LengthUnit): ScheduleColumn[] {
  const mm = (id: string, head: string, value: (row: ScheduleRow) => number | null, more: Partial<ScheduleColumn> = {}): ScheduleColumn => ({
    id, head, width: '78px', isNumber: true, text: (row) => (value(row) === null ? '' : formatLengthFigure(value(row)!, unit)), sort: (row) => value(row) ?? -1, ...more,
  })
  const word = (id: string, head: string, width: string, value: (row: ScheduleRow) => string, more: Partial<ScheduleColumn> = {}): ScheduleColumn => ({ id, head, width, text: value, sort: value, ...more })
  return [
    word('label', 'Run', '150px', (row) => row.label),
    word('stage', 'Stage', '122px', (row) => (row.dropped === null ? row.stage : 'not pulled')),
    word('cable', 'Cable', '112px', (row) => row.cable),
    word('plate', 'Plate', '84px', (row) => row.plate),
    word('device', 'For', 'minmax(140px, 1fr)', (row) => row.device, { edits: 'purpose' }),
    word('rackPort', 'Rack port', '132px', (row) => row.rackPort),
    word('bundle', 'Bundle', '72px', (row) => row.bundle, { edits: 'bundle' }),
    word('spool', 'Spool', '78px', (row) => row.spool),
    mm('rise', 'Rise', (row) => row.riseMm, { width: '58px' }),
    mm('along', 'Along', (row) => row.alongMm, { width: '62px' }),
    mm('drop', 'Drop', (row) => row.dropMm, { width: '58px' }),
    mm('slack', 'Slack', (row) => row.slackMm, { width: '58px' }),
    mm('length', `Length, ${unit}`, (row) => row.lengthMm, { width: '86px', edits: 'statedLengthMm' }),
    mm('pulled', `Pulled, ${unit}`, (row) => row.pulledMm, { width: '84px' }),
    { id: 'loss', head: 'Loss, dB', width: '80px', isNumber: true, text: (row) => (row.lossDb === null ? '' : formatNumber(row.lossDb, 2)), sort: (row) => row.lossDb ?? -1 },
  ]
}
