import { finite } from '../usable.ts'

export interface ChannelCount {
  amplifierChannels: number
  subwoofers: number
  outputs: number
}

/**
 * Channels that a format such as 7.1.4 asks for: ear level and overhead need an amplifier, subwoofers power themselves.
 * Many pages count a subwoofer as an amplifier channel (8 for 7.1): `subwoofersNeedAmplifier` does so.
 * Null: a format that is not two or three whole numbers with dots. Derived.
 */
export function channelCount(format: string, subwoofersNeedAmplifier = false): ChannelCount | null {
  const read = /^\s*(\d{1,2})\.(\d{1,2})(?:\.(\d{1,2}))?\s*$/.exec(format)
  if (read === null) return null
  const [earLevel, subwoofers, overhead] = [Number(read[1]), Number(read[2]), Number(read[3] ?? 0)]
  const amplifierChannels = earLevel + overhead + (subwoofersNeedAmplifier ? subwoofers : 0)
  return { amplifierChannels, subwoofers, outputs: earLevel + subwoofers + overhead }
}

/**
 * Amplifier channels of a house: the theatres', and two for each stereo zone (a single-point stereo speaker takes two
 * as well). Null: a format that cannot be read, or a count of zones that is no whole number. Common practice, no
 * source.
 */
export function amplifierChannels(
  theatres: readonly string[],
  stereoZones: number,
  subwoofersNeedAmplifier = false,
): number | null {
  if (!Number.isSafeInteger(stereoZones) || stereoZones < 0) return null
  let total = 2 * stereoZones
  for (const format of theatres) {
    const count = channelCount(format, subwoofersNeedAmplifier)
    if (count === null) return null
    total += count.amplifierChannels
  }
  return finite(total)
}
