import fc from 'fast-check'
import { describe, expect, expectTypeOf, it } from 'vitest'
import { jobRowMappers } from '../../../server/db/rows/jobRowMappers.ts'
import { jobRecordOf, jobRow } from '../../../server/db/rows/jobRows.ts'
import { runRows } from '../../../server/db/rows/cablingRows.ts'
import { defineRows, type ContentOf, type Row } from '../../../server/db/rows/rowMapper.ts'
import { levels } from '../../../server/db/tables/places.ts'
import { runs } from '../../../server/db/tables/cabling.ts'
import { kinds, type Kind } from '../../../shared/model/record.ts'
import type { Level } from '../../../shared/model/place.ts'
import { buildRun } from '../../support/build.ts'
import { arbitraryRecord } from '../../support/arbitraryDocument.ts'

const owned = kinds.filter((kind): kind is Exclude<Kind, 'job'> => kind !== 'job')

describe('rows', () => {
  it.each(owned)('carry a %s there and back unchanged', (kind) => {
    const mapper = jobRowMappers[kind]
    fc.assert(
      fc.property(arbitraryRecord(kind), (record) => {
        const parts = mapper.part?.toRows(record as unknown as Row) ?? []
        expect(mapper.fromRow(mapper.toRow(record as unknown as Row), parts)).toEqual(record)
      }),
      { numRuns: 300 },
    )
  })
  it('carry the job’s own record there and back unchanged', () => {
    fc.assert(
      fc.property(arbitraryRecord('job'), (job) => {
        expect(jobRecordOf(jobRow(job))).toEqual(job)
      }),
    )
  })
  it('give a limit that is newer than the row its default', () => {
    const row = { ...jobRow({ ...fc.sample(arbitraryRecord('job'), 1)[0]! }), limits: {} as never }
    expect(jobRecordOf(row).limits.lineLoadShare).toBe(80)
  })
  it('name every column of their table and no other', () => {
    for (const kind of owned) {
      const [record] = fc.sample(arbitraryRecord(kind) as fc.Arbitrary<object>, 1)
      const columns = Object.keys(jobRowMappers[kind].table).filter((name) => !['companyId', 'jobId', 'seq', 'enableRLS', '_', '$inferSelect', '$inferInsert'].includes(name))
      expect(Object.keys(jobRowMappers[kind].toRow(record as Row)).sort(), kind).toEqual(columns.sort())
    }
  })
  it('put an end in its own columns only', () => {
    expect(runRows.toRow(buildRun({ a: { rackId: 'rk1' }, b: { plateId: 'pat1', jackId: null } }) as unknown as Row)).toMatchObject({ aRackId: 'rk1', aPlateId: null, aDeviceId: null, bPlateId: 'pat1', bJackId: null, bRackId: null })
  })
})

describe('types', () => {
  it('a mapper that forgets a column or a field does not compile', () => {
    expectTypeOf<ContentOf<typeof runs>>().toHaveProperty('loadJoin')
    expectTypeOf<ContentOf<typeof runs>>().not.toHaveProperty('companyId')
    expectTypeOf<Omit<Level, 'kind'>>().toEqualTypeOf<ContentOf<typeof levels>>()
    const forgets = () =>
      defineRows({
        kind: 'level',
        table: levels,
        // @ts-expect-error the column ceilingHeightMm is missing
        toRow: ({ id, name, code, use, elevationMm }) => ({ id, name, code, use, elevationMm }),
        fromRow: ({ id, name, code, use, elevationMm, ceilingHeightMm }) => ({ kind: 'level', id, name, code, use, elevationMm, ceilingHeightMm }),
      })
    expect(forgets).toBeTypeOf('function')
  })
})
