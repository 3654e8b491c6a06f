import { describe, expect, it } from 'vitest'
import { awgResistanceOhmPerKm } from '../../../../shared/calc/conductor/resistance.ts'
import { iecMaximumOhmPerKm } from '../../../../shared/calc/conductor/iec60228.table.ts'
import { leastAreaMm2 } from '../../../../shared/calc/speaker/leastArea.ts'
import {
  convertLoss,
  lineLoss,
  longestLineM,
  loopResistanceOhm,
} from '../../../../shared/calc/speaker/lineLoss.ts'
import { linePower } from '../../../../shared/calc/speaker/linePower.ts'
import { lineLoadOhm } from '../../../../shared/calc/speaker/load.ts'
import { loopForDampingOhm } from '../../../../shared/calc/speaker/damping.ts'

const metres = (feet: number) => feet * 0.3048
const solid = (awg: number) => awgResistanceOhmPerKm(awg) ?? Number.NaN
const loop = (lengthM: number, ohmPerKm: number) => loopResistanceOhm(lengthM, ohmPerKm) ?? Number.NaN

describe('table T1, 5 % of impedance, one-way feet (widely reprinted hi-fi article)', () => {
  it.each([
    [22, [3, 6, 9, 12]],
    [20, [5, 10, 15, 20]],
    [18, [8, 16, 24, 32]],
    [16, [12, 24, 36, 48]],
    [14, [20, 40, 60, 80]],
    [12, [30, 60, 90, 120]],
    [10, [50, 100, 150, 200]],
  ])('%i AWG comes to 4.7 to 5.2 %% of every load', (awg, lengths) => {
    ;[2, 4, 6, 8].forEach((load, place) => {
      const percent = lineLoss(loop(metres(lengths[place] ?? 0), solid(awg)), load)?.impedance
      expect(percent).toBeGreaterThan(4.7)
      expect(percent).toBeLessThan(5.2)
    })
  })
})

describe('table T2, dB over 100 ft one way (pro-audio store)', () => {
  // Resistance of one conductor in ohm per 1000 ft is inferred from the same table: it tests convention and scaling.
  it.each([
    [10, 1.03, [0.44, 0.22, 0.11]],
    [12, 1.655, [0.69, 0.35, 0.18]],
    [14, 2.62, [1.07, 0.55, 0.28]],
    [16, 4.17, [1.65, 0.86, 0.44]],
    [18, 6.63, [2.49, 1.33, 0.69]],
  ])('%i AWG loses what is printed, from stranded copper', (awg, perKft, printed) => {
    ;[4, 8, 16].forEach((load, place) => {
      const loss = lineLoss(loop(metres(100), perKft / 0.3048), load)?.decibel ?? Number.NaN
      expect(Math.abs(loss - (printed[place] ?? 0))).toBeLessThanOrEqual(0.011)
    })
    expect(perKft / 0.3048 / solid(awg)).toBeGreaterThan(1.02)
    expect(perKft / 0.3048 / solid(awg)).toBeLessThan(1.05)
  })
})

