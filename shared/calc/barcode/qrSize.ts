import { floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'
import { qrVersions } from './qrCapacity.ts'

export interface QrSide {
  modules: number
  /** With four light modules on each side. */
  withQuietZone: number
}

/**
 * Modules along one side: 4 x version + 17. Null: a version that is no whole number from 1 to 40. Source: ISO/IEC
 * 18004.
 */
export function qrSide(version: number): QrSide | null {
  if (!Number.isSafeInteger(version) || version < 1 || version > qrVersions) return null
  const modules = 4 * version + 17
  return { modules, withQuietZone: modules + 8 }
}

/** Side of a symbol with its quiet zone, mm. Null as above, or a module that is not above nothing. */
export function qrSideMm(version: number, moduleMm: number): number | null {
  const side = qrSide(version)
  return side === null || !usable(moduleMm) || moduleMm <= 0 ? null : finite(side.withQuietZone * moduleMm)
}

/**
 * Widest whole-dot module with which a symbol and its quiet zone fit a square, mm. Null: not one dot fits, or as
 * above.
 */
export function qrModuleFitMm(version: number, roomMm: number, dotsPerInch: number): number | null {
  const side = qrSide(version)
  if (side === null || !usable(roomMm, dotsPerInch) || roomMm <= 0 || dotsPerInch <= 0) return null
  const dotMm = 25.4 / dotsPerInch
  const dots = floorOf(roomMm / (side.withQuietZone * dotMm))
  return dots < 1 ? null : finite(dots * dotMm)
}
