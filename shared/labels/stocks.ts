import { z } from 'zod'

/** A sheet of labels, in millimetres from the sheet's top left corner. */
export interface SheetGeometry {
  readonly pageWidthMm: number
  readonly pageHeightMm: number
  readonly columns: number
  readonly rows: number
  readonly labelWidthMm: number
  readonly labelHeightMm: number
  readonly leftMm: number
  readonly topMm: number
  readonly pitchXMm: number
  readonly pitchYMm: number
}

/** What labels are printed on. A wrap label has a print zone at its top and a clear tail below it. */
export interface LabelStock {
  readonly id: string
  readonly name: string
  readonly sheet: SheetGeometry
  /** Height of the white part that takes print; the label's own height where there is no tail. */
  readonly printHeightMm: number
  readonly wraps: boolean
}

const inch = 25.4
const letter = { pageWidthMm: 215.9, pageHeightMm: 279.4 }
const a4 = { pageWidthMm: 210, pageHeightMm: 297 }

/** Wrap sheets are ours: whole labels cut from letter or A4 sheets, three lengths of tail for three ranges of cable. */
function wrapStock(id: string, name: string, page: typeof letter, columns: number, rows: number, width: number, height: number, print: number): LabelStock {
  return {
    id,
    name,
    wraps: true,
    printHeightMm: print,
    sheet: {
      ...page,
      columns,
      rows,
      labelWidthMm: width,
      labelHeightMm: height,
      leftMm: (page.pageWidthMm - columns * width) / 2,
      topMm: (page.pageHeightMm - rows * height) / 2,
      pitchXMm: width,
      pitchYMm: height,
    },
  }
}

/**
 * Geometry of the three sheets: public data files of sheet layouts, each of which closes exactly on its sheet.
 * The wrap sheets close on theirs by construction.
 */
export const labelStocks: readonly LabelStock[] = [
  {
    id: 'letter-30',
    name: 'Letter, 30 labels of 2-5/8 x 1 in',
    wraps: false,
    printHeightMm: inch,
    sheet: { ...letter, columns: 3, rows: 10, labelWidthMm: 66.675, labelHeightMm: inch, leftMm: 4.7625, topMm: 12.7, pitchXMm: 69.85, pitchYMm: inch },
  },
  {
    id: 'letter-80',
    name: 'Letter, 80 labels of 1-3/4 x 1/2 in',
    wraps: false,
    printHeightMm: 12.7,
    sheet: { ...letter, columns: 4, rows: 20, labelWidthMm: 44.45, labelHeightMm: 12.7, leftMm: 7.14375, topMm: 12.7, pitchXMm: 52.3875, pitchYMm: 12.7 },
  },
  {
    id: 'a4-65',
    name: 'A4, 65 labels of 38.1 x 21.2 mm',
    wraps: false,
    printHeightMm: 21.2,
    sheet: { ...a4, columns: 5, rows: 13, labelWidthMm: 38.1, labelHeightMm: 21.2, leftMm: 4.75, topMm: 10.7, pitchXMm: 40.6, pitchYMm: 21.2 },
  },
  wrapStock('wrap-letter-s', 'Letter, wrap labels for thin cable', letter, 5, 6, 38.1, 41.275, 15.875),
  wrapStock('wrap-letter-m', 'Letter, wrap labels for cable up to 9 mm', letter, 5, 5, 38.1, 50.8, 19.05),
  wrapStock('wrap-letter-l', 'Letter, wrap labels for thick cable', letter, 5, 3, 38.1, 76.2, 24.13),
  wrapStock('wrap-a4-s', 'A4, wrap labels for thin cable', a4, 5, 6, 38.1, 41.275, 15.875),
  wrapStock('wrap-a4-m', 'A4, wrap labels for cable up to 9 mm', a4, 5, 5, 38.1, 50.8, 19.05),
  wrapStock('wrap-a4-l', 'A4, wrap labels for thick cable', a4, 5, 3, 38.1, 76.2, 24.13),
]

/** What a person chooses: a sheet, or wrap labels on a paper size, where the tail follows the cable. */
export const labelChoices = [
  { id: 'letter-30', name: 'Letter, 30 a sheet', stockIds: ['letter-30'] },
  { id: 'letter-80', name: 'Letter, 80 a sheet', stockIds: ['letter-80'] },
  { id: 'a4-65', name: 'A4, 65 a sheet', stockIds: ['a4-65'] },
  { id: 'wrap-letter', name: 'Letter, self-laminating wrap', stockIds: ['wrap-letter-s', 'wrap-letter-m', 'wrap-letter-l'] },
  { id: 'wrap-a4', name: 'A4, self-laminating wrap', stockIds: ['wrap-a4-s', 'wrap-a4-m', 'wrap-a4-l'] },
] as const
export type LabelChoiceId = (typeof labelChoices)[number]['id']
export const labelChoiceIdSchema = z.enum(labelChoices.map((choice) => choice.id) as [LabelChoiceId, ...LabelChoiceId[]])

export const stockById = (id: string): LabelStock | undefined => labelStocks.find((stock) => stock.id === id)

/** Overlap of a clear tail over its own print, mm (common practice 2 to 3 mm, no source). */
export const wrapOverlapMm = 3

/** Thickest cable whose label still goes once round and covers the print: (label - print - overlap) / pi, mm. */
export const thickestCableMm = (stock: LabelStock): number => (stock.sheet.labelHeightMm - stock.printHeightMm - wrapOverlapMm) / Math.PI

/** The smallest of these stocks that fits a cable; the last where none does. Sheets without a tail fit every cable. */
export function stockFor(choice: LabelChoiceId, cableDiameterMm: number): { stock: LabelStock; fits: boolean } {
  const stocks = labelChoices.find((each) => each.id === choice)!.stockIds.map((id) => stockById(id)!)
  const fitting = stocks.find((stock) => !stock.wraps || cableDiameterMm <= thickestCableMm(stock) + 1e-9)
  return { stock: fitting ?? stocks.at(-1)!, fits: fitting !== undefined }
}
