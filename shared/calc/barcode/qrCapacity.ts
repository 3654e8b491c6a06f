import { qrCountBits, qrDataCodewords, type QrLevel, type QrMode } from './qr.table.ts'

export const qrVersions = 40

/**
 * Characters that one QR symbol holds in one mode. A digit costs 3 1/3 bits, a character of 0-9 A-Z space $ % * + - .
 * / : 5 1/2, a byte 8, a kanji 13. Null: a version that is no whole number from 1 to 40. Source beside the table.
 */
export function qrCapacity(version: number, level: QrLevel, mode: QrMode): number | null {
  const codewords = Number.isSafeInteger(version) ? qrDataCodewords[level][version - 1] : undefined
  if (codewords === undefined) return null
  const bits = 8 * codewords - 4 - qrCountBits[mode][version <= 9 ? 0 : version <= 26 ? 1 : 2]
  switch (mode) {
    case 'numeric':
      return 3 * Math.floor(bits / 10) + (bits % 10 >= 7 ? 2 : bits % 10 >= 4 ? 1 : 0)
    case 'alphanumeric':
      return 2 * Math.floor(bits / 11) + (bits % 11 >= 6 ? 1 : 0)
    case 'byte':
      return Math.floor(bits / 8)
    case 'kanji':
      return Math.floor(bits / 13)
  }
}

/** Smallest version that holds so many characters. Null: none does, or a count that is no whole number. */
export function qrVersionFor(characters: number, level: QrLevel, mode: QrMode = 'byte'): number | null {
  if (!Number.isSafeInteger(characters) || characters < 0) return null
  for (let version = 1; version <= qrVersions; version++) {
    if ((qrCapacity(version, level, mode) ?? 0) >= characters) return version
  }
  return null
}

/** The cheapest single mode for a text; kanji is not chosen, as a label holds none. */
export function qrModeOf(text: string): Exclude<QrMode, 'kanji'> {
  if (/^\d+$/.test(text)) return 'numeric'
  return /^[0-9A-Z $%*+\-./:]+$/.test(text) ? 'alphanumeric' : 'byte'
}
