export interface NecResistance {
  readonly solid: number | null
  /** Seven concentric strands; cords of fine strands are 2 to 4 % higher again. */
  readonly stranded: number
}

export const necFinishes = ['uncoated', 'coated'] as const
export type NecFinish = (typeof necFinishes)[number]

/**
 * Direct-current resistance of copper at 75 °C, ohm per 1000 ft by gauge; coated is tinned. Source: NEC chapter 9
 * table 8, read in public copies; the code's own units. 75 °C figures are 21.6 % above those at 20 °C.
 */
export const necTable8: Readonly<Record<NecFinish, Readonly<Record<number, NecResistance>>>> = {
  uncoated: {
    18: { solid: 7.77, stranded: 7.95 },
    16: { solid: 4.89, stranded: 4.99 },
    14: { solid: 3.07, stranded: 3.14 },
    12: { solid: 1.93, stranded: 1.98 },
    10: { solid: 1.21, stranded: 1.24 },
    8: { solid: 0.764, stranded: 0.778 },
    6: { solid: null, stranded: 0.491 },
  },
  coated: {
    18: { solid: 8.08, stranded: 8.45 },
    16: { solid: 5.08, stranded: 5.29 },
    14: { solid: 3.19, stranded: 3.26 },
    12: { solid: 2.01, stranded: 2.05 },
    10: { solid: 1.26, stranded: 1.29 },
    8: { solid: 0.786, stranded: 0.809 },
    6: { solid: null, stranded: 0.51 },
  },
}

const kmPerThousandFeet = 0.3048

/** An entry of the table at 75 °C, ohm/km; null where the table has none. */
export function necOhmPerKm75(awg: number, finish: NecFinish, stranding: keyof NecResistance): number | null {
  const ohmPerKft = necTable8[finish][awg]?.[stranding]
  return ohmPerKft === undefined || ohmPerKft === null ? null : ohmPerKft / kmPerThousandFeet
}
