import { floorOf } from '../roundUp.ts'
import { finite, usable } from '../usable.ts'
import type { TradeSize } from './raceway.table.ts'
import { reducedChart, reducedChartDiametersMm } from './reducedChart.table.ts'

/** The chart's column for a diameter, mm: the next one that is at least as thick; -1 when none is. */
const columnOf = (outerDiameterMm: number) =>
  reducedChartDiametersMm.findIndex((column) => column >= outerDiameterMm - 1e-9)

/**
 * Cables per conduit by the reduced telecom chart; a diameter between two columns takes the thicker. Null: thicker than
 * the chart, a size it does not print, or a value that is no number. Source beside the table.
 */
export function reducedCount(size: TradeSize, outerDiameterMm: number): number | null {
  if (!usable(outerDiameterMm) || outerDiameterMm <= 0) return null
  return reducedChart.get(size)?.[columnOf(outerDiameterMm)] ?? null
}

/** Smallest trade size whose chart count holds so many cables. Null: none does, or a value that is no number. */
export function reducedSize(cables: number, outerDiameterMm: number): TradeSize | null {
  if (!usable(cables) || cables < 1) return null
  for (const size of reducedChart.keys()) if ((reducedCount(size, outerDiameterMm) ?? 0) >= cables) return size
  return null
}

/** Straight pull that a bend of 90 degrees is worth, mm (30 ft). Source: a public fill chart (speedytemplate.com). */
export const straightPerRightAngleMm = 9144

/**
 * Cables to pull through a long or bent conduit: 15 % fewer where the pull is worth more than 50 ft, each right angle
 * counting as 30 ft of straight. Null: a value that is no number, negative, or a pull worth more than 100 ft, for
 * which the chart gives nothing: put in a pull box. Source: a public fill chart (speedytemplate.com); a rule of thumb.
 */
export function countForLongPull(cables: number, lengthMm: number, bendsDeg: readonly number[]): number | null {
  if (!usable(cables, lengthMm, ...bendsDeg) || cables < 0 || lengthMm < 0 || bendsDeg.some((bend) => bend < 0))
    return null
  const turns = bendsDeg.reduce((sum, bend) => sum + bend, 0)
  const worthMm = lengthMm + (turns / 90) * straightPerRightAngleMm
  if (worthMm > 2 * 15_240) return null
  return finite(floorOf(worthMm > 15_240 ? cables * 0.85 : cables))
}
