import type { PlacedLabel } from './layoutLabels.ts'
import type { LabelStock } from './stocks.ts'

/** What a label is drawn of, in millimetres on the sheet. A PDF and a page of SVG draw the same. */
export type LabelShape =
  | { readonly shape: 'text'; readonly text: string; readonly xMm: number; readonly baselineMm: number; readonly sizeMm: number; readonly bold: boolean; readonly widthMm: number; readonly align: 'middle' | 'end' }
  | { readonly shape: 'bars'; readonly text: string; readonly xMm: number; readonly yMm: number; readonly moduleMm: number; readonly heightMm: number; readonly bars: readonly (readonly [at: number, width: number])[] }
  | { readonly shape: 'line'; readonly x1Mm: number; readonly y1Mm: number; readonly x2Mm: number; readonly y2Mm: number; readonly dashed: boolean }

/** One printer dot at 300 dpi. Bars stand on whole dots, so that a 300 dpi printer widens none. */
export const dotMm = 25.4 / 300

/** Clear space on each side of the bars, in modules (ISO/IEC 15417: at least 10). */
export const quietModules = 10

/** Narrowest module that is printed, in dots: 2 dots are 0.169 mm, about 6.7 mil. */
const narrowestDots = 2
const widestDots = 4

/** Widths of one character of the mono face against its size (0.6 em, as the face is drawn). */
const monoAdvance = 0.6

/**
 * The widest module that fits, on whole dots, mm; null when even the narrowest does not: the text is then printed
 * without bars rather than with bars that do not scan.
 */
export function moduleWidthMm(modules: number, widthMm: number): number | null {
  const dots = Math.min(widestDots, Math.floor(widthMm / ((modules + 2 * quietModules) * dotMm)))
  return dots >= narrowestDots ? dots * dotMm : null
}

/** The bars of a module string such as "11010010000", as pairs of place and width in modules. */
export function barsOf(modules: string): [number, number][] {
  const bars: [number, number][] = []
  for (const match of modules.matchAll(/1+/g)) bars.push([match.index, match[0].length])
  return bars
}

/**
 * The shapes of one label. `encode` gives the modules of a Code 128 symbol for a text.
 * The text stands above the bars as large as fits; below 13 mm of height the note is left out, and on a wrap label the
 * text is repeated under the bars so that it can be read from either side.
 */
export function drawLabel(stock: LabelStock, placed: PlacedLabel, encode: (text: string) => string): LabelShape[] {
  const { item, xMm, yMm } = placed
  const width = stock.sheet.labelWidthMm
  const height = stock.printHeightMm
  const pad = 1.2
  const modules = encode(item.text)
  const moduleMm = moduleWidthMm(modules.length, width - 2 * 0.3)
  const rows = rowsOf(height, stock.wraps)
  const shapes: LabelShape[] = []
  const middle = xMm + width / 2
  const textSize = Math.min(rows.text, (width - 2 * pad) / (item.text.length * monoAdvance))
  let y = yMm + rows.top
  const text = (value: string, sizeMm: number, bold: boolean) =>
    shapes.push({ shape: 'text', text: value, xMm: middle, baselineMm: y + sizeMm * 0.76, sizeMm, bold, widthMm: width - 2 * pad, align: 'middle' })
  text(item.text, textSize, true)
  y += textSize + rows.gap
  if (rows.note && item.note) {
    const noteSize = Math.min(rows.note, (width - 2 * pad) / (item.note.length * monoAdvance))
    text(item.note, noteSize, false)
    y += rows.note + rows.gap
  }
  if (moduleMm !== null) {
    const symbolMm = modules.length * moduleMm
    const left = Math.round((middle - symbolMm / 2) / dotMm) * dotMm
    shapes.push({ shape: 'bars', text: item.text, xMm: left, yMm: y, moduleMm, heightMm: rows.bars, bars: barsOf(modules) })
    y += rows.bars + rows.gap
  }
  if (rows.repeat) text(item.text, Math.min(rows.repeat, textSize), true)
  if (item.printedBefore > 0)
    shapes.push({ shape: 'text', text: `r${item.printedBefore + 1}`, xMm: xMm + width - 0.8, baselineMm: yMm + 2.4, sizeMm: 2, bold: false, widthMm: 6, align: 'end' })
  if (stock.wraps) shapes.push({ shape: 'line', x1Mm: xMm, y1Mm: yMm + height, x2Mm: xMm + width, y2Mm: yMm + height, dashed: true })
  return shapes
}

/** Heights of the rows of a label by the height it has for print, mm. Text of 2.3 mm or more reads at arm's length (NUREG-0700 rev. 3: 16 arc-minutes at 0.5 m). */
function rowsOf(height: number, wraps: boolean) {
  if (wraps) return { top: 1, text: height * 0.24, note: height * 0.13, bars: height * 0.3, repeat: height * 0.17, gap: height * 0.02 }
  if (height < 13) return { top: 0.9, text: 4, note: 0, bars: height - 6.6, repeat: 0, gap: 0.6 }
  return { top: 1.6, text: height * 0.26, note: height * 0.13, bars: height * 0.38, repeat: 0, gap: height * 0.035 }
}

/** A line that must measure two inches on paper: the check that nothing was scaled. */
export function checkLine(stock: LabelStock): LabelShape[] {
  const { pageWidthMm, pageHeightMm, topMm } = stock.sheet
  const x = (pageWidthMm - 50.8) / 2
  const y = topMm > 9 ? topMm - 4.5 : pageHeightMm - 4.5
  const tick = (at: number): LabelShape => ({ shape: 'line', x1Mm: at, y1Mm: y - 1.2, x2Mm: at, y2Mm: y + 1.2, dashed: false })
  return [
    { shape: 'line', x1Mm: x, y1Mm: y, x2Mm: x + 50.8, y2Mm: y, dashed: false },
    tick(x),
    tick(x + 25.4),
    tick(x + 50.8),
    { shape: 'text', text: 'This line must measure 2 in. Print at 100 %.', xMm: x + 25.4, baselineMm: y - 1.8, sizeMm: 2.2, bold: false, widthMm: 80, align: 'middle' },
  ]
}
