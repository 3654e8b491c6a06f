import { spawn, type ChildProcess } from 'node:child_process'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { demoSignIns } from '../demo/demoCompany.ts'
import { failStart } from './failStart.ts'
import { databaseOf } from './ownDatabase.ts'
import { assertPortFree, freePort } from './ports.ts'
import { projectFolder, readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

const say = (line: string) => console.log(line)

/** A tool of node_modules, in a process of its own: each has its own way with signals. */
const tool = (file: string, args: readonly string[], environment: NodeJS.ProcessEnv): ChildProcess =>
  spawn(process.execPath, [join(projectFolder, 'node_modules', file), ...args], {
    cwd: projectFolder,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...environment },
  })

const hasEnded = (child: ChildProcess) => child.exitCode !== null || child.signalCode !== null

async function end(child: ChildProcess): Promise<void> {
  if (hasEnded(child)) return
  const gone = new Promise<void>((done) => child.once('exit', () => done()))
  child.kill('SIGTERM')
  await gone
}

/**
 * Waits for the server's first answer. One that ends before has said why; the next change of its code starts it again.
 */
async function untilAnswering(address: string, child: ChildProcess): Promise<void> {
  for (let tries = 0; tries < 300 && !hasEnded(child); tries++) {
    const answers = await fetch(`${address}/api/session`).then(
      () => true,
      () => false,
    )
    if (answers) return
    await pause(100)
  }
}

/** Database once, the server again whenever its code changes, the client with hot reload in front of it. */
try {
  const settings = readSettings()
  await assertPortFree(settings.port)
  const database = await databaseOf(settings, say)
  const apiPort = await freePort()
  const apiAddress = `http://127.0.0.1:${apiPort}`
  const api = tool('tsx/dist/cli.mjs', ['watch', '--clear-screen=false', 'server/start/api.ts'], {
    PORT: String(apiPort),
    MUDRING_DATA: settings.dataFolder,
    DATABASE_URL: database.url,
    DATABASE_MIGRATION_URL: database.migrationUrl,
  })
  await untilAnswering(apiAddress, api)
  const client = tool(
    'vite/bin/vite.js',
    ['--host', '127.0.0.1', '--port', String(settings.port), '--strictPort', '--clearScreen', 'false'],
    {
      MUDRING_API: apiAddress,
    },
  )
  say(`\nMudring, with hot reload, is at http://127.0.0.1:${settings.port}\n\n${demoSignIns()}\n`)
  const stop = async () => {
    await Promise.all([end(client), end(api)])
    await database.stop()
  }
  await untilStopped(stop, database.gone, say)
} catch (error) {
  failStart(error)
}
