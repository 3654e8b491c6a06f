export interface TypicalDiameter {
  cable: string
  outerDiameterIn: number
  outerDiameterMm: number
}

const row = (cable: string, outerDiameterIn: number, outerDiameterMm: number): TypicalDiameter => ({
  cable, outerDiameterIn, outerDiameterMm,
})

/**
 * Typical outer diameters, for a company to replace by its own cable's. From memory, unverified, except 0.24 in for
 * four-pair cable, which is published in MIL-HDBK-1012/3.
 */
export const typicalDiameters: readonly TypicalDiameter[] = [
  row('Cat5e', 0.2, 5.1),
  row('Cat6', 0.23, 5.8),
  row('Cat6 with spline', 0.24, 6.1),
  row('Cat6A U/UTP', 0.3, 7.6),
  row('Cat6A F/UTP', 0.29, 7.4),
  row('RG6 dual shield', 0.27, 6.9),
  row('RG6 quad shield', 0.297, 7.5),
  row('RG11', 0.405, 10.3),
  row('speaker 16/2', 0.27, 6.9),
  row('speaker 16/4', 0.33, 8.4),
  row('speaker 14/2', 0.31, 7.9),
  row('speaker 14/4', 0.38, 9.7),
  row('speaker 12/2', 0.37, 9.4),
  row('speaker 12/4', 0.47, 11.9),
  row('18/2', 0.17, 4.3),
  row('22/4', 0.15, 3.8),
  row('22/6', 0.17, 4.3),
  row('fibre 2-strand round', 0.19, 4.8),
  row('HDMI passive 28 AWG', 0.29, 7.4),
  row('HDMI 24 AWG', 0.36, 9.1),
]
