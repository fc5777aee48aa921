import { cpSync, existsSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { Failure } from './failure.mjs'
import { fromRoot } from './place.mjs'

const DUMP = 'database.dump'
const BLOBS = 'blobs'
const FULL = /^\d{8}-\d{6}$/

/** Everything of ours and of the job queue; what belongs to PostgreSQL itself stays. */
const EMPTY_IT = `
do $$
declare name text;
begin
  for name in select nspname from pg_namespace where nspname !~ '^pg_' and nspname <> 'information_schema' loop
    execute format('drop schema %I cascade', name);
  end loop;
  create schema public;
end $$;
`

const tool = (programs, name) => join(programs.folder, name)

export function backupsFolder(place) {
  return join(place.shared, 'backups')
}

/** The backups that are here, newest first. */
export function listBackups(place) {
  const folder = backupsFolder(place)
  return existsSync(folder) ? readdirSync(folder).filter((name) => FULL.test(name)).sort().reverse() : []
}

function stampOf(date) {
  return date.toISOString().replace(/[-:]/g, '').replace('T', '-').slice(0, 15)
}

export async function emptyDatabase({ processes, programs, url }) {
  await processes.run('psql', tool(programs, 'psql'), ['-X', '-q', '-v', 'ON_ERROR_STOP=1', '-1', '-d', url], {
    input: EMPTY_IT,
    failure: 'The database could not be emptied; nothing was changed.',
    todo: 'See the lines above.',
  })
}

/** Writes the database and the stored files into a folder of their own, which appears only when it is whole. */
export async function backUp({ place, processes, programs, url, blobDir, now = new Date() }) {
  const name = stampOf(now)
  const folder = join(backupsFolder(place), name)
  if (existsSync(folder)) throw new Failure(`There is a backup of this very second already: ${fromRoot(folder)}.`, { todo: 'Run it again.' })
  const draft = `${folder}.unfinished`
  rmSync(draft, { recursive: true, force: true })
  mkdirSync(draft, { recursive: true, mode: 0o700 })
  try {
    await processes.run('pg_dump', tool(programs, 'pg_dump'), ['-Fc', '--no-owner', '--no-privileges', '-f', join(draft, DUMP), '-d', url], {
      failure: 'The database could not be backed up.',
      todo: 'See the lines above.',
    })
    // Files are only ever added and never changed, so the copy after the dump holds all that the dump names.
    if (blobDir && existsSync(blobDir)) cpSync(blobDir, join(draft, BLOBS), { recursive: true })
    renameSync(draft, folder)
  } finally {
    rmSync(draft, { recursive: true, force: true })
  }
  return { name, folder, withFiles: Boolean(blobDir) }
}

/** Puts a backup in the place of what is there. */
export async function restore({ place, processes, programs, url, blobDir, name }) {
  const there = listBackups(place)
  if (!there.includes(name)) {
    throw new Failure(name ? `There is no backup called ${name}.` : 'Say which backup to restore.', {
      todo: there.length > 0 ? `There are: ${there.join(', ')}. So:  npm run db:restore -- ${there[0]}` : 'There is none yet; npm run db:backup makes one.',
    })
  }
  const folder = join(backupsFolder(place), name)
  await emptyDatabase({ processes, programs, url })
  await processes.run(
    'pg_restore',
    tool(programs, 'pg_restore'),
    ['--no-owner', '--no-privileges', '--exit-on-error', '--single-transaction', '--clean', '--if-exists', '-d', url, join(folder, DUMP)],
    {
      failure: `The backup ${name} could not be put back; the database is empty now and the backup is whole.`,
      todo: 'See the lines above, mend what they name, and run it again.',
    },
  )
  const files = join(folder, BLOBS)
  if (!blobDir || !existsSync(files)) return
  const aside = `${blobDir}.before-${stampOf(new Date())}`
  if (existsSync(blobDir)) renameSync(blobDir, aside)
  cpSync(files, blobDir, { recursive: true })
  rmSync(aside, { recursive: true, force: true })
}
