import { createRequire } from 'node:module'
import { readFileSync } from 'node:fs'
import PDFDocument from 'pdfkit'
import { code128Modules } from '../../../shared/labels/code128.ts'
import { checkLine, drawLabel, type LabelShape } from '../../../shared/labels/drawLabel.ts'
import type { LabelPage } from '../../../shared/labels/layoutLabels.ts'

const pointsPerMm = 72 / 25.4
const points = (mm: number) => mm * pointsPerMm

// pdfkit reads .woff but not .woff2, so the static faces are used here and the variable ones on the web.
const require = createRequire(import.meta.url)
const face = (weight: 400 | 700) => readFileSync(require.resolve(`@fontsource/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-latin-${weight}-normal.woff`))
let faces: { plain: Buffer; bold: Buffer } | undefined

/** Sheets of labels as a PDF at true size: text embedded, bars as vector rectangles on whole printer dots. */
export function labelsPdf(pages: readonly LabelPage[], about: { readonly title: string }): PDFKit.PDFDocument {
  faces ??= { plain: face(400), bold: face(700) }
  const pdf = new PDFDocument({ autoFirstPage: false, margin: 0, info: { Title: about.title, Creator: 'Mudring' } })
  pdf.registerFont('plain', faces.plain)
  pdf.registerFont('bold', faces.bold)
  for (const page of pages) {
    const { pageWidthMm, pageHeightMm } = page.stock.sheet
    pdf.addPage({ size: [points(pageWidthMm), points(pageHeightMm)], margin: 0 })
    for (const placed of page.labels) for (const shape of drawLabel(page.stock, placed, code128Modules)) draw(pdf, shape)
    for (const shape of checkLine(page.stock)) draw(pdf, shape)
  }
  pdf.end()
  return pdf
}

function draw(pdf: PDFKit.PDFDocument, shape: LabelShape): void {
  switch (shape.shape) {
    case 'text': {
      const size = points(shape.sizeMm)
      pdf.font(shape.bold ? 'bold' : 'plain').fontSize(size)
      const width = pdf.widthOfString(shape.text)
      const x = shape.align === 'middle' ? points(shape.xMm) - width / 2 : points(shape.xMm) - width
      pdf.fillColor('black').text(shape.text, x, points(shape.baselineMm), { lineBreak: false, baseline: 'alphabetic' })
      return
    }
    case 'bars': {
      for (const [at, width] of shape.bars) pdf.rect(points(shape.xMm + at * shape.moduleMm), points(shape.yMm), points(width * shape.moduleMm), points(shape.heightMm))
      pdf.fill('black')
      return
    }
    case 'line': {
      pdf.moveTo(points(shape.x1Mm), points(shape.y1Mm)).lineTo(points(shape.x2Mm), points(shape.y2Mm)).lineWidth(0.5)
      if (shape.dashed) pdf.dash(2, { space: 2 }).stroke('#777777').undash()
      else pdf.stroke('black')
    }
  }
}
