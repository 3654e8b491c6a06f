import { describe, expect, it } from 'vitest'
import { readCheckRows } from '../../checks/checkRow.ts'
import { isSame, judgeRow } from '../../checks/judgeRow.ts'

describe('published values of the cabling calculations', () => {
  it.each(readCheckRows('fixtures/checks/cabling.json').map((row) => [row.id, row.fn, row.source, row] as const))(
    '%s %s (%s)',
    (_id, _fn, _source, row) => {
      const { got, expected, passed } = judgeRow(row)
      expect(passed, `got ${JSON.stringify(got)}, expected ${JSON.stringify(expected)}`).toBe(true)
    },
    20_000,
  )
})

describe('the comparison itself', () => {
  it('takes numbers within the tolerance, also in arrays and objects, and the rest exactly', () => {
    expect(isSame(1.04, 1, 0.05)).toBe(true)
    expect(isSame(1.06, 1, 0.05)).toBe(false)
    expect(isSame([1, 2.01], [1, 2], 0.02)).toBe(true)
    expect(isSame([1], [1, 2], 1)).toBe(false)
    expect(isSame({ a: 1.01, b: 'x' }, { a: 1, b: 'x' }, 0.02)).toBe(true)
    expect(isSame({ a: 1, c: 2 }, { a: 1 }, 1)).toBe(false)
    expect(isSame('1', 1, 1)).toBe(false)
    expect(isSame(null, 0, 1)).toBe(false)
    expect(isSame(Number.NaN, 1, 1)).toBe(false)
    expect(isSame(0.1 + 0.2, 0.3, 0)).toBe(true)
  })

  it('fails a row that nothing answers', () => {
    const row = { id: 'X', fn: 'no such calculation', formula: '', inputs: {}, expected: 1, source: 'none' }
    expect(judgeRow(row).passed).toBe(false)
    expect(judgeRow({ ...row, fn: 'fact', formula: 'no such table' }).passed).toBe(false)
  })
})
