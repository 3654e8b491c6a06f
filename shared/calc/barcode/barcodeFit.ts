import { floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'
import { code128Modules, quietModules, usualLeastModuleMm } from './code128Size.ts'

export interface BarcodeRoom {
  /** Data and switch characters, as `encodeCode128` counts them. */
  characters: number
  /** Room on the label along the code, mm. */
  roomMm: number
  dotsPerInch: number
  /** Narrowest module that is still printed, mm. */
  leastModuleMm?: number
}

export interface BarcodeFit {
  moduleMm: number
  dotsPerModule: number
  /** With both quiet zones. */
  widthMm: number
}

/**
 * The widest whole-dot module with which a symbol and its quiet zones fit a label: 0.254 mm is three dots at 300 dpi,
 * two at 203. Null: it does not fit with the narrowest module (shorten the text, or print a QR code), or a value that
 * is no number. Derived from ISO/IEC 15417.
 */
export function fitBarcode({
  characters,
  roomMm,
  dotsPerInch,
  leastModuleMm = usualLeastModuleMm,
}: BarcodeRoom): BarcodeFit | null {
  const modules = code128Modules(characters)
  if (modules === null || !usable(roomMm, dotsPerInch, leastModuleMm) || roomMm <= 0 || dotsPerInch <= 0) return null
  const all = modules + 2 * quietModules
  const dotMm = 25.4 / dotsPerInch
  const dotsPerModule = floorOf(roomMm / (all * dotMm))
  const moduleMm = finite(dotsPerModule * dotMm)
  if (dotsPerModule < 1 || moduleMm === null || moduleMm < leastModuleMm - 1e-9) return null
  return { moduleMm, dotsPerModule, widthMm: all * moduleMm }
}
