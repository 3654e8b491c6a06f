import { PassThrough, Writable } from 'node:stream'
import { finished } from 'node:stream/promises'
import { createRequire } from 'node:module'
import { readFileSync } from 'node:fs'
import ExcelJS from 'exceljs'
import PDFDocument from 'pdfkit'
import { writeJobWorkbook } from '../../server/modules/exports/jobWorkbook.ts'
import { labelsPdf } from '../../server/modules/exports/labelsPdf.ts'
import { deriveJob } from '../../shared/derive/deriveJob.ts'
import { code128Modules } from '../../shared/labels/code128.ts'
import { checkLine, drawLabel } from '../../shared/labels/drawLabel.ts'
import { labelItems } from '../../shared/labels/labelItems.ts'
import { layoutLabels } from '../../shared/labels/layoutLabels.ts'
import { playFixture } from '../support/playFixture.ts'
import { bigHouse } from './bigHouse.ts'
import { paired, row, type Row } from './measure.ts'

const nowhere = () => new Writable({ write: (_chunk, _encoding, done) => done() })

/** The workbook against bare exceljs, and the label sheets against bare pdfkit, each writing the same. */
export async function exportBench(): Promise<Row[]> {
  const doc = playFixture(bigHouse(2000))
  const { runs, findings } = deriveJob(doc)
  const source = { doc, runs, findings, day: '2026-12-01' }
  const sheets = await cellsOf((out) => writeJobWorkbook(out, source))
  const [ourBook, bareBook] = await paired(5, () => writeJobWorkbook(nowhere(), source), () => bareWorkbook(sheets))

  const items = labelItems(doc, runs, { runIds: [...runs.keys()].slice(0, 400), copiesAtRack: 1, copiesAtPlate: 1 })
  const placing = { choice: 'letter-30' as const, startAt: 1, offsetXMm: 0, offsetYMm: 0 }
  const shapes = layoutLabels(items, placing).map((page) => ({ page, shapes: [...page.labels.flatMap((label) => drawLabel(page.stock, label, code128Modules)), ...checkLine(page.stock)] }))
  const [ourPdf, barePdf] = await paired(5, () => finished(labelsPdf(layoutLabels(labelItems(doc, runs, { runIds: [...runs.keys()].slice(0, 400), copiesAtRack: 1, copiesAtPlate: 1 }), placing), { title: 'Labels' }).pipe(nowhere())), () => barePages(shapes))
  return [row('xlsx', ourBook, bareBook, 'ms, 2,000 runs on six sheets'), row('labels-pdf', ourPdf, barePdf, 'ms, 800 labels')]
}

type Cells = readonly (readonly (string | number | null)[])[]

/** The cells of a workbook, read back from what was written. */
async function cellsOf(write: (out: Writable) => Promise<void>): Promise<Map<string, Cells>> {
  const through = new PassThrough()
  const workbook = new ExcelJS.Workbook()
  const read = workbook.xlsx.read(through)
  await write(through)
  await read
  return new Map(workbook.worksheets.map((sheet) => {
    const rows: (string | number | null)[][] = []
    sheet.eachRow((each) => rows.push((each.values as (string | number | null)[]).slice(1).map((value) => value ?? null)))
    return [sheet.name, rows]
  }))
}

async function bareWorkbook(sheets: ReadonlyMap<string, Cells>): Promise<void> {
  const workbook = new ExcelJS.stream.xlsx.WorkbookWriter({ stream: nowhere(), useStyles: true, useSharedStrings: false })
  for (const [name, rows] of sheets) {
    const sheet = workbook.addWorksheet(name)
    for (const cells of rows) sheet.addRow([...cells]).commit()
    sheet.commit()
  }
  await workbook.commit()
}

const require = createRequire(import.meta.url)
const faces = ([400, 700] as const).map((weight) => readFileSync(require.resolve(`@fontsource/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-${weight}-normal.woff`)))
const pt = 72 / 25.4

/** The same marks on paper by the library alone: where each stands is known beforehand. */
async function barePages(pages: readonly { page: ReturnType<typeof layoutLabels>[number]; shapes: ReturnType<typeof drawLabel> }[]): Promise<void> {
  const pdf = new PDFDocument({ autoFirstPage: false, margin: 0 })
  pdf.registerFont('plain', faces[0]!)
  pdf.registerFont('bold', faces[1]!)
  for (const { page, shapes } of pages) {
    pdf.addPage({ size: [page.stock.sheet.pageWidthMm * pt, page.stock.sheet.pageHeightMm * pt], margin: 0 })
    for (const shape of shapes) {
      if (shape.shape === 'text') {
        pdf.font(shape.bold ? 'bold' : 'plain').fontSize(shape.sizeMm * pt)
        pdf.text(shape.text, shape.xMm * pt - pdf.widthOfString(shape.text) / 2, shape.baselineMm * pt, { lineBreak: false, baseline: 'alphabetic' })
      } else if (shape.shape === 'bars') {
        for (const [at, width] of shape.bars) pdf.rect((shape.xMm + at * shape.moduleMm) * pt, shape.yMm * pt, width * shape.moduleMm * pt, shape.heightMm * pt)
        pdf.fill('black')
      } else pdf.moveTo(shape.x1Mm * pt, shape.y1Mm * pt).lineTo(shape.x2Mm * pt, shape.y2Mm * pt).stroke('black')
    }
  }
  pdf.end()
  await finished(pdf.pipe(nowhere()))
}
