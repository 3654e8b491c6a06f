import { usable } from '../usable.ts'

/** Reference arrangement of ITU-R BS.775-3 Figure 1; azimuth positive to the left. */
export const bs775Positions = {
  C: { fromDeg: 0, toDeg: 0 },
  L: { fromDeg: 30, toDeg: 30 },
  R: { fromDeg: -30, toDeg: -30 },
  LS: { fromDeg: 100, toDeg: 120 },
  RS: { fromDeg: -120, toDeg: -100 },
} as const
export type Bs775Channel = keyof typeof bs775Positions

/** Height of the front loudspeakers and least height of the surrounds, m; surrounds may tilt down so far, degrees. */
export const bs775Rules = { heightM: 1.2, surroundTiltDeg: 15 } as const

/** More than two surrounds: an even number, equally spaced on the arc between these azimuths, degrees. */
export const bs775SurroundArc = { fromDeg: 60, toDeg: 150 } as const

/**
 * Whether a loudspeaker stands where ITU-R BS.775-3 puts it: C at 0, L and R at 30, LS and RS at 100 to 120 degrees.
 * `slackDeg` widens it for a real room; by the letter it is 0. Null: a value that is no number, or a negative slack.
 */
export function isBs775Azimuth(channel: Bs775Channel, azimuthDeg: number, slackDeg = 0): boolean | null {
  if (!usable(azimuthDeg, slackDeg) || slackDeg < 0) return null
  const { fromDeg, toDeg } = bs775Positions[channel]
  return azimuthDeg >= fromDeg - slackDeg - 1e-9 && azimuthDeg <= toDeg + slackDeg + 1e-9
}

/**
 * Whether its height suits: 1.2 m in front without tilt; at least that for surrounds, tilted 0 to 15 degrees down.
 * Null as above.
 */
export function isBs775Height(channel: Bs775Channel, heightM: number, tiltDownDeg: number, slackM = 0): boolean | null {
  if (!usable(heightM, tiltDownDeg, slackM) || slackM < 0) return null
  const isSurround = channel === 'LS' || channel === 'RS'
  if (isSurround)
    return (
      heightM >= bs775Rules.heightM - slackM - 1e-9 && tiltDownDeg >= 0 && tiltDownDeg <= bs775Rules.surroundTiltDeg
    )
  return Math.abs(heightM - bs775Rules.heightM) <= slackM + 1e-9 && tiltDownDeg === 0
}

/**
 * Azimuths of an even number of surrounds, degrees, left ones first and from the front: equal spacing on the arc 60 to
 * 150 on each side; two stand at 110. Null: a count that is not even or not above nothing. Source: ITU-R BS.775-3.
 */
export function surroundAzimuthsDeg(count: number): number[] | null {
  if (!Number.isSafeInteger(count) || count < 2 || count % 2 !== 0) return null
  const perSide = count / 2
  const step = (bs775SurroundArc.toDeg - bs775SurroundArc.fromDeg) / Math.max(1, perSide - 1)
  const left =
    perSide === 1 ? [110] : Array.from({ length: perSide }, (_, place) => bs775SurroundArc.fromDeg + place * step)
  return [...left, ...left.map((azimuth) => -azimuth)]
}

/**
 * Width of the picture seen from k picture heights, degrees: 2 atan((16/9) / 2 / k). Null: no number, or not above
 * nothing.
 */
export function pictureAngleDeg(pictureHeights: number, aspect = 16 / 9): number | null {
  if (!usable(pictureHeights, aspect) || pictureHeights <= 0 || aspect <= 0) return null
  return (2 * Math.atan(aspect / 2 / pictureHeights) * 180) / Math.PI
}
