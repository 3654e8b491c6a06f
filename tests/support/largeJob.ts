import type { JobDocument } from '../../shared/model/jobDocument.ts'
import type { Connector } from '../../shared/model/place.ts'
import type { JobRecord } from '../../shared/model/record.ts'
import type { RunEnd } from '../../shared/model/run.ts'
import {
  buildCableType, buildCord, buildDevice, buildDoc, buildJob, buildLevel, buildModel, buildPathway, buildPlate, buildRack, buildRoom, buildRun, buildTerminal, rectangle,
} from './build.ts'

const plates = 6
const ports = 48
const channels = 12
const at = '2026-12-01T10:00:00.000Z'

/** Every fourth run feeds a loudspeaker, the others carry data. */
const isSpeaker = (run: number) => run % 4 === 3

/**
 * A job of this many runs, the same in kind whatever its size: two levels, rooms of six plates, a head end for every
 * sixty runs with panels, amplifiers and cords; half of it is pulled and printed, a quarter has both ends on.
 */
export function buildLargeJob(runs: number): JobDocument {
  const records: JobRecord[] = [...rules()]
  for (let room = 0; room * plates < runs; room++) records.push(roomAt(room))
  for (let head = 0; head * 60 < runs; head++) records.push(...headEnd(head))
  for (let run = 0; run < runs; run++) records.push(...pointOf(run))
  for (let run = 0; run < runs; run += 2) records.push(...saidOf(run))
  return buildDoc(...records)
}

const rules = (): JobRecord[] => [
  buildJob(), buildLevel(), buildLevel({ id: 'l2', name: 'Level 2', code: 'L2', elevationMm: 3100 }), buildPathway({ at: { xMm: 0, yMm: 0 } }),
  buildCableType(), buildCableType({ id: 'c-14-2', code: '14/2', awg: 14 }),
  buildCableType({ id: 'c-cat6', code: 'CAT6', family: 'twisted-pair', labelKind: 'D', conductors: 8, awg: 23, stranding: 'solid', category: '6', jacketRating: 'CMR' }),
  panel('m-sp', 'speaker', 'speaker-pair'), panel('m-pp', 'ethernet', 'modular'),
  buildModel({ id: 'm-amp', category: 'amplifier', terminals: Array.from({ length: channels }, (_, i) => buildTerminal({ key: `ch${i + 1}`, position: i + 1, direction: 'out', ratings: { minLoadOhm: 4 } })) }),
  buildModel({ id: 'm-spk', category: 'speaker', terminals: [buildTerminal({ key: 'in', direction: 'in', ratings: { loadOhm: 8 } })] }),
]

const panel = (id: string, signal: 'speaker' | 'ethernet', connector: Connector) =>
  buildModel({ id, terminals: Array.from({ length: ports }, (_, i) => buildTerminal({ key: `p${i + 1}`, position: i + 1, signal, connector })) })

/** Ten rooms to a head end, so that a run is as long in a large job as in a small one. */
function roomAt(room: number): JobRecord {
  const near = room % 10
  return buildRoom({ id: `room${room}`, code: `R${room}`, name: `Room ${room}`, levelId: near < 5 ? 'l1' : 'l2', outline: rectangle((near % 5) * 4000, 0, 4000, 4000) })
}

function headEnd(head: number): JobRecord[] {
  const stand = (name: string, modelId: string, unit: number) => buildDevice({ id: `${name}${head}`, modelId, rackId: `rk${head}`, unit, name: `${name} ${head}`, code: `${name.toUpperCase()}${head}` })
  const amplifiers = [0, 1].map((each) => stand(`amp${each}x`, 'm-amp', 1 + 2 * each))
  return [buildRack({ id: `rk${head}`, roomId: `room${Math.floor((head * 60) / plates)}`, code: `RK${head}`, at: { xMm: 2000, yMm: 2000 } }), stand('sp', 'm-sp', 40), stand('pp', 'm-pp', 38), ...amplifiers]
}

function pointOf(run: number): JobRecord[] {
  const [head, port] = [Math.floor(run / 60), 1 + (run % 60)]
  const plate = `plate${run}`
  const speaker = isSpeaker(run)
  const nth = Math.ceil(port / 4)
  const source: RunEnd = speaker ? { deviceId: `sp${head}`, terminal: `p${nth}` } : { deviceId: `pp${head}`, terminal: `p${port - Math.floor(port / 4)}` }
  const made: JobRecord[] = [
    buildPlate({ id: plate, roomId: `room${Math.floor(run / plates)}`, number: 1 + (run % plates), wall: run % 4, alongMm: 300 + (run % 7) * 400, jacks: [{ id: `j${run}`, position: 1, connector: speaker ? 'speaker-pair' : 'modular' }] }),
    buildRun({ id: `r${run}`, serial: run + 1, label: `R${Math.floor(run / plates)}-${run}`, cableTypeId: speaker ? 'c-16-2' : 'c-cat6', a: source, b: { plateId: plate, jackId: `j${run}` } }),
  ]
  if (speaker) {
    made.push(buildDevice({ id: `spk${run}`, modelId: 'm-spk', plateId: plate, rackId: null, unit: null, name: `Speaker ${run}`, code: null }))
    made.push(buildCord({ id: `k${run}`, a: { deviceId: `sp${head}`, terminal: `p${nth}` }, b: { deviceId: `amp${nth > channels ? 1 : 0}x${head}`, terminal: `ch${1 + ((nth - 1) % channels)}` } }))
  }
  return made
}

function saidOf(run: number): JobRecord[] {
  const said = { at, byId: 'lead', runId: `r${run}` }
  const ends = (['a', 'b'] as const).map((end): JobRecord => ({ kind: 'termination', id: `t${run}${end}`, ...said, end, scheme: 'T568B' }))
  return [
    { kind: 'labelPrint', id: `p${run}`, ...said, end: 'a', text: `R${Math.floor(run / plates)}-${run}`, copies: 2, stock: 'letter-30' },
    { kind: 'pull', id: `pull${run}`, ...said, markA: 1000 + run, markB: 1060 + run, markUnit: 'ft', spool: 'S-01' },
    ...(run % 4 === 0 ? ends : []),
  ]
}
