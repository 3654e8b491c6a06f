export interface VideoTiming {
  /** Pixels and lines of a whole frame, blanking included. */
  readonly hTotal: number
  readonly vTotal: number
}

/**
 * Frame totals of CTA-861 timings by picture and frames per second; rates 1/1.001 of these have the same totals.
 * Source: timing tables of public display drivers.
 */
export const videoTimings = {
  '720p60': { hTotal: 1650, vTotal: 750 },
  '1080p50': { hTotal: 2640, vTotal: 1125 },
  '1080p60': { hTotal: 2200, vTotal: 1125 },
  '2160p24': { hTotal: 5500, vTotal: 2250 },
  '2160p25': { hTotal: 5280, vTotal: 2250 },
  '2160p30': { hTotal: 4400, vTotal: 2250 },
  '2160p50': { hTotal: 5280, vTotal: 2250 },
  '2160p60': { hTotal: 4400, vTotal: 2250 },
  '2160p120': { hTotal: 4400, vTotal: 2250 },
  '4320p30': { hTotal: 9000, vTotal: 4400 },
  '4320p60': { hTotal: 9000, vTotal: 4400 },
} as const satisfies Record<string, VideoTiming>
export type VideoFormat = keyof typeof videoTimings
