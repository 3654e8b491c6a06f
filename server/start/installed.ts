import { execFileSync, spawnSync } from 'node:child_process'

const has = (program: string) => spawnSync('sh', ['-c', `command -v ${program}`], { stdio: 'ignore' }).status === 0
const isRoot = () => process.getuid?.() === 0

/** A Debian package, and the program that shows it is there. */
export interface Needed {
  readonly package: string
  readonly program: string
}

/**
 * Installs Debian packages that are missing, as root or with sudo where it asks nothing. Throws an Error that says
 * exactly what to install where neither is possible.
 */
export function ensureInstalled(needed: readonly Needed[], say: (line: string) => void): void {
  const missing = needed.filter(({ program }) => !has(program)).map((each) => each.package)
  if (!missing.length) return
  const sudo = isRoot() ? [] : has('sudo') && spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0 ? ['sudo', '-n'] : undefined
  if (!sudo || !has('apt-get')) throw new Error(`Please install ${missing.join(', ')} and start again, for instance: sudo apt-get install --no-install-recommends ${missing.join(' ')}`)
  say(`Installing ${missing.join(', ')}`)
  const apt = (args: string[]) => {
    const [command, ...rest] = [...sudo, 'apt-get', '-o', 'DPkg::Lock::Timeout=500', ...args]
    execFileSync(command!, rest, { stdio: ['ignore', 'ignore', 'inherit'], env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } })
  }
  apt(['update', '-qq'])
  apt(['install', '-y', '-qq', '--no-install-recommends', ...missing])
}
