import { execFileSync } from 'node:child_process'
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { phone, startWorld, type World } from './support/world.ts'

let world: World
beforeAll(async () => {
  world = await startWorld()
})
afterAll(() => world.stop())

const job = '/jobs/heron-point-14'

/** A room of the section, by its name; clicks go into it at shares of its width and height. */
async function clickInRoom(page: Page, name: string, x: number, y: number) {
  const bay = page.locator(`.bay[aria-label^="${name},"]`)
  await bay.waitFor()
  const box = (await bay.boundingBox())!
  await page.mouse.click(box.x + box.width * x, box.y + box.height * y)
}
async function pick(page: Page, tool: string, list: string, what: string) {
  await page.getByRole('button', { name: tool, exact: true }).click()
  await page.getByLabel(`Find in ${list}`).fill(what)
  await page.keyboard.press('Enter')
}

describe('from a wire that is too thin to a traced one', () => {
  it('the designer joins a plate to the rack, is told that the wire is too thin, and changes it with one click', async () => {
    const { page, faults } = await world.enter('designer@larkhook.example')
    await page.getByText('Heron Point, lot 14').click()
    await page.locator('.bay[aria-label^="Patio,"]').waitFor()

    await pick(page, 'Run', 'cables', '16/2')
    await clickInRoom(page, 'Patio', 0.25, 0.8)
    await page.keyboard.press('Escape')
    await page.getByText('PAT4-S1').first().waitFor()
    await pick(page, 'Device', 'devices', 'outdoor speaker, 8')
    const plate = page.locator('.vue-flow__node', { has: page.getByText('PAT4', { exact: true }) }).first()
    const box = (await plate.count()) ? await plate.boundingBox() : null
    if (box) await page.mouse.click(box.x + box.width / 2, box.y + box.height / 3)
    else await clickInRoom(page, 'Patio', 0.25, 0.8)
    await page.keyboard.press('Escape')

    await page.keyboard.press('/')
    await page.keyboard.type('PAT4-S1')
    await page.keyboard.press('Enter')
    await page.getByText(/16 AWG loses 0\.\d\d dB at \d+ ft into 8 ohm; the limit is 0\.50 dB/).first().waitFor()
    await page.getByRole('button', { name: 'Change to 14/2' }).click()
    await page.getByText(/16 AWG loses/).first().waitFor({ state: 'detached' })
    await page.getByText(/14\/2/).first().waitFor()
    // Another person opens the job only once the server has it all.
    await expect.poll(async () => JSON.stringify(await (await page.request.get(`${world.address}/api${job}`)).json())).toMatch(/"cableTypeId":"cable-14-2"[^}]*}[^}]*}[^}]*"label":"PAT4-S1"/)
    expect(faults).toEqual([])
    await page.context().close()
  })

  it('the crew exports the schedule, prints the labels, and records what it pulled', async () => {
    const { page, context, faults } = await world.enter('lead@larkhook.example')
    await page.goto(`${world.address}${job}/schedule`)
    await page.getByLabel('Find in schedule').fill('PAT4-S1')
    await page.getByText('PAT4-S1').first().waitFor()
    const [workbook] = await Promise.all([page.waitForEvent('download'), page.getByText('Export to spreadsheet').click()])
    const xlsx = join(world.folder, 'schedule.xlsx')
    await workbook.saveAs(xlsx)
    const csv = openElsewhere(xlsx)
    const line = csv.split('\n').find((each) => each.startsWith('"PAT4-S1",'))!
    expect(line).toContain('14/2')
    expect(csv.split('\n')[0]).toContain('Length, ft')
    const shown = await page.locator('.row', { hasText: 'PAT4-S1' }).first().locator('.length').innerText()
    expect(cellsOf(csv, 'PAT4-S1')['Length, ft']).toBe(shown.trim())

    await page.goto(`${world.address}${job}/labels`)
    const [sheets] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Print to PDF' }).click()])
    const pdf = join(world.folder, 'labels.pdf')
    await sheets.saveAs(pdf)
    await page.getByText('recorded as printed').waitFor()
    expect(decode(pdf)).toContain('PAT4-S1')

    const onPhone = await context.newPage()
    await onPhone.setViewportSize(phone)
    await onPhone.goto(`${world.address}${job}/field/pull`)
    await onPhone.getByText('PAT4-S1').click()
    for (const digit of '1247') await onPhone.getByRole('button', { name: digit, exact: true }).click()
    await onPhone.getByRole('button', { name: /Mark at the plate/ }).click()
    for (const digit of '1331') await onPhone.getByRole('button', { name: digit, exact: true }).click()
    await onPhone.getByText('84 ft').first().waitFor()
    await onPhone.getByRole('button', { name: 'Pulled', exact: true }).click()
    await onPhone.waitForURL((url) => !url.pathname.endsWith('PAT4') && url.pathname.includes('/field/pull'))
    await page.goto(`${world.address}${job}/schedule`)
    await page.getByLabel('Find in schedule').fill('PAT4-S1')
    const row = page.locator('.row', { hasText: 'PAT4-S1' }).first()
    await expect.poll(() => row.innerText()).toMatch(/pulled/)
    await expect.poll(() => row.locator('.pulled').innerText()).toBe('84')
    expect(faults).toEqual([])
    await context.close()
  })

  it('the trim-out tech types a label and sees the whole way to the amplifier channel', async () => {
    const { page, faults } = await world.enter('technician@larkhook.example', { viewport: phone })
    await page.goto(`${world.address}${job}/field/trace`)
    await page.getByLabel('Label, plate or port').fill('med4')
    await page.getByRole('link', { name: /MED4-S1/ }).click()
    await page.getByText('Amp A, channel 3').waitFor()
    const way = (await page.locator('.string').first().innerText()).split('\n').filter((each) => /^(Front right speaker|lead|MED4|MED4-S1|SP1-03|jumper|Amp A)/.test(each))
    expect(way).toEqual(['Front right speaker', 'lead, 6 ft', 'MED4', 'MED4-S1', 'SP1-03', 'jumper, 2 ft', 'Amp A, channel 3'])
    await page.getByText('zone Media room').waitFor()

    await page.goto(`${world.address}${job}/field/trace`)
    await page.getByLabel('Label, plate or port').fill('pat4')
    await page.getByRole('link', { name: /PAT4-S1/ }).click()
    await page.getByText(/no cord from SP1-\d\d yet/).waitFor()
    await page.getByRole('button', { name: 'Plate end on' }).click()
    await page.getByText('one end on').first().waitFor()
    await page.getByRole('button', { name: 'Rack end on' }).click()
    await page.getByRole('button', { name: 'Mark tested' }).click()
    await page.getByText('tested', { exact: true }).first().waitFor()
    expect(faults).toEqual([])
    await page.context().close()
  })

  it('what they did is there for the next who comes', async () => {
    const { page } = await world.enter('owner@larkhook.example')
    const answer = await page.request.get(`${world.address}/api${job}`)
    const { records } = (await answer.json()) as { records: { kind: string; label?: string; id: string; runId?: string }[] }
    const run = records.find((record) => record.label === 'PAT4-S1')!
    const said = records.filter((record) => record.runId === run.id).map((record) => record.kind)
    expect(said.sort()).toEqual(['labelPrint', 'labelPrint', 'pull', 'termination', 'termination', 'test'])
    await page.context().close()
  })
})

