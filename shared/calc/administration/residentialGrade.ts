export interface GradeCables {
  /** Four-pair cables per location: 5e or better for grade 1; for grade 2 Cat 6 is advised. */
  twistedPair: number
  /** Series-6 coaxial cables. */
  coaxial: number
  /** Optional fibres. */
  optionalFibre: number
}

export type ResidentialGrade = 1 | 2

/**
 * Cables to each location by grade. Source: TIA-570-B, in several pages; -C, -D and -E changed the grades and were not
 * seen.
 */
export const residentialGrades: Record<ResidentialGrade, GradeCables> = {
  1: { twistedPair: 1, coaxial: 1, optionalFibre: 1 },
  2: { twistedPair: 2, coaxial: 2, optionalFibre: 2 },
}

/** Cables for so many locations of one grade. Null: a count that is no whole number, or negative. Source above. */
export function cablesForGrade(grade: ResidentialGrade, locations: number): GradeCables | null {
  if (!Number.isSafeInteger(locations) || locations < 0) return null
  const { twistedPair, coaxial, optionalFibre } = residentialGrades[grade]
  return {
    twistedPair: twistedPair * locations,
    coaxial: coaxial * locations,
    optionalFibre: optionalFibre * locations,
  }
}
