import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { Failure } from './failure.mjs'
import { holderOf, withLock } from './lock.mjs'
import { npmCommand } from './npm.mjs'

const readJson = (file) => JSON.parse(readFileSync(file, 'utf8'))

/**
 * What is not installed as locked: names, at most all of them.
 * npm writes its own list of what it installed last of all, so that a broken-off installation counts as none. The lock file also holds packages
 * that npm rightly leaves out (for other systems, optional peers), so it is asked in two parts: is everything here the locked version,
 * and is everything here that package.json asks for.
 */
export function missingPackages(projectRoot) {
  const installedFile = join(projectRoot, 'node_modules', '.package-lock.json')
  if (!existsSync(installedFile)) return ['all of them']
  const locked = readJson(join(projectRoot, 'package-lock.json')).packages
  const installed = readJson(installedFile).packages
  const { dependencies = {}, devDependencies = {} } = readJson(join(projectRoot, 'package.json'))
  const changed = Object.keys(installed).filter(
    (path) => installed[path].version !== locked[path]?.version || !existsSync(join(projectRoot, path)),
  )
  const lacking = Object.keys({ ...dependencies, ...devDependencies })
    .map((name) => `node_modules/${name}`)
    .filter((path) => !(path in installed))
  return [...lacking, ...changed].map((path) => path.slice(path.lastIndexOf('node_modules/') + 'node_modules/'.length))
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
