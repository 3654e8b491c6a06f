import type { CableDescription } from '../../../shared/model/cableType.ts'
import type { DeviceDescription, Terminal } from '../../../shared/model/device.ts'

/** What a form for a new cable type begins with. */
export const newCable = (): CableDescription => ({
  code: '', name: '', family: 'speaker', labelKind: 'S', conductors: 2, awg: 16, areaMm2: null, stranding: 'stranded', material: 'copper', resistanceOhmPerKm: null, category: null,
  jacketRating: 'CL3R', wet: false, outdoor: false, buried: false, outerDiameterUm: 6900, jacketColour: 'white', putUps: [{ form: 'spool', lengthMm: 152_400 }],
})

/** What a form for a new device model begins with: no terminal, because only its maker knows them. */
export const newDevice = (): DeviceDescription => ({ name: '', category: 'other', rackUnits: 0, terminals: [], passes: [], sharedPowerW: null })

export const newTerminal = (position: number): Terminal => ({ key: `t${position}`, name: `Terminal ${position}`, position, signal: 'ethernet', direction: 'both', connector: 'modular', ratings: {} })
