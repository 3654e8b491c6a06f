import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mayReplace, replacementsOf } from '../../../../shared/calc/jacket/mayReplace.ts'
import { mayCrossReturnAir } from '../../../../shared/calc/jacket/returnAirCrossing.ts'
import { type CableInSpace, spaceFit } from '../../../../shared/calc/jacket/spaceFit.ts'
import { listedMarkings, standsInFor } from '../../../../shared/calc/jacket/substitution.table.ts'
import { entranceLengthMm, mayEnterUnlisted } from '../../../../shared/calc/jacket/unlistedEntrance.ts'
import { jacketRatings } from '../../../../shared/model/cableType.ts'

describe('substitution (what-when-how.com Tables 5.3 and 5.7)', () => {
  it('knows every rating that a cable type can have', () => {
    expect(jacketRatings.filter((rating) => rating !== 'none' && standsInFor[rating] === undefined)).toEqual([])
  })

  it('runs down the communications order and never up', () => {
    expect(listedMarkings.filter((have) => mayReplace(have, 'CMX'))).toEqual(['CMP', 'CMR', 'CM', 'CMG', 'CMX'])
    expect(listedMarkings.filter((have) => mayReplace(have, 'CMP'))).toEqual(['CMP'])
    expect(mayReplace('CM', 'CMG') && mayReplace('CMG', 'CM')).toBe(true)
  })

  it('lets CMP stand for every copper type', () => {
    const copper = listedMarkings.filter((marking) => /^(CM|CL|CATV|FPL)/.test(marking))
    expect(copper.filter((need) => !mayReplace('CMP', need))).toEqual([])
  })

  it('never gives a lower voltage class, CATV for CM, or conductive for non-conductive fibre', () => {
    const of = (pattern: RegExp) => listedMarkings.filter((marking) => pattern.test(marking))
    for (const have of of(/^CL2/))
      for (const need of of(/^(CL3|CM)/)) expect(mayReplace(have, need), `${have} ${need}`).toBe(false)
    for (const have of of(/^CATV/))
      for (const need of of(/^(CM|CL)/)) expect(mayReplace(have, need), `${have} ${need}`).toBe(false)
    for (const have of of(/^OFC/))
      for (const need of of(/^OFN/)) expect(mayReplace(have, need), `${have} ${need}`).toBe(false)
    for (const have of of(/^OF/))
      for (const need of of(/^C/)) expect(mayReplace(have, need), `${have} ${need}`).toBe(false)
  })

  it('never lets a lesser flame rating stand for a greater', () => {
    const rank = (marking: string) =>
      marking === 'PLTC' ? 1 : marking.endsWith('P') ? 3 : marking.endsWith('R') ? 2 : marking.endsWith('X') ? 0 : 1
    for (const need of listedMarkings)
      for (const have of replacementsOf(need)) expect(rank(have)).toBeGreaterThanOrEqual(rank(need))
  })

  it('carries on: what stands in for a stand-in stands in', () => {
    const marking = fc.constantFrom(...listedMarkings)
    fc.assert(
      fc.property(marking, marking, marking, (a, b, c) => !(mayReplace(a, b) && mayReplace(b, c)) || mayReplace(a, c)),
    )
  })

  it('gives unmarked cable nothing', () => {
    expect(listedMarkings.some((need) => mayReplace('none', need))).toBe(false)
  })
})

describe('spaces', () => {
  const cable: CableInSpace = { marking: 'CM', space: 'general', occupancy: 'other', outerDiameterMm: 5 }
  const reason = (change: Partial<CableInSpace>) => spaceFit({ ...cable, ...change })?.reason

  it('ask for a plenum marking in a plenum, or metal raceway', () => {
    expect(reason({ space: 'plenum', marking: 'CMR' })).toBe('plenum marking needed')
    expect(reason({ space: 'plenum', marking: 'CL2P' })).toBe('fits')
    expect(reason({ space: 'plenum', marking: 'CM', inMetalRaceway: true })).toBe('fits')
    expect(reason({ space: 'plenum', marking: 'CMR', occupancy: 'one or two family' })).toBe('plenum marking needed')
  })

  it('ask for a riser marking between floors, except in a one- or two-family dwelling', () => {
    expect(reason({ space: 'riser' })).toBe('riser marking needed')
    expect(reason({ space: 'riser', occupancy: 'multifamily' })).toBe('riser marking needed')
    expect(reason({ space: 'riser', occupancy: 'one or two family' })).toBe('fits')
    expect(reason({ space: 'riser', marking: 'OFNP' })).toBe('fits')
    expect(reason({ space: 'riser', inMetalRaceway: true })).toBe('fits')
  })

  it('take X types under 1/4 in in a small dwelling, elsewhere in raceway or exposed to 10 ft', () => {
    expect(reason({ marking: 'CMX', occupancy: 'one or two family', outerDiameterMm: 6.3 })).toBe('fits')
    expect(reason({ marking: 'CMX', occupancy: 'one or two family', outerDiameterMm: 6.35 })).toBe(
      'too thick for an X type',
    )
    expect(reason({ marking: 'CL2X' })).toBe('X type outside a dwelling')
    expect(reason({ marking: 'CL2X', inRaceway: true })).toBe('fits')
    expect(reason({ marking: 'CL2X', exposedMm: 3048 })).toBe('fits')
    expect(reason({ marking: 'CL2X', exposedMm: 3049 })).toBe('X type outside a dwelling')
  })

  it('ask the maker where it is wet, outdoors or underground', () => {
    expect(reason({ space: 'wet' })).toBe('wet rating needed')
    expect(reason({ space: 'outdoor', isOutdoorRated: true, marking: 'none' })).toBe('fits')
    expect(reason({ space: 'buried', isWetRated: true })).toBe('burial rating needed')
    expect(reason({ space: 'buried', isWetRated: true, inRaceway: true })).toBe('fits')
    expect(reason({ space: 'buried', inRaceway: true })).toBe('wet rating needed')
  })

  it('take no unlisted cable indoors, and judge no cable without a diameter', () => {
    expect(reason({ marking: 'none' })).toBe('not listed')
    expect(spaceFit({ ...cable, outerDiameterMm: 0 })).toBeNull()
  })
})

describe('unlisted cable from outside (NEC 800.48)', () => {
  const entry = { lengthMm: 15_240, isTerminated: true, space: 'general' as const }

  it('comes in 50 ft, terminated, and not through riser or plenum', () => {
    expect(mayEnterUnlisted(entry)).toBe(true)
    expect(mayEnterUnlisted({ ...entry, lengthMm: 15_241 })).toBe(false)
    expect(mayEnterUnlisted({ ...entry, isTerminated: false })).toBe(false)
    expect(mayEnterUnlisted({ ...entry, space: 'riser' })).toBe(false)
    expect(mayEnterUnlisted({ ...entry, space: 'plenum' })).toBe(false)
    expect(mayEnterUnlisted({ ...entry, lengthMm: -1 })).toBeNull()
  })

  it('counts from the end of bonded rigid conduit', () => {
    expect(entranceLengthMm(24_384, 12_192)).toBe(12_192)
    expect(entranceLengthMm(1000, 2000)).toBeNull()
  })
})

describe('a bay that returns air', () => {
  it('is crossed and not followed, and a duct is neither', () => {
    expect(mayCrossReturnAir('across')).toBe(true)
    expect(mayCrossReturnAir('along')).toBe(false)
    expect(mayCrossReturnAir('across', true)).toBe(false)
  })
})
