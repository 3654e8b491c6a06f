import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dbuOfDbv, voltsOfDbu } from '../../../../shared/calc/analogue/audioLevel.ts'
import {
  cornerHz,
  longestAtCapacitanceM,
  longestAtLossM,
  lowPassLossDb,
} from '../../../../shared/calc/analogue/capacitance.ts'
import { dmxRefreshHz, fullDmxFrame, longestAtRateM, unitLoadsOhm } from '../../../../shared/calc/analogue/serial.ts'
import { serialLimits } from '../../../../shared/calc/analogue/serial.table.ts'
import { endOfLineOhm, longestZoneM, zoneStates, zoneWireM } from '../../../../shared/calc/analogue/supervisedLoop.ts'
import { awgResistanceOhmPerKm } from '../../../../shared/calc/conductor/resistance.ts'

const feet = (metres: number | null) => (metres ?? Number.NaN) / 0.3048

describe('capacitance', () => {
  it('lets 600 ohm go 132.6 m to -3 dB at 20 kHz, and 100 ohm 405 m to -1 dB', () => {
    expect(cornerHz(600, 132.6)).toBeCloseTo(20000, -2)
    expect(longestAtLossM(1, 100, 20000)).toBeCloseTo(404.9, 0)
    expect(longestAtLossM(1, 10000, 20000)).toBeCloseTo(4.05, 2)
    const halfPowerDb = 10 * Math.log10(2)
    const share = (longestAtLossM(1, 600, 20000) ?? 0) / (longestAtLossM(halfPowerDb, 600, 20000) ?? 1)
    expect(share).toBeCloseTo(0.509, 3)
  })

  it('is 12.4 kHz for 8 kilohm and 20 ft at 80 pF/ft (audio formula page)', () => {
    expect(cornerHz(8000, 20 * 0.3048, 80 / 0.3048)).toBeCloseTo(12434, -1)
  })

  it('costs 0.07 dB at 20 kHz for a microsecond (magazine, 1991)', () => {
    expect(lowPassLossDb(1000, 1000, 20000)).toBeCloseTo(0.068, 3)
    expect(lowPassLossDb(0, 1000, 20000)).toBe(0)
  })

  it('loses just its limit at the longest length, and 3 dB at its corner', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 20, noNaN: true }),
        fc.double({ min: 10, max: 50000, noNaN: true }),
        fc.double({ min: 20, max: 20000, noNaN: true }),
        (loss, ohm, hz) => {
          const length = longestAtLossM(loss, ohm, hz) ?? Number.NaN
          expect(lowPassLossDb(ohm, length * 100, hz)).toBeCloseTo(loss, 6)
          const corner = cornerHz(ohm, length) ?? Number.NaN
          expect(lowPassLossDb(ohm, length * 100, corner)).toBeCloseTo(10 * Math.log10(2), 6)
        },
      ),
    )
  })

  it('lets RS-232 go 50, 83 and 147 ft at 50, 30 and 17 pF/ft', () => {
    const lengths = [50, 30, 17].map((pf) => longestAtCapacitanceM(serialLimits.rs232MostPf, pf / 0.3048))
    expect(lengths.map((length) => Math.floor(feet(length) + 1e-9))).toEqual([50, 83, 147])
  })
})

describe('serial lines', () => {
  it.each([[9600, 100], [19200, 50], [38400, 25], [115200, 8]])('%i baud go %i m (instrument maker)', (baud, metres) =>
    expect(Math.floor(longestAtRateM(serialLimits.rs232BitMetresPerSecond, baud) ?? 0)).toBe(metres),
  )

  it('shares 12 kilohm among 32 unit loads: 375 ohm', () => {
    expect(unitLoadsOhm(serialLimits.unitLoads)).toBe(375)
    expect(unitLoadsOhm(0)).toBeNull()
  })

  it('refreshes a full DMX universe 44 times a second, and less of it more often', () => {
    expect(dmxRefreshHz()).toBeCloseTo(44.1, 1)
    expect(dmxRefreshHz({ ...fullDmxFrame, slots: 24 })).toBeGreaterThan(44.2)
    expect(dmxRefreshHz({ ...fullDmxFrame, slots: 513 })).toBeNull()
  })
})

describe('supervised loops', () => {
  // One-way feet to the end-of-line resistor at 100 ohm (alarm-panel sheet).
  it.each([[24, 1900], [22, 3000], [20, 4900], [18, 7800], [16, 12450], [14, 19800]])(
    '%i AWG goes %i ft',
    (awg, printed) => {
      const length = feet(longestZoneM(100, awgResistanceOhmPerKm(awg) ?? Number.NaN))
      expect(Math.abs(length / printed - 1)).toBeLessThan(0.034)
    },
  )

  // Feet of wire, tinned copper at 75 °C (fire-panel manual): twice the run.
  it.each([[8.08, 12376], [5.08, 19685], [3.19, 31347], [2.01, 49751]])(
    '%f ohm/kft is %i ft of wire',
    (perKft, printed) => {
      const ohmPerKm = perKft / 0.3048
      expect(Math.abs(feet(zoneWireM(100, ohmPerKm)) - printed)).toBeLessThan(16)
      expect(zoneWireM(100, ohmPerKm)).toBeCloseTo(2 * (longestZoneM(100, ohmPerKm) ?? 0), 6)
    },
  )

  it('sees 5600 ohm when secure and 11200 when violated (alarm-panel manual)', () => {
    expect(endOfLineOhm(5600, zoneStates.secure)).toBe(5600)
    expect(endOfLineOhm(5600, zoneStates.violated)).toBe(11200)
    expect(endOfLineOhm(5600, zoneStates.short)).toBe(0)
    expect(endOfLineOhm(5600, 0.5)).toBeNull()
  })
})

describe('audio levels', () => {
  it('has +4 dBu at 1.228 V and -10 dBV at -7.78 dBu', () => {
    expect(voltsOfDbu(0)).toBeCloseTo(0.7746, 4)
    expect(voltsOfDbu(4)).toBeCloseTo(1.2277, 4)
    expect(dbuOfDbv(-10)).toBeCloseTo(-7.782, 3)
    expect(voltsOfDbu(dbuOfDbv(-10) ?? 0)).toBeCloseTo(10 ** -0.5, 9)
  })
})