describe('tables T3 to T8', () => {
  it.each([[18, 0.207], [16, 0.131], [14, 0.082], [12, 0.052], [10, 0.033]])(
    'T3: 5 m of %i AWG is %f ohm there and back (amplifier manual)',
    (awg, ohm) => expect(Math.abs(loop(5, solid(awg)) / ohm - 1)).toBeLessThan(0.02),
  )

  it.each([[2.5, [30, 15, 10]], [4, [50, 25, 17]], [6, [74, 37, 25]]])(
    'T4: lengths of %f mm2 lose 0.43 to 0.46 dB (amplified-controller manual)',
    (mm2, lengths) => {
      ;[8, 4, 2.7].forEach((load, place) => {
        const decibel = lineLoss(loop(lengths[place] ?? 0, 17.2 / mm2), load)?.decibel
        expect(decibel).toBeGreaterThan(0.425)
        expect(decibel).toBeLessThan(0.465)
      })
    },
  )

  it('T5: 160 ft of 10 AWG into 8 ohm at 24.5 V (pro-amplifier manual)', () => {
    const power = linePower(24.5, 8, 160 * 0.00204)
    expect(power?.amplifierW).toBeCloseTo(72, 0)
    expect(power?.speakerW).toBeCloseTo(69, 0)
    expect(power?.cableW).toBeCloseTo(2.83, 2)
  })

  it('T6: damping of 25 behind an amplifier of 400 is 0.3 ohm and 0.32 dB at 8 ohm (pro-audio article)', () => {
    const ohm = loopForDampingOhm(8, 25, 400) ?? Number.NaN
    expect(ohm).toBeCloseTo(0.3, 9)
    expect(lineLoss(ohm, 8)?.decibel).toBeCloseTo(0.32, 2)
  })

  it('T7: 1000 ft of 18 AWG bring 63.4 of 100 W on 70.7 V (worksheet after a sound-engineering handbook)', () => {
    const load = lineLoadOhm(Math.sqrt(5000), 100) ?? Number.NaN
    expect(load).toBeCloseTo(50, 9)
    expect(loop(metres(1000), solid(18))).toBeCloseTo(12.77, 2)
    // 63.45: the worksheet cuts rather than rounds.
    expect(Math.floor((linePower(Math.sqrt(5000), load, 12.77)?.speakerW ?? 0) * 10) / 10).toBe(63.4)
    expect(lineLoss(12.77, load)?.decibel).toBeCloseTo(1.98, 2)
  })

  it('T8: 300 m, 100 W, 10 % on 100 V want 0.945 mm2 (sizing note), which is 0.915 dB', () => {
    expect(leastAreaMm2(300, 100, 10, 'voltage', 17.5)).toBeCloseTo(0.945, 6)
    expect(convertLoss(10, 'voltage', 'decibel')).toBeCloseTo(0.915, 3)
  })
})

describe('the four conventions of one cable', () => {
  // Rc/Z percent, dB, share in the cable percent, power missing at the loudspeaker percent.
  it.each([
    [1, 0.086, 0.99, 1.97],
    [2, 0.172, 1.96, 3.88],
    [3, 0.257, 2.91, 5.74],
    [5, 0.424, 4.76, 9.3],
    [5.925, 0.5, 5.59, 10.87],
    [10, 0.828, 9.09, 17.36],
    [11.11, 0.915, 10, 19],
    [12, 0.984, 10.71, 20.28],
    [12.2, 1, 10.87, 20.56],
    [15, 1.214, 13.04, 24.39],
    [20, 1.584, 16.67, 30.56],
    [41.25, 3, 29.2, 49.88],
    [100, 6.021, 50, 75],
  ])('%f %% of the load', (impedance, decibel, voltage, power) => {
    const loss = lineLoss(impedance / 100, 1)
    expect(loss?.decibel).toBeCloseTo(decibel, 3)
    expect(loss?.voltage).toBeCloseTo(voltage, 2)
    expect(Math.abs((loss?.power ?? 0) - power)).toBeLessThanOrEqual(0.011)
  })
})

