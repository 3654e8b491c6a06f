/** Arguments of a check row, as the file names them. */
export type Inputs = Readonly<Record<string, unknown>>

/** How a row's calculation is answered by the product's own code; undefined: by nothing. */
export type Answer = (inputs: Inputs) => unknown
export type Answers = Readonly<Record<string, Answer>>

/** Tables by what a row's formula calls them, the first that matches. */
export type FactAnswers = readonly (readonly [RegExp, Answer])[]

/** A number of the row; NaN where it has none, which every calculation answers with null. */
export const num = (inputs: Inputs, name: string, otherwise = Number.NaN): number => {
  const value = inputs[name]
  return typeof value === 'number' ? value : value === undefined ? otherwise : Number.NaN
}

export const text = (inputs: Inputs, name: string): string => {
  const value = inputs[name]
  return typeof value === 'string' || typeof value === 'number' ? String(value) : ''
}

export const list = (inputs: Inputs, name: string): unknown[] => {
  const value = inputs[name]
  return Array.isArray(value) ? value : []
}

export const nums = (inputs: Inputs, name: string): number[] => list(inputs, name).map(Number)
export const texts = (inputs: Inputs, name: string): string[] => list(inputs, name).map(String)

/** Pairs of numbers, such as [count, size]. */
export const pairs = (inputs: Inputs, name: string): [number, number][] =>
  list(inputs, name).map((pair) =>
    Array.isArray(pair) ? [Number(pair[0]), Number(pair[1])] : [Number.NaN, Number.NaN],
  )

/** A name of the file's among the product's own; undefined where there is none. */
export const oneOf = <T extends string>(value: string, names: readonly T[]): T | undefined =>
  names.find((name) => name === value)

/** The first entry whose pattern a name of the file's matches: the file's words for the product's. */
export const byWords = <T>(value: string, words: readonly (readonly [RegExp, T])[]): T | undefined =>
  words.find(([pattern]) => pattern.test(value))?.[1]

const mmPerFoot = 304.8
export const feet = (value: number) => value * mmPerFoot
export const metres = (value: number) => value * 1000
export const inches = (value: number) => value * 25.4

/** A result in millimetres given back in the row's unit. */
export const inFeet = (mm: number | null) => (mm === null ? null : mm / mmPerFoot)
export const inMetres = (mm: number | null) => (mm === null ? null : mm / 1000)
