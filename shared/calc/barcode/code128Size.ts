import { finite, usable } from '../usable.ts'

/** Light modules that must stand at each end. Source: ISO/IEC 15417. */
export const quietModules = 10

/** Narrowest module that hand scanners read with ease, mm. Common practice, no source. */
export const usualLeastModuleMm = 0.19

/**
 * Modules of a symbol without quiet zones: 11 for each data and switch character, and 35 for start, check and stop.
 * Null: a count that is no whole number, or negative. Source: ISO/IEC 15417.
 */
export function code128Modules(characters: number): number | null {
  return Number.isSafeInteger(characters) && characters >= 0 ? finite(11 * characters + 35) : null
}

/** Width of a symbol with both quiet zones, mm. Null as above, or a module that is not above nothing. */
export function code128WidthMm(characters: number, moduleMm: number): number | null {
  const modules = code128Modules(characters)
  return modules === null || !usable(moduleMm) || moduleMm <= 0 ? null : finite((modules + 2 * quietModules) * moduleMm)
}

/**
 * Height of bars for hand scanning, mm: 15 % of the symbol's width or 5 mm, whichever is more. Guidance: ISO/IEC
 * 15417:2007 sets none; an older rule asks 6.35 mm (from memory). Null: a value that is no number, or not above
 * nothing.
 */
export function barHeightMm(symbolWidthMm: number): number | null {
  return usable(symbolWidthMm) && symbolWidthMm > 0 ? finite(Math.max(0.15 * symbolWidthMm, 5)) : null
}
