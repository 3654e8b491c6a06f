import type { Outline } from '../../../../shared/model/place.ts'

/** A rectangle from its north-west corner, clockwise on the drawing. */
export const rectangleOutline = (xMm: number, yMm: number, widthMm: number, depthMm: number): Outline => [
  { xMm, yMm }, { xMm: xMm + widthMm, yMm }, { xMm: xMm + widthMm, yMm: yMm + depthMm }, { xMm, yMm: yMm + depthMm },
]

/** Whether an outline is four corners with upright sides. */
export function isRectangle(outline: Outline): boolean {
  const xs = new Set(outline.map((point) => point.xMm))
  const ys = new Set(outline.map((point) => point.yMm))
  return outline.length === 4 && xs.size === 2 && ys.size === 2
}

/** An outline moved and stretched to another origin and size; what is not given stays. Whole millimetres. */
export function resized(outline: Outline, to: Partial<{ xMm: number; yMm: number; widthMm: number; depthMm: number }>): Outline {
  const xs = outline.map((point) => point.xMm)
  const ys = outline.map((point) => point.yMm)
  const [minX, minY] = [Math.min(...xs), Math.min(...ys)]
  const [width, depth] = [Math.max(1, Math.max(...xs) - minX), Math.max(1, Math.max(...ys) - minY)]
  const { xMm = minX, yMm = minY, widthMm = width, depthMm = depth } = to
  return outline.map((point) => ({ xMm: Math.round(xMm + ((point.xMm - minX) * widthMm) / width), yMm: Math.round(yMm + ((point.yMm - minY) * depthMm) / depth) }))
}
