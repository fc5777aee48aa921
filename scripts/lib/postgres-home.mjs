import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, realpathSync, rmSync, statSync } from 'node:fs'
import { userInfo } from 'node:os'
import { join } from 'node:path'
import { Failure } from './failure.mjs'
import { fromRoot } from './place.mjs'

/** A socket's path may hold 107 bytes; the file is called ".s.PGSQL.65535.lock" at the longest. */
const LONGEST_SOCKET_PATH = 107
const LONGEST_SOCKET_NAME = '/.s.PGSQL.65535.lock'.length
const USERS_FOR_ROOT = ['postgres', 'nobody']

/**
 * PostgreSQL refuses to run as root. Root hands it to Debian's own user for it, or else to nobody; anyone else runs it themselves.
 * @returns {{ name: string, uid?: number, gid?: number }} without numbers: as the user who is here
 */
export function serverUser() {
  if (process.getuid?.() !== 0) return { name: userInfo().username }
  const users = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
  for (const wanted of USERS_FOR_ROOT) {
    const found = users.find(([name]) => name === wanted)
    if (found) return { name: wanted, uid: Number(found[2]), gid: Number(found[3]) }
  }
  throw new Failure('PostgreSQL refuses to run as root, and this machine has no user "postgres" or "nobody" to run it as.', {
    todo: 'Start as another user, or set DATABASE_URL to a database that is running.',
  })
}

/** Makes the folder the server's own; false when the server could not live there. */
function settle(folder, user) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const { uid = process.getuid?.() } = user
  const owner = statSync(folder).uid
  if (owner !== uid && owner !== process.getuid?.()) {
    throw new Failure(`${fromRoot(folder)} belongs to another user of this machine.`, { todo: 'Remove that folder, or run as its owner.' })
  }
  try {
    if (user.uid !== undefined) chownSync(folder, user.uid, user.gid)
    chmodSync(folder, 0o700)
  } catch {
    return false
  }
  // Only the server's own user can tell whether it gets through every folder above.
  return spawnSync('test', ['-w', folder], { uid: user.uid, gid: user.gid }).status === 0
}

/**
 * The folder of a run's own database server: `pg` in its place. Where the server's user cannot reach that (a project under /root, say),
 * or its sockets' paths would be too long, a folder under /var/tmp named by the project's path.
 * @returns {{ folder: string, data: string, user: ReturnType<typeof serverUser>, elsewhere: boolean }}
 */
export function clusterHome(place, user = serverUser()) {
  const here = join(place.local, 'pg')
  const fits = Buffer.byteLength(here) + LONGEST_SOCKET_NAME <= LONGEST_SOCKET_PATH
  if (fits && settle(here, user)) return { folder: here, data: join(here, 'data'), user, elsewhere: false }
  if (existsSync(here)) rmSync(here, { recursive: true })
  const hash = createHash('sha256').update(realpathSync(place.root)).digest('hex').slice(0, 12)
  const folder = `/var/tmp/hoopwright-${hash}-${place.kind}`
  if (!settle(folder, user)) {
    throw new Failure(`PostgreSQL's user "${user.name}" can use neither ${fromRoot(here)} nor ${folder}.`, {
      todo: 'Move the project to a folder that user can reach, or set DATABASE_URL to a database that is running.',
    })
  }
  return { folder, data: join(folder, 'data'), user, elsewhere: true }
}

/** The major version that made a cluster, or null when there is none yet. */
export function clusterVersion(home) {
  const file = join(home.data, 'PG_VERSION')
  return existsSync(file) ? Number(readFileSync(file, 'utf8').trim()) : null
}
