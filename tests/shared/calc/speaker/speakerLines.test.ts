import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  lineCurrentA,
  lumpedShare,
  mostTapsOf,
  mostTapsW,
  tapAtVoltageW,
  tapsTotalW,
} from '../../../../shared/calc/speaker/constantVoltage.ts'
import { dampingAtSpeaker, loopForDampingOhm, outputOhm } from '../../../../shared/calc/speaker/damping.ts'
import { inductiveCornerHz } from '../../../../shared/calc/speaker/inductiveCorner.ts'
import { speakerLadder } from '../../../../shared/calc/speaker/ladder.ts'
import { leastAreaMm2 } from '../../../../shared/calc/speaker/leastArea.ts'
import {
  convertLoss,
  lineLoss,
  longestLineM,
  type LossConvention,
  loopResistanceOhm,
  timesLonger,
} from '../../../../shared/calc/speaker/lineLoss.ts'
import { heatWPerM, linePower, voltsForPower } from '../../../../shared/calc/speaker/linePower.ts'
import { exactLineVoltage, lineLoadOhm, lineLoadPercent, withinLimit } from '../../../../shared/calc/speaker/load.ts'
import { parallelSharesW, seriesParallelOhm, seriesSharesW } from '../../../../shared/calc/speaker/sharing.ts'

const conventions: readonly LossConvention[] = ['impedance', 'decibel', 'voltage', 'power']
const ohms = fc.double({ min: 0.1, max: 1000, noNaN: true })

describe('damping', () => {
  it('is the amplifier’s own without a line, and sinks with one', () => {
    const source = outputOhm(8, 400) ?? Number.NaN
    expect(dampingAtSpeaker(8, source, 0)).toBeCloseTo(400, 9)
    expect(dampingAtSpeaker(8, source, 0.3)).toBeCloseTo(25, 9)
    expect(dampingAtSpeaker(8, 0, 0)).toBeNull()
  })

  it('comes back from the loop that a wanted damping allows', () => {
    fc.assert(
      fc.property(ohms, fc.integer({ min: 1, max: 100 }), fc.integer({ min: 101, max: 2000 }), (load, wanted, own) => {
        const loop = loopForDampingOhm(load, wanted, own) ?? Number.NaN
        expect((dampingAtSpeaker(load, outputOhm(load, own) ?? 0, loop) ?? 0) / wanted).toBeCloseTo(1, 9)
      }),
    )
    expect(loopForDampingOhm(8, 400, 25)).toBeNull()
  })
})

describe('power along a line', () => {
  it('parts into load and line, and nothing is lost on the way', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 200, noNaN: true }), ohms, ohms, (volts, load, loop) => {
        const power = linePower(volts, load, loop)
        expect((power?.speakerW ?? 0) + (power?.cableW ?? 0)).toBeCloseTo(power?.amplifierW ?? -1, 6)
      }),
    )
  })

  it('spends 0.0482 W/ft in 14 AWG at 75 W into 8 ohm (pro-amplifier manual)', () => {
    expect((heatWPerM(75, 8, 0.00515 / 0.3048) ?? 0) * 0.3048).toBeCloseTo(0.0482, 3)
    expect(voltsForPower(100, 8)).toBeCloseTo(28.284, 3)
  })
})

describe('sharing', () => {
  it('gives a 6 ohm loudspeaker beside an 8 ohm one a third more', () => {
    expect(parallelSharesW(Math.sqrt(800), [8, 6])).toEqual([expect.closeTo(100, 6), expect.closeTo(133.33, 2)])
    expect(seriesSharesW(Math.sqrt(800), [8, 8])).toEqual([expect.closeTo(25, 6), expect.closeTo(25, 6)])
    expect(seriesParallelOhm([[8, 8], [8, 8]])).toBeCloseTo(8, 9)
    expect(parallelSharesW(20, [])).toBeNull()
    expect(seriesParallelOhm([[8], []])).toBeNull()
  })

  it('adds up to what the source gives into all of it', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 100 }), fc.array(ohms, { minLength: 1, maxLength: 6 }), (volts, loads) => {
        const sum = (shares: number[] | null) => (shares ?? []).reduce((total, share) => total + share, 0)
        const seriesOhm = loads.reduce((total, load) => total + load, 0)
        expect(sum(seriesSharesW(volts, loads)) / (volts ** 2 / seriesOhm)).toBeCloseTo(1, 9)
        const admittance = loads.reduce((total, load) => total + 1 / load, 0)
        expect(sum(parallelSharesW(volts, loads)) / (volts ** 2 * admittance)).toBeCloseTo(1, 9)
      }),
    )
  })
})

