import { finite, usable } from '../usable.ts'
import type { LabelSheet } from './sheet.table.ts'

export interface Extent {
  widthMm: number
  heightMm: number
}

/**
 * Whether a sheet's numbers can be worked with: whole counts above nothing, sizes above nothing, margins not negative.
 */
function isUsableSheet(sheet: LabelSheet): boolean {
  const { columns, rows, labelWidthMm, labelHeightMm, leftMm, topMm, gapXMm, gapYMm } = sheet
  return (
    Number.isSafeInteger(columns) && Number.isSafeInteger(rows) && columns >= 1 && rows >= 1 &&
    usable(labelWidthMm, labelHeightMm, leftMm, topMm, gapXMm, gapYMm) && labelWidthMm > 0 && labelHeightMm > 0 &&
    leftMm >= 0 && topMm >= 0 && gapXMm >= 0 && gapYMm >= 0
  )
}

/**
 * Paper that a sheet's labels, gaps and equal margins add up to, mm; a layout is right when that is its paper. Null: a
 * value that is no number, negative, or counts that are no whole numbers. Arithmetic.
 */
export function sheetClosure(sheet: LabelSheet): Extent | null {
  if (!isUsableSheet(sheet)) return null
  const { columns, rows, labelWidthMm, labelHeightMm, leftMm, topMm, gapXMm, gapYMm } = sheet
  const widthMm = finite(2 * leftMm + columns * labelWidthMm + (columns - 1) * gapXMm)
  const heightMm = finite(2 * topMm + rows * labelHeightMm + (rows - 1) * gapYMm)
  return widthMm === null || heightMm === null ? null : { widthMm, heightMm }
}

/**
 * Whether the labels of a sheet lie on its paper: what stands between a typed-in layout and spoiled stock. Null as
 * above.
 */
export function isOnPaper(sheet: LabelSheet): boolean | null {
  const closure = sheetClosure(sheet)
  if (closure === null || !usable(sheet.widthMm, sheet.heightMm)) return null
  return (
    closure.widthMm - sheet.leftMm <= sheet.widthMm + 0.05 && closure.heightMm - sheet.topMm <= sheet.heightMm + 0.05
  )
}

export interface LabelOrigin {
  xMm: number
  yMm: number
}

/** Upper left corner of a label, mm, row and column from 0. Null: a place the sheet does not have, or as above. */
export function labelOrigin(sheet: LabelSheet, row: number, column: number): LabelOrigin | null {
  if (sheetClosure(sheet) === null || !Number.isSafeInteger(row) || !Number.isSafeInteger(column)) return null
  if (row < 0 || column < 0 || row >= sheet.rows || column >= sheet.columns) return null
  return {
    xMm: sheet.leftMm + column * (sheet.labelWidthMm + sheet.gapXMm),
    yMm: sheet.topMm + row * (sheet.labelHeightMm + sheet.gapYMm),
  }
}

export interface LabelPlace extends LabelOrigin {
  /** Sheet, row and column, from 0. */
  sheet: number
  row: number
  column: number
}

export interface PrintSettings {
  /** First free label on the first sheet, from 1. */
  startAt: number
  /** What the printer is off by, mm. */
  offsetXMm?: number
  offsetYMm?: number
}

/**
 * Where the label number `ordinal` (from 0) of a print goes, row by row, starting at a label of the first sheet.
 * Null: a start the sheet does not have, or as above.
 */
export function labelPlace(sheet: LabelSheet, ordinal: number, settings: PrintSettings): LabelPlace | null {
  const { startAt, offsetXMm = 0, offsetYMm = 0 } = settings
  const perSheet = sheet.columns * sheet.rows
  if (
    !Number.isSafeInteger(ordinal) ||
    ordinal < 0 ||
    !Number.isSafeInteger(startAt) ||
    startAt < 1 ||
    startAt > perSheet
  )
    return null
  const place = ordinal + startAt - 1
  const onSheet = place % perSheet
  const row = Math.floor(onSheet / sheet.columns)
  const column = onSheet % sheet.columns
  const origin = labelOrigin(sheet, row, column)
  if (origin === null) return null
  const xMm = finite(origin.xMm + offsetXMm)
  const yMm = finite(origin.yMm + offsetYMm)
  return xMm === null || yMm === null ? null : { sheet: Math.floor(place / perSheet), row, column, xMm, yMm }
}
