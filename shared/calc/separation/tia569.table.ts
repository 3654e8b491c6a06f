/**
 * Situations of the 1990 table. open-open: unshielded power to an open or non-metal pathway. open-metal: unshielded
 * power to a grounded metal pathway. metal-metal: power in grounded metal conduit to such a pathway.
 */
export const tia569Conditions = [
  'open-open',
  'open-metal',
  'metal-metal',
  'transformer or motor',
  'fluorescent',
] as const
export type Tia569Condition = (typeof tia569Conditions)[number]

export type LoadBand = 'under2' | 'from2to5' | 'over5'

/**
 * Separation from power under 480 V, in; null where the table gives none. Source: EIA/TIA-569 (1990), from a trade
 * reference page and cablinginstall.com 16465376. Dropped in TIA/EIA-569-A (1998), which defers to the NEC for 120/240
 * V 20 A circuits (what-when-how.com p. 49). Later editions carry a table by circuit count that was not seen.
 */
export const tia569Table: Record<Tia569Condition, Record<LoadBand, number | null>> = {
  'open-open': { under2: 5, from2to5: 12, over5: 24 },
  'open-metal': { under2: 2.5, from2to5: 6, over5: 12 },
  'metal-metal': { under2: null, from2to5: 6, over5: 12 },
  'transformer or motor': { under2: 40, from2to5: 40, over5: 40 },
  fluorescent: { under2: 12, from2to5: 12, over5: 12 },
}

/** TIA-569-C: clear of fluorescent lamps and above ceiling tile, mm. Source: a catalogue extract of TIA-569-C. */
export const tia569C = { fluorescentMm: 125, aboveTileMm: 75 } as const
