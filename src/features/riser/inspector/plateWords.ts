import type { Plate, PlateForm } from '../../../../shared/model/place.ts'

export const formWords: Record<PlateForm, string> = { 'wall-box': 'wall box', 'ceiling-opening': 'ceiling opening', 'floor-box': 'floor box', 'exterior-box': 'exterior box', stub: 'raw stub' }

/** A plate's form and height: "exterior box, 16 in up". */
export function plateWords(plate: Plate, length: (mm: number) => string): string {
  const form = formWords[plate.form]
  if (plate.mounting === 'ceiling') return plate.form === 'ceiling-opening' ? form : `${form} in the ceiling`
  if (plate.mounting === 'floor') return plate.form === 'floor-box' ? form : `${form} in the floor`
  return `${form}, ${length(plate.heightMm)} up`
}
