/**
 * Segregation class of a data cable: d Cat 7 and 7A screened, c screened Cat 5e to 6A, b unscreened, a coaxial and
 * other.
 */
export const segregationClasses = ['a', 'b', 'c', 'd'] as const
export type SegregationClass = (typeof segregationClasses)[number]

export const containments = ['none', 'open metal', 'perforated metal', 'solid metal'] as const
export type Containment = (typeof containments)[number]

/**
 * Least separation S, mm, of EN 50174-2 in its 2009 scheme. Source: a Swedish trade handbook, 2017, p. 528, for
 * classes b, c, d; class a from memory, unverified.
 */
export const separationMm: Record<SegregationClass, Record<Containment, number>> = {
  d: { none: 10, 'open metal': 8, 'perforated metal': 5, 'solid metal': 0 },
  c: { none: 50, 'open metal': 38, 'perforated metal': 25, 'solid metal': 0 },
  b: { none: 100, 'open metal': 75, 'perforated metal': 50, 'solid metal': 0 },
  a: { none: 300, 'open metal': 225, 'perforated metal': 150, 'solid metal': 0 },
}

/** Factor P by the most single-phase 20 A circuits it covers; above the last, 6. Same source. */
export const circuitFactors: readonly { upTo: number; factor: number }[] = [
  { upTo: 3, factor: 0.2 },
  { upTo: 6, factor: 0.4 },
  { upTo: 9, factor: 0.6 },
  { upTo: 12, factor: 0.8 },
  { upTo: 15, factor: 1 },
  { upTo: 30, factor: 2 },
  { upTo: 45, factor: 3 },
  { upTo: 60, factor: 4 },
  { upTo: 75, factor: 5 },
]
export const circuitFactorAbove = 6

export type Screening = 'unscreened' | 'screened'
export type Divider2000 = 'none' | 'aluminium' | 'steel'

/** Separation by the 2000 edition, mm: power, then data, then divider. Source: pdfmaal 246609. */
export const separation2000Mm: Record<Screening, Record<Screening, Record<Divider2000, number>>> = {
  unscreened: {
    unscreened: { none: 200, aluminium: 100, steel: 50 },
    screened: { none: 50, aluminium: 20, steel: 5 },
  },
  screened: {
    unscreened: { none: 30, aluminium: 10, steel: 2 },
    screened: { none: 0, aluminium: 0, steel: 0 },
  },
}

/** The 2000 edition asks 130 mm from fluorescent lamps, and none for the last 15 m to the outlet. Same source. */
export const rules2000 = { fluorescentMm: 130, exemptLastMm: 15_000 } as const
