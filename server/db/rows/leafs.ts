import type { Point } from '../../../shared/model/fields.ts'
import type { CordEnd, RunEnd } from '../../../shared/model/run.ts'

/** A point in two columns. */
export const pointColumns = (at: Point) => ({ atXMm: at.xMm, atYMm: at.yMm })
export const maybePointColumns = (at: Point | null) => (at ? pointColumns(at) : { atXMm: null, atYMm: null })
export const pointOf = ({ atXMm, atYMm }: { atXMm: number; atYMm: number }): Point => ({ xMm: atXMm, yMm: atYMm })
export const maybePointOf = ({ atXMm, atYMm }: { atXMm: number | null; atYMm: number | null }): Point | null =>
  atXMm === null || atYMm === null ? null : { xMm: atXMm, yMm: atYMm }

/** One end of a run or a cord in columns of its own. */
export interface EndColumns {
  readonly plateId: string | null
  readonly jackId: string | null
  readonly deviceId: string | null
  readonly terminal: string | null
  readonly rackId: string | null
}
const nowhere: EndColumns = { plateId: null, jackId: null, deviceId: null, terminal: null, rackId: null }

export const endColumns = (end: RunEnd | CordEnd | null): EndColumns => ({ ...nowhere, ...end })

export function runEndOf({ plateId, jackId, deviceId, terminal, rackId }: EndColumns): RunEnd | null {
  if (plateId !== null) return { plateId, jackId }
  if (deviceId !== null) return { deviceId, terminal }
  return rackId === null ? null : { rackId }
}

/** The end of a cord, which always has one. */
export function cordEndOf({ plateId, jackId, deviceId, terminal }: Omit<EndColumns, 'rackId'>): CordEnd {
  if (plateId !== null && jackId !== null) return { plateId, jackId }
  if (deviceId !== null && terminal !== null) return { deviceId, terminal }
  throw new Error('A cord in the database has an end that is nowhere')
}

/** A moment as MariaDB writes it, in UTC: 2026-12-01 10:00:00.000. */
export const momentColumn = (moment: string): string => moment.replace('T', ' ').replace('Z', '')
export const momentOf = (stored: string): string => `${stored.replace(' ', 'T')}Z`
