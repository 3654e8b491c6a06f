import type { TradeSize } from './raceway.table.ts'

/** Outer diameters that the chart has a column for, mm. */
export const reducedChartDiametersMm = [3.3, 4.6, 5.6, 6.1, 7.4, 7.9, 9.4, 13.5, 15.8, 17.8] as const

/**
 * Cables per conduit as telecom work pulls them, fewer than 40 % fill allows; null where the chart says nothing.
 * Source: MIL-HDBK-1012/3 (navalfacilities.tpub.com 1012_30047); the same figures circulate as the TIA-569 chart.
 */
export const reducedChart: ReadonlyMap<TradeSize, readonly (number | null)[]> = new Map<
  TradeSize,
  readonly (number | null)[]
>([
  ['1/2', [1, 1, 0, 0, 0, 0, 0, 0, 0, 0]],
  ['3/4', [6, 5, 4, 3, 2, 2, 1, 0, 0, 0]],
  ['1', [8, 8, 7, 6, 3, 3, 2, 1, 0, 0]],
  ['1-1/4', [16, 14, 12, 10, 6, 4, 3, 1, 1, 1]],
  ['1-1/2', [20, 18, 16, 15, 7, 6, 4, 2, 1, 1]],
  ['2', [30, 26, 22, 20, 14, 12, 7, 4, 3, 2]],
  ['2-1/2', [45, 40, 36, 30, 17, 14, 12, 6, 3, 3]],
  ['3', [70, 60, 50, 40, 20, 20, 17, 7, 6, 6]],
  ['3-1/2', [null, null, null, null, null, null, 22, 12, 7, 6]],
  ['4', [null, null, null, null, null, null, 30, 14, 12, 7]],
])
