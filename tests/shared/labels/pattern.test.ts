import { describe, expect, it } from 'vitest'
import { defaultLabelPattern, labelFor, labelPatternSchema, parsePattern } from '../../../shared/labels/pattern.ts'

const facts = { level: 'L1', room: 'PAT', plate: '1', kind: 'S', cable: '12/2-DB', serial: 212 }
const none = () => false

describe('labelFor', () => {
  it.each([
    [defaultLabelPattern, 'PAT1-S1'],
    ['{level}-{room}{plate}-{kind}{n2}', 'L1-PAT1-S01'],
    ['W{serial4}', 'W0212'],
    ['{room}.{cable}.{n}', 'PAT.122DB.1'],
  ])('%s gives %s', (pattern, label) => {
    expect(labelFor(pattern, facts, none)).toBe(label)
  })
  it('counts on past labels that are taken', () => {
    const taken = new Set(['PAT1-S1', 'PAT1-S2'])
    expect(labelFor(defaultLabelPattern, facts, (label) => taken.has(label))).toBe('PAT1-S3')
  })
  it('stays unique where a serial alone counts and somebody has it', () => {
    expect(labelFor('W{serial4}', facts, (label) => label === 'W0212')).toBe('W0212.2')
  })
})

describe('a label pattern', () => {
  it.each([
    ['{room}{plate}', 'two runs would get the same label'],
    ['{roomm}{n}', '{roomm} is not a token'],
    ['{room} {n}', '" " cannot stand in a label pattern'],
    ['{n}-{n}', 'Use {n} once'],
  ])('%s is refused: %s', (pattern, sentence) => {
    expect(parsePattern(pattern)).toMatchObject({ message: expect.stringContaining(sentence) })
    expect(labelPatternSchema.safeParse(pattern).success).toBe(false)
  })
  it('is kept as written when it is good', () => {
    expect(labelPatternSchema.parse(' {room}-{n} ')).toBe('{room}-{n}')
  })
})
