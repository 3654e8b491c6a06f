import { z } from 'zod'

/** What a pattern may be made of, with the words that explain each token. */
export const patternTokens = {
  level: 'code of the level',
  room: 'code of the room at the far end',
  plate: 'number of the plate in its room',
  kind: 'letter of the cable: S, D, V, C, P, F',
  cable: 'code of the cable, such as 16/2 (signs left out)',
  n: 'counts 1, 2, 3 among labels that are otherwise alike; {n2} writes two digits',
  serial: 'counts through the whole job; {serial4} writes four digits',
} as const
export type PatternToken = keyof typeof patternTokens

export type PatternPart = { readonly text: string } | { readonly token: PatternToken; readonly digits: number }

const tokenAt = /\{([a-z]+)(\d?)\}/gy
const plainAt = /[A-Za-z0-9_./+-]+/gy

/** Reads a label pattern such as "{room}{plate}-{kind}{n}". Returns its parts, or a sentence that says what is wrong. */
export function parsePattern(pattern: string): { parts: PatternPart[] } | { message: string } {
  const parts: PatternPart[] = []
  let index = 0
  while (index < pattern.length) {
    tokenAt.lastIndex = plainAt.lastIndex = index
    const token = tokenAt.exec(pattern)
    if (token) {
      const name = token[1]!
      if (!(name in patternTokens)) return { message: `{${name}} is not a token. Use ${tokenList()}` }
      parts.push({ token: name as PatternToken, digits: Number(token[2] || '1') })
      index = tokenAt.lastIndex
      continue
    }
    const plain = plainAt.exec(pattern)
    if (!plain) return { message: `"${pattern[index]}" cannot stand in a label pattern. Use letters, digits, - _ . / + and tokens in braces` }
    parts.push({ text: plain[0] })
    index = plainAt.lastIndex
  }
  if (!parts.some((part) => 'token' in part && (part.token === 'n' || part.token === 'serial')))
    return { message: 'Add {n} or {serial}: without a number that counts, two runs would get the same label' }
  if (parts.filter((part) => 'token' in part && part.token === 'n').length > 1) return { message: 'Use {n} once' }
  return { parts }
}

const tokenList = () => Object.keys(patternTokens).map((name) => `{${name}}`).join(' ')

/** A company's own numbering: text and tokens, at least one of which counts. */
export const labelPatternSchema = z
  .string()
  .trim()
  .min(1, 'Write a label pattern')
  .max(60, 'A label pattern has at most 60 characters')
  .superRefine((pattern, context) => {
    const parsed = parsePattern(pattern)
    if ('message' in parsed) context.addIssue({ code: 'custom', message: parsed.message })
  })

export const defaultLabelPattern = '{room}{plate}-{kind}{n}'

export interface LabelFacts {
  readonly level: string
  readonly room: string
  readonly plate: string
  readonly kind: string
  readonly cable: string
  readonly serial: number
}

/**
 * The labels that a pattern can give a run, the first choice first. Where the pattern counts with {n}, the number goes
 * up to 10,000 and then the serial number tells runs apart; where it does not, a suffix counts without end.
 */
export function* labelsFor(pattern: string, facts: LabelFacts): Generator<string> {
  const parsed = parsePattern(pattern)
  const parts: PatternPart[] = 'parts' in parsed ? parsed.parts : [{ token: 'serial', digits: 4 }]
  const write = (n: number) => parts.map((part) => ('text' in part ? part.text : fill(part.token, part.digits, facts, n))).join('').slice(0, 24)
  const counts = parts.some((part) => 'token' in part && part.token === 'n')
  for (let n = 1; !counts || n <= 10_000; n++) yield counts ? write(n) : n === 1 ? write(1) : `${write(1).slice(0, 20)}.${n}`
  yield `${write(1).slice(0, 16)}.${facts.serial}`
}

/**
 * The label that a pattern gives for a run: the first that nobody has, or else the last there is.
 * Labels are compared without regard to capitals, because people read them so.
 */
export function labelFor(pattern: string, facts: LabelFacts, isTaken: (label: string) => boolean): string {
  let last = ''
  for (const label of labelsFor(pattern, facts)) {
    if (!isTaken(label)) return label
    last = label
  }
  return last
}

function fill(token: PatternToken, digits: number, facts: LabelFacts, n: number): string {
  if (token === 'n') return String(n).padStart(digits, '0')
  if (token === 'serial') return String(facts.serial).padStart(digits, '0')
  return token === 'cable' ? facts.cable.replace(/[^A-Za-z0-9]/g, '') : facts[token]
}
