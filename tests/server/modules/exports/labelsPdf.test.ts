import { execFileSync } from 'node:child_process'
import { createWriteStream, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { finished } from 'node:stream/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { labelsPdf } from '../../../../server/modules/exports/labelsPdf.ts'
import type { LabelItem } from '../../../../shared/labels/labelItems.ts'
import { layoutLabels } from '../../../../shared/labels/layoutLabels.ts'
import { labelChoices, type LabelChoiceId } from '../../../../shared/labels/stocks.ts'

let folder = ''
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'labels-'))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

const items = (count: number): LabelItem[] =>
  Array.from({ length: count }, (_, i) => ({
    runId: `r${i}`, end: 'b', copy: 1, text: `${['PAT', 'MED', 'GRT', 'ATT'][i % 4]}${i + 1}-${'SDVCPF'[i % 6]}${1 + (i % 3)}`, note: '14/2 · 62 ft',
    printedBefore: i % 7 === 0 ? 1 : 0, cableDiameterMm: 4 + (i % 9),
  }))

async function print(choice: LabelChoiceId, count: number): Promise<string> {
  const path = join(folder, `${choice}.pdf`)
  await finished(labelsPdf(layoutLabels(items(count), { choice, startAt: 1, offsetXMm: 0, offsetYMm: 0 }), { title: 'Labels' }).pipe(createWriteStream(path)))
  return path
}

describe('labelsPdf', () => {
  it.each(labelChoices.map((choice) => choice.id))('%s: another program decodes every code, rendered at 300 dpi, to exactly the label', async (choice) => {
    const wanted = items(96)
    const pdf = await print(choice, wanted.length)
    execFileSync('pdftoppm', ['-r', '300', '-gray', pdf, pdf.replace('.pdf', '')])
    const images = readdirSync(folder).filter((name) => name.startsWith(`${choice}-`) && name.endsWith('.pgm'))
    const read = images.flatMap((name) => execFileSync('zbarimg', ['-q', '--raw', '-Sdisable', '-Scode128.enable', join(folder, name)], { encoding: 'utf8' }).trim().split('\n'))
    expect([...new Set(read)].sort()).toEqual(wanted.map((item) => item.text).sort())
  }, 60_000)
  it('is a page of true size', async () => {
    const info = execFileSync('pdfinfo', [await print('a4-65', 3)], { encoding: 'utf8' })
    expect(info).toMatch(/Page size:\s+595\.2\d+ x 841\.8\d+ pts \(A4\)/)
  })
})
