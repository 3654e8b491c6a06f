import { separationEn2000Mm, separationEn50174Mm } from '../../../shared/calc/separation/en50174.ts'
import {
  containments,
  type Divider2000,
  type Screening,
  segregationClasses,
} from '../../../shared/calc/separation/en50174.table.ts'
import { isClearOfPower, type PowerWiring } from '../../../shared/calc/separation/necSeparation.ts'
import { type EnclosureDivider, mayShareEnclosure } from '../../../shared/calc/separation/sharedEnclosure.ts'
import { separationTia569In } from '../../../shared/calc/separation/tia569.ts'
import type { Tia569Condition } from '../../../shared/calc/separation/tia569.table.ts'
import { type Answers, byWords, inches, num, text } from './readInputs.ts'

const conditions: readonly (readonly [RegExp, Tia569Condition])[] = [
  [/^open-open/, 'open-open'],
  [/^open-metal/, 'open-metal'],
  [/^metal-metal/, 'metal-metal'],
  [/transformer|motor/i, 'transformer or motor'],
  [/fluorescent/i, 'fluorescent'],
]
const wirings: readonly (readonly [RegExp, PowerWiring])[] = [
  [/single|open|conductor/i, 'single conductors'],
  [/\bNM\b/, 'NM cable'],
  [/\bUF\b/, 'UF cable'],
  [/\bAC\b|armou?r/i, 'AC cable'],
  [/sheath|\bMC\b/i, 'metal-sheathed cable'],
  [/raceway|conduit|EMT/i, 'raceway'],
]
const dividers: readonly (readonly [RegExp, EnclosureDivider])[] = [
  [/none/i, 'none'],
  [/listed|divider/i, 'listed divider'],
  [/barrier|permanent/i, 'permanent barrier'],
]
const dividers2000: readonly (readonly [RegExp, Divider2000])[] = [
  [/none|without/i, 'none'],
  [/alu/i, 'aluminium'],
  [/steel/i, 'steel'],
]
const screenings: readonly (readonly [RegExp, Screening])[] = [[/^u/i, 'unscreened'], [/^s/i, 'screened']]

export const separationAnswers: Answers = {
  en50174: (i) => {
    const segregation = segregationClasses.find((name) => text(i, 'cls').toLowerCase().startsWith(name))
    const containment = containments.find((name) => text(i, 'containment').startsWith(name))
    return segregation && containment && separationEn50174Mm(segregation, containment, num(i, 'circuits'))
  },
  en2000: (i) => {
    const [power, data] = [byWords(text(i, 'power'), screenings), byWords(text(i, 'it'), screenings)]
    const divider = byWords(text(i, 'divider'), dividers2000)
    return power && data && divider && separationEn2000Mm(power, data, divider)
  },
  tia569_1990: (i) => {
    const condition = byWords(text(i, 'condition'), conditions)
    return condition && separationTia569In(condition, num(i, 'kva'))
  },
  nec2in: (i) => {
    const power = byWords(text(i, 'power'), wirings)
    return (
      power && isClearOfPower({ power, gapMm: inches(num(i, 'gap_in')), hasNonconductor: i['nonconductor'] === true })
    )
  },
  same_box: (i) => {
    const divider = byWords(text(i, 'barrier'), dividers)
    return divider && mayShareEnclosure(divider)
  },
}
