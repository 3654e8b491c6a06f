import type { Device } from '../../../../shared/model/device.ts'
import { find, type JobDocument } from '../../../../shared/model/jobDocument.ts'
import type { Plate } from '../../../../shared/model/place.ts'
import type { Glyph } from './riserLayout.ts'

/** Where a device's picture goes, seen from its plate. */
export type GlyphPlace = 'below' | 'above' | 'beside' | 'on'

const sizes: Record<Glyph, readonly [w: number, h: number, place: GlyphPlace]> = {
  speaker: [13, 20, 'below'],
  box: [14, 17, 'below'],
  display: [46, 25, 'above'],
  subwoofer: [16, 17, 'above'],
  shade: [26, 20, 'below'],
  screen: [24, 15, 'below'],
  desk: [36, 4, 'above'],
  camera: [17, 9, 'beside'],
  contact: [12, 11, 'below'],
  service: [14, 10, 'below'],
  mast: [18, 32, 'above'],
  drop: [10, 15, 'beside'],
  keypad: [13, 17, 'below'],
  dome: [17, 17, 'below'],
}

/** Size of a device's picture and where it hangs. A display is as wide as the runs behind it. */
export function glyphSize(glyph: Glyph, runs = 2): readonly [w: number, h: number, place: GlyphPlace] {
  const size = sizes[glyph]
  if (glyph !== 'display') return size
  const w = Math.min(50, Math.max(34, runs * 17.5))
  return [w, w * 0.56, size[2]]
}

/**
 * The picture of a device, by what its model is and what its plate looks like; null where the plate's own face says it
 * already (a ceiling speaker, an access point, a keypad).
 */
export function glyphOf(doc: JobDocument, device: Device, plate: Plate | null): Glyph | null {
  const model = find(doc, 'deviceModel', device.modelId)
  const connector = model?.terminals[0]?.connector
  switch (model?.category) {
    case 'speaker':
      if (plate?.mounting === 'ceiling') return null
      return plate?.form === 'exterior-box' || plate?.form === 'stub' ? 'box' : plate ? 'speaker' : 'dome'
    case 'display':
      return 'display'
    case 'subwoofer':
      return 'subwoofer'
    case 'shade':
      return 'shade'
    case 'camera':
      return 'camera'
    case 'access-point':
      return plate?.mounting === 'ceiling' ? null : plate ? 'service' : 'dome'
    case 'keypad':
      if (plate?.jacks.some((jack) => jack.connector === 'keypad')) return null
      return connector === 'modular' ? 'screen' : 'keypad'
    case 'volume-control':
      return plate ? null : 'keypad'
    case 'sensor':
      return plate && plate.heightMm < 300 ? 'drop' : 'contact'
    case 'service':
      return connector === 'coax' && model.terminals.length === 1 ? 'mast' : 'service'
    case 'other':
      return connector === 'modular' ? 'desk' : 'service'
    default:
      return 'service'
  }
}
