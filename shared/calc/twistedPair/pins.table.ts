export const pinSchemes = ['T568A', 'T568B'] as const
export type PinScheme = (typeof pinSchemes)[number]

/** Colours at pins 1 to 8. Source: TIA-568, two public tables. */
export const pinColours: Readonly<Record<PinScheme, readonly string[]>> = {
  T568A: ['white/green', 'green', 'white/orange', 'blue', 'white/blue', 'orange', 'white/brown', 'brown'],
  T568B: ['white/orange', 'orange', 'white/green', 'blue', 'white/blue', 'green', 'white/brown', 'brown'],
}

/** Tip and ring pins of pairs 1 to 4: blue, orange, green, brown. Same source. */
export const pairPins: Readonly<Record<PinScheme, readonly (readonly [number, number])[]>> = {
  T568A: [[5, 4], [3, 6], [1, 2], [7, 8]],
  T568B: [[5, 4], [1, 2], [3, 6], [7, 8]],
}

export const pairColours = ['blue', 'orange', 'green', 'brown'] as const
