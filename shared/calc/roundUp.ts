/**
 * The next whole number, where a sum that should be whole but is off by rounding of floating point stays where it is:
 * 100 x 1.1 is 110, not 111. The allowance is one part in 10^9.
 */
export const ceilOf = (value: number): number => Math.ceil(value - Math.max(1, Math.abs(value)) * 1e-9) + 0

/** The whole number below, with the same allowance upward. */
export const floorOf = (value: number): number => Math.floor(value + Math.max(1, Math.abs(value)) * 1e-9) + 0
