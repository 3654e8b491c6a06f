import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { projectFolder } from './settings.ts'

const inputs = ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'package-lock.json']
export const clientFolder = join(projectFolder, 'dist')

/**
 * Builds the client when what it is made of has changed since it was last built. It is built beside its place and
 * moved there when whole, so that a server that is running never serves half of it. Throws an Error with the words of
 * the tool.
 */
export async function buildClientIfStale(say: (line: string) => void): Promise<void> {
  const digest = digestOf(inputs)
  if (existsSync(join(clientFolder, 'index.html')) && builtFrom(clientFolder) === digest) return
  say('Building the client')
  const draft = join(projectFolder, '.tsbuild', `client-${process.pid}`)
  try {
    // In a process of its own: the tool's memory is not kept by the server that starts next.
    await promisify(execFile)(
      process.execPath,
      [
        join(projectFolder, 'node_modules/vite/bin/vite.js'),
        'build',
        '--outDir',
        draft,
        '--emptyOutDir',
        '--logLevel',
        'warn',
      ],
      {
        cwd: projectFolder,
        env: { ...process.env, NODE_ENV: 'production', NO_COLOR: '1' },
        maxBuffer: 16 * 1024 * 1024,
      },
    )
    writeFileSync(join(draft, '.built-from'), digest)
    putInPlace(draft, digest)
  } catch (error) {
    const { stderr, stdout } = error as { stderr?: string; stdout?: string }
    throw new Error(`The client could not be built:\n${firstLines(stderr || stdout || String(error))}`, {
      cause: error,
    })
  } finally {
    rmSync(draft, { recursive: true, force: true })
  }
}

const firstLines = (text: string) => text.split('\n').slice(0, 20).join('\n')

function putInPlace(draft: string, digest: string) {
  rmSync(clientFolder, { recursive: true, force: true })
  try {
    renameSync(draft, clientFolder)
  } catch (error) {
    // Another start was as quick with the same client.
    if (builtFrom(clientFolder) !== digest) throw error
  }
}

function builtFrom(folder: string): string | undefined {
  const stamp = join(folder, '.built-from')
  return existsSync(stamp) ? readFileSync(stamp, 'utf8') : undefined
}

function digestOf(paths: readonly string[]): string {
  const hash = createHash('sha256')
  for (const path of paths)
    for (const file of filesUnder(join(projectFolder, path)))
      hash.update(file.slice(projectFolder.length)).update('\0').update(readFileSync(file)).update('\0')
  return hash.digest('hex')
}

function filesUnder(path: string): string[] {
  if (!existsSync(path)) return []
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name)))
}
