import { finite, usable } from '../usable.ts'

export const chromas = ['4:4:4', '4:2:2', '4:2:0'] as const
/** How colour is sampled; 4:4:4 stands for RGB too. */
export type Chroma = (typeof chromas)[number]

/** Bits that each of the three components may have. */
const depths: readonly number[] = [8, 10, 12, 16]
/** 4:2:2 travels in the container of 8-bit 4:4:4, whatever its depth up to this. */
const deepestPacked = 12

const isDepth = (bitsPerComponent: number, chroma: Chroma) =>
  depths.includes(bitsPerComponent) && (chroma !== '4:2:2' || bitsPerComponent <= deepestPacked)

/** Pixel clock, MHz: whole-frame pixels times lines times frames per second. Null unless all are more than nothing. */
export const pixelClockMhz = (hTotal: number, vTotal: number, framesPerSecond: number): number | null =>
  usable(hTotal, vTotal, framesPerSecond) && hTotal > 0 && vTotal > 0 && framesPerSecond > 0
    ? finite((hTotal * vTotal * framesPerSecond) / 1e6)
    : null

/**
 * Bits per pixel: 3 depths at 4:4:4, 24 at 4:2:2 whatever the depth, half at 4:2:0. Null for a depth that does not
 * exist.
 */
export function bitsPerPixel(chroma: Chroma, bitsPerComponent: number): number | null {
  if (!isDepth(bitsPerComponent, chroma)) return null
  return { '4:4:4': 3 * bitsPerComponent, '4:2:2': 24, '4:2:0': 1.5 * bitsPerComponent }[chroma]
}

/**
 * TMDS character rate, MHz: the pixel clock times depth/8 at 4:4:4, as it is at 4:2:2, half of it times depth/8 at
 * 4:2:0. Source: a published rate sheet, reproduced at every depth. Null for a depth that does not exist or no clock.
 */
export function characterRateMhz(pixelClock: number, chroma: Chroma, bitsPerComponent: number): number | null {
  const bits = bitsPerPixel(chroma, bitsPerComponent)
  return bits === null || !usable(pixelClock) || pixelClock <= 0 ? null : finite((pixelClock * bits) / 24)
}

/** Three lanes of ten bits for each character. */
const bitsPerCharacter = 30

/**
 * TMDS bit rate, Gb/s, with its 8-to-10 coding: 30 bits a character. Past 18 no TMDS link carries it. Null as above.
 */
export function tmdsGbps(pixelClock: number, chroma: Chroma, bitsPerComponent: number): number | null {
  const rate = characterRateMhz(pixelClock, chroma, bitsPerComponent)
  return rate === null ? null : rate * (bitsPerCharacter / 1000)
}

/** Most that a TMDS link carries, Gb/s: a character rate of 600 MHz. */
export const mostTmdsGbps = 18

/**
 * Rate over a fixed-rate link, Gb/s: pixels times bits with 16-to-18 coding. An upper estimate, since real links send
 * less while blanking: what comes to 40.1 fits a 40 Gb/s port. Null as above.
 */
export function fixedRateGbps(pixelClock: number, chroma: Chroma, bitsPerComponent: number): number | null {
  const bits = bitsPerPixel(chroma, bitsPerComponent)
  return bits === null || !usable(pixelClock) || pixelClock <= 0 ? null : finite((pixelClock * bits * 18) / 16 / 1000)
}

/** Raw rate of a link of lanes, Gb/s. Null unless the lanes are a whole number and the rate is more than nothing. */
export const linkGbps = (lanes: number, gbpsPerLane: number): number | null =>
  Number.isSafeInteger(lanes) && lanes > 0 && usable(gbpsPerLane) && gbpsPerLane > 0
    ? finite(lanes * gbpsPerLane)
    : null

/** What a fixed-rate link carries after its 16-to-18 coding, Gb/s: 48 raw is 42.67. Null as above. */
export function linkPayloadGbps(lanes: number, gbpsPerLane: number): number | null {
  const raw = linkGbps(lanes, gbpsPerLane)
  return raw === null ? null : raw * (16 / 18)
}

/** Lanes and Gb/s per lane of the fixed-rate links (public licensing statements). */
export const fixedRateLinks = [[3, 3], [3, 6], [4, 6], [4, 8], [4, 10], [4, 12]] as const
