export type AdministrationClass = 1 | 2 | 3 | 4

export interface AdministeredSystem {
  telecomSpaces: number
  buildings: number
  sites: number
}

/**
 * Class of administration: 1 one telecom space, 2 one building with several, 3 a campus, 4 several sites.
 * Null: a count that is no whole number above nothing. Source: TIA-606-A, as given in a structured-cabling guide.
 */
export function administrationClass({
  telecomSpaces,
  buildings,
  sites,
}: AdministeredSystem): AdministrationClass | null {
  if (![telecomSpaces, buildings, sites].every((count) => Number.isSafeInteger(count) && count >= 1)) return null
  return sites > 1 ? 4 : buildings > 1 ? 3 : telecomSpaces > 1 ? 2 : 1
}
