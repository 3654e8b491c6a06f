import fc, { type Arbitrary } from 'fast-check'
import type { JobRecord, Kind, RecordOf } from '../../shared/model/record.ts'
import { kinds, recordSchemas } from '../../shared/model/record.ts'
import { arbitraryOf } from './zodArbitrary.ts'

/** Records of one kind, each with values of its schema; what they point at is nowhere. */
export const arbitraryRecord = <K extends Kind>(kind: K): Arbitrary<RecordOf<K>> => arbitraryOf(recordSchemas[kind]) as Arbitrary<RecordOf<K>>

type Pool = { [K in Kind]?: readonly RecordOf<K>[] }

/**
 * A few records of every kind, which point at each other as the model allows, with keys that differ. The values of all
 * other fields are anything their schemas take.
 */
export function arbitraryRecords(memberIds: readonly string[]): Arbitrary<JobRecord[]> {
  const wild = fc.tuple(...kinds.map((kind) => fc.array(arbitraryRecord(kind) as Arbitrary<JobRecord>, { minLength: 1, maxLength: kind === 'job' ? 1 : 4 })))
  return fc.tuple(wild, fc.array(fc.nat(), { minLength: 400, maxLength: 400 })).map(([groups, numbers]) => {
    let next = 0
    const roll = () => numbers[next++ % numbers.length]!
    const pick = <T>(from: readonly T[]): T => from[roll() % from.length]!
    const pool: Pool = {}
    const all: JobRecord[] = []
    for (const group of groups) {
      const tied = group.map((record, index) => tie({ ...record, id: record.kind === 'job' ? 'job' : `${record.kind}-${index}` } as JobRecord, index, pool, pick, memberIds))
      Object.assign(pool, { [tied[0]!.kind]: tied })
      all.push(...tied)
    }
    return all
  })
}

function tie(record: JobRecord, index: number, pool: Pool, pick: <T>(from: readonly T[]) => T, memberIds: readonly string[]): JobRecord {
  const idOf = (kind: Kind) => pick(pool[kind] as readonly JobRecord[]).id
  const said = { byId: pick(memberIds) }
  const plate = pool.plate && pick(pool.plate)
  const jackId = plate?.jacks.length ? pick(plate.jacks).id : null
  const cordEnd = () => (jackId ? pick([{ plateId: plate!.id, jackId }, { deviceId: idOf('device'), terminal: 'p1' }]) : { deviceId: idOf('device'), terminal: 'p1' })
  switch (record.kind) {
    case 'job':
    case 'deviceModel':
      return record
    case 'level':
    case 'cableType':
      return { ...record, code: `K${index}` }
    case 'room':
      return { ...record, code: `K${index}`, levelId: idOf('level') }
    case 'plate':
      return { ...record, number: index + 1, roomId: idOf('room'), jacks: record.jacks.map((jack, position) => ({ ...jack, id: `j${position}` })) }
    case 'rack':
      return { ...record, code: `K${index}`, roomId: idOf('room') }
    case 'pathway':
      return { ...record, bottomLevelId: idOf('level'), topLevelId: idOf('level') }
    case 'device': {
      const place = pick([{ plateId: plate!.id }, { rackId: idOf('rack') }, { roomId: idOf('room') }])
      return { ...record, code: record.code && `K${index}`, modelId: idOf('deviceModel'), plateId: null, rackId: null, roomId: null, ...place }
    }
    case 'run': {
      const end = () => pick([null, { plateId: plate!.id, jackId }, { plateId: plate!.id, jackId: null }, { deviceId: idOf('device'), terminal: pick([null, 'p1']) }, { rackId: idOf('rack') }])
      return { ...record, serial: index + 1, label: `${record.label.slice(0, 20)}.${index}`, cableTypeId: idOf('cableType'), a: end(), b: end(), pathwayIds: record.pathwayIds.map(() => idOf('pathway')) }
    }
    case 'cord':
      return { ...record, a: cordEnd(), b: cordEnd() }
    case 'acceptance':
      return { ...record, ...said }
    case 'strike': {
      const targetKind = pick(['labelPrint', 'pull', 'termination', 'test', 'acceptance'] as const)
      return { ...record, ...said, targetKind, targetId: idOf(targetKind) }
    }
    default:
      return { ...record, ...said, runId: idOf('run') }
  }
}
