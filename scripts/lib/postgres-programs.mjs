import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { delimiter, dirname, join } from 'node:path'
import { hasApt, installFromDebian } from './apt.mjs'
import { Failure } from './failure.mjs'

export const OLDEST_VERSION = 14
const NEEDED = ['initdb', 'postgres', 'psql', 'pg_dump', 'pg_restore']
const DEBIAN = '/usr/lib/postgresql'
const CLUSTER_CONFIG = '/etc/postgresql-common/createcluster.conf'

function foldersToLookIn() {
  const debian = existsSync(DEBIAN) ? readdirSync(DEBIAN).map((version) => join(DEBIAN, version, 'bin')) : []
  return [...debian, ...(process.env['PATH'] ?? '').split(delimiter)].filter(
    (folder) => folder !== '' && NEEDED.every((name) => existsSync(join(folder, name))),
  )
}

function versionOf(folder) {
  const { stdout } = spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' })
  return Number(/(\d+)/.exec(stdout ?? '')?.[1] ?? 0)
}

/** The PostgreSQL installations of this machine, newest first. */
export function foundPrograms() {
  return foldersToLookIn()
    .map((folder) => ({ folder: dirname(join(folder, 'x')), version: versionOf(folder) }))
    .filter(({ version }) => version >= OLDEST_VERSION)
    .sort((a, b) => b.version - a.version)
}

/**
 * Debian starts a database server of its own when it installs PostgreSQL. Nobody asked for one here:
 * it is told not to while we install, and its setting is put back as it was.
 */
async function withoutDebiansOwnCluster({ install, prefix, processes }) {
  await install(['postgresql-common'])
  const asRoot = (script, input) => {
    const [first, ...rest] = [...prefix, 'sh', '-c', script]
    return processes.run('apt-cluster-setting', first, rest, { input })
  }
  const before = readFileSync(CLUSTER_CONFIG, 'utf8')
  await asRoot(`cat > ${CLUSTER_CONFIG}`, `${before}\ncreate_main_cluster = false\n`)
  return () => asRoot(`cat > ${CLUSTER_CONFIG}`, before)
}

/** Finds PostgreSQL, or installs it from Debian. */
export async function findPostgres({ place, processes, say }) {
  const [found] = foundPrograms()
  if (found) {
    say(`version ${found.version} is here`)
    return found
  }
  let putBack
  try {
    await installFromDebian(
      {
        packages: ['postgresql'],
        what: `PostgreSQL (version ${OLDEST_VERSION} or newer)`,
        otherwise: `${hasApt() ? 'Or install' : 'Install'} it in another way so that initdb and postgres are on the PATH, or set DATABASE_URL to a database that is running.`,
      },
      { place, processes, before: async (root) => (putBack = await withoutDebiansOwnCluster({ ...root, processes })) },
    )
  } finally {
    await putBack?.()
  }
  const [installed] = foundPrograms()
  if (!installed) {
    throw new Failure(`Debian's PostgreSQL is older than version ${OLDEST_VERSION}.`, {
      todo: 'Install a newer one, or set DATABASE_URL to a database that is running.',
    })
  }
  say(`version ${installed.version} installed from Debian`)
  return installed
}

/** The installation that can open a cluster made earlier: the same major version. */
export function programsFor(clusterVersion, programs) {
  if (clusterVersion === null || clusterVersion === programs.version) return programs
  const fitting = foundPrograms().find(({ version }) => version === clusterVersion)
  if (fitting) return fitting
  throw new Failure(`The database here was made by PostgreSQL ${clusterVersion}, and this machine now has ${programs.version} only.`, {
    todo: `Install PostgreSQL ${clusterVersion} beside it (apt-get install postgresql-${clusterVersion}) and start again.`,
  })
}
