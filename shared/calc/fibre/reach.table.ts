import type { FibreKind } from './fibre.table.ts'

export const opticalKinds = [
  '1000BASE-SX', '1000BASE-LX', '10GBASE-SR', '10GBASE-LR', '10GBASE-LRM', '25GBASE-SR', '25GBASE-LR', '40GBASE-SR4',
  '40GBASE-LR4', '100GBASE-SR10', '100GBASE-SR4', '100GBASE-LR4',
] as const
export type OpticalKind = (typeof opticalKinds)[number]

const singleMode10Km = { OS2: 10_000 }

/**
 * Longest link by kind and fibre, m; a fibre that is missing is not specified. Source: IEEE 802.3, read on a
 * test-equipment maker's page for TIA-568.3-D and on vendor pages; 25GBASE, 100GBASE-SR4 and the LR4 kinds from memory,
 * unverified. TIA does not specify 1000BASE-SX on OM3 to OM5. Pages that print 550 m for 10GBASE-SR on OM4, or 125 m
 * for 40 and 100 G, exceed IEEE.
 */
export const fibreReachTable: Readonly<Record<OpticalKind, Readonly<Partial<Record<FibreKind, number>>>>> = {
  '1000BASE-SX': { OM1: 275, OM2: 550, OM3: 550, OM4: 550, OM5: 550 },
  '1000BASE-LX': { OM1: 550, OM2: 550, OM3: 550, OM4: 550, OM5: 550, OS2: 5000 },
  '10GBASE-SR': { OM1: 33, OM2: 82, OM3: 300, OM4: 400, OM5: 400 },
  '10GBASE-LR': singleMode10Km,
  '10GBASE-LRM': { OM1: 220, OM2: 220, OM3: 220, OM4: 220, OM5: 220 },
  '25GBASE-SR': { OM3: 70, OM4: 100, OM5: 100 },
  '25GBASE-LR': singleMode10Km,
  '40GBASE-SR4': { OM3: 100, OM4: 150, OM5: 150 },
  '40GBASE-LR4': singleMode10Km,
  '100GBASE-SR10': { OM3: 100, OM4: 150, OM5: 150 },
  '100GBASE-SR4': { OM3: 70, OM4: 100, OM5: 100 },
  '100GBASE-LR4': singleMode10Km,
}

/**
 * 1000BASE-SX on fibre of 62.5 µm by its modal bandwidth, m by MHz km: 200 is OM1, 160 is older (IEEE 802.3z, seen).
 */
export const sxReachByBandwidthM: Readonly<Record<number, number>> = { 160: 220, 200: 275 }

/** Most channel loss of 10GBASE-LRM, dB, whichever multimode fibre (seen on the same page). */
export const lrmMostLossDb = 1.9

/** Longest link, m; null where the fibre is not specified for it. A budget that passes is not a reach that passes. */
export const fibreReachM = (kind: OpticalKind, fibre: FibreKind): number | null => fibreReachTable[kind][fibre] ?? null
