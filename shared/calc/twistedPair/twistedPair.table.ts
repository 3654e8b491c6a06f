/** Limits of balanced pair. Source: TIA-568, read in vendor pages and install guides; what is from memory says so. */
export const twistedPairLimits = {
  /** Horizontal cable, outlet to panel. */
  permanentLinkM: 90,
  /** The link with its cords. */
  channelM: 100,
  /** The same as printed in feet. */
  permanentLinkFt: 295,
  channelFt: 328,
  /** Cords at both ends together. */
  cordsM: 10,
  /** Pair left untwisted at a termination, half an inch. */
  untwistMm: 13,
  untwistIn: 0.5,
  /** Longest work-area cord at a multi-user outlet, by TIA and by ISO. */
  workAreaCordM: 22,
  workAreaCordIsoM: 20,
  /** Category 8 channel and permanent link, from memory, unverified. */
  category8ChannelM: 30,
  /**
   * Bend radius of screened cable in one guide, times the diameter; unscreened 4 stands with the other bend factors.
   */
  screenedBendFactor: 8,
  /** Most resistance of one conductor; from memory, unverified. */
  conductorOhmPer100M: 9.38,
} as const
