import { finite, usable } from '../usable.ts'
import { usbDelay } from './usb.table.ts'

/** Length that a delay allows, m. Null for a negative delay, or a cable without any. */
export const delayLengthM = (mostNs: number = usbDelay.mostNs, nsPerM: number = usbDelay.nsPerM): number | null =>
  usable(mostNs, nsPerM) && mostNs >= 0 && nsPerM > 0 ? finite(mostNs / nsPerM) : null
