import { execFileSync, spawnSync } from 'node:child_process'
import { accessSync, constants, existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'

/** A Debian package, and the program that shows it is there. */
export interface Needed {
  readonly package: string
  readonly program: string
}

/** Where a program lies; people who are not root often have no sbin in their path. */
export function findProgram(name: string): string | undefined {
  const folders = [...(process.env['PATH'] ?? '').split(delimiter), '/usr/local/sbin', '/usr/sbin', '/sbin']
  return folders.map((folder) => join(folder, name)).find(isExecutable)
}

/**
 * Installs Debian packages that are missing, as root or with sudo where it asks nothing. Throws an Error that says
 * exactly what to install where neither is possible.
 */
export function ensureInstalled(needed: readonly Needed[], say: (line: string) => void): void {
  const missing = needed.filter(({ program }) => !findProgram(program)).map((each) => each.package)
  if (!missing.length) return
  const byHand = `sudo apt-get install --no-install-recommends ${missing.join(' ')}`
  const asRoot = rootCommand()
  if (!asRoot || !findProgram('apt-get'))
    throw new Error(`Please install ${missing.join(', ')} and start again. On Debian or Ubuntu: ${byHand}`)
  say(`Installing ${missing.join(', ')}`)
  const apt = (...args: string[]) => {
    const [command, ...rest] = [
      ...asRoot,
      'env',
      'DEBIAN_FRONTEND=noninteractive',
      'apt-get',
      '-o',
      'DPkg::Lock::Timeout=500',
      ...args,
    ]
    execFileSync(command!, rest, { stdio: ['ignore', 'ignore', 'inherit'] })
  }
  try {
    apt('update', '-qq')
    withoutServices(asRoot, () => apt('install', '-y', '-qq', '--no-install-recommends', ...missing))
  } catch (error) {
    throw new Error(`Could not install ${missing.join(', ')}. Install by hand and start again: ${byHand}`, {
      cause: error,
    })
  }
}

/** What to put before a command so that it runs as root; undefined where that would ask for a password. */
function rootCommand(): string[] | undefined {
  if (process.getuid?.() === 0) return []
  return findProgram('sudo') && spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0
    ? ['sudo', '-n']
    : undefined
}

/**
 * Debian asks this file before it starts a service of a package: Mudring starts its database by itself, on its own
 * folder.
 */
const servicePolicy = '/usr/sbin/policy-rc.d'

function withoutServices(asRoot: readonly string[], work: () => void) {
  if (existsSync(servicePolicy)) return work()
  const [shell, ...flags] = [...asRoot, 'sh', '-c']
  execFileSync(shell!, [...flags, `printf '#!/bin/sh\\nexit 101\\n' > ${servicePolicy} && chmod 755 ${servicePolicy}`])
  try {
    work()
  } finally {
    execFileSync(shell!, [...flags, `rm -f ${servicePolicy}`])
  }
}

function isExecutable(file: string): boolean {
  try {
    accessSync(file, constants.X_OK)
    return true
  } catch {
    return false
  }
}
