import { spawn, type ChildProcess } from 'node:child_process'
import { mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { z } from 'zod'
import { buildClientIfStale } from '../server/start/buildClient.ts'
import { ensureInstalled } from '../server/start/installed.ts'
import { projectFolder } from '../server/start/settings.ts'

/**
 * `npm test`: sets up what is missing, runs every stage whatever the one before it said, and ends with one line that
 * counts.
 */

interface Counted {
  readonly passed: number
  readonly failed: number
}

const ok: Counted = { passed: 1, failed: 0 }
const notOk: Counted = { passed: 0, failed: 1 }
const reportSchema = z.object({
  numPassedTests: z.int(),
  numFailedTests: z.int(),
  testResults: z.array(z.object({ name: z.string(), status: z.string(), assertionResults: z.array(z.unknown()) })),
})
const reports = join(projectFolder, 'reports')
/** A stage that takes longer hangs, and would keep a machine busy for ever. */
const stageLimitMs = 12 * 60_000

const say = (line: string) => console.log(line)
const bin = (name: string) => join(projectFolder, 'node_modules/.bin', name)
const running = new Set<ChildProcess>()

/** Runs a tool in a process group of its own, so that all of it ends when its time is up. */
function run(command: string, args: readonly string[]): Promise<number> {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd: projectFolder, stdio: ['ignore', 'inherit', 'inherit'], detached: true })
    running.add(child)
    const limit = setTimeout(() => {
      say(`Stopped after ${stageLimitMs / 60_000} minutes`)
      endGroup(child)
    }, stageLimitMs)
    const settle = (code: number) => {
      clearTimeout(limit)
      running.delete(child)
      done(code)
    }
    child.once('error', (error) => {
      console.error(error.message)
      settle(1)
    })
    child.once('exit', (code) => settle(code ?? 1))
  })
}

function endGroup({ pid }: ChildProcess) {
  try {
    if (pid !== undefined) process.kill(-pid, 'SIGKILL')
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error
  }
}

/** A tool that only says yes or no counts as one test. */
const tool =
  (command: string, ...args: string[]) =>
  async () =>
    (await run(command, args)) === 0 ? ok : notOk

/**
 * Runs vitest projects and counts what they report. A run without a report, and a file that could not be run, have
 * failed.
 */
const vitest =
  (name: string, ...projects: string[]) =>
  async (): Promise<Counted> => {
    const file = join(reports, `${name}.json`)
    rmSync(file, { force: true })
    const chosen = projects.flatMap((project) => ['--project', project])
    const code = await run(bin('vitest'), [
      'run',
      ...chosen,
      '--reporter=dot',
      '--reporter=json',
      `--outputFile.json=${file}`,
    ])
    const report = reportSchema.parse(JSON.parse(readFileSync(file, 'utf8')))
    const broken = report.testResults.filter(
      (result) => result.status === 'failed' && result.assertionResults.length === 0,
    )
    for (const { name: path } of broken) say(`Could not be run: ${path}`)
    const failed = report.numFailedTests + broken.length
    return { passed: report.numPassedTests, failed: code !== 0 && failed === 0 ? 1 : failed }
  }

const install = async () => {
  const needed = {
    'mariadb-server': 'mariadbd',
    chromium: 'chromium',
    'poppler-utils': 'pdftoppm',
    'zbar-tools': 'zbarimg',
    'libreoffice-calc': 'soffice',
  }
  ensureInstalled(
    Object.entries(needed).map(([name, program]) => ({ package: name, program })),
    say,
  )
  mkdirSync(reports, { recursive: true })
  // Programs that are there are no test.
  return { passed: 0, failed: 0 }
}
const build = async () => {
  await buildClientIfStale(say)
  return ok
}

const stages: readonly (readonly [string, () => Promise<Counted>])[] = [
  ['programs', install],
  ['types', tool(bin('vue-tsc'), '--build')],
  ['lint', tool(bin('eslint'), '--config', 'tests/lint/eslint.config.js', '--max-warnings', '0', '.')],
  ['unit and components', vitest('unit', 'unit', 'components')],
  ['database and API', vitest('db', 'db')],
  ['build', build],
  ['end to end', vitest('e2e', 'e2e')],
]

for (const signal of ['SIGINT', 'SIGTERM'] as const)
  process.once(signal, () => {
    running.forEach(endGroup)
    process.exit(130)
  })

const total = { passed: 0, failed: 0 }
const summary: string[] = []
for (const [name, work] of stages) {
  const start = Date.now()
  say(`\n== ${name}`)
  const counted = await work().catch((error: unknown) => {
    console.error(error instanceof Error ? error.message : error)
    return notOk
  })
  const seconds = Math.round((Date.now() - start) / 1000)
  total.passed += counted.passed
  total.failed += counted.failed
  summary.push(`${name.padEnd(20)} ${counted.passed} passed, ${counted.failed} failed, ${seconds} s`)
  say(`== ${summary.at(-1)}`)
}
say(`\n${summary.join('\n')}\n`)
process.exitCode = total.failed === 0 && total.passed > 0 ? 0 : 1
say(`${total.passed} passed, ${total.failed} failed`)
