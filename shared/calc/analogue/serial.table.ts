/**
 * Limits of control lines. Source: vendor knowledge pages, an instrument maker's table, ANSI E1.27-2 and an ESTA
 * report, public copies; `rs485LongestM` and the DMX timing from memory, unverified; `dmxPlannedM` common practice, no
 * source.
 */
export const serialLimits = {
  rs232MostPf: 2500,
  /** 50 ft of 50 pF/ft cable, as printed. */
  rs232NominalFt: 50,
  /** Rate times length by an instrument maker; publishers differ by more than six times. */
  rs232BitMetresPerSecond: 960_000,
  /** Rate times length, a careful rule. */
  rs485BitMetresPerSecond: 1e8,
  rs485LongestM: 1200,
  unitLoads: 32,
  unitLoadOhm: 12_000,
  terminationOhm: 120,
  dmxBitsPerSecond: 250_000,
  /** Eleven bits of 4 µs. */
  dmxSlotUs: 44,
  dmxLeastBreakUs: 92,
  dmxLeastMarkUs: 12,
  dmxMostSlots: 512,
  dmxPlannedM: 300,
  dmxFixtureManualsM: 500,
  dmxAbsoluteM: 1000,
} as const
