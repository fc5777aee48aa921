import { mkdirSync } from 'node:fs'
import { dirname, join, relative } from 'node:path'
import { fileURLToPath } from 'node:url'

export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))))

/**
 * Where one kind of run keeps its things. `npm start` and `npm test` have a place each, so that neither disturbs the other.
 * @param {'start' | 'test'} kind
 */
export function placeOf(kind, projectRoot = root) {
  const shared = join(projectRoot, '.local')
  const local = kind === 'start' ? shared : join(shared, 'test')
  const place = {
    kind,
    root: projectRoot,
    /** Locks and backups of the whole project lie here, whatever the kind of run. */
    shared,
    local,
    logs: join(local, 'logs'),
    blobs: join(local, 'blobs'),
    mail: join(local, 'mail'),
    secretsFile: join(local, 'secrets.json'),
    processesFile: join(shared, `${kind}.processes.json`),
    lockFile: join(shared, `${kind}.lock`),
    distDir: kind === 'start' ? '.next' : '.next-test',
    /** Null: the project's own. Next writes its build folder into the one it uses, so a test build has one of its own. */
    tsconfig: kind === 'start' ? null : join(local, 'tsconfig.json'),
  }
  mkdirSync(place.logs, { recursive: true })
  return place
}

/** A path as a reader in the project's folder would type it. */
export function fromRoot(path, projectRoot = root) {
  const shown = relative(projectRoot, path)
  return shown.startsWith('..') ? path : shown
}
