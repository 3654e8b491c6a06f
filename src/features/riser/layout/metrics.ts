/** Measures of the drawing, in its own units: one is a pixel at 100 percent. */
export const metrics = {
  margin: { left: 96, leftLarge: 150, right: 12, top: 10, bottom: 28 },
  /** Space left of a bay's wall line to its neighbour's. */
  bayInset: 3,
  bayPad: 8,
  outsidePad: 14,
  /** From one run's way down to the next, while every run has its own tag. */
  slotPitch: 16.9,
  /** The same on a level whose tags are folded into counts. */
  densePitch: 8.2,
  /** Runs on a level above which tags are folded. */
  foldOver: 90,
  /** Ends on a job that is laid out more tightly, and the runs on a level above which it then folds. */
  largeJob: 200,
  foldOverInLarge: 40,
  lane: { bundled: 1.25, apart: 3.2, mostHeight: 46, mostWidth: 118 },
  localLane: 2.5,
  tag: { height: 13, rowHeight: 15.5, rows: 4, rowsAlone: 6, aloneOver: 30, more: 2, font: 9.5, charWidth: 0.632, lead: 17, tail: 4, shape: 12, reach: 8, gap: 2.5 },
  /** Between the lowest lane and the first row of tags, and between the last row and the ceiling. */
  tagOver: 9,
  tagUnder: 6,
  voidTop: 9,
  corner: 4,
  bay: { pxPerFoot: 18, pxPerFootLarge: 25, least: 128, most: 290 },
  planPxPerFoot: 5.5,
  plateScale: 0.386,
  densePlateScale: 0.3,
  ceilingScale: 0.34,
  rack: { width: 74, most: 132, gap: 6, over: 28, under: 4, pad: 7 },
  roof: 64,
  crawl: 30,
} as const

/** Width of mono text, as the label face sets it. */
export const monoWidth = (text: string, size: number = metrics.tag.font): number => text.length * metrics.tag.charWidth * size

/** A number as it stands in a path: two decimals at most. */
export const f2 = (value: number): number => Math.round(value * 100) / 100
