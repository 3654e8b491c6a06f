import { usable } from '../usable.ts'
import { bs2051Channels, type Bs2051Channel, type Bs2051Layout, type DegreeRange } from './bs2051.table.ts'

export interface SeenPlace {
  azimuthDeg: number
  elevationDeg: number
}

export interface Bs2051Count {
  loudspeakers: number
  lfe: number
}

/** Loudspeakers and LFE channels of a layout. Source beside the table. */
export function bs2051Count(layout: Bs2051Layout): Bs2051Count {
  const channels = bs2051Channels[layout]
  const lfe = channels.filter(({ isLfe }) => isLfe).length
  return { loudspeakers: channels.length - lfe, lfe }
}

/** A channel of a layout by its name, such as M+110; null where the layout has none. */
export function bs2051Channel(layout: Bs2051Layout, name: string): Bs2051Channel | null {
  return bs2051Channels[layout].find((channel) => channel.name === name) ?? null
}

/**
 * Whether a loudspeaker stands within its channel's range of azimuth (positive to the left) and elevation. `slackDeg`
 * widens both for a real room; by the letter it is 0. Null: no such channel in the layout, or a value that is no
 * number.
 */
export function isBs2051Position(layout: Bs2051Layout, name: string, place: SeenPlace, slackDeg = 0): boolean | null {
  const channel = bs2051Channel(layout, name)
  const { azimuthDeg, elevationDeg } = place
  if (channel === null || !usable(azimuthDeg, elevationDeg, slackDeg) || slackDeg < 0) return null
  const isElevated = isWithin(elevationDeg, channel.elevationDeg, slackDeg)
  // Azimuth is a circle: 180 and -180 are one direction.
  return (
    isElevated &&
    [azimuthDeg - 360, azimuthDeg, azimuthDeg + 360].some((turn) => isWithin(turn, channel.azimuthDeg, slackDeg))
  )
}

const isWithin = (value: number, [from, to]: DegreeRange, slack: number) =>
  value >= from - slack - 1e-9 && value <= to + slack + 1e-9
