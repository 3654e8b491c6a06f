import type { LabelItem } from './labelItems.ts'
import { stockFor, type LabelChoiceId, type LabelStock } from './stocks.ts'

export interface PlacedLabel {
  readonly item: LabelItem
  readonly xMm: number
  readonly yMm: number
  /** False: the cable is thicker than the longest tail, so the print would not be covered. */
  readonly fits: boolean
}

export interface LabelPage {
  readonly stock: LabelStock
  readonly labels: readonly PlacedLabel[]
}

export interface LabelPlacing {
  readonly choice: LabelChoiceId
  /** Place of the first label on the first sheet, from 1: a sheet that was begun is used up. */
  readonly startAt: number
  /** How far this printer sets everything off, mm; right and down are positive. */
  readonly offsetXMm: number
  readonly offsetYMm: number
}

/** Sheets of labels in order, each label at its true place. Wrap labels are gathered by the size their cable needs. */
export function layoutLabels(items: readonly LabelItem[], placing: LabelPlacing): LabelPage[] {
  const groups = new Map<LabelStock, { item: LabelItem; fits: boolean }[]>()
  for (const item of items) {
    const { stock, fits } = stockFor(placing.choice, item.cableDiameterMm)
    const group = groups.get(stock) ?? []
    group.push({ item, fits })
    groups.set(stock, group)
  }
  let skip = Math.max(0, placing.startAt - 1)
  const pages: LabelPage[] = []
  for (const [stock, group] of groups) {
    pages.push(...fillSheets(stock, group, skip, placing))
    skip = 0
  }
  return pages
}

function fillSheets(stock: LabelStock, group: readonly { item: LabelItem; fits: boolean }[], skip: number, placing: LabelPlacing): LabelPage[] {
  const { columns, rows, leftMm, topMm, pitchXMm, pitchYMm } = stock.sheet
  const perSheet = columns * rows
  const pages: PlacedLabel[][] = []
  group.forEach(({ item, fits }, index) => {
    const place = index + (skip % perSheet)
    const page = Math.floor(place / perSheet)
    const cell = place % perSheet
    const labels = (pages[page] ??= [])
    labels.push({
      item,
      fits,
      xMm: leftMm + (cell % columns) * pitchXMm + placing.offsetXMm,
      yMm: topMm + Math.floor(cell / columns) * pitchYMm + placing.offsetYMm,
    })
  })
  return pages.map((labels) => ({ stock, labels }))
}
