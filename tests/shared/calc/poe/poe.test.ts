import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { awgResistanceOhmPerKm } from '../../../../shared/calc/conductor/resistance.ts'
import { poeClasses, poeClassPower, poeTypeLimits } from '../../../../shared/calc/poe/poe.table.ts'
import { poeChannelOhm, poeDelivery } from '../../../../shared/calc/poe/poeChannel.ts'
import { poeClassFor } from '../../../../shared/calc/poe/poeClassFor.ts'
import { canFeed, constantPowerSupply, mostLoadW } from '../../../../shared/calc/power/constantPower.ts'

describe('classes', () => {
  it('are chosen at their exact device power, and not past it', () => {
    for (const name of poeClasses) {
      if (name === 0) continue
      expect(poeClassFor(poeClassPower[name].deviceW)).toBe(name)
    }
    expect(poeClassFor(12.95)).toBe(3)
    expect(poeClassFor(12.96)).toBe(4)
    expect(poeClassFor(25.6)).toBe(5)
    expect(poeClassFor(71.4)).toBeNull()
    expect(poeClassFor(-1)).toBeNull()
  })

  // IEEE 802.3 clauses 33 and 145: worst voltage and resistance leave what the device may take.
  it.each([
    [1, 44, 20], [2, 44, 20], [3, 44, 20], [4, 50, 12.5], [5, 50, 6.25], [6, 50, 6.25], [7, 52, 6.25], [8, 52, 6.25],
  ] as const)('class %i follows from %f V and %f ohm to 0.063 W', (name, volts, ohm) => {
    const delivery = poeDelivery(poeClassPower[name].sourceW, volts, ohm)
    expect(Math.abs((delivery?.deviceW ?? 0) - poeClassPower[name].deviceW)).toBeLessThanOrEqual(0.063)
  })

  it('leave the least voltages of the types', () => {
    expect(poeDelivery(15.4, 44, 20)?.deviceV).toBeCloseTo(poeTypeLimits[1].deviceLeastV, 9)
    expect(poeDelivery(30, 50, 12.5)?.deviceV).toBeCloseTo(poeTypeLimits[2].deviceLeastV, 9)
    expect(poeDelivery(60, 50, 6.25)?.deviceV).toBeCloseTo(poeTypeLimits[3].deviceLeastV, 9)
    expect(poeDelivery(90, 52, 6.25)?.deviceV).toBeCloseTo(poeTypeLimits[4].deviceLeastV, 0)
    expect(poeDelivery(75, 52, 6.25)?.deviceV).toBeCloseTo(42.9, 0)
    expect(poeDelivery(30, 50, 12.5)?.currentA).toBe(poeTypeLimits[2].mostA)
  })
})

describe('a device of constant power behind a channel', () => {
  // Source V, ohm, device W; total A, device V, source W, loss W: computed twice by separate programs.
  it.each([
    [44, 20, 12.95, 0.35, 37, 15.4, 2.45],
    [50, 12.5, 25.5, 0.6, 42.5, 30, 4.5],
    [50, 6.25, 40, 0.9016, 44.36, 45.08, 5.08],
    [50, 6.25, 51, 1.2, 42.5, 60, 9],
    [52, 6.25, 62, 1.4424, 42.99, 75, 13],
    [52, 6.25, 71.3, 1.7315, 41.18, 90.04, 18.74],
    [48, 2.105, 12.95, 0.2731, 47.43, 13.11, 0.16],
    [54, 8.421, 25.5, 0.5133, 49.68, 27.72, 2.22],
    [54, 4.211, 51, 1.0266, 49.68, 55.44, 4.44],
    [54, 3.339, 71.3, 1.4505, 49.16, 78.33, 7.03],
  ])('%f V, %f ohm, %f W', (volts, ohm, watts, amps, left, source, loss) => {
    const supply = constantPowerSupply(volts, ohm, watts)
    expect(supply?.currentA).toBeCloseTo(amps, 3)
    expect(supply?.loadV).toBeCloseTo(left, 1)
    expect(supply?.sourceW).toBeCloseTo(source, 1)
    expect(supply?.lossW).toBeCloseTo(loss, 1)
  })

  it('leaves half the voltage at the very most, and null past it', () => {
    const most = mostLoadW(50, 12.5) ?? Number.NaN
    expect(most).toBe(50)
    expect(constantPowerSupply(50, 12.5, most)?.loadV).toBeCloseTo(25, 6)
    expect(constantPowerSupply(50, 12.5, 50.001)).toBeNull()
    expect(canFeed(50, 12.5, 50)).toBe(true)
    expect(canFeed(50, 12.5, 60)).toBe(false)
    expect(canFeed(Number.NaN, 12.5, 60)).toBeNull()
  })

  it('is the inverse of what arrives, and loses nothing that it does not burn', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 10, max: 57, noNaN: true }),
        fc.double({ min: 0.001, max: 30, noNaN: true }),
        fc.double({ min: 0, max: 0.99, noNaN: true }),
        (volts, ohm, share) => {
          const watts = share * (mostLoadW(volts, ohm) ?? 100)
          const supply = constantPowerSupply(volts, ohm, watts)
          expect(supply).not.toBeNull()
          if (!supply) return
          expect(supply.sourceW - supply.lossW).toBeCloseTo(watts, 5)
          expect(supply.loadV).toBeGreaterThanOrEqual(volts / 2 - 1e-6)
          expect(poeDelivery(supply.sourceW, volts, ohm)?.deviceW).toBeCloseTo(watts, 5)
        },
      ),
    )
  })
})

describe('channel', () => {
  it('is r L over two pairs and half of it over four, never the loop of one pair', () => {
    const ohmPerKm = awgResistanceOhmPerKm(24) ?? Number.NaN
    expect(poeChannelOhm(100, ohmPerKm, 2)).toBeCloseTo(8.421, 3)
    expect(poeChannelOhm(100, ohmPerKm, 4)).toBeCloseTo(4.211, 3)
    expect(poeChannelOhm(100, awgResistanceOhmPerKm(23) ?? 0, 2)).toBeCloseTo(6.678, 3)
    expect(poeChannelOhm(100, ohmPerKm, 2)).toBeLessThan(poeTypeLimits[2].channelOhm)
    expect(poeChannelOhm(-1, ohmPerKm, 2)).toBeNull()
  })
})
