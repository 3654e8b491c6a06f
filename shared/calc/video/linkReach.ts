import { usable } from '../usable.ts'

/**
 * Highest TMDS character rate at which a full-class link over twisted pair still goes 100 m on category 5e or 6, MHz
 * (projector and matrix manuals).
 */
export const fullReachClockMhz = 225

export type LinkCategory = '5e' | '6' | '6A' | '7A' | '8'

/**
 * TMDS character rates, MHz, of the formats a device may be set to carry (CTA-861 totals; 8 bit; from public driver
 * tables).
 */
export const formatClockMhz = {
  '1080p60': 148.5,
  '2160p30': 297,
  '2160p60-420': 297,
  '2160p60': 594,
  '4320p60': 2376,
} as const
export type CarriedFormat = keyof typeof formatClockMhz

/** Highest rate of a full-class link without compression, MHz: about 10.2 Gb/s of video is a character rate of 340. */
const fullClassMostMhz = 340

/**
 * How far one straight run of a category goes at a character rate, m, whether or not a link can carry that rate: 100 m
 * up to 225 MHz, above it 70 m on 5e and 6 and 100 m on the better ones (projector and matrix manuals). The boundary
 * counts as the lower class. Null for no rate.
 */
export function straightRunM(clockMhz: number, category: LinkCategory | '7'): number | null {
  if (!usable(clockMhz) || clockMhz <= 0) return null
  if (clockMhz <= fullReachClockMhz + 1e-9) return 100
  return category === '5e' || category === '6' ? 70 : 100
}

/** Reach of a full-class extender link, m: the straight run, or null where the link cannot carry the rate at all. */
export const fullClassReachM = (clockMhz: number, category: LinkCategory): number | null =>
  clockMhz <= fullClassMostMhz + 1e-9 ? straightRunM(clockMhz, category) : null

/**
 * Reach of a reduced-class link, m: 70 at 1080p, 40 at 4K. From memory, unverified; several data sheets print 35 for
 * 4K, so a device's own figure goes before it.
 */
export const reducedClassReachM = { '1080p': 70, '4K': 40 } as const

/** What each connection on the way takes off the reach, m (a public reference page). */
export const reachPerConnectionM = 5
