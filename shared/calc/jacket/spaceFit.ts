import type { SpaceClass } from '../../model/place.ts'
import { usable } from '../usable.ts'
import { type ListedMarking } from './substitution.table.ts'

/**
 * Who lives in the building: code relaxes the riser rule in a one- or two-family dwelling, not in a multifamily one.
 */
export type Occupancy = 'one or two family' | 'multifamily' | 'other'

export interface CableInSpace {
  marking: ListedMarking | 'none'
  space: SpaceClass
  occupancy: Occupancy
  outerDiameterMm: number
  /** Inside metal raceway, or for a riser in a fireproof shaft. */
  inMetalRaceway?: boolean
  /** Inside any raceway. */
  inRaceway?: boolean
  /** Length that lies open to view, mm, where nothing conceals it; null: concealed. */
  exposedMm?: number | null
  /** Fit for the place by its maker's word. */
  isWetRated?: boolean
  isOutdoorRated?: boolean
  isBuriedRated?: boolean
}

export type SpaceReason =
  | 'fits' | 'not listed' | 'plenum marking needed' | 'riser marking needed' | 'too thick for an X type'
  | 'X type outside a dwelling' | 'wet rating needed' | 'outdoor rating needed' | 'burial rating needed'

export interface SpaceFit {
  fits: boolean
  reason: SpaceReason
}

/**
 * An X type in a dwelling is thinner than this, mm (1/4 in). For CATVX 3/8 in is remembered; the stricter stands here.
 */
export const xTypeBelowMm = 6.35
/** Outside a dwelling an X type may lie exposed this far, mm (10 ft). */
export const xTypeExposedMm = 3048

const isPlenum = (marking: ListedMarking) => marking.endsWith('P')
const isRiser = (marking: ListedMarking) => marking.endsWith('R')
const isX = (marking: ListedMarking) => marking.endsWith('X')
const no = (reason: SpaceReason): SpaceFit => ({ fits: false, reason })
const yes: SpaceFit = { fits: true, reason: 'fits' }

/**
 * Whether a cable's marking suits the space it lies in. Null: a diameter that is no number, or not above nothing.
 * Plenum: a P type, or any listed cable in metal raceway (NEC 300.22, 725.179(A)). Riser: an R or P type; general
 * types in metal raceway or a fireproof shaft, and in a one- or two-family dwelling, which needs no riser marking
 * (800.154). X types: under 1/4 in in such a dwelling; elsewhere in raceway or exposed up to 10 ft (1987 Article 800
 * summary). Wet, outdoors, underground: the maker's rating (from memory, unverified); no listing is asked for outside
 * the building. Advice: local code and the inspector decide.
 */
export function spaceFit(cable: CableInSpace): SpaceFit | null {
  if (!usable(cable.outerDiameterMm) || cable.outerDiameterMm <= 0) return null
  switch (cable.space) {
    case 'wet':
      return cable.isWetRated === true ? yes : no('wet rating needed')
    case 'outdoor':
      return cable.isOutdoorRated === true ? yes : no('outdoor rating needed')
    case 'buried':
      // A raceway under the ground counts as wet inside.
      if (cable.inRaceway === true || cable.inMetalRaceway === true) {
        return cable.isWetRated === true || cable.isBuriedRated === true ? yes : no('wet rating needed')
      }
      return cable.isBuriedRated === true ? yes : no('burial rating needed')
    default:
      return indoors(cable, cable.space)
  }
}

function indoors(cable: CableInSpace, space: 'general' | 'riser' | 'plenum'): SpaceFit {
  const { marking, inMetalRaceway = false } = cable
  if (marking === 'none') return no('not listed')
  if (space === 'plenum') return isPlenum(marking) || inMetalRaceway ? yes : no('plenum marking needed')
  if (isPlenum(marking) || isRiser(marking)) return yes
  if (space === 'riser') {
    if (inMetalRaceway) return yes
    if (cable.occupancy !== 'one or two family') return no('riser marking needed')
  }
  return isX(marking) ? xType(cable) : yes
}

function xType(cable: CableInSpace): SpaceFit {
  if (cable.occupancy === 'one or two family' && cable.outerDiameterMm < xTypeBelowMm - 1e-9) return yes
  if (cable.inRaceway === true || cable.inMetalRaceway === true) return yes
  const exposed = cable.exposedMm ?? null
  if (exposed !== null && exposed >= 0 && exposed <= xTypeExposedMm + 1e-9) return yes
  return no(cable.occupancy === 'one or two family' ? 'too thick for an X type' : 'X type outside a dwelling')
}
