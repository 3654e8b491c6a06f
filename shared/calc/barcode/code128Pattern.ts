import { code128Widths } from './code128.table.ts'

/** Bars and spaces of a value as modules, 1 dark and 0 light. Null: not a whole number from 0 to 106. */
export function code128Pattern(value: number): string | null {
  const widths = Number.isSafeInteger(value) ? code128Widths[value] : undefined
  if (widths === undefined) return null
  return [...widths].map((width, place) => (place % 2 === 0 ? '1' : '0').repeat(Number(width))).join('')
}
