export const racewayKinds = ['EMT', 'ENT', 'PVC40', 'PVC80', 'FMC', 'LFNC-B', 'LFNC-A', 'LFMC'] as const
export type RacewayKind = (typeof racewayKinds)[number]

/** Trade sizes, from the least. */
export const tradeSizes = ['3/8', '1/2', '3/4', '1', '1-1/4', '1-1/2', '2', '2-1/2', '3', '3-1/2', '4'] as const
export type TradeSize = (typeof tradeSizes)[number]

export interface RacewayBore {
  /** Internal area as printed, in2. */
  areaIn2: number
  /** Internal diameter as printed, in. */
  diameterIn: number
}

const bores = (...pairs: readonly (readonly [TradeSize, number, number])[]): ReadonlyMap<TradeSize, RacewayBore> =>
  new Map(pairs.map(([size, areaIn2, diameterIn]) => [size, { areaIn2, diameterIn }]))

/**
 * Internal areas and diameters of raceways. Source: NEC Chapter 9 Table 4 as printed on a public conduit table page and
 * steeltubeinstitute.org; second-hand, official edition not read; every pair agrees with pi/4 d2 to 0.003 in2.
 * The public file prints 3.834 in for 3-1/2 FMC beside 9.621 in2: the diameter of that area, 3.500 in, stands here.
 */
export const racewayTable: Record<RacewayKind, ReadonlyMap<TradeSize, RacewayBore>> = {
  EMT: bores(
    ['1/2', 0.304, 0.622], ['3/4', 0.533, 0.824], ['1', 0.864, 1.049], ['1-1/4', 1.496, 1.38], ['1-1/2', 2.036, 1.61],
    ['2', 3.356, 2.067], ['2-1/2', 5.858, 2.731], ['3', 8.846, 3.356], ['3-1/2', 11.545, 3.834], ['4', 14.753, 4.334],
  ),
  ENT: bores(
    ['1/2', 0.246, 0.56], ['3/4', 0.454, 0.76], ['1', 0.785, 1], ['1-1/4', 1.41, 1.34], ['1-1/2', 1.936, 1.57],
    ['2', 3.205, 2.02],
  ),
  PVC40: bores(
    ['1/2', 0.285, 0.602], ['3/4', 0.508, 0.804], ['1', 0.832, 1.029], ['1-1/4', 1.453, 1.36], ['1-1/2', 1.986, 1.59],
    ['2', 3.291, 2.047], ['2-1/2', 4.695, 2.445], ['3', 7.268, 3.042], ['3-1/2', 9.737, 3.521], ['4', 12.554, 3.998],
  ),
  PVC80: bores(
    ['1/2', 0.217, 0.526], ['3/4', 0.409, 0.722], ['1', 0.688, 0.936], ['1-1/4', 1.237, 1.255], ['1-1/2', 1.711, 1.476],
    ['2', 2.874, 1.913], ['2-1/2', 4.119, 2.29], ['3', 6.442, 2.864], ['3-1/2', 8.688, 3.326], ['4', 11.258, 3.786],
  ),
  FMC: bores(
    ['3/8', 0.116, 0.384], ['1/2', 0.317, 0.635], ['3/4', 0.533, 0.824], ['1', 0.817, 1.02], ['1-1/4', 1.277, 1.275],
    ['1-1/2', 1.858, 1.538], ['2', 3.269, 2.04], ['2-1/2', 4.909, 2.5], ['3', 7.069, 3], ['3-1/2', 9.621, 3.5],
    ['4', 12.566, 4],
  ),
  'LFNC-B': bores(
    ['3/8', 0.192, 0.494], ['1/2', 0.314, 0.632], ['3/4', 0.541, 0.83], ['1', 0.873, 1.054], ['1-1/4', 1.528, 1.395],
    ['1-1/2', 1.981, 1.588], ['2', 3.246, 2.033],
  ),
  'LFNC-A': bores(
    ['3/8', 0.192, 0.495], ['1/2', 0.312, 0.63], ['3/4', 0.535, 0.825], ['1', 0.854, 1.043], ['1-1/4', 1.502, 1.383],
    ['1-1/2', 2.018, 1.603], ['2', 3.343, 2.063],
  ),
  LFMC: bores(
    ['3/8', 0.192, 0.494], ['1/2', 0.314, 0.632], ['3/4', 0.541, 0.83], ['1', 0.873, 1.054], ['1-1/4', 1.528, 1.395],
    ['1-1/2', 1.981, 1.588], ['2', 3.246, 2.033], ['2-1/2', 4.881, 2.493], ['3', 7.475, 3.085], ['3-1/2', 9.731, 3.52],
    ['4', 12.692, 4.02],
  ),
}

/**
 * ENT areas equal to PVC schedule 40, which some edition is remembered to print, in2. From memory, unverified: the
 * smaller areas of the table above are what the program judges by.
 */
export const entAlternativeAreasIn2: ReadonlyMap<TradeSize, number> = new Map([
  ['1/2', 0.285], ['3/4', 0.508], ['1', 0.832], ['1-1/4', 1.453], ['1-1/2', 1.986], ['2', 3.291],
])
