/** Serial rates, Mb/s. Source: SMPTE 259M, 292M and ST 2082 as printed; 424M and ST 2081 from memory, unverified. */
export const sdiMbps = { SD: 270, HD: 1485, '3G': 2970, '6G': 5940, '12G': 11880 } as const
export type SdiKind = keyof typeof sdiMbps

/** Loss that a link may have at half its clock, dB: SMPTE 292M, and ST 2081 and 2082 of 2015 (public copies). */
export const sdiBudgetDb = { upToThreeG: 20, fromSixG: 40 } as const
