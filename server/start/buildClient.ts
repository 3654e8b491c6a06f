import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { projectFolder } from './settings.ts'

const inputs = ['src', 'shared', 'index.html', 'vite.config.ts', 'package-lock.json']
export const clientFolder = join(projectFolder, 'dist')
const stamp = join(clientFolder, '.built-from')

/** Builds the client when what it is made of has changed since it was last built. */
export async function buildClientIfStale(say: (line: string) => void): Promise<void> {
  const digest = digestOf(inputs)
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === digest) return
  say('Building the client')
  const { build } = await import('vite')
  await build({ root: projectFolder, configFile: join(projectFolder, 'vite.config.ts'), mode: 'production', logLevel: 'warn' })
  writeFileSync(stamp, digest)
}

function digestOf(paths: readonly string[]): string {
  const hash = createHash('sha256')
  const add = (path: string) => {
    const full = join(projectFolder, path)
    for (const file of existsSync(full) ? filesUnder(full) : []) hash.update(file.slice(projectFolder.length)).update(readFileSync(file))
  }
  paths.forEach(add)
  return hash.digest('hex')
}

function filesUnder(path: string): string[] {
  try {
    return readdirSync(path, { withFileTypes: true })
      .sort((a, b) => (a.name < b.name ? -1 : 1))
      .flatMap((entry) => (entry.isDirectory() ? filesUnder(join(path, entry.name)) : [join(path, entry.name)]))
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOTDIR') return [path]
    throw error
  }
}
