/** Longest passive cable, m. Source: two public reference pages; one cable maker's 10, 5 and 1 m are not used. */
export const usbLengthM = {
  '1.x low speed': 3,
  '2.0': 5,
  '3.2 Gen 1': 3,
  '3.2 Gen 1 certain': 2,
  '3.2 Gen 2': 1,
  '3.2 Gen 2x2': 1,
  USB4: 0.8,
} as const
export type UsbLink = keyof typeof usbLengthM

/** What USB 2.0 leaves the cable, ns, and what a metre of it takes: 5 m (public reference page). */
export const usbDelay = { mostNs: 26, nsPerM: 5.2 } as const
