/** Newtons in a pound-force: exact by definition, 0.45359237 kg x 9.80665 m/s2. */
export const newtonsPerPoundForce = 4.4482216152605

export interface PullTension {
  mostN: number
  poundsForce: number
  source: string
}

/** Most pull on a cable. For coaxial and speaker cable the maker's figure counts; no published one was found. */
export const pullTensions = {
  'four-pair': { mostN: 110, poundsForce: 25, source: 'TIA-568, repeated in public UTP installation pages' },
  'horizontal fibre': { mostN: 222, poundsForce: 50, source: 'TIA-568, for 2 and 4 fibres' },
} as const satisfies Record<string, PullTension>
