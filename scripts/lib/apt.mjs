import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { Failure } from './failure.mjs'
import { withLock } from './lock.mjs'

const APT = '/usr/bin/apt-get'
const QUIET = { DEBIAN_FRONTEND: 'noninteractive', NEEDRESTART_MODE: 'l' }

/** How to run a command as root: directly, through sudo without a password, or (null) not at all. */
export function rootPrefix() {
  if (process.getuid?.() === 0) return []
  const sudo = spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' })
  return sudo.status === 0 ? ['sudo', '-n', 'env', ...Object.entries(QUIET).map(([name, value]) => `${name}=${value}`)] : null
}

/** Whether this machine installs its software by apt. */
export const hasApt = () => existsSync(APT)

/**
 * Installs Debian packages, if this user may.
 * @param {{ packages: string[], what: string, otherwise: string }} wanted `otherwise`: what to do on a machine where we cannot
 */
export async function installFromDebian({ packages, what, otherwise }, { place, processes, before }) {
  const command = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!hasApt()) throw new Failure(`${what} is not on this machine, and it has no apt-get to install it with.`, { todo: otherwise })
  const prefix = rootPrefix()
  if (prefix === null) {
    throw new Failure(`${what} is not on this machine, and installing it needs root.`, {
      todo: `Run:  sudo sh -c '${command}'  and then start again. ${otherwise}`,
    })
  }
  const apt = async (name, args) => {
    const [first, ...rest] = [...prefix, APT, '-o', 'DPkg::Lock::Timeout=300', ...args]
    await processes.run(name, first, rest, {
      env: QUIET,
      failure: `${what} could not be installed by apt-get.`,
      todo: `Check the connection and the package sources, or run it yourself:  ${command}`,
    })
  }
  const install = (names) => apt(`apt-${names[0]}`, ['install', '-y', '--no-install-recommends', '-o', 'Dpkg::Options::=--force-confold', ...names])
  await withLock(join(place.shared, 'apt.lock'), async () => {
    await apt('apt-update', ['update'])
    if (before) await before({ install, prefix })
    await install(packages)
  })
}
