import type { CableDescription } from '../../../shared/model/cableType.ts'
import type { DeviceDescription } from '../../../shared/model/device.ts'

/** A kind of cable from a row of the catalogue or of a job: the same columns in both. */
export const cableDescriptionOf = ({
  code, name, family, labelKind, conductors, awg, areaMm2, stranding, material, resistanceOhmPerKm, category, jacketRating, wet, outdoor, buried, outerDiameterUm, jacketColour, putUps,
}: CableDescription): CableDescription => ({
  code, name, family, labelKind, conductors, awg, areaMm2, stranding, material, resistanceOhmPerKm, category, jacketRating, wet, outdoor, buried, outerDiameterUm, jacketColour, putUps,
})

/** A kind of device, likewise. */
export const deviceDescriptionOf = ({ name, category, rackUnits, terminals, passes, sharedPowerW }: DeviceDescription): DeviceDescription => ({
  name, category, rackUnits, terminals, passes, sharedPowerW,
})
