/** From and to, degrees. */
export type DegreeRange = readonly [from: number, to: number]

export interface Bs2051Channel {
  /** M middle, U upper, UH upper high, T top, B bottom; then the nominal azimuth, positive to the left. */
  name: string
  isLfe: boolean
  azimuthDeg: DegreeRange
  elevationDeg: DegreeRange
}

export const bs2051Systems = {
  A: '0+2+0',
  B: '0+5+0',
  C: '2+5+0',
  D: '4+5+0',
  E: '4+5+1',
  F: '3+7+0',
  G: '4+9+0',
  H: '9+10+3',
  I: '0+7+0',
  J: '4+7+0',
} as const
export type Bs2051System = keyof typeof bs2051Systems
export type Bs2051Layout = (typeof bs2051Systems)[Bs2051System]

const at = (
  name: string,
  azimuthDeg: DegreeRange,
  elevationDeg: DegreeRange = [0, 0],
  isLfe = false,
): Bs2051Channel => ({
  name,
  isLfe,
  azimuthDeg,
  elevationDeg,
})

/** A channel to the left and its mirror to the right; the number is the azimuth it is named for. */
function pair(layer: string, named: string, [from, to]: DegreeRange, elevation: DegreeRange = [0, 0]): Bs2051Channel[] {
  return [at(`${layer}+${named}`, [from, to], elevation), at(`${layer}-${named}`, [-to, -from], elevation)]
}

const centre = at('M+000', [0, 0])
const front = pair('M', '030', [30, 30])
const wideFront = pair('M', '030', [30, 45])
const surround = (elevation: DegreeRange) => pair('M', '110', [100, 120], elevation)
const sides = [...pair('M', '090', [85, 110]), ...pair('M', '135', [120, 150])]
const upperFront = pair('U', '030', [30, 45], [30, 55])
const upperBack = pair('U', '110', [100, 135], [30, 55])
const upperFour = [...pair('U', '045', [30, 45], [30, 55]), ...pair('U', '135', [100, 150], [30, 55])]
/** An LFE without a position of its own. */
const lfe = at('LFE1', [-180, 180], [-90, 90], true)
const lfePair = [at('LFE1', [30, 90], [-30, -15], true), at('LFE2', [-90, -30], [-30, -15], true)]
const below = at('B+000', [0, 0], [-30, -15])

/**
 * Loudspeakers of each layout, upper + middle + bottom layer. Source: Recommendation ITU-R BS.2051, from a public
 * machine-readable transcription (the EBU's ADM renderer, 2051_layouts.yaml). A channel without a range stands at its
 * nominal place.
 */
export const bs2051Channels: Record<Bs2051Layout, readonly Bs2051Channel[]> = {
  '0+2+0': front,
  '0+5+0': [...front, centre, lfe, ...surround([0, 15])],
  '2+5+0': [...front, centre, lfe, ...surround([0, 15]), ...upperFront],
  '4+5+0': [...front, centre, lfe, ...surround([0, 0]), ...upperFront, ...upperBack],
  '4+5+1': [...front, centre, lfe, ...surround([0, 0]), ...upperFront, ...upperBack, below],
  '3+7+0': [
    centre,
    ...front,
    ...pair('U', '045', [30, 45], [30, 45]),
    ...pair('M', '090', [60, 150]),
    ...pair('M', '135', [60, 150]),
    at('UH+180', [180, 180], [45, 90]),
    ...lfePair,
  ],
  '4+9+0': [...wideFront, centre, lfe, ...sides, ...upperFour, ...pair('M', 'SC', [5, 25])],
  '9+10+3': [
    ...pair('M', '060', [45, 60], [0, 5]),
    at('M+000', [0, 0], [0, 5]),
    ...pair('M', '135', [110, 135], [0, 15]),
    ...pair('M', '030', [22.5, 30], [0, 5]),
    at('M+180', [180, 180], [0, 15]),
    ...pair('M', '090', [90, 90], [0, 15]),
    ...pair('U', '045', [45, 60], [30, 45]),
    at('U+000', [0, 0], [30, 45]),
    at('T+000', [-180, 180], [90, 90]),
    ...pair('U', '135', [110, 135], [30, 45]),
    ...pair('U', '090', [90, 90], [30, 45]),
    at('U+180', [180, 180], [30, 45]),
    below,
    ...pair('B', '045', [45, 60], [-30, -15]),
    ...lfePair,
  ],
  '0+7+0': [...wideFront, centre, lfe, ...sides],
  '4+7+0': [...wideFront, centre, lfe, ...sides, ...upperFour],
}

/**
 * Layouts by the names that homes use. 5.1.2 is only near C: its overhead pair, 65 to 100 degrees up, has no place in
 * BS.2051.
 */
export const bs2051HomeNames: Readonly<Record<string, { layout: Bs2051Layout; isExact: boolean }>> = {
  '2.0': { layout: '0+2+0', isExact: true },
  '5.1': { layout: '0+5+0', isExact: true },
  '7.1': { layout: '0+7+0', isExact: true },
  '5.1.2': { layout: '2+5+0', isExact: false },
  '5.1.4': { layout: '4+5+0', isExact: true },
  '7.1.4': { layout: '4+7+0', isExact: true },
}
