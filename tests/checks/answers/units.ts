/** A result given back in another unit; null stays null. */
export const scaled = (value: number | null, factor: number): number | null => (value === null ? null : value * factor)

export const metresPerFoot = 0.3048

/** Ohm per 1000 ft as ohm/km. */
export const perKm = (ohmPerKft: number) => ohmPerKft / metresPerFoot

/** Feet as metres. */
export const ftAsM = (feet: number) => feet * metresPerFoot

/** Metres given back as feet. */
export const mAsFt = (value: number | null) => scaled(value, 1 / metresPerFoot)

/** A result that goes on into the next calculation, where NaN is what is impossible. */
export const orNaN = (value: number | null): number => value ?? Number.NaN
