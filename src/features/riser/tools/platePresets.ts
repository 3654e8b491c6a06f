import type { Connector, Mounting, PlateForm } from '../../../../shared/model/place.ts'

/** A plate as it is usually put in: its form, its jacks, and how high. */
export interface PlatePreset {
  readonly key: string
  readonly label: string
  readonly form: PlateForm
  readonly mounting: Mounting
  readonly jacks: readonly Connector[]
  /** Usual height of its centre over the floor, mm; null: on the ceiling or floor. */
  readonly heightMm: number | null
  readonly name: string
}

/**
 * Heights: outlet 305 mm and control 1219 mm as in shared/calc/length/mountingHeight.table.ts; the others are common
 * practice, no source.
 */
export const platePresets: readonly PlatePreset[] = [
  { key: 'data', label: 'Data', form: 'wall-box', mounting: 'wall', jacks: ['modular'], heightMm: 305, name: 'Data outlet' },
  { key: 'data2', label: 'Data, 2 jacks', form: 'wall-box', mounting: 'wall', jacks: ['modular', 'modular'], heightMm: 305, name: 'Desk outlet' },
  { key: 'tv', label: 'TV: 2 data, coax', form: 'wall-box', mounting: 'wall', jacks: ['modular', 'modular', 'coax'], heightMm: 1524, name: 'Display' },
  { key: 'speaker', label: 'Ceiling speaker', form: 'ceiling-opening', mounting: 'ceiling', jacks: ['speaker-pair'], heightMm: null, name: 'Ceiling speaker' },
  { key: 'wallSpeaker', label: 'In-wall speaker', form: 'wall-box', mounting: 'wall', jacks: ['speaker-pair'], heightMm: 1016, name: 'In-wall speaker' },
  { key: 'subwoofer', label: 'Subwoofer', form: 'wall-box', mounting: 'wall', jacks: ['line'], heightMm: 406, name: 'Subwoofer' },
  { key: 'keypad', label: 'Keypad', form: 'wall-box', mounting: 'wall', jacks: ['keypad'], heightMm: 1219, name: 'Keypad' },
  { key: 'touch', label: 'Touch panel', form: 'wall-box', mounting: 'wall', jacks: ['modular'], heightMm: 1372, name: 'Touch panel' },
  { key: 'accessPoint', label: 'Access point', form: 'ceiling-opening', mounting: 'ceiling', jacks: ['modular'], heightMm: null, name: 'Access point' },
  { key: 'camera', label: 'Camera', form: 'exterior-box', mounting: 'outside', jacks: ['modular'], heightMm: 2438, name: 'Camera' },
  { key: 'shade', label: 'Shade', form: 'wall-box', mounting: 'wall', jacks: ['power'], heightMm: 2235, name: 'Roller shade' },
  { key: 'contact', label: 'Contact', form: 'wall-box', mounting: 'wall', jacks: ['control'], heightMm: 2083, name: 'Contact' },
  { key: 'patioSpeaker', label: 'Outdoor speaker', form: 'exterior-box', mounting: 'outside', jacks: ['speaker-pair'], heightMm: 406, name: 'Outdoor speaker' },
  { key: 'stub', label: 'Stub, no jack', form: 'stub', mounting: 'wall', jacks: [], heightMm: 305, name: '' },
]

/** The plate that a single run of a cable is usually given where somebody only clicks. */
export function presetFor(connector: Connector, isHigh: boolean, isOutside: boolean): PlatePreset {
  const key = isOutside
    ? ({ 'speaker-pair': 'patioSpeaker', modular: 'camera' } as Partial<Record<Connector, string>>)[connector]
    : ({ 'speaker-pair': isHigh ? 'speaker' : 'wallSpeaker', modular: isHigh ? 'accessPoint' : 'data', power: 'shade', control: 'contact', keypad: 'keypad', line: 'subwoofer' } as Partial<Record<Connector, string>>)[connector]
  const preset = platePresets.find((each) => each.key === key)
  if (preset) return preset
  return isOutside
    ? { key: 'run', label: 'Run', form: 'exterior-box', mounting: 'outside', jacks: [connector], heightMm: 406, name: '' }
    : { key: 'run', label: 'Run', form: isHigh ? 'ceiling-opening' : 'wall-box', mounting: isHigh ? 'ceiling' : 'wall', jacks: [connector], heightMm: 305, name: '' }
}

/** Boxes side by side that a number of jacks needs: a single box holds two with room to bend the cable. */
export const gangsFor = (jacks: number): number => Math.min(6, Math.max(1, Math.ceil(jacks / 2)))