describe('longest lines, computed twice by separate programs', () => {
  const loads = [2, 4, 6, 8, 16]
  // Solid copper at 20 °C, one-way feet: 5 % of the load, 0.5 dB, 0.2 dB, 10 %, 1 dB.
  it.each([
    [18, [7.8, 15.7, 23.5, 31.3, 62.6], [9.3, 18.6, 27.8, 37.1, 74.2], [3.6, 7.3, 10.9, 14.6, 29.2]],
    [16, [12.5, 24.9, 37.4, 49.8, 99.6], [14.8, 29.5, 44.3, 59, 118.1], [5.8, 11.6, 17.4, 23.2, 46.4]],
    [14, [19.8, 39.6, 59.4, 79.2, 158.4], [23.5, 46.9, 70.4, 93.9, 187.7], [9.2, 18.4, 27.7, 36.9, 73.8]],
    [12, [31.5, 63, 94.4, 125.9, 251.9], [37.3, 74.6, 111.9, 149.2, 298.5], [14.7, 29.3, 44, 58.7, 117.3]],
    [10, [50.1, 100.1, 150.2, 200.2, 400.5], [59.3, 118.6, 178, 237.3, 474.6], [23.3, 46.6, 70, 93.3, 186.6]],
  ])('%i AWG', (awg, fivePercent, halfDb, fifthDb) => {
    loads.forEach((load, place) => {
      const feet = (limit: number, convention: 'impedance' | 'decibel') =>
        (longestLineM(limit, convention, load, solid(awg)) ?? Number.NaN) / 0.3048
      expect(Math.abs(feet(5, 'impedance') - (fivePercent[place] ?? 0))).toBeLessThanOrEqual(0.06)
      expect(Math.abs(feet(0.5, 'decibel') - (halfDb[place] ?? 0))).toBeLessThanOrEqual(0.06)
      expect(Math.abs(feet(0.2, 'decibel') - (fifthDb[place] ?? 0))).toBeLessThanOrEqual(0.06)
    })
  })

  it.each([
    [0.75, [1.9, 3.8, 5.8, 7.7, 15.4], [2.3, 4.6, 6.8, 9.1, 18.2]],
    [1, [2.6, 5.1, 7.7, 10.3, 20.5], [3, 6.1, 9.1, 12.2, 24.3]],
    [1.5, [3.8, 7.5, 11.3, 15, 30.1], [4.5, 8.9, 13.4, 17.8, 35.6]],
    [2.5, [6.3, 12.5, 18.8, 25.1, 50.1], [7.4, 14.9, 22.3, 29.7, 59.4]],
    [4, [10.1, 20.2, 30.3, 40.4, 80.8], [12, 23.9, 35.9, 47.9, 95.8]],
    [6, [15.2, 30.3, 45.5, 60.6, 121.2], [18, 35.9, 53.9, 71.8, 143.6]],
  ])('%f mm2 of class 5, metres', (mm2, fivePercent, halfDb) => {
    const ohmPerKm = iecMaximumOhmPerKm(mm2, 'class 5/6') ?? Number.NaN
    loads.forEach((load, place) => {
      const atFive = longestLineM(5, 'impedance', load, ohmPerKm) ?? Number.NaN
      const atHalf = longestLineM(0.5, 'decibel', load, ohmPerKm) ?? Number.NaN
      expect(Math.abs(atFive - (fivePercent[place] ?? 0))).toBeLessThanOrEqual(0.06)
      expect(Math.abs(atHalf - (halfDb[place] ?? 0))).toBeLessThanOrEqual(0.06)
    })
  })
})

describe('constant-voltage lengths for 0.5 dB, all of the load at the end', () => {
  it.each([
    [18, [354, 118, 71, 29], [707, 236, 141, 59]],
    [16, [562, 187, 112, 47], [1124, 375, 225, 94]],
    [14, [894, 298, 179, 74], [1788, 596, 358, 149]],
    [12, [1421, 474, 284, 118], [2843, 948, 569, 237]],
  ])('%i AWG, metres', (awg, at70, at100) => {
    ;[20, 60, 100, 240].forEach((watts, place) => {
      const length = (volts: number) =>
        longestLineM(0.5, 'decibel', lineLoadOhm(volts, watts) ?? Number.NaN, solid(awg)) ?? Number.NaN
      expect(Math.abs(length(Math.sqrt(5000)) - (at70[place] ?? 0))).toBeLessThanOrEqual(0.6)
      expect(Math.abs(length(100) - (at100[place] ?? 0))).toBeLessThanOrEqual(0.6)
    })
  })
})
