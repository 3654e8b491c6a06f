export const pairCategories = ['3', '5', '5e', '6', '6A', '7', '7A', '8'] as const
export type PairCategory = (typeof pairCategories)[number]

/**
 * Bandwidth of a category, MHz. Source: TIA-568 and ISO 11801, vendor standards pages; 3 and 5 from memory, unverified.
 */
export const categoryBandwidthMhz: Readonly<Record<PairCategory, number>> = {
  '3': 16, '5': 100, '5e': 100, '6': 250, '6A': 500, '7': 600, '7A': 1000, '8': 2000,
}

export const ethernetKinds = [
  '10BASE-T', '100BASE-TX', '1000BASE-T', '2.5GBASE-T', '5GBASE-T', '10GBASE-T', '25GBASE-T', '40GBASE-T',
] as const
export type EthernetKind = (typeof ethernetKinds)[number]

export interface EthernetReach {
  /** Channel that holds whatever lies beside it, m; null: none is promised. */
  readonly sureM: number | null
  /** Channel that holds where alien crosstalk from neighbours allows, m; null: unsupported. */
  readonly possibleM: number | null
}

const sure = (reachM: number): EthernetReach => ({ sureM: reachM, possibleM: reachM })
const none: EthernetReach = { sureM: null, possibleM: null }
const caseByCase: EthernetReach = { sureM: null, possibleM: 100 }
const on = (reach: EthernetReach, ...categories: readonly PairCategory[]) =>
  Object.fromEntries(categories.map((category) => [category, reach]))

/**
 * Channel by kind and category, m. Source: IEEE 802.3, TIA-568 and TSB-155-A, read in vendor pages and install guides.
 * Above 55 m, 10GBASE-T on category 6 needs mitigation; a vendor reads TSB-155-A as sparing screened category 6. From
 * memory, unverified: category 3, gigabit on category 5, and the 30 m of category 8.
 */
export const ethernetReach: Readonly<Record<EthernetKind, Readonly<Partial<Record<PairCategory, EthernetReach>>>>> = {
  '10BASE-T': on(sure(100), ...pairCategories),
  '100BASE-TX': { '3': none, ...on(sure(100), '5', '5e', '6', '6A', '7', '7A', '8') },
  '1000BASE-T': { '3': none, ...on(sure(100), '5', '5e', '6', '6A', '7', '7A', '8') },
  '2.5GBASE-T': on(sure(100), '5e', '6', '6A', '7', '7A', '8'),
  '5GBASE-T': { '5e': caseByCase, ...on(sure(100), '6', '6A', '7', '7A', '8') },
  '10GBASE-T': { '5e': none, '6': { sureM: 37, possibleM: 55 }, ...on(sure(100), '6A', '7', '7A', '8') },
  '25GBASE-T': on(sure(30), '8'),
  '40GBASE-T': on(sure(30), '8'),
}

/** Channel of a kind on a category, m; null: not supported, or nothing is known. */
export function ethernetReachM(
  kind: EthernetKind,
  category: PairCategory,
  crosstalk: 'hostile' | 'benign' = 'hostile',
): number | null {
  const reach = ethernetReach[kind][category]
  return (crosstalk === 'hostile' ? reach?.sureM : reach?.possibleM) ?? null
}
