import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startWorld, type World } from './support/world.ts'

let world: World
beforeAll(async () => {
  world = await startWorld()
})
afterAll(() => world.stop())

/** Hands that count: every click, every key. */
class Hands {
  count = 0
  constructor(readonly page: Page) {}

  async click(name: string) {
    this.count++
    await this.page.getByRole('button', { name }).first().click()
  }
  async key(key: string) {
    this.count++
    await this.page.keyboard.press(key)
  }
  async type(text: string) {
    this.count += text.length
    await this.page.keyboard.type(text)
  }
  /** A dialog gives the focus to its first field once it stands; a hand that types waits for the caret. */
  async awaitCaret(label: string) {
    await expect.poll(() => this.page.evaluate(() => (document.activeElement as HTMLElement | null)?.closest('label, .pick')?.textContent ?? '')).toContain(label)
  }
  async clickInRoom(name: string, x: number, y: number) {
    this.count++
    const box = (await this.page.locator(`.bay[aria-label^="${name},"]`).boundingBox())!
    await this.page.mouse.click(box.x + box.width * x, box.y + box.height * y)
  }
  async takeCable(code: string) {
    await this.click('Run')
    await this.page.getByLabel('Find in cables').waitFor()
    await this.type(code)
    await this.key('Enter')
    await this.page.getByText(`${code} run`).waitFor()
  }
}

/** The runs of one media room and a patio zone: cable, room, and how many. */
const plan = [
  ['16/2', 'Media room', 7], ['SUB', 'Media room', 2], ['CAT6', 'Media room', 4], ['RG6', 'Media room', 1], ['HDMI-AO', 'Media room', 1], ['CAT6A', 'Hall', 1], ['12/2-DB', 'Patio', 2], ['CAT6-OD', 'Patio', 2],
] as const

describe('a job from nothing', () => {
  it('is led by the hand to its first run, and then takes six clicks and keys a run or fewer', async () => {
    const { page, faults } = await world.enter('designer@larkhook.example')
    await page.getByRole('button', { name: 'New job' }).click()
    await page.getByLabel('Name').fill('Alder Street again')
    await page.getByRole('button', { name: 'Make the job' }).click()
    const hands = new Hands(page)

    await hands.click('Add a level')
    await page.getByRole('heading', { name: 'Add a level' }).waitFor()
    await hands.click('Add the level')
    await page.getByRole('button', { name: 'Add rooms' }).waitFor()
    await hands.click('Add rooms')
    for (const room of ['Media room', 'Hall', 'Patio']) {
      await hands.awaitCaret('Name')
      await hands.type(room)
      await hands.key('Enter')
      await page.getByText(new RegExp(`Added: .*${room}`)).waitFor()
    }
    await page.getByRole('button', { name: 'Close', exact: true }).last().click()
    hands.count++
    await hands.click('Add a rack')
    await page.getByRole('heading', { name: 'Add a rack' }).waitFor()
    await hands.awaitCaret('Name')
    await hands.key('Enter')
    await hands.click('Fill the rack')
    for (const panel of ['speaker panel, 12', 'patch panel, 12', 'coax panel, 12', 'line level', 'video panel']) {
      await page.getByLabel('Find in panels and devices').fill('')
      await page.getByLabel('Find in panels and devices').focus()
      await hands.type(panel)
      await hands.key('Enter')
      await page.getByText(/is in$/).waitFor()
    }
    await hands.click('Done')
    const before = hands.count

    for (const [cable, room, count] of plan) {
      await hands.takeCable(cable)
      for (let i = 0; i < count; i++) await hands.clickInRoom(room, 0.12 + (0.76 * (i + 0.5)) / count, cable === '16/2' ? 0.55 : 0.3 + 0.04 * plan.findIndex((each) => each[0] === cable))
      await hands.key('Escape')
    }
    const forRuns = hands.count - before
    const answer = await (async () => {
      await expect.poll(async () => (await jobOf(page)).filter((record) => record.kind === 'run').length, { timeout: 10_000 }).toBe(20)
      return jobOf(page)
    })()
    const runs = answer.filter((record) => record.kind === 'run')
    console.log(`20 runs from an empty job: ${forRuns} clicks and keys for the runs (${(forRuns / 20).toFixed(1)} a run), ${hands.count} with the house and the rack`)
    expect(forRuns / runs.length).toBeLessThanOrEqual(6)
    expect(new Set(runs.map((run) => run.label)).size).toBe(20)
    expect(runs.every((run) => run.a && run.b)).toBe(true)
    expect(faults).toEqual([])
    await page.context().close()
  })
})

interface Shown {
  readonly kind: string
  readonly label?: string
  readonly a?: unknown
  readonly b?: unknown
}
async function jobOf(page: Page): Promise<Shown[]> {
  const id = new URL(page.url()).pathname.split('/')[2]!
  const response = await page.request.get(`${world.address}/api/jobs/${id}`)
  return ((await response.json()) as { records: Shown[] }).records
}
