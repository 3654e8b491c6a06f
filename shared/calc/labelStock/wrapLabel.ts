import { finite, usable } from '../usable.ts'

const isDiameter = (value: number) => usable(value) && value > 0

/** Way round a cable, mm: pi x diameter. Null: a value that is no number, or not above nothing. Geometry. */
export function circumferenceMm(diameterMm: number): number | null {
  return isDiameter(diameterMm) ? finite(Math.PI * diameterMm) : null
}

/** Overlap by which a clear tail covers the end of its print zone, mm: 2 to 3. Common practice, no source. */
export const usualOverlapMm = 3

/**
 * Least length of a self-laminating label, mm: print zone, once round the cable, and an overlap. Null: a value that is
 * no number, negative, or a cable of nothing. Geometry.
 */
export function wrapLeastLengthMm(diameterMm: number, printMm: number, overlapMm: number): number | null {
  if (!isDiameter(diameterMm) || !usable(printMm, overlapMm) || printMm < 0 || overlapMm < 0) return null
  return finite(printMm + Math.PI * diameterMm + overlapMm)
}

/**
 * Length of a wrap label by the rule of thumb, mm: 2.5 to 3 circumferences. Null as above. Common practice, no source.
 */
export function wrapUsualLengthMm(diameterMm: number): { fromMm: number; toMm: number } | null {
  const round = circumferenceMm(diameterMm)
  const toMm = round === null ? null : finite(3 * round)
  return round === null || toMm === null ? null : { fromMm: 2.5 * round, toMm }
}

/**
 * Thickest cable that a self-laminating label goes round once, mm: (length - print zone) / pi. Null: no tail is left,
 * or a value that is no number. Geometry; a 1-1/3 in label with 3/8 in of print serves to 7.7 mm.
 */
export function wrapLargestDiameterMm(lengthMm: number, printMm: number): number | null {
  if (!usable(lengthMm, printMm) || printMm < 0 || lengthMm <= printMm) return null
  return finite((lengthMm - printMm) / Math.PI)
}

/**
 * Print that can be read without turning the cable, mm: half the way round. Null as above. Common practice, no source.
 */
export function readablePrintMm(diameterMm: number): number | null {
  const round = circumferenceMm(diameterMm)
  return round === null ? null : round / 2
}
