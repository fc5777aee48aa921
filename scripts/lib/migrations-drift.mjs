import { cpSync, existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { Failure } from './failure.mjs'

const sqlFiles = (folder) => (existsSync(folder) ? readdirSync(folder).filter((name) => name.endsWith('.sql')) : [])

/** Fails if the schema says something that the migrations do not make: a migration made now, into a copy of them, must come out empty. */
export async function checkMigrationsDrift({ place, processes, say }) {
  const folder = join(place.local, 'drift')
  const copy = join(folder, 'migrations')
  rmSync(folder, { recursive: true, force: true })
  mkdirSync(folder, { recursive: true })
  cpSync(join(place.root, 'db', 'migrations'), copy, { recursive: true })
  const configFile = join(folder, 'drizzle.config.ts')
  const original = relative(folder, join(place.root, 'drizzle.config'))
  writeFileSync(
    configFile,
    `import config from '${original}'\nexport default { ...config, out: ${JSON.stringify(`./${relative(place.root, copy)}`)} }\n`,
  )
  const before = new Set(sqlFiles(copy))
  await processes.run('drift', process.execPath, [join('node_modules', 'drizzle-kit', 'bin.cjs'), 'generate', '--config', relative(place.root, configFile)], {
    failure: 'The migrations could not be compared with the schema.',
    todo: 'If a column or table was renamed, make the migration with npm run db:generate, which asks.',
  })
  const added = sqlFiles(copy).filter((name) => !before.has(name))
  if (added.length > 0) {
    throw new Failure('The schema has changed and no migration says so.', {
      todo: 'Make it with npm run db:generate -- --name what-changes.',
      output: added.map((name) => readFileSync(join(copy, name), 'utf8')).join('\n'),
    })
  }
  say(`${before.size} migrations make the schema`)
}
