export type SlackMedium = 'twisted pair' | 'optical fibre'

export interface EndSlack {
  atHeadMm: number
  atOutletMm: number
}

/**
 * Stored slack at the two ends of a run, mm. Source: BICSI TDMM 1996 ch. 4 as quoted at cablinginstall.com 16469021.
 * The same answer says TIA-568-A gives no slack figure, and that slack is convenience, not performance.
 */
export const bicsiSlack: Record<SlackMedium, EndSlack> = {
  'twisted pair': { atHeadMm: 3000, atOutletMm: 300 },
  'optical fibre': { atHeadMm: 3000, atOutletMm: 1000 },
}

/** Source: Residential Cabling Guide, 3rd ed. (cabling-design.com tips 14Nov20011): 36 in and 8 in, 44 in together. */
export const residentialSlack: EndSlack = { atHeadMm: 900, atOutletMm: 200 }
