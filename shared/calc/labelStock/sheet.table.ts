/** A sheet of labels, mm. */
export interface LabelSheet {
  widthMm: number
  heightMm: number
  columns: number
  rows: number
  labelWidthMm: number
  labelHeightMm: number
  leftMm: number
  topMm: number
  /** Between labels. */
  gapXMm: number
  gapYMm: number
}

export type SheetName = 'letter-30' | 'letter-80' | 'a4-65'

/**
 * Common sheets, by paper and count. Source: public data files; each closes on its paper exactly. Variants exist:
 * 80-up with left 0.30 in and pitch 2.05 in; some files give 65-up no gap or a top of 6 mm, which is wrong (13 x 21.2
 * leaves 10.7).
 */
export const labelSheets: Record<SheetName, LabelSheet> = {
  'letter-30': {
    widthMm: 215.9, heightMm: 279.4, columns: 3, rows: 10, labelWidthMm: 66.675, labelHeightMm: 25.4,
    leftMm: 4.7625, topMm: 12.7, gapXMm: 3.175, gapYMm: 0,
  },
  'letter-80': {
    widthMm: 215.9, heightMm: 279.4, columns: 4, rows: 20, labelWidthMm: 44.45, labelHeightMm: 12.7,
    leftMm: 7.1437, topMm: 12.7, gapXMm: 7.9375, gapYMm: 0,
  },
  'a4-65': {
    widthMm: 210, heightMm: 297, columns: 5, rows: 13, labelWidthMm: 38.1, labelHeightMm: 21.2,
    leftMm: 4.75, topMm: 10.7, gapXMm: 2.5, gapYMm: 0,
  },
}
