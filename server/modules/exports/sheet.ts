import type ExcelJS from 'exceljs'

/** A column of a sheet: its head (with the unit), how wide, and what a row has there. Text is always text, numbers are numbers. */
export interface Column<Row> {
  readonly head: string
  readonly width: number
  readonly format?: string
  readonly value: (row: Row) => string | number | null
}

export interface SheetTitle {
  readonly job: string
  /** The day it was made, as YYYY-MM-DD. */
  readonly day: string
}

/**
 * Streams one sheet: heads in bold and frozen, a filter over them, print set-up with the job and the day on every page.
 * Cells are typed by what they hold, so a name that begins with = + - or @ stays text and never becomes a formula.
 */
export function writeSheet<Row>(workbook: ExcelJS.stream.xlsx.WorkbookWriter, name: string, title: SheetTitle, columns: readonly Column<Row>[], rows: Iterable<Row>, options: { landscape?: boolean; isGroup?: (row: Row) => boolean } = {}): void {
  const sheet = workbook.addWorksheet(name, {
    views: [{ state: 'frozen', ySplit: 1, xSplit: 1 }],
    pageSetup: { orientation: options.landscape === false ? 'portrait' : 'landscape', fitToPage: true, fitToWidth: 1, fitToHeight: 0, printTitlesRow: '1:1' },
    headerFooter: { oddHeader: `&L${escapeHeader(title.job)}&C${escapeHeader(name)}&R${title.day}`, oddFooter: '&RPage &P of &N' },
  })
  sheet.columns = columns.map(({ head, width, format }) => ({ header: head, width, ...(format ? { style: { numFmt: format } } : {}) }))
  const head = sheet.getRow(1)
  head.font = { bold: true }
  head.alignment = { vertical: 'middle', wrapText: true }
  head.commit()
  sheet.autoFilter = { from: { row: 1, column: 1 }, to: { row: 1, column: columns.length } }
  for (const each of rows) {
    const row = sheet.addRow(columns.map((column) => column.value(each)))
    if (options.isGroup?.(each)) row.font = { bold: true }
    row.commit()
  }
  sheet.commit()
}

/** In a page header & begins a code; a real one is written twice. */
const escapeHeader = (text: string) => text.replaceAll('&', '&&').slice(0, 100)
