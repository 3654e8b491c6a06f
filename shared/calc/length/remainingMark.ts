import type { MarkUnit } from './jacketMarks.ts'

export interface ReadMark {
  value: number
  unit: MarkUnit
}

const units: Record<string, MarkUnit> = {
  FT: 'ft',
  FEET: 'ft',
  F: 'ft',
  M: 'm',
  MTR: 'm',
  METER: 'm',
  METERS: 'm',
  METRE: 'm',
  METRES: 'm',
}

/**
 * Reads a printed length mark such as "000750 FT" or "0212M". On a box that counts down to zero this is what is left
 * in it. Null: no digits, or a unit that is not feet or metres. A serial number is not always a length mark: the
 * reader must know. Source: example legend 000750 FT, cablingfiberoptic.blogspot.com 2011/03.
 */
export function readMark(legend: string, unitWhenNone: MarkUnit): ReadMark | null {
  const read = /^\s*(\d{1,6})\s*([A-Z]*)\.?\s*$/.exec(legend.toUpperCase())
  if (read === null) return null
  const [, digits = '', word = ''] = read
  const unit = word === '' ? unitWhenNone : units[word]
  return unit === undefined ? null : { value: Number(digits), unit }
}
