/**
 * Most that each category of video cable is tested for, Gb/s, the least first: 74.25, 340 and 600 MHz of 30 bits, then
 * 48. Source: licensing statements in a news item and an installer page; the last is from memory, unverified.
 */
export const videoCableGbps = {
  Standard: 2.2275,
  'High Speed': 10.2,
  'Premium High Speed': 18,
  'Ultra High Speed': 48,
  Ultra96: 96,
} as const
export type VideoCableCategory = keyof typeof videoCableGbps

/** Those whose limit was seen in a source, the least first. */
export const advisedCategories = ['Standard', 'High Speed', 'Premium High Speed', 'Ultra High Speed'] as const

/**
 * Longest passive copper to plan for, m, by the most Gb/s it shall carry: the specification sets no length. Common
 * practice, no source: the careful end of what manuals and installer guides print.
 */
export const passiveLengthsM: readonly (readonly [mostGbps: number, lengthM: number])[] = [
  [4.5, 10], [10.2, 7.5], [18, 5], [48, 3],
]
