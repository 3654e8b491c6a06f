export const fibreKinds = ['OM1', 'OM2', 'OM3', 'OM4', 'OM5', 'OS2'] as const
export type FibreKind = (typeof fibreKinds)[number]
export type MultimodeKind = Exclude<FibreKind, 'OS2'>

/**
 * Modal bandwidth at 850 nm, MHz km: with an overfilled launch, and effective for a laser, null where none is stated.
 * Source: a test-equipment maker's page on TIA-568.3-D and vendor pages.
 */
export const modalBandwidthMhzKm: Readonly<Record<MultimodeKind, { overfilled: number; effective: number | null }>> = {
  OM1: { overfilled: 200, effective: null },
  OM2: { overfilled: 500, effective: null },
  OM3: { overfilled: 1500, effective: 2000 },
  OM4: { overfilled: 3500, effective: 4700 },
  OM5: { overfilled: 3500, effective: 4700 },
}

/** Most attenuation, dB/km, at the shorter and the longer wavelength: 850 and 1300 nm, or 1310 and 1550 nm. */
export interface FibreAttenuation {
  readonly short: number
  readonly long: number
}

const multimodeOld: FibreAttenuation = { short: 3.5, long: 1.5 }
const multimode: FibreAttenuation = { short: 3, long: 1.5 }

/**
 * Most attenuation by kind of fibre, dB/km. Source: TIA-568.3, known, not re-read; 3.5 seen, which older tables give
 * all multimode. Single-mode has two: outside plant, and the 1.0 of inside plant.
 */
export const fibreDbPerKm: Readonly<Record<MultimodeKind | 'OS2 outside' | 'OS2 inside', FibreAttenuation>> = {
  OM1: multimodeOld,
  OM2: multimodeOld,
  OM3: multimode,
  OM4: multimode,
  OM5: multimode,
  'OS2 outside': { short: 0.5, long: 0.5 },
  'OS2 inside': { short: 1, long: 1 },
}

/** Most loss of a mated pair and of a splice, dB: TIA-568.3 (0.75 seen; 0.3 known). */
export const fibreJointDb = { matedPair: 0.75, splice: 0.3 } as const

/**
 * What a link usually has, by a fibre association (public copy): dB/km at the two wavelengths, dB per connection and
 * splice. For an estimate; a budget takes the most.
 */
export const usualFibreLoss = {
  multimode: { dbPerKm: { short: 3, long: 0.8 }, connectionDb: 0.5, spliceDb: 0.3 },
  singleMode: { dbPerKm: { short: 0.4, long: 0.2 }, connectionDb: 0.5, spliceDb: 0.15 },
} as const
