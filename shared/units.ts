import { awgAreaMm2, awgOfAreaMm2 } from './calc/conductor/awg.ts'
import type { ConductorUnit, LengthUnit } from './model/job.ts'

export type { ConductorUnit, LengthUnit }

/** Millimetres in an inch and a foot: exact by definition (international yard and pound agreement, 1959). */
export const mmPerInch = 25.4
export const mmPerFoot = 304.8
export const mmPerMetre = 1000
export const metresPerFoot = 0.3048

const sixteenthsPerInch = 16
const sixteenthsPerFoot = 12 * sixteenthsPerInch

/** Millimetres as feet, a real number; not rounded. */
export const mmToFeet = (mm: number) => mm / mmPerFoot
/** Millimetres as inches, a real number; not rounded. */
export const mmToInches = (mm: number) => mm / mmPerInch
/** Millimetres as metres, a real number; not rounded. */
export const mmToMetres = (mm: number) => mm / mmPerMetre
/** Feet as whole millimetres, the form in which lengths are stored. */
export const feetToMm = (feet: number) => Math.round(feet * 12 * mmPerInch)
/** Inches as whole millimetres. */
export const inchesToMm = (inches: number) => Math.round(inches * mmPerInch)
/** Metres as whole millimetres. */
export const metresToMm = (metres: number) => Math.round(metres * mmPerMetre)

export interface LengthFormat {
  /** whole: the nearest foot or metre, for lists. exact: feet, inches and sixteenths, or metres to the millimetre. */
  as: 'whole' | 'exact'
}

/**
 * A stored length as a person reads it: "88 ft", "9 ft 6 1/2 in", "27 m", "26.822 m".
 * Rounding carries, so that inches never read 12. A length that is no number reads "no length".
 * `parseLength` reads every text made here; in metres to the millimetre, in feet to the nearest sixteenth of an inch.
 */
export function formatLength(mm: number, unit: LengthUnit, { as }: LengthFormat): string {
  if (!Number.isFinite(mm)) return 'no length'
  const size = Math.abs(mm)
  const text = unit === 'm' ? metresText(size, as) : feetText(size, as)
  return mm < 0 && /[1-9]/.test(text) ? `-${text}` : text
}

function metresText(mm: number, as: LengthFormat['as']): string {
  if (as === 'whole') return `${Math.round(mm / mmPerMetre)} m`
  return `${Number((Math.round(mm) / mmPerMetre).toFixed(3))} m`
}

function feetText(mm: number, as: LengthFormat['as']): string {
  if (as === 'whole') return `${Math.round(mm / mmPerFoot)} ft`
  const total = Math.round((mm * sixteenthsPerInch) / mmPerInch)
  const feet = Math.floor(total / sixteenthsPerFoot)
  const inches = inchesText(total % sixteenthsPerFoot)
  if (inches === null) return `${feet} ft`
  return feet === 0 ? `${inches} in` : `${feet} ft ${inches} in`
}

/** Sixteenths under one foot as "6", "1/2" or "6 1/2"; null for none. */
function inchesText(sixteenths: number): string | null {
  const whole = Math.floor(sixteenths / sixteenthsPerInch)
  let top = sixteenths % sixteenthsPerInch
  let bottom = sixteenthsPerInch
  while (top > 0 && top % 2 === 0) {
    top /= 2
    bottom /= 2
  }
  const fraction = top === 0 ? '' : `${top}/${bottom}`
  const text = [whole === 0 ? '' : String(whole), fraction].filter(Boolean).join(' ')
  return text === '' ? null : text
}

/** A length without its unit, for a column whose head names it: whole feet, or metres with one decimal. */
export function formatLengthFigure(mm: number, unit: LengthUnit): string {
  return unit === 'm' ? formatNumber(mm / mmPerMetre, 1) : formatNumber(mm / mmPerFoot, 0)
}

const numberFormats = new Map<number, Intl.NumberFormat>()

/**
 * A number with thousands separators and a fixed count of decimals, 0 to 20: 1234.5 with 1 is "1,234.5".
 * Never "-0"; a value that is no number reads "not known".
 */
export function formatNumber(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return 'not known'
  const places = Number.isFinite(decimals) ? Math.min(20, Math.max(0, Math.trunc(decimals))) : 0
  let format = numberFormats.get(places)
  if (format === undefined) {
    format = new Intl.NumberFormat('en-US', {
      minimumFractionDigits: places,
      maximumFractionDigits: places,
      signDisplay: 'negative',
    })
    numberFormats.set(places, format)
  }
  return format.format(value)
}

export type ParsedInt = { ok: true; value: number } | { ok: false; message: string }

/**
 * A whole number of at least one, as typed: "12", " 12 ", "1,000". Anything else is refused with a sentence to show.
 */
export function parsePositiveInt(text: string, most: number = Number.MAX_SAFE_INTEGER): ParsedInt {
  const typed = text.trim()
  if (typed === '') return { ok: false, message: 'Type a whole number, such as 12.' }
  const plain = /^\d{1,3}(,\d{3})+$/.test(typed) ? typed.replaceAll(',', '') : typed
  if (!/^\+?\d+$/.test(plain)) {
    return { ok: false, message: `"${shorten(typed)}" is not a whole number. Type digits only, such as 12.` }
  }
  const value = Number(plain)
  if (value < 1) return { ok: false, message: 'The number must be 1 or more.' }
  if (value > most) return { ok: false, message: `The number can be at most ${formatNumber(most, 0)}.` }
  return { ok: true, value }
}

/** What someone typed, cut short so that a message stays one line. */
export const shorten = (text: string) => (text.length > 24 ? `${text.slice(0, 23)}…` : text)

export interface ConductorSize {
  /** American wire gauge; 0, -1, -2, -3 are 1/0 to 4/0. */
  awg: number | null
  areaMm2: number | null
}

/**
 * A conductor size by the job's setting: "16 AWG", "4/0 AWG", "1.5 mm²". A size known only in the other system is
 * converted by the definition of the gauge (ASTM B258) and, into gauges, marked "about", as there is no gauge for most
 * areas. Neither known, or out of range: "size not known".
 */
export function formatConductor({ awg, areaMm2 }: ConductorSize, unit: ConductorUnit): string {
  const area = areaMm2 !== null && Number.isFinite(areaMm2) && areaMm2 > 0 ? areaMm2 : null
  const areaOfGauge = awg === null ? null : awgAreaMm2(awg)
  if (unit === 'mm2') {
    const mm2 = area ?? areaOfGauge
    return mm2 === null ? 'size not known' : `${Number(mm2.toPrecision(3))} mm²`
  }
  if (awg !== null && areaOfGauge !== null) return `${gaugeText(awg)} AWG`
  const gauge = area === null ? null : awgOfAreaMm2(area)
  return gauge === null ? 'size not known' : `about ${gaugeText(Math.round(gauge))} AWG`
}

/** 0, -1, -2 and -3 are written 1/0 to 4/0. */
const gaugeText = (awg: number) => (awg > 0 ? String(awg) : `${1 - awg}/0`)

export { parseLength, type ParsedLength, type ParseLengthOptions } from './parseLength.ts'