describe('constant voltage', () => {
  // Load W, ohm at 25, 70.7 and 100 V, ampere at 70.7 and 100 V (EIA 70.7 V convention: 1 W is 5000 ohm).
  it.each([
    [1, 625, 5000, 10000, 0.014, 0.01],
    [2.5, 250, 2000, 4000, 0.035, 0.025],
    [6, 104.2, 833.3, 1666.7, 0.085, 0.06],
    [7.5, 83.33, 666.7, 1333.3, 0.106, 0.075],
    [30, 20.83, 166.7, 333.33, 0.424, 0.3],
    [100, 6.25, 50, 100, 1.414, 1],
    [240, 2.604, 20.83, 41.667, 3.394, 2.4],
    [500, 1.25, 10, 20, 7.071, 5],
  ])('%f W', (watts, at25, at70, at100, amps70, amps100) => {
    const exact = exactLineVoltage(70.7)
    expect((lineLoadOhm(25, watts) ?? 0) / at25).toBeCloseTo(1, 3)
    expect((lineLoadOhm(exact, watts) ?? 0) / at70).toBeCloseTo(1, 3)
    expect((lineLoadOhm(100, watts) ?? 0) / at100).toBeCloseTo(1, 3)
    expect(Math.abs((lineCurrentA(watts, exact) ?? 0) - amps70)).toBeLessThanOrEqual(0.0006)
    expect(lineCurrentA(watts, 100)).toBeCloseTo(amps100, 3)
  })

  it('takes ten 8 W taps on 100 W at 80 %, the exact boundary, and no eleventh', () => {
    expect(mostTapsOf(100, 8)).toBe(10)
    expect(withinLimit(lineLoadPercent(tapsTotalW([{ tapW: 8, count: 10 }]) ?? 0, 100) ?? 0, 80)).toBe(true)
    expect(withinLimit(lineLoadPercent(tapsTotalW([{ tapW: 8, count: 11 }]) ?? 0, 100) ?? 0, 80)).toBe(false)
    expect(mostTapsOf(30, 0.1)).toBe(240)
    expect(mostTapsW(30)).toBe(24)
    expect(mostTapsW(30, 1.1)).toBeNull()
    expect(tapsTotalW([{ tapW: 6, count: 1.5 }])).toBeNull()
    expect(tapsTotalW([])).toBe(0)
  })

  it('doubles a 70.7 V tap on 100 V', () => {
    expect(tapAtVoltageW(10, exactLineVoltage(70.7), 100)).toBeCloseTo(20, 9)
  })
})

describe('a line of taps', () => {
  const tenTaps = (count = 10) =>
    Array.from({ length: count }, () => ({ loopOhm: loopResistanceOhm(10, 13.3) ?? Number.NaN, loadOhm: 1000 }))

  it('loses 0.1265 dB at the last of ten 10 W taps, and 0.228 with all at the end', () => {
    expect(speakerLadder(tenTaps())?.lossDb.at(-1)).toBeCloseTo(0.1265, 4)
    expect(lineLoss(2.66, 100)?.decibel).toBeCloseTo(0.228, 3)
    expect(lineLoss(2.66 * (lumpedShare(10) ?? 0), 100)?.decibel).toBeCloseTo(0.1262, 4)
  })

  it('tends to half the length, and one tap is all of it', () => {
    expect(lumpedShare(1)).toBe(1)
    expect(lumpedShare(1e6)).toBeCloseTo(0.5, 5)
    expect(lumpedShare(0)).toBeNull()
  })

  it('loses more with every tap, never less', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 30 }), (count) => {
        const { lossDb = [] } = speakerLadder(tenTaps(count)) ?? {}
        expect(lossDb).toHaveLength(count)
        lossDb.forEach((loss, place) => expect(loss).toBeGreaterThanOrEqual(lossDb[place - 1] ?? 0))
      }),
    )
  })
})

describe('properties of loss', () => {
  it('says a loss by any convention and back', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 30, noNaN: true }),
        fc.constantFrom(...conventions),
        (decibel, convention) => {
          const other = convertLoss(decibel, 'decibel', convention) ?? Number.NaN
          expect(convertLoss(other, convention, 'decibel')).toBeCloseTo(decibel, 5)
        },
      ),
    )
  })

  it('loses just its limit at the longest length, and least area is what that conductor has', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 40, noNaN: true }),
        ohms,
        fc.double({ min: 0.5, max: 10, noNaN: true }),
        fc.constantFrom(...conventions),
        (limit, load, mm2, convention) => {
          const lengthM = longestLineM(limit, convention, load, 17.241 / mm2) ?? Number.NaN
          const loop = loopResistanceOhm(lengthM, 17.241 / mm2) ?? Number.NaN
          expect(lineLoss(loop, load)?.[convention]).toBeCloseTo(limit, 6)
          expect(leastAreaMm2(lengthM, load, limit, convention)).toBeCloseTo(mm2, 6)
        },
      ),
    )
  })

  it('lets 1 dB go 2.059 times as far as 0.5, and 3 dB 3.381 times as far as 1', () => {
    expect(timesLonger(0.5, 1)).toBeCloseTo(2.059, 3)
    expect(timesLonger(1, 3)).toBeCloseTo(3.381, 3)
    expect(timesLonger(0, 1)).toBeNull()
  })

  it('is nothing without resistance or length', () => {
    expect(lineLoss(0, 8)?.decibel).toBe(0)
    expect(loopResistanceOhm(0, 20)).toBe(0)
    expect(loopResistanceOhm(30, 20.948, 2)).toBeCloseTo((loopResistanceOhm(30, 20.948) ?? 0) / 2, 12)
  })
})

describe('inductance', () => {
  it('takes 3 dB at about 20 kHz from 300 ft into 8 ohm (loudspeaker manual)', () => {
    expect(inductiveCornerHz(8, 300 * 0.3048)).toBeCloseTo(20210, -1)
    expect(inductiveCornerHz(8, 0)).toBeNull()
  })
})
