import type { DeviceModel } from '../../shared/model/device.ts'
import type { JobRecord } from '../../shared/model/record.ts'
import { buildCableType, buildCord, buildDevice, buildJob, buildLevel, buildModel, buildPathway, buildPlate, buildRack, buildRoom, buildRun, buildTerminal, rectangle } from './build.ts'

/** Device models that tests join: what each is made for is in its name. */
export const models = {
  speakerPanel: buildModel(),
  dataPanel: buildModel({ id: 'm-pp', name: 'Patch panel', terminals: Array.from({ length: 12 }, (_, i) => buildTerminal({ key: `p${i + 1}`, name: `Port ${i + 1}`, position: i + 1, signal: 'ethernet', connector: 'modular' })) }),
  switch: buildModel({ id: 'm-sw', name: 'Switch', category: 'switch', terminals: Array.from({ length: 8 }, (_, i) => buildTerminal({ key: `p${i + 1}`, name: `Port ${i + 1}`, position: i + 1, signal: 'ethernet', connector: 'modular' })) }),
  amplifier: amplifier('m-amp', 4),
  speaker: speaker('m-spk', 8),
  lineAmplifier: buildModel({
    id: 'm-amp70', name: '70 V amplifier', category: 'amplifier', sharedPowerW: 240,
    terminals: [1, 2].map((n) => buildTerminal({ key: `ch${n}`, name: `Channel ${n}`, position: n, signal: 'speaker-line', direction: 'out', ratings: { lineVoltageV: 70.7 } })),
  }),
  lineSpeaker: buildModel({
    id: 'm-spk70', name: '70 V speaker', category: 'speaker', passes: [{ from: 'in', to: 'thru' }],
    terminals: [
      buildTerminal({ key: 'in', name: 'Line in', direction: 'in', signal: 'speaker-line', ratings: { loadOhm: 8, lineVoltageV: 70.7, tapsW: [7.5, 15, 30] } }),
      buildTerminal({ key: 'thru', name: 'Line on', position: 2, direction: 'out', signal: 'speaker-line' }),
    ],
  }),
  volumeControl: buildModel({
    id: 'm-vol', name: 'Volume control', category: 'volume-control', passes: [{ from: 'in', to: 'left' }, { from: 'in', to: 'right' }],
    terminals: [
      buildTerminal({ key: 'in', name: 'From the amplifier', direction: 'in' }),
      buildTerminal({ key: 'left', name: 'Left', position: 2, direction: 'out' }),
      buildTerminal({ key: 'right', name: 'Right', position: 3, direction: 'out' }),
    ],
  }),
  computer: buildModel({ id: 'm-pc', name: 'Desk outlet', category: 'other', terminals: [buildTerminal({ key: 'net', name: 'Network', signal: 'ethernet', connector: 'modular' })] }),
} satisfies Record<string, DeviceModel>

export function amplifier(id: string, channels: number): DeviceModel {
  return buildModel({
    id, name: `Amplifier, ${channels} channels`, category: 'amplifier', rackUnits: 2,
    terminals: Array.from({ length: channels }, (_, i) => buildTerminal({ key: `ch${i + 1}`, name: `Channel ${i + 1}`, position: i + 1, direction: 'out', ratings: { minLoadOhm: 4, powerW: 60 } })),
  })
}

export function speaker(id: string, loadOhm: number): DeviceModel {
  return buildModel({
    id, name: `Speaker, ${loadOhm} ohm`, category: 'speaker', passes: [{ from: 'in', to: 'thru' }],
    terminals: [buildTerminal({ key: 'in', name: 'Terminals', direction: 'in', ratings: { loadOhm } }), buildTerminal({ key: 'thru', name: 'On to the next', position: 2, direction: 'out' })],
  })
}

/** Cable types that tests lay. Speaker cable has the resistance of its solid gauge at 20 °C, ohm/km. */
export const cables = {
  sixteen: buildCableType({ resistanceOhmPerKm: 13.17 }),
  fourteen: buildCableType({ id: 'c-14-2', code: '14/2', name: '14/2 speaker', awg: 14, resistanceOhmPerKm: 8.285 }),
  twelve: buildCableType({ id: 'c-12-2', code: '12/2', name: '12/2 speaker', awg: 12, resistanceOhmPerKm: 5.211 }),
  quad: buildCableType({ id: 'c-16-4', code: '16/4', name: '16/4 speaker', conductors: 4, resistanceOhmPerKm: 13.17 }),
  cat6: buildCableType({ id: 'c-cat6', code: 'CAT6', name: 'CAT6', family: 'twisted-pair', labelKind: 'D', conductors: 8, awg: 23, stranding: 'solid', category: '6', jacketRating: 'CMR' }),
}

