import { type Code128Set, code128Values } from './code128.table.ts'
import { code128Check } from './code128Check.ts'
import { code128Pattern } from './code128Pattern.ts'

export interface Code128Symbol {
  start: number
  /** Data and switch values, in order. */
  values: readonly number[]
  check: number
  /** Whole symbol without quiet zones, 1 dark and 0 light. */
  modules: string
}

interface Way {
  cost: number
  values: readonly number[]
  next: Code128Set
  taken: number
}

const sets: readonly Code128Set[] = ['B', 'A', 'C']
const startOf: Record<Code128Set, number> = {
  A: code128Values.startA,
  B: code128Values.startB,
  C: code128Values.startC,
}
const switchTo: Record<Code128Set, number> = { A: code128Values.codeA, B: code128Values.codeB, C: code128Values.codeC }

/** Longest text that is encoded; a label has far less. */
const mostCharacters = 128

/**
 * The shortest Code 128 symbol for a text of ASCII characters, with the code sets chosen by dynamic programming.
 * Null: an empty text, more than 128 characters, or one outside ASCII. Source: ISO/IEC 15417.
 */
export function encodeCode128(text: string): Code128Symbol | null {
  const codes = Array.from(text, (character) => character.charCodeAt(0))
  if (codes.length === 0 || codes.length > mostCharacters || codes.some((code) => code > 127)) return null
  const ways = shortestWays(codes)
  let set = sets.reduce((best, other) => (costAt(ways, 0, other) < costAt(ways, 0, best) ? other : best))
  const start = startOf[set]
  const values: number[] = []
  let at = 0
  while (at < codes.length) {
    const way = ways[at]?.[set]
    if (way === undefined) return null
    values.push(...way.values)
    at += way.taken
    set = way.next
  }
  const check = code128Check(start, values)
  if (check === null) return null
  const modules = [start, ...values, check, code128Values.stop].map((value) => code128Pattern(value) ?? '').join('')
  return { start, values, check, modules }
}

type Ways = readonly Partial<Record<Code128Set, Way>>[]

const costAt = (ways: Ways, at: number, set: Code128Set) => ways[at]?.[set]?.cost ?? Infinity

/** From the end backward: the cheapest way to encode the rest of the text when standing in each set. */
function shortestWays(codes: readonly number[]): Ways {
  const ways: Partial<Record<Code128Set, Way>>[] = Array.from({ length: codes.length }, () => ({}))
  const rest = (at: number, set: Code128Set) => (at >= codes.length ? 0 : costAt(ways, at, set))
  for (let at = codes.length - 1; at >= 0; at--) {
    const here = ways[at] ?? {}
    for (const set of sets) {
      for (const way of stepsFrom(codes, at, set)) {
        const cost = way.values.length + rest(at + way.taken, way.next)
        if (cost < (here[set]?.cost ?? Infinity)) here[set] = { ...way, cost }
      }
    }
  }
  return ways
}

/** Ways to encode the next one or two characters from a set, switching or shifting where that helps. */
function stepsFrom(codes: readonly number[], at: number, set: Code128Set): Omit<Way, 'cost'>[] {
  const code = codes[at] ?? 0
  const found: Omit<Way, 'cost'>[] = []
  for (const target of sets) {
    const before = target === set ? [] : [switchTo[target]]
    const pair = target === 'C' ? pairValue(code, codes[at + 1]) : null
    if (pair !== null) found.push({ values: [...before, pair], next: 'C', taken: 2 })
    const value = target === 'C' ? null : valueIn(target, code)
    if (value !== null) found.push({ values: [...before, value], next: target, taken: 1 })
    if (value !== null && set !== target && set !== 'C') {
      found.push({ values: [code128Values.shift, value], next: set, taken: 1 })
    }
  }
  return found
}

function pairValue(first: number, second: number | undefined): number | null {
  const digit = (code: number | undefined) => (code !== undefined && code >= 48 && code <= 57 ? code - 48 : null)
  const [tens, ones] = [digit(first), digit(second)]
  return tens === null || ones === null ? null : 10 * tens + ones
}

/** Value of an ASCII character in set A or B; null where that set has no such character. */
function valueIn(set: 'A' | 'B', code: number): number | null {
  if (set === 'B') return code >= 32 ? code - 32 : null
  return code < 32 ? code + 64 : code < 96 ? code - 32 : null
}
