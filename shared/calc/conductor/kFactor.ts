import { finite, usable } from '../usable.ts'

/** Circular mils in a square millimetre: a circle of a thousandth of an inch is 0.0254 mm across. */
const mm2PerCmil = (Math.PI / 4) * 0.0254 ** 2

/**
 * A resistivity in ohm mm2/km as the K of American drop formulas, ohm circular mil per foot: 10.37 for copper at 20 °C,
 * about 12.9 at 75 °C. Null unless it is more than nothing.
 */
export const kFactorOhmCmilPerFt = (resistivityOhmMm2PerKm: number): number | null =>
  usable(resistivityOhmMm2PerKm) && resistivityOhmMm2PerKm > 0
    ? finite((resistivityOhmMm2PerKm * 0.0003048) / mm2PerCmil)
    : null

/** A resistivity in ohm mm2/km out of a K in ohm circular mil per foot. Null unless it is more than nothing. */
export const resistivityOfKFactor = (kOhmCmilPerFt: number): number | null =>
  usable(kOhmCmilPerFt) && kOhmCmilPerFt > 0 ? finite((kOhmCmilPerFt * mm2PerCmil) / 0.0003048) : null

/** An area in circular mils as mm2. Null unless it is more than nothing. */
export const mm2OfCmil = (areaCmil: number): number | null =>
  usable(areaCmil) && areaCmil > 0 ? finite(areaCmil * mm2PerCmil) : null
