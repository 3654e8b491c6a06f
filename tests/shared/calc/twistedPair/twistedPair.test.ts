import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  categoryBandwidthMhz,
  ethernetKinds,
  ethernetReach,
  ethernetReachM,
  pairCategories,
} from '../../../../shared/calc/twistedPair/ethernetReach.table.ts'
import { pairColours, pairPins, pinColours, pinSchemes } from '../../../../shared/calc/twistedPair/pins.table.ts'
import {
  channelM,
  cordFactor,
  cordsForFactorM,
  crossConnectCordsM,
  longestCordsM,
  permanentLinkM,
  workAreaCordM,
} from '../../../../shared/calc/twistedPair/reach.ts'
import {
  deratedLengthM,
  deratedLinearM,
  meanTemperatureC,
  temperatureFactor,
} from '../../../../shared/calc/twistedPair/temperature.ts'

describe('cords', () => {
  // Horizontal m, all cords of 24 and of 26 AWG, m: the exact values of the open-office formula of TIA-568.
  it.each([
    [90, 10, 8],
    [85, 14.17, 11.33],
    [80, 18.33, 14.67],
    [75, 22.5, 18],
    [70, 26.67, 21.33],
  ])('%i m of horizontal cable', (horizontal, of24, of26) => {
    expect(longestCordsM(horizontal, '24')).toBeCloseTo(of24, 2)
    expect(longestCordsM(horizontal, '26')).toBeCloseTo(of26, 2)
  })

  it('floors to the printed work-area cords, or one less where those are rounded up', () => {
    const printed = { '24': [5, 9, 13, 17, 22], '26': [4, 7, 11, 14, 17] } as const
    ;[90, 85, 80, 75, 70].forEach((horizontal, place) => {
      for (const awg of ['24', '26'] as const) {
        const exact = workAreaCordM(horizontal, cordFactor[awg], crossConnectCordsM[awg]) ?? Number.NaN
        expect(Math.abs(exact - printed[awg][place]!)).toBeLessThan(0.9)
      }
    })
  })

  it('stops at 22 m, at a link over 90 m, and where the cross-connect takes all', () => {
    expect(workAreaCordM(50, 0.2, 5)).toBe(22)
    expect(longestCordsM(90, '24')).toBeCloseTo(channelM - permanentLinkM, 9)
    expect(longestCordsM(90.01, '24')).toBeNull()
    expect(workAreaCordM(90, 0.2, 10)).toBeCloseTo(0, 9)
    expect(workAreaCordM(90, 0.5, 9)).toBeNull()
  })

  it('leaves less cord to a longer link, and to cords that lose more', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 89, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (h, d) => {
        expect(cordsForFactorM(h + 1, d)).toBeLessThan(cordsForFactorM(h, d) ?? 0)
        expect(cordsForFactorM(h, d + 0.1)).toBeLessThan(cordsForFactorM(h, d) ?? 0)
      }),
    )
  })
})

describe('temperature', () => {
  // TIA-568-C.2 Annex G: 84 m at 40 °C seen on a tester-maker page, the rest from memory; up to 0.8 m over 90/factor.
  it.each([[20, 90], [25, 89], [30, 87], [35, 85.5], [40, 84], [45, 81.7], [50, 79.5], [55, 77.2], [60, 75]])(
    'shortens 90 m at %i °C to at most %f',
    (celsius, printed) => {
      const length = deratedLengthM(90, celsius, false) ?? Number.NaN
      expect(length).toBeLessThanOrEqual(printed)
      expect(printed - length).toBeLessThan(0.85)
    },
  )

  it('is 83.3 and 75 m by division, 82.8 and 72 m by the other wording', () => {
    expect(deratedLengthM(90, 40, false)).toBeCloseTo(83.33, 2)
    expect(deratedLengthM(90, 60, false)).toBeCloseTo(75, 9)
    expect(deratedLinearM(90, 40, false)).toBeCloseTo(82.8, 9)
    expect(deratedLinearM(90, 60, false)).toBeCloseTo(72, 9)
  })

  it('gives screened cable 1.08 at 60 °C, cold no bonus, and heat past 60 no answer', () => {
    expect(temperatureFactor(60, true)).toBeCloseTo(1.08, 9)
    expect(temperatureFactor(-20, false)).toBe(1)
    expect(temperatureFactor(60.01, true)).toBeNull()
    expect(deratedLengthM(90, 61, false)).toBeNull()
  })

  it('never lengthens, and the linear wording is never the longer', () => {
    fc.assert(
      fc.property(fc.double({ min: -40, max: 60, noNaN: true }), fc.boolean(), (celsius, screened) => {
        const divided = deratedLengthM(90, celsius, screened) ?? Number.NaN
        expect(divided).toBeLessThanOrEqual(90)
        expect(deratedLinearM(90, celsius, screened)).toBeLessThanOrEqual(divided + 1e-9)
      }),
    )
  })

  it('weighs places by length', () => {
    expect(meanTemperatureC([{ lengthM: 30, temperatureC: 60 }, { lengthM: 60, temperatureC: 21 }])).toBeCloseTo(34, 9)
    expect(meanTemperatureC([])).toBeNull()
    expect(meanTemperatureC([{ lengthM: -1, temperatureC: 20 }])).toBeNull()
  })
})

describe('Ethernet', () => {
  it('goes 37 m on category 6 at 10 gigabit, 55 where neighbours allow, and not on 5e', () => {
    expect(ethernetReachM('10GBASE-T', '6')).toBe(37)
    expect(ethernetReachM('10GBASE-T', '6', 'benign')).toBe(55)
    expect(ethernetReachM('10GBASE-T', '6A')).toBe(100)
    expect(ethernetReachM('10GBASE-T', '5e', 'benign')).toBeNull()
    expect(ethernetReachM('5GBASE-T', '5e')).toBeNull()
    expect(ethernetReachM('5GBASE-T', '5e', 'benign')).toBe(100)
    expect(ethernetReachM('40GBASE-T', '6A')).toBeNull()
  })

  it('never goes farther on a lesser category, nor farther for sure than possibly', () => {
    for (const kind of ethernetKinds) {
      const reaches = pairCategories.map((category) => ethernetReach[kind][category]?.possibleM ?? 0)
      expect(reaches).toEqual([...reaches].sort((a, b) => a - b))
      for (const category of pairCategories) {
        const { sureM, possibleM } = ethernetReach[kind][category] ?? { sureM: null, possibleM: null }
        expect(sureM ?? 0).toBeLessThanOrEqual(possibleM ?? 0)
      }
    }
  })

  it('has the bandwidths of the categories', () => {
    expect(pairCategories.slice(2).map((category) => categoryBandwidthMhz[category])).toEqual([
      100, 250, 500, 600, 1000, 2000,
    ])
  })
})

describe('pins', () => {
  it.each(pinSchemes)('puts the colours of %s where its pairs are', (scheme) => {
    pairPins[scheme].forEach(([tip, ring], pair) => {
      expect(pinColours[scheme][ring - 1]).toBe(pairColours[pair])
      expect(pinColours[scheme][tip - 1]).toBe(`white/${pairColours[pair]}`)
    })
    expect([...pairPins[scheme].flat()].sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8])
  })

  it('differs in pairs 2 and 3 alone', () => {
    expect(pairPins.T568A[1]).toEqual(pairPins.T568B[2])
    expect(pairPins.T568A[2]).toEqual(pairPins.T568B[1])
    expect(pairPins.T568A[0]).toEqual(pairPins.T568B[0])
    expect(pairPins.T568A[3]).toEqual(pairPins.T568B[3])
  })
})
