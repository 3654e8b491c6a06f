/**
 * Shares of a sawn stud or joist that may be taken away, and distances, in.
 * Source: IRC R502.8.1 and R602.6 as given on open-exam-prep.com, hinarratives.com and jlconline.com; second-hand.
 */
export const studRules = {
  /** A bearing or an exterior wall. */
  bearing: { holeShare: 0.4, notchShare: 0.25 },
  nonBearing: { holeShare: 0.6, notchShare: 0.4 },
  /** Between a hole's edge and the stud's. */
  edgeIn: 5 / 8,
  /**
   * A bearing stud with a hole up to this share passes if it is doubled, at most two in a row. From memory,
   * unverified.
   */
  doubledBearingHoleShare: 0.6,
  mostDoubledInARow: 2,
} as const

export const joistRules = {
  holeShare: 1 / 3,
  /** Between a hole and the top, the bottom, another hole or a notch. */
  edgeIn: 2,
  notchDepthShare: 1 / 6,
  endNotchDepthShare: 1 / 4,
  notchLengthShare: 1 / 3,
} as const

/** Sawn depths, in. Source: several joist-boring pages; 2x4 and the 2x6 stud from the same dressed sizes. */
export const sawnDepthsIn = { '2x4': 3.5, '2x6': 5.5, '2x8': 7.25, '2x10': 9.25, '2x12': 11.25 } as const

/** Kinds of member. Only sawn lumber has a rule of thumb; the others go by their maker's chart or an engineer. */
export const memberKinds = ['sawn', 'I-joist', 'open-web truss', 'roof truss', 'glulam', 'LVL', 'steel stud'] as const
export type MemberKind = (typeof memberKinds)[number]
