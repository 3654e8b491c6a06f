import { describe, expect, it } from 'vitest'
import { readCheckRows } from '../../checks/checkRow.ts'
import { judgeRow } from '../../checks/judgeRow.ts'

describe('published values of the electrical calculations', () => {
  it.each(readCheckRows('fixtures/checks/electrical.json').map((row) => [row.id, row.fn, row.source, row] as const))(
    '%s %s (%s)',
    (_id, _fn, _source, row) => {
      const { got, expected, passed } = judgeRow(row)
      expect(passed, `got ${JSON.stringify(got)}, expected ${JSON.stringify(expected)}`).toBe(true)
    },
  )
})
