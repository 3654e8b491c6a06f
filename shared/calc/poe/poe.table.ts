export const poeClasses = [0, 1, 2, 3, 4, 5, 6, 7, 8] as const
export type PoeClass = (typeof poeClasses)[number]

export interface PoeClassPower {
  /** Least that the source must give, W. */
  readonly sourceW: number
  /** Most that the device may take, W. */
  readonly deviceW: number
}

/**
 * Power by class. Source: IEEE 802.3 clauses 33 and 145, read in a device manual's reference table and other public
 * tables. Figures of 34.2 W for class 4 and 99 W for class 8 are upper bounds of other tables, not these. Class 0 is a
 * device that states no class.
 */
export const poeClassPower: Readonly<Record<PoeClass, PoeClassPower>> = {
  0: { sourceW: 15.4, deviceW: 12.95 },
  1: { sourceW: 4, deviceW: 3.84 },
  2: { sourceW: 7, deviceW: 6.49 },
  3: { sourceW: 15.4, deviceW: 12.95 },
  4: { sourceW: 30, deviceW: 25.5 },
  5: { sourceW: 45, deviceW: 40 },
  6: { sourceW: 60, deviceW: 51 },
  7: { sourceW: 75, deviceW: 62 },
  8: { sourceW: 90, deviceW: 71.3 },
}

export const poeTypes = [1, 2, 3, 4] as const
export type PoeType = (typeof poeTypes)[number]

export interface PoeTypeLimits {
  readonly pairs: 2 | 4
  readonly sourceLeastV: number
  readonly sourceMostV: number
  /** Least voltage left at the device, by its highest class. */
  readonly deviceLeastV: number
  /** Most current of a pair set, A. */
  readonly mostA: number
  /** Channel that the type is defined for, ohm per pair set. */
  readonly channelOhm: number
}

/**
 * Limits by type. Same source. Type 3 is given for its four-pair classes 5 and 6, type 4 for 7 and 8; at classes 5 and
 * 7 44.3 and 42.9 V are left, from memory, and both follow from the formula.
 */
export const poeTypeLimits: Readonly<Record<PoeType, PoeTypeLimits>> = {
  1: { pairs: 2, sourceLeastV: 44, sourceMostV: 57, deviceLeastV: 37, mostA: 0.35, channelOhm: 20 },
  2: { pairs: 2, sourceLeastV: 50, sourceMostV: 57, deviceLeastV: 42.5, mostA: 0.6, channelOhm: 12.5 },
  3: { pairs: 4, sourceLeastV: 50, sourceMostV: 57, deviceLeastV: 42.5, mostA: 0.6, channelOhm: 12.5 },
  4: { pairs: 4, sourceLeastV: 52, sourceMostV: 57, deviceLeastV: 41.1, mostA: 0.96, channelOhm: 12.5 },
}
