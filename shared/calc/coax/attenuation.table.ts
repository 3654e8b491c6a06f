export const coaxKinds = ['RG-59', 'RG-6', 'RG-11'] as const
export type CoaxKind = (typeof coaxKinds)[number]

/** How a figure came about: printed in common tables, between two of them, or beyond them and good to about 5 %. */
export type CoaxStanding = 'table' | 'interpolated' | 'extrapolated'

export interface CoaxRow {
  readonly mhz: number
  readonly dbPer100Ft: Readonly<Record<CoaxKind, number>>
  readonly standing: CoaxStanding
}

const row = (mhz: number, rg59: number, rg6: number, rg11: number, standing: CoaxStanding = 'table'): CoaxRow => ({
  mhz,
  dbPer100Ft: { 'RG-59': rg59, 'RG-6': rg6, 'RG-11': rg11 },
  standing,
})

/**
 * Most attenuation at 20 °C, dB per 100 ft, the table's own unit. Source: common maximum tables, from memory,
 * unverified; within 0.2 dB of a maker's page and of a public table of series 6 cable where they overlap.
 */
export const coaxAttenuation: readonly CoaxRow[] = [
  row(5, 0.86, 0.58, 0.38),
  row(55, 2.05, 1.6, 0.96),
  row(211, 3.8, 3.05, 1.9),
  row(270, 4.24, 3.4, 2.13, 'interpolated'),
  row(400, 5.1, 4.15, 2.6),
  row(550, 5.95, 4.9, 3.04),
  row(750, 6.97, 5.65, 3.65),
  row(870, 7.54, 6.12, 3.99, 'interpolated'),
  row(1000, 8.12, 6.55, 4.35),
  row(1450, 9.6, 7.88, 5.23, 'extrapolated'),
  row(1800, 10.65, 8.77, 5.9, 'extrapolated'),
  row(2150, 11.59, 9.57, 6.51, 'extrapolated'),
  row(3000, 13.58, 11.29, 7.87, 'extrapolated'),
]

/**
 * Loop resistance, ohm per 100 m, and attenuation at 10 MHz, dB per 100 m (a conference system's manual, public copy).
 */
export const coaxAtTenMhz = {
  'RG-59': { dbPer100M: 3.3, loopOhmPer100M: 16.82 },
  'RG-6': { dbPer100M: 2.7, loopOhmPer100M: 12.82 },
  'RG-11': { dbPer100M: 2, loopOhmPer100M: 2.4 },
} as const satisfies Record<CoaxKind, { dbPer100M: number; loopOhmPer100M: number }>

/** Longest run of baseband composite video, ft as printed: solid copper, 95 % braid (public copy). */
export const compositeRunFt: Readonly<Record<CoaxKind, number>> = { 'RG-59': 750, 'RG-6': 1000, 'RG-11': 1500 }
