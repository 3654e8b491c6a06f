import type { CableType } from '../../shared/model/cableType.ts'
import type { Device, DeviceModel, Terminal } from '../../shared/model/device.ts'
import type { Job } from '../../shared/model/job.ts'
import { buildDocument, type JobDocument } from '../../shared/model/jobDocument.ts'
import { defaultLimits } from '../../shared/model/limits.ts'
import type { Level, Pathway, Plate, Rack, Room } from '../../shared/model/place.ts'
import type { JobRecord } from '../../shared/model/record.ts'
import type { Cord, Run } from '../../shared/model/run.ts'
import { defaultLabelPattern } from '../../shared/labels/pattern.ts'

/** Records with sensible values, so that a test names only what it is about. */
export const buildJob = (over: Partial<Job> = {}): Job => ({
  kind: 'job', id: 'job', name: 'Heron Point, lot 14', client: '', address: '', lengthUnit: 'ft', conductorUnit: 'awg',
  labelPattern: defaultLabelPattern, slackRackMm: 2134, slackPlateMm: 914, limits: defaultLimits, ...over,
})
export const buildLevel = (over: Partial<Level> = {}): Level => ({ kind: 'level', id: 'l1', name: 'Level 1', code: 'L1', use: 'living', elevationMm: 0, ceilingHeightMm: 2743, ...over })
export const rectangle = (xMm: number, yMm: number, widthMm: number, depthMm: number) => [
  { xMm, yMm }, { xMm: xMm + widthMm, yMm }, { xMm: xMm + widthMm, yMm: yMm + depthMm }, { xMm, yMm: yMm + depthMm },
]
export const buildRoom = (over: Partial<Room> = {}): Room => ({
  kind: 'room', id: 'pat', levelId: 'l1', name: 'Patio', code: 'PAT', aliases: [], outline: rectangle(0, 0, 6000, 4000), ceilingHeightMm: null, spaceClass: 'general', ...over,
})
export const buildPlate = (over: Partial<Plate> = {}): Plate => ({
  kind: 'plate', id: 'pat1', roomId: 'pat', number: 1, name: '', form: 'wall-box', mounting: 'wall', wall: 0, alongMm: 1000, at: null, heightMm: 400, heightTo: 'centre', gangs: 1,
  jacks: [{ id: 'j1', position: 1, connector: 'speaker-pair' }], ...over,
})
export const buildRack = (over: Partial<Rack> = {}): Rack => ({ kind: 'rack', id: 'rk1', roomId: 'mch', name: 'Rack 1', code: 'RK1', units: 42, at: { xMm: 12_000, yMm: 2000 }, ...over })
export const buildTerminal = (over: Partial<Terminal> = {}): Terminal => ({ key: 'p1', name: 'Port 1', position: 1, signal: 'speaker', direction: 'both', connector: 'speaker-pair', ratings: {}, ...over })
export const buildModel = (over: Partial<DeviceModel> = {}): DeviceModel => ({
  kind: 'deviceModel', id: 'm-sp', catalogId: null, catalogVersion: null, name: 'Speaker panel, 12', category: 'panel', rackUnits: 1,
  terminals: Array.from({ length: 12 }, (_, i) => buildTerminal({ key: `p${i + 1}`, name: `Port ${i + 1}`, position: i + 1 })), passes: [], sharedPowerW: null, ...over,
})
export const buildDevice = (over: Partial<Device> = {}): Device => ({
  kind: 'device', id: 'sp1', modelId: 'm-sp', plateId: null, rackId: 'rk1', unit: 30, roomId: null, at: null, heightMm: null, name: 'Speaker panel 1', code: 'SP1', suppliedBy: 'us',
  loadOhm: null, tapW: null, videoFormat: null, zones: {}, ...over,
})
export const buildCableType = (over: Partial<CableType> = {}): CableType => ({
  kind: 'cableType', id: 'c-16-2', catalogId: null, catalogVersion: null, code: '16/2', name: '16/2 speaker', family: 'speaker', labelKind: 'S', conductors: 2, awg: 16, areaMm2: null, stranding: 'stranded',
  material: 'copper', resistanceOhmPerKm: null, category: null, jacketRating: 'CL3R', wet: false, outdoor: false, buried: false, outerDiameterUm: 6900, jacketColour: 'white', putUps: [{ form: 'spool', lengthMm: 152_400 }], ...over,
})
export const buildRun = (over: Partial<Run> = {}): Run => ({
  kind: 'run', id: 'r1', serial: 1, cableTypeId: 'c-16-2', a: { deviceId: 'sp1', terminal: 'p1' }, b: { plateId: 'pat1', jackId: 'j1' }, label: 'PAT1-S1', purpose: '', bundle: null, pathwayIds: [], route: null,
  slackAMm: null, slackBMm: null, statedLengthMm: null, loadJoin: 'parallel', dropped: null, ...over,
})
export const buildCord = (over: Partial<Cord> = {}): Cord => ({ kind: 'cord', id: 'k1', a: { deviceId: 'sp1', terminal: 'p1' }, b: { plateId: 'pat1', jackId: 'j1' }, form: 'patch cord', lengthMm: 1000, ...over })
export const buildPathway = (over: Partial<Pathway> = {}): Pathway => ({ kind: 'pathway', id: 'w1', name: 'Chase A', form: 'chase', at: { xMm: 9000, yMm: 2000 }, bottomLevelId: 'l1', topLevelId: 'l2', ...over })

/** A job with these records, and the job's own record unless one is given. */
export const buildDoc = (...records: JobRecord[]): JobDocument =>
  buildDocument('job', 0, records.some((record) => record.kind === 'job') ? records : [buildJob(), ...records])

/** A small sound house: one level, a patio with a speaker plate, a rack with a panel, and a 16/2 run between them. */
export const smallHouse = (): JobRecord[] => [
  buildJob(), buildLevel(), buildRoom(), buildRoom({ id: 'mch', name: 'Mechanical', code: 'MCH', outline: rectangle(10_000, 0, 3000, 3000) }), buildPlate(), buildRack(), buildCableType(),
  buildCableType({ id: 'c-14-2', code: '14/2', name: '14/2 speaker', awg: 14, jacketColour: 'slate', outerDiameterUm: 7900 }), buildModel(), buildDevice(), buildRun(),
]

/** Freezes a value and all it holds, so that a test fails when something is changed in place. */
export function deepFreeze<T>(value: T): T {
  if (value && typeof value === 'object' && !Object.isFrozen(value)) {
    Object.freeze(value)
    for (const each of value instanceof Map ? value.values() : Object.values(value)) deepFreeze(each)
  }
  return value
}
