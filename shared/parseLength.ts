import type { LengthUnit } from './model/job.ts'

export type ParsedLength = { ok: true; mm: number } | { ok: false; message: string }
export interface ParseLengthOptions {
  /** Accept a minus sign, as for a position left of an origin. Lengths have none. */
  signed?: boolean
}

type NamedUnit = 'ft' | 'in' | 'm' | 'cm' | 'mm'
const mmPerUnit: Record<Exclude<NamedUnit, 'ft'>, number> = { in: 25.4, m: 1000, cm: 10, mm: 1 }

/** Feet go by way of inches, so that a half millimetre rounds one way whichever unit it was typed in. */
const mmOf = (value: number, unit: NamedUnit) => (unit === 'ft' ? 12 * value * mmPerUnit.in : value * mmPerUnit[unit])

const unitWords: readonly (readonly [NamedUnit, RegExp])[] = [
  ['ft', /^('|ft\.?|feet|foot)/],
  ['in', /^("|in\.?|inch(es)?)(?![a-z])/],
  ['mm', /^(mm|millimet(re|er)s?)(?![a-z])/],
  ['cm', /^(cm|centimet(re|er)s?)(?![a-z])/],
  ['m', /^(m|met(re|er)s?)(?![a-z])/],
]
const numberAtStart = /^(\d+ \d+\/\d+|\d+\/\d+|[\d.,]*\d[\d.,]*)/
const fractionSigns: Record<string, string> = {
  '½': '1/2', '¼': '1/4', '¾': '3/4', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8',
}
const examples: Record<LengthUnit, string> = {
  ft: 'Type feet and inches such as 88 ft, 9 ft 6 in or 10\'-2", or metres such as 27 m.',
  m: 'Type metres such as 26.8, or another unit such as 300 mm or 9 ft 6 in.',
}

class NotUnderstood extends Error {}
interface Part {
  value: number
  unit: NamedUnit | null
}

/**
 * Reads a length as people type it and gives whole millimetres: 88, 88 ft, 9 ft 6 in, 10'-2", 9' 6 1/2, 27 m, 26.8,
 * 300 mm, 26,8 m, 1,000 ft. A bare number is in `unit`. A comma with exactly three digits behind it groups thousands
 * in feet, inches and millimetres; in metres and centimetres it could be either and is refused.
 * What cannot be read comes back as a sentence that says what was not understood, with an example.
 */
export function parseLength(text: string, unit: LengthUnit, { signed = false }: ParseLengthOptions = {}): ParsedLength {
  const plain = normalise(text)
  if (plain === '') return refuse('Nothing was typed.', unit)
  const negative = plain.startsWith('-')
  if (negative && !signed) return refuse(`"${shown(text)}" is negative, and a length cannot be.`, unit)
  try {
    const size = toMm(readParts(negative ? plain.slice(1).trim() : plain, unit), unit)
    const mm = Math.round(size)
    if (!Number.isSafeInteger(mm)) throw new NotUnderstood(`"${shown(text)}" is too long to be a length.`)
    return { ok: true, mm: negative && mm !== 0 ? -mm : mm }
  } catch (error) {
    if (error instanceof NotUnderstood) return refuse(error.message || `"${shown(text)}" was not understood.`, unit)
    throw error
  }
}

const refuse = (what: string, unit: LengthUnit): ParsedLength => ({ ok: false, message: `${what} ${examples[unit]}` })
const shown = (text: string) => (text.trim().length > 24 ? `${text.trim().slice(0, 23)}…` : text.trim())

function normalise(text: string): string {
  return text
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => ` ${fractionSigns[sign] ?? ''}`)
    .replaceAll('\u2044', '/')
    .replace(/''|[\u2033\u201c\u201d\u02ba]/g, '"')
    .replace(/[\u2032\u2018\u2019\u02b9]/g, "'")
    .replace(/[\u2212\u2013]/g, '-')
    .toLowerCase()
    .replace(/\s+/g, ' ')
    .trim()
}

/** Splits into number-and-unit parts: one, or feet and then inches (a hyphen or space between). */
function readParts(text: string, unit: LengthUnit): Part[] {
  const parts: Part[] = []
  let rest = text
  while (rest !== '') {
    const digits = numberAtStart.exec(rest)?.[0]
    if (digits === undefined) throw new NotUnderstood(parts.length === 0 ? '' : `"${shown(rest)}" was not understood.`)
    rest = rest.slice(digits.length).trimStart()
    const named = unitWords
      .map(([name, words]) => [name, words.exec(rest)?.[0]] as const)
      .find(([, word]) => word !== undefined)
    if (named === undefined && rest !== '') throw new NotUnderstood(`"${shown(rest)}" is not a unit of length.`)
    rest = rest.slice(named?.[1]?.length ?? 0).replace(/^[ ,]*-?\s*/, '')
    const name = named?.[0] ?? null
    parts.push({ value: readNumber(digits, name ?? (parts.length > 0 ? 'in' : unit)), unit: name })
  }
  return parts
}

function readNumber(digits: string, unit: NamedUnit): number {
  const fraction = /^(?:(\d+) )?(\d+)\/(\d+)$/.exec(digits)
  if (fraction) {
    const [, whole = '0', top = '', bottom = ''] = fraction
    if (Number(bottom) === 0) throw new NotUnderstood(`"${digits}" divides by zero.`)
    return Number(whole) + Number(top) / Number(bottom)
  }
  return Number(withPoint(digits, unit))
}

/** A typed number with a decimal point and no grouping. */
function withPoint(digits: string, unit: NamedUnit): string {
  if (/^(\d+\.?\d*|\.\d+)$/.test(digits)) return digits
  if (/^\d{1,3}(,\d{3})+(\.\d+)?$/.test(digits)) {
    const certain = digits.includes('.') || digits.indexOf(',') !== digits.lastIndexOf(',')
    if (digits.startsWith('0')) {
      if (certain) throw new NotUnderstood(`"${digits}" is not a number.`)
      return digits.replace(',', '.')
    }
    if (certain || unit === 'ft' || unit === 'in' || unit === 'mm') return digits.replaceAll(',', '')
    throw new NotUnderstood(
      `"${digits}" can be read in two ways: write ${digits.replace(',', '')} or ${digits.replace(',', '.')}.`,
    )
  }
  if (/^\d*,\d+$|^\d+,$/.test(digits)) return digits.replace(',', '.')
  throw new NotUnderstood(`"${digits}" is not a number.`)
}

function toMm(parts: readonly Part[], unit: LengthUnit): number {
  const [first, second, third] = parts
  if (first === undefined || third !== undefined) throw new NotUnderstood('')
  if (second === undefined) return mmOf(first.value, first.unit ?? unit)
  if (first.unit !== 'ft' || (second.unit !== 'in' && second.unit !== null)) throw new NotUnderstood('')
  if (!Number.isInteger(first.value))
    throw new NotUnderstood('Feet with a fraction and inches as well cannot both be meant.')
  if (second.value >= 12) throw new NotUnderstood('There are 12 inches in a foot, so inches after feet stay under 12.')
  return mmOf(first.value * 12 + second.value, 'in')
}
