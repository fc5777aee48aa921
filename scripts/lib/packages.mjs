import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { Failure } from './failure.mjs'
import { holderOf, withLock } from './lock.mjs'
import { npmCommand } from './npm.mjs'

/**
 * What of the lock file is not installed as locked: names, at most a few.
 * npm writes its own list last, so that a broken-off installation counts as none.
 */
export function missingPackages(projectRoot) {
  const installedFile = join(projectRoot, 'node_modules', '.package-lock.json')
  if (!existsSync(installedFile)) return ['all of them']
  const locked = JSON.parse(readFileSync(join(projectRoot, 'package-lock.json'), 'utf8')).packages
  const installed = JSON.parse(readFileSync(installedFile, 'utf8')).packages
  return Object.entries(locked)
    .filter(([path, wanted]) => {
      if (path === '' || wanted.link) return false
      const found = installed[path]
      // Packages for other systems are locked too and rightly not here.
      if (!found) return !(wanted.optional || wanted.devOptional || wanted.peer)
      return found.version !== wanted.version || !existsSync(join(projectRoot, path))
    })
    .map(([path, wanted]) => `${path.slice(path.lastIndexOf('node_modules/') + 13)} ${wanted.version}`)
}

export async function installPackages({ place, processes, say }) {
  await withLock(
    join(place.shared, 'packages.lock'),
    async () => {
      const missing = missingPackages(place.root)
      if (missing.length === 0) return say('as locked')
      const other = holderOf(join(place.shared, place.kind === 'start' ? 'test.lock' : 'start.lock'))
      if (other?.running) {
        throw new Failure(
          `The packages have changed (${missing[0]}), and process ${other.pid} still runs on the old ones.`,
          { todo: 'Stop it first, then run this again.' },
        )
      }
      const [command, args] = npmCommand(['ci', '--include=dev', '--no-audit', '--no-fund'])
      await processes.run('npm', command, args, {
        failure: 'The packages could not be installed.',
        todo: 'Check the connection to the package registry and that npm is there, then run this again.',
      })
      say(`${missing[0] === 'all of them' ? 'installed' : `installed again (${missing.length} had changed)`}`)
    },
    { onWait: (holder) => say(`waiting for process ${holder.pid}, which installs them`) },
  )
}
