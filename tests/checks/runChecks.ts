import { readCheckRows } from './checkRow.ts'
import { judgeRow } from './judgeRow.ts'

const files = process.argv.slice(2)
if (files.length === 0) {
  console.error('Name one or more files of check rows: npm run checks -- fixtures/checks/cabling.json')
  process.exit(2)
}

const shown = (value: unknown) => JSON.stringify(value) ?? String(value)
let passed = 0
let failed = 0
for (const row of files.flatMap(readCheckRows)) {
  const verdict = judgeRow(row)
  if (verdict.passed) {
    passed++
    continue
  }
  failed++
  console.log(`${row.id}: got ${shown(verdict.got)}, expected ${shown(verdict.expected)} (${row.source})`)
}
console.log(`${passed} passed, ${failed} failed`)
process.exitCode = failed === 0 ? 0 : 1
