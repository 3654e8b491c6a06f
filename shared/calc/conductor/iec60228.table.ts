export const iecClasses = ['class 1/2', 'class 5/6'] as const
export type IecClass = (typeof iecClasses)[number]

/**
 * Most resistance at 20 °C of plain copper, ohm/km by nominal mm2. Source: IEC 60228; three public extracts agree.
 * Class 1 is solid, 2 stranded, 5 flexible, 6 more flexible. A class 5 core has 11 to 16 % more than its nominal area
 * would give, so a listed value goes before resistivity over area.
 */
export const iec60228: Readonly<Record<IecClass, Readonly<Record<string, number>>>> = {
  'class 1/2': { '0.5': 36, '0.75': 24.5, '1': 18.1, '1.5': 12.1, '2.5': 7.41, '4': 4.61, '6': 3.08, '10': 1.83 },
  'class 5/6': { '0.5': 39, '0.75': 26, '1': 19.5, '1.5': 13.3, '2.5': 7.98, '4': 4.95, '6': 3.3, '10': 1.91 },
}

/**
 * Most resistance at 20 °C of small bunched plain copper cores, ohm/km by nominal mm2. Source: DIN VDE 0295, public
 * extract.
 */
export const smallBunched: Readonly<Record<string, number>> = { '0.14': 134, '0.22': 96, '0.25': 76, '0.34': 53 }

/** The listed maximum of a nominal area, ohm/km at 20 °C; null where the table has no such size. */
export const iecMaximumOhmPerKm = (areaMm2: number, iecClass: IecClass): number | null =>
  iec60228[iecClass][String(areaMm2)] ?? null

/** The listed maximum of a small bunched core, ohm/km at 20 °C; null where the table has no such size. */
export const smallBunchedOhmPerKm = (areaMm2: number): number | null => smallBunched[String(areaMm2)] ?? null
