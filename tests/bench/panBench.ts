import { chromium, type BrowserContext, type Page } from 'playwright-core'
import type { JobStory } from '../../server/demo/playJob.ts'
import { ensureInstalled, findProgram } from '../../server/start/installed.ts'
import type { BenchWorld } from './benchWorld.ts'
import { bigHouse } from './bigHouse.ts'
import { median, type Row } from './measure.ts'

const flags = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync']
const sizes = [60, 600] as const
const rounds = 5
const panMs = 2000

const levelOnly: JobStory = {
  id: 'pan-empty', name: 'Empty house', client: '', address: '', lengthUnit: 'ft', conductorUnit: 'awg',
  commands: [{ as: 'designer', intent: { verb: 'level.add', args: { id: 'level-L1', code: 'L1', name: 'Level 1', use: 'living', elevationMm: 0, ceilingHeightMm: 2743 } } }],
}
export const panStories = (): JobStory[] => [levelOnly, ...sizes.map((size) => ({ ...bigHouse(size), id: `pan-${size}` }))]

/** Dragging the riser about: the slow frames of a drawing against those of a pane with nothing on it but a level. */
export async function panBench(world: BenchWorld, say: (line: string) => void): Promise<Row[]> {
  ensureInstalled([{ package: 'chromium', program: 'chromium' }], say)
  const browser = await chromium.launch({ executablePath: process.env['CHROMIUM'] ?? findProgram('chromium')!, args: flags })
  try {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 } })
    const [name, value] = world.cookie.split('=')
    await context.addCookies([{ name: name!, value: value!, url: world.address }])
    // What runs this file wraps functions that have a name, those that are sent to the page too.
    await context.addInitScript('globalThis.__name = (named) => named')
    say('Opening the risers')
    const empty = await openRiser(context, world, 'pan-empty', 0)
    const drawn: Page[] = []
    for (const size of sizes) drawn.push(await openRiser(context, world, `pan-${size}`, size))
    for (const page of [empty, ...drawn]) await slowFrame(page)
    say('Panning')
    const taken: { reference: number; ours: number[] }[] = []
    for (let i = 0; i < rounds; i++) {
      const reference = await slowFrame(empty)
      const ours: number[] = []
      for (const page of drawn) ours.push(await slowFrame(page))
      taken.push({ reference, ours })
    }
    return sizes.map((size, at) => ({
      name: `riser-pan-${size}`,
      ours: median(taken.map(({ ours }) => ours[at]!)),
      reference: median(taken.map(({ reference }) => reference)),
      ratio: median(taken.map(({ reference, ours }) => ours[at]! / reference)),
      unit: `ms, 95th percentile between frames, ${size} runs against an empty pane`,
    }))
  } finally {
    await browser.close()
  }
}

async function openRiser(context: BrowserContext, world: BenchWorld, jobId: string, runs: number): Promise<Page> {
  const opened = (await world.open(jobId)).records.filter(({ kind }) => kind === 'run').length
  if (opened !== runs) throw new Error(`${jobId} holds ${opened} runs, not ${runs}`)
  const page = await context.newPage()
  await page.goto(`${world.address}/jobs/${jobId}/riser`)
  await page.locator('.riser-canvas .vue-flow__pane').waitFor()
  if (runs) await page.locator('.riser-canvas .vue-flow__node-plate').first().waitFor()
  await page.waitForLoadState('networkidle').catch(() => undefined)
  await page.waitForTimeout(1000)
  return page
}

const transformOf = (page: Page) => page.locator('.riser-canvas .vue-flow__transformationpane').evaluate((pane) => (pane as HTMLElement).style.transform)

/** Drags the pane to and fro; the 95th percentile of the times between frames meanwhile, ms. Throws when nothing moved. */
async function slowFrame(page: Page): Promise<number> {
  await page.bringToFront()
  const start = await page.evaluate(pointOnPane)
  if (!start) throw new Error(`${page.url()} shows no ground to drag`)
  const before = await transformOf(page)
  await page.mouse.move(start.x, start.y)
  await page.mouse.down()
  await page.evaluate(startFrames)
  const end = Date.now() + panMs
  let moved = 0
  for (let step = 1; Date.now() < end; step++) {
    await page.mouse.move(start.x + 180 * Math.sin(step / 12), start.y + 90 * Math.sin(step / 17))
    if (step % 10 === 0 && (await transformOf(page)) !== before) moved++
  }
  const frames = await page.evaluate(stopFrames)
  await page.mouse.move(start.x, start.y)
  await page.mouse.up()
  if (moved < 3 || frames.length < 20) throw new Error(`${page.url()} did not pan: moved ${moved} times in ${frames.length} frames`)
  return [...frames].sort((a, b) => a - b)[Math.floor(frames.length * 0.95)]!
}

// These run in the page.
function pointOnPane(): { x: number; y: number } | undefined {
  const box = document.querySelector('.riser-canvas')!.getBoundingClientRect()
  for (let y = box.top + 120; y < box.bottom - 120; y += 13)
    for (let x = box.left + 220; x < box.right - 220; x += 17) if (document.elementFromPoint(x, y)?.classList.contains('vue-flow__pane')) return { x, y }
  return undefined
}

interface Watched extends Window {
  panFrames?: number[] | undefined
}

function startFrames(): void {
  const frames: number[] = []
  const page = window as Watched
  page.panFrames = frames
  let last: number | undefined
  const tick = (at: number) => {
    if (page.panFrames !== frames) return
    if (last !== undefined) frames.push(at - last)
    last = at
    requestAnimationFrame(tick)
  }
  requestAnimationFrame(tick)
}

function stopFrames(): number[] {
  const page = window as Watched
  const frames = page.panFrames ?? []
  page.panFrames = undefined
  return frames
}
