import { spawn } from 'node:child_process'
import { mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { z } from 'zod'
import { buildClientIfStale } from '../server/start/buildClient.ts'
import { ensureInstalled } from '../server/start/installed.ts'
import { projectFolder } from '../server/start/settings.ts'

/** `npm test`: sets up what is missing, runs every stage, and ends with one line that counts. */
const reportSchema = z.object({ numPassedTests: z.int(), numFailedTests: z.int(), testResults: z.array(z.object({ status: z.string(), assertionResults: z.array(z.unknown()) })) })
const reports = join(projectFolder, 'reports')
let passed = 0
let failed = 0

const say = (line: string) => console.log(line)
const bin = (name: string) => join(projectFolder, 'node_modules/.bin', name)

function run(command: string, args: readonly string[]): Promise<number> {
  return new Promise((done) => {
    const child = spawn(command, args, { cwd: projectFolder, stdio: ['ignore', 'inherit', 'inherit'] })
    child.once('error', () => done(1))
    child.once('exit', (code) => done(code ?? 1))
  })
}

async function stage(name: string, work: () => Promise<{ passed: number; failed: number }>) {
  const start = Date.now()
  say(`\n== ${name}`)
  const result = await work()
  passed += result.passed
  failed += result.failed
  say(`== ${name}: ${result.passed} passed, ${result.failed} failed, ${Math.round((Date.now() - start) / 1000)} s`)
}

/** A tool that only says yes or no counts as one test. */
const tool = (command: string, args: readonly string[]) => async () => {
  const code = await run(command, args)
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1 }
}

/** Runs vitest projects and counts what they report; a run that wrote no report, or a file that could not be read, has failed. */
const vitest = (name: string, projects: readonly string[]) => async () => {
  const report = join(reports, `${name}.json`)
  rmSync(report, { force: true })
  const code = await run(bin('vitest'), ['run', ...projects.flatMap((each) => ['--project', each]), '--reporter=dot', '--reporter=json', `--outputFile.json=${report}`])
  try {
    const counted = reportSchema.parse(JSON.parse(readFileSync(report, 'utf8')))
    const broken = counted.testResults.filter((file) => file.status === 'failed' && file.assertionResults.length === 0).length
    const bad = counted.numFailedTests + broken
    return { passed: counted.numPassedTests, failed: code !== 0 && bad === 0 ? 1 : bad }
  } catch (error) {
    console.error(error)
    return { passed: 0, failed: 1 }
  }
}

mkdirSync(reports, { recursive: true })
ensureInstalled(
  [
    { package: 'mariadb-server', program: 'mariadbd' },
    { package: 'chromium', program: 'chromium' },
    { package: 'poppler-utils', program: 'pdftoppm' },
    { package: 'zbar-tools', program: 'zbarimg' },
    { package: 'libreoffice-calc', program: 'soffice' },
  ],
  say,
)
await stage('types', tool(bin('vue-tsc'), ['--build']))
await stage('lint', tool(bin('eslint'), ['--config', 'tests/lint/eslint.config.js', '--max-warnings', '0', '.']))
await stage('unit and components', vitest('unit', ['unit', 'components']))
await stage('database and API', vitest('db', ['db']))
await stage('build', async () => {
  try {
    await buildClientIfStale(say)
    return { passed: 1, failed: 0 }
  } catch (error) {
    console.error(error)
    return { passed: 0, failed: 1 }
  }
})
await stage('end to end', vitest('e2e', ['e2e']))
say(`\n${passed} passed, ${failed} failed`)
process.exitCode = failed === 0 && passed > 0 ? 0 : 1
