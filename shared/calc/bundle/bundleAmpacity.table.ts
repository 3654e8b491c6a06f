export const cableRatingsC = [60, 75, 90] as const
export type CableRatingC = (typeof cableRatingsC)[number]
export const bundleGauges = [26, 24, 23, 22] as const
export type BundleGauge = (typeof bundleGauges)[number]

/** Most cables in each column of the table. */
export const bundleColumns = [7, 19, 37, 61, 91, 192] as const

/**
 * Ampacity per conductor, A, all conductors loaded, 30 degrees Celsius, by gauge, cable rating and column; null: none
 * given. Source: NEC 2020 Table 725.144, carried to 722 in NEC 2023; from memory, unverified. Cross-checked against a
 * published note's limits for 45 degrees (24 AWG at 60 C: 37 cables; 23 at 60: 61; 24 at 75: 91; 23 at 75: 192). The
 * 2017 edition differs.
 */
export const bundleAmpacityTable: Record<BundleGauge, Record<CableRatingC, readonly (number | null)[]>> = {
  26: {
    60: [1, 0.71, 0.55, 0.46, 0.45, null],
    75: [1.23, 0.87, 0.68, 0.57, 0.55, null],
    90: [1.42, 1.02, 0.78, 0.67, 0.64, null],
  },
  24: {
    60: [1.19, 0.81, 0.63, 0.55, 0.46, 0.4],
    75: [1.46, 1.01, 0.78, 0.67, 0.56, 0.48],
    90: [1.69, 1.17, 0.91, 0.78, 0.65, 0.55],
  },
  23: {
    60: [1.24, 0.89, 0.77, 0.66, 0.58, 0.45],
    75: [1.53, 1.11, 0.95, 0.8, 0.71, 0.55],
    90: [1.78, 1.28, 1.1, 0.93, 0.82, 0.63],
  },
  22: {
    60: [1.5, 1.04, 0.77, 0.66, 0.62, 0.53],
    75: [1.86, 1.28, 0.95, 0.82, 0.77, 0.63],
    90: [2.16, 1.49, 1.11, 0.96, 0.89, 0.72],
  },
}

/** Nominal current per conductor by power sourced, A. From memory, unverified. */
export const nominalCurrents = { '15 W': 0.175, '30 W': 0.3, '60 W': 0.3, '90 W': 0.48 } as const
