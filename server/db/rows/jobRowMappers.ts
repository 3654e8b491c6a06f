import type { Kind } from '../../../shared/model/record.ts'
import { cableTypeRows, cordRows, deviceModelRows, deviceRows, runRows } from './cablingRows.ts'
import { levelRows, pathwayRows, plateRows, rackRows, roomRows } from './placeRows.ts'
import { acceptanceRows, labelPrintRows, pullRows, strikeRows, terminationRows, testRows } from './recordRows.ts'
import type { RowMapper } from './rowMapper.ts'

/** How each kind of record lies in its table; the job's own record is the `jobs` row itself. */
export const jobRowMappers: Readonly<Record<Exclude<Kind, 'job'>, RowMapper>> = {
  level: levelRows,
  room: roomRows,
  plate: plateRows,
  rack: rackRows,
  pathway: pathwayRows,
  cableType: cableTypeRows,
  deviceModel: deviceModelRows,
  device: deviceRows,
  run: runRows,
  cord: cordRows,
  labelPrint: labelPrintRows,
  pull: pullRows,
  termination: terminationRows,
  test: testRows,
  acceptance: acceptanceRows,
  strike: strikeRows,
}
