import type { CableDescription, CableFamily } from '../../../../shared/model/cableType.ts'
import type { Connector } from '../../../../shared/model/place.ts'

const byFamily: Record<CableFamily, Connector> = {
  speaker: 'speaker-pair', 'twisted-pair': 'modular', coax: 'coax', line: 'line', control: 'control', fibre: 'fibre', video: 'hdmi', usb: 'usb',
}

/** The jack that a cable of this kind comes out of. A control cable labelled P carries power, for shades. */
export const connectorOf = (type: Pick<CableDescription, 'family' | 'labelKind'>): Connector =>
  type.family === 'control' && type.labelKind === 'P' ? 'power' : byFamily[type.family]

/** Jacks on which a cable for another may be landed: a keypad takes a control cable. */
const alike: Partial<Record<Connector, Connector>> = { keypad: 'control', bare: 'control' }
const plain = (connector: Connector): Connector => alike[connector] ?? connector

/** Whether a cable for one jack can be landed on another. */
export const fits = (a: Connector, b: Connector): boolean => a === b || plain(a) === plain(b)

/** A jack as a person calls it. */
export const connectorWord: Record<Connector, string> = {
  modular: 'data', coax: 'coax', 'speaker-pair': 'speaker', fibre: 'fiber', control: 'control', power: 'power', keypad: 'keypad', line: 'line level', hdmi: 'HDMI', usb: 'USB', bare: 'bare end',
}
