import { usable } from '../usable.ts'

/** Highest TMDS character rate at which a full-class link over twisted pair still goes 100 m on category 5e or 6, MHz (projector and matrix manuals). */
export const fullReachClockMhz = 225

export type LinkCategory = '5e' | '6' | '6A' | '7A' | '8'

/** TMDS character rates, MHz, of the formats a device may be set to carry (CTA-861 totals; 8 bit; from public driver tables). */
export const formatClockMhz = { '1080p60': 148.5, '2160p30': 297, '2160p60-420': 297, '2160p60': 594, '4320p60': 2376 } as const
export type CarriedFormat = keyof typeof formatClockMhz

/** Highest rate of a full-class link without compression, MHz: about 10.2 Gb/s of video is a character rate of 340. */
const fullClassMostMhz = 340

/**
 * Reach of a full-class extender link, m: 100 m up to 225 MHz on category 5e or better, above it 70 m on 5e and 6 and 100 m
 * on 6A and better; null where the link cannot carry it at all. The boundary counts as the lower class.
 */
export function fullClassReachM(clockMhz: number, category: LinkCategory): number | null {
  if (!usable(clockMhz) || clockMhz <= 0 || clockMhz > fullClassMostMhz + 1e-9) return null
  if (clockMhz <= fullReachClockMhz + 1e-9) return 100
  return category === '5e' || category === '6' ? 70 : 100
}