/** A device at a plate, known by its name only. */
export const atPlate = (id: string, modelId: string, plateId: string) => buildDevice({ id, modelId, plateId, rackId: null, unit: null, name: id, code: null })

/**
 * A wired house of two levels: a patio pair behind a volume control, a desk outlet upstairs through a chase, and a
 * 70 V line of two speakers with a hop. Everything is corded to its amplifier or switch.
 */
export const wiredHouse = (): JobRecord[] => [
  buildJob(), buildLevel(), buildLevel({ id: 'l2', name: 'Level 2', code: 'L2', elevationMm: 3048, ceilingHeightMm: 2438 }), buildPathway(),
  buildRoom(), buildRoom({ id: 'mch', name: 'Mechanical', code: 'MCH', outline: rectangle(10_000, 0, 3000, 3000) }),
  buildRoom({ id: 'stu', levelId: 'l2', name: 'Study', code: 'STU', outline: rectangle(0, 0, 4000, 4000) }), buildRoom({ id: 'bar', name: 'Bar', code: 'BAR', outline: rectangle(0, 5000, 6000, 4000) }),
  buildPlate({ jacks: [] }), buildPlate({ id: 'pat2', number: 2, alongMm: 2000, jacks: [] }), buildPlate({ id: 'pat3', number: 3, alongMm: 5000, jacks: [] }),
  buildPlate({ id: 'stu1', roomId: 'stu', wall: 2, alongMm: 1500, jacks: [{ id: 'sj1', position: 1, connector: 'modular' }, { id: 'sj2', position: 2, connector: 'modular' }] }),
  buildPlate({ id: 'bar1', roomId: 'bar', jacks: [] }), buildPlate({ id: 'bar2', roomId: 'bar', number: 2, alongMm: 4000, jacks: [] }),
  buildRack(), ...Object.values(cables), ...Object.values(models),
  buildDevice(), buildDevice({ id: 'pp1', modelId: 'm-pp', unit: 28, name: 'Patch panel 1', code: 'PP1' }), buildDevice({ id: 'sw1', modelId: 'm-sw', unit: 26, name: 'Switch', code: 'SW1' }),
  buildDevice({ id: 'amp', modelId: 'm-amp', unit: 10, name: 'Amp A', code: 'AMPA', zones: { ch1: 'Patio', ch2: 'Patio' } }), buildDevice({ id: 'amp70', modelId: 'm-amp70', unit: 6, name: '70 V amplifier', code: 'AMPL' }),
  atPlate('vol', 'm-vol', 'pat1'), atPlate('left', 'm-spk', 'pat2'), atPlate('right', 'm-spk', 'pat3'), atPlate('desk', 'm-pc', 'stu1'),
  { ...atPlate('bar-a', 'm-spk70', 'bar1'), tapW: 15 }, { ...atPlate('bar-b', 'm-spk70', 'bar2'), tapW: 15 },
  buildRun({ id: 'home', serial: 1, label: 'PAT1-S1', cableTypeId: 'c-16-4', b: { deviceId: 'vol', terminal: 'in' } }),
  buildRun({ id: 'to-left', serial: 2, label: 'PAT2-S1', a: { deviceId: 'vol', terminal: 'left' }, b: { deviceId: 'left', terminal: 'in' } }),
  buildRun({ id: 'to-right', serial: 3, label: 'PAT3-S1', a: { deviceId: 'vol', terminal: 'right' }, b: { deviceId: 'right', terminal: 'in' } }),
  buildRun({ id: 'data', serial: 4, label: 'STU1-D1', cableTypeId: 'c-cat6', a: { deviceId: 'pp1', terminal: 'p1' }, b: { plateId: 'stu1', jackId: 'sj1' } }),
  buildRun({ id: 'line', serial: 5, label: 'BAR1-S1', a: { deviceId: 'amp70', terminal: 'ch1' }, b: { deviceId: 'bar-a', terminal: 'in' } }),
  buildRun({ id: 'hop', serial: 6, label: 'BAR2-S1', a: { deviceId: 'bar-a', terminal: 'thru' }, b: { deviceId: 'bar-b', terminal: 'in' } }),
  buildCord({ id: 'k-amp', a: { deviceId: 'sp1', terminal: 'p1' }, b: { deviceId: 'amp', terminal: 'ch1' } }),
  buildCord({ id: 'k-sw', a: { deviceId: 'pp1', terminal: 'p1' }, b: { deviceId: 'sw1', terminal: 'p1' } }),
  buildCord({ id: 'k-desk', a: { plateId: 'stu1', jackId: 'sj1' }, b: { deviceId: 'desk', terminal: 'net' } }),
]
