import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { buildClientIfStale, clientFolder } from '../../../server/start/buildClient.ts'
import { freePort } from '../../../server/start/ports.ts'
import { serve, type Serving } from '../../../server/start/serve.ts'
import { readSettings } from '../../../server/start/settings.ts'

export const desk = { width: 1440, height: 900 }
export const phone = { width: 390, height: 844 }

export interface World {
  readonly address: string
  readonly folder: string
  /** A browser of their own for somebody of the demo company, signed in, with what went wrong on its pages. */
  readonly enter: (email: string, options?: { viewport?: { width: number; height: number }; dark?: boolean }) => Promise<Person>
  readonly stop: () => Promise<void>
}

export interface Person {
  readonly page: Page
  readonly context: BrowserContext
  /** Console errors and uncaught exceptions; none is right. */
  readonly faults: string[]
}

const flags = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync']

/** The whole program as npm start runs it, on a folder that is thrown away, with the demo company, and Debian's Chromium. */
export async function startWorld(): Promise<World> {
  const folder = mkdtempSync(join(tmpdir(), 'mudring-e2e-'))
  await buildClientIfStale(() => undefined)
  const port = await freePort()
  const serving: Serving = await serve(readSettings({ PORT: String(port), MUDRING_DATA: join(folder, 'data'), LOG_LEVEL: 'error' }), { clientFolder, say: () => undefined })
  const browser: Browser = await chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium', args: flags })
  return {
    address: serving.address,
    folder,
    enter: async (email, { viewport = desk, dark = false } = {}) => {
      const context = await browser.newContext({ viewport, colorScheme: dark ? 'dark' : 'light', acceptDownloads: true, reducedMotion: 'reduce' })
      const page = await context.newPage()
      const faults: string[] = []
      page.on('console', (message) => message.type() === 'error' && faults.push(message.text()))
      page.on('pageerror', (error) => faults.push(error.message))
      await page.goto(`${serving.address}/sign-in`)
      await page.getByLabel('E-mail').fill(email)
      await page.getByLabel('Passphrase').fill(demoPassphrase)
      await page.keyboard.press('Enter')
      await page.getByRole('heading', { name: 'Jobs' }).waitFor()
      return { page, context, faults }
    },
    stop: async () => {
      await browser.close()
      await serving.stop()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}
