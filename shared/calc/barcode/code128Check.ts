/**
 * Check value of a symbol: (start + sum of position x value) mod 103, positions from 1; switch codes count like data.
 * Null: a start other than 103, 104, 105, or a value that is no whole number from 0 to 102. Source: ISO/IEC 15417.
 */
export function code128Check(start: number, values: readonly number[]): number | null {
  if (![103, 104, 105].includes(start)) return null
  if (!values.every((value) => Number.isSafeInteger(value) && value >= 0 && value <= 102)) return null
  return values.reduce((sum, value, place) => (sum + (place + 1) * value) % 103, start % 103)
}