/** The first sheet as another program reads it. */
function openElsewhere(xlsx: string): string {
  execFileSync('soffice', ['--headless', '--convert-to', 'csv:Text - txt - csv (StarCalc):44,34,76,1', '--outdir', world.folder, xlsx], { stdio: 'ignore', env: { ...process.env, HOME: world.folder } })
  return readFileSync(xlsx.replace('.xlsx', '.csv'), 'utf8')
}
function cellsOf(csv: string, label: string): Record<string, string> {
  const split = (line: string) => [...line.matchAll(/("(?:[^"]|"")*"|[^,]*)(?:,|$)/g)].map((match) => match[1]!.replace(/^"|"$/g, ''))
  const [head, ...rows] = csv.split('\n')
  const values = split(rows.find((row) => row.startsWith(`"${label}",`))!)
  return Object.fromEntries(split(head!).map((name, i) => [name, values[i] ?? '']))
}
/** Every code on every sheet, read by another program at 300 dpi. */
function decode(pdf: string): string[] {
  const stem = join(world.folder, 'sheet')
  execFileSync('pdftoppm', ['-r', '300', '-gray', pdf, stem])
  const images = execFileSync('sh', ['-c', `ls ${stem}-*.pgm`], { encoding: 'utf8' }).trim().split('\n')
  const read = images.flatMap((image) => execFileSync('zbarimg', ['-q', '--raw', '-Sdisable', '-Scode128.enable', image], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }).trim().split('\n'))
  writeFileSync(join(world.folder, 'read.txt'), read.join('\n'))
  return read
}
