import { spawn, type ChildProcess } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { projectFolder } from '../../server/start/settings.ts'

/** A start command as people run it: a process of its own on a folder of its own. */
export interface StartedServer {
  readonly process: ChildProcess
  readonly address: string
  /** What it has said so far. */
  readonly said: () => string
  /** Resolves with the exit code, or the signal's name. */
  readonly ended: Promise<number | string>
}

/** Starts a script of server/start; `environment` names port and data folder. It may still be starting. */
export function startServer(
  script: 'start.ts' | 'api.ts',
  environment: Readonly<Record<string, string>>,
): StartedServer {
  const { DATABASE_URL: _url, DATABASE_MIGRATION_URL: _migrationUrl, ...inherited } = process.env
  const child = spawn(process.execPath, ['--import', 'tsx', join('server/start', script)], {
    cwd: projectFolder,
    env: { ...inherited, ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let said = ''
  child.stdout.on('data', (part: Buffer) => (said += part.toString()))
  child.stderr.on('data', (part: Buffer) => (said += part.toString()))
  return {
    process: child,
    address: `http://127.0.0.1:${environment['PORT']}`,
    said: () => said,
    ended: new Promise((done) => child.once('exit', (code, signal) => done(code ?? signal ?? ''))),
  }
}

/** Waits until the server answers. Throws with what it said when it ended instead. */
export async function untilServing(server: StartedServer, patienceMs = 60_000): Promise<void> {
  const end = Date.now() + patienceMs
  let over = false
  void server.ended.then(() => (over = true))
  while (Date.now() < end) {
    if (over) throw new Error(`The server ended:\n${server.said()}`)
    if (
      await fetch(`${server.address}/api/session`).then(
        () => true,
        () => false,
      )
    )
      return
    await pause(50)
  }
  throw new Error(`The server did not answer within ${patienceMs / 1000} s:\n${server.said()}`)
}

/** The number of the database's process on a data folder; undefined: none runs. */
export function databaseProcessOf(folder: string): number | undefined {
  const file = join(folder, 'mariadb.pid')
  const pid = existsSync(file) ? Number(readFileSync(file, 'utf8')) : undefined
  return pid && existsSync(`/proc/${pid}`) && readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes(folder)
    ? pid
    : undefined
}
