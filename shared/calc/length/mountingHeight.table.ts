export type MountingItem = 'outlet' | 'control' | 'thermostat' | 'flat display'

export interface MountingHeight {
  item: MountingItem
  heightMm: number
  /** Whether trades that use this figure mean the centre of the box; the other habit is its bottom. */
  to: 'centre'
  source: string
}

/** Usual heights above the finished floor. The NEC sets none for outlets and controls. Store which edge is meant. */
export const mountingHeights: readonly MountingHeight[] = [
  { item: 'outlet', heightMm: 305, to: 'centre', source: 'published: tpub.com ceb/64 (12 in; 12 to 18 in is common)' },
  { item: 'control', heightMm: 1219, to: 'centre', source: 'published: contractors’ list (48 in)' },
  { item: 'thermostat', heightMm: 1524, to: 'centre', source: 'published: contractors’ list (60 in)' },
  { item: 'flat display', heightMm: 1600, to: 'centre', source: 'common practice, no source (60 to 66 in)' },
]

/**
 * Reach of a seated person, mm: 15 in to 48 in, 44 in over a deep counter. Source: Fair Housing Act guidance, as
 * summarised.
 */
export const reachRangeMm = { lowest: 381, highest: 1219, highestOverCounter: 1118 } as const
