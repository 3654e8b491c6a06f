import { usable } from '../usable.ts'

/**
 * Least distance from a bored hole, or a cable run along framing, to the face that is nailed, in. Source: NEC 300.4.
 */
export const nailClearanceIn = 1.25

/** Thickness of the steel plate or sleeve that stands in for the distance, in. Source: NEC 300.4. */
export const nailPlateThicknessIn = 1 / 16

/**
 * Whether a hole needs a steel plate: its edge is less than 1-1/4 in from the nearest face. A hole is centred unless
 * `offCentreIn` says how far it lies from the middle. Conduit is exempt. A 1 in hole centred in a 2x4 is just enough.
 * Null: a value that is no number, a hole of nothing, or one that does not fit in the member.
 * Source: NEC 300.4, taken up for communications cable by 800.24 (qastack diy 42030, 1588).
 */
export function needsNailPlate(depthIn: number, holeIn: number, offCentreIn = 0): boolean | null {
  if (!usable(depthIn, holeIn, offCentreIn) || depthIn <= 0 || holeIn <= 0) return null
  const edge = (depthIn - holeIn) / 2 - Math.abs(offCentreIn)
  return edge < 0 ? null : edge < nailClearanceIn - 1e-9
}

/**
 * Whether a cable that runs along a stud or joist this far from its face needs a plate. Null as above. NEC 300.4(D).
 */
export function needsPlateAlong(distanceToFaceIn: number): boolean | null {
  return usable(distanceToFaceIn) && distanceToFaceIn >= 0 ? distanceToFaceIn < nailClearanceIn - 1e-9 : null
}
