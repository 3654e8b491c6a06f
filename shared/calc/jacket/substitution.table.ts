import type { JacketRating } from '../../model/cableType.ts'

/** A marking that a listing laboratory gives. PLTC is power-limited tray cable. */
export type ListedMarking = Exclude<JacketRating, 'none'> | 'PLTC'

/**
 * Which markings may stand in for each, step by step; the relation is transitive.
 * Source: what-when-how.com Tables 5.3 (NEC 1996) and 5.7 (NEC 1999). MP types and FPL for CL were withdrawn later and
 * are left out, from memory. FPL arrows other than CM, CMR, CMP, and all CATV arrows: from memory, unverified.
 * CATV never stands in for CM; Class 2 never for Class 3; conductive fibre never for non-conductive.
 */
export const standsInFor: Record<ListedMarking, readonly ListedMarking[]> = {
  CMP: [],
  CMR: ['CMP'],
  CM: ['CMR', 'CMG'],
  CMG: ['CMR', 'CM'],
  CMX: ['CM', 'CMG'],
  CL3P: ['CMP'],
  CL3R: ['CL3P', 'CMR'],
  CL3: ['CL3R', 'CM', 'CMG', 'PLTC'],
  CL3X: ['CL3', 'CMX'],
  CL2P: ['CL3P'],
  CL2R: ['CL3R', 'CL2P'],
  CL2: ['CL3', 'CL2R'],
  CL2X: ['CL3X', 'CL2'],
  FPLP: ['CMP'],
  FPLR: ['FPLP', 'CMR'],
  FPL: ['FPLR', 'CM', 'CMG'],
  CATVP: ['CMP'],
  CATVR: ['CATVP', 'CMR'],
  CATV: ['CATVR', 'CM', 'CMG'],
  CATVX: ['CATV', 'CMX'],
  OFNP: [],
  OFNR: ['OFNP'],
  OFN: ['OFNR', 'OFNG'],
  OFNG: ['OFNR', 'OFN'],
  OFCP: ['OFNP'],
  OFCR: ['OFNR', 'OFCP'],
  OFC: ['OFCR', 'OFCG', 'OFN', 'OFNG'],
  OFCG: ['OFCR', 'OFC', 'OFN', 'OFNG'],
  PLTC: [],
}

export const listedMarkings = Object.keys(standsInFor) as readonly ListedMarking[]
