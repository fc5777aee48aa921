import { readFileSync } from 'node:fs'
import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import { runMigrations } from 'graphile-worker'
import pg from 'pg'

/**
 * Brings DATABASE_URL up to this release: our tables, then the job queue's. Says what it did in one line.
 * A database that a newer release has migrated is refused: running old code on it could lose what it does not know.
 */
const folder = new URL('./migrations', import.meta.url).pathname

async function run(databaseUrl: string): Promise<string> {
  const journal = JSON.parse(readFileSync(`${folder}/meta/_journal.json`, 'utf8')) as { entries: { when: number; tag: string }[] }
  const client = new pg.Client({ connectionString: databaseUrl })
  await client.connect()
  try {
    // Two processes starting at once take turns.
    await client.query('select pg_advisory_lock(7305013)')
    const before = await appliedMoments(client)
    const known = new Set(journal.entries.map((entry) => entry.when))
    const unknown = before.filter((moment) => !known.has(moment))
    if (unknown.length > 0) {
      throw new Error(
        'This database was migrated by a newer release of Hoopwright. Start that release, or restore a backup made before it; nothing was changed.',
      )
    }
    await migrate(drizzle({ client }), { migrationsFolder: folder })
    await runMigrations({ connectionString: databaseUrl })
    const added = journal.entries.filter((entry) => !before.includes(entry.when))
    if (before.length === 0) return `made the tables (${added.length} migrations)`
    return added.length === 0 ? 'up to date' : `brought up from an older release: ${added.map((entry) => entry.tag).join(', ')}`
  } finally {
    await client.end()
  }
}

async function appliedMoments(client: pg.Client): Promise<number[]> {
  const there = await client.query<{ name: string | null }>(`select to_regclass('drizzle.__drizzle_migrations') as name`)
  if (!there.rows[0]?.name) return []
  const rows = await client.query<{ created_at: string }>('select created_at from drizzle.__drizzle_migrations order by created_at')
  return rows.rows.map((row) => Number(row.created_at))
}

const databaseUrl = process.env['DATABASE_URL']
if (!databaseUrl) {
  process.stderr.write('DATABASE_URL is not set: say which database to migrate.\n')
  process.exit(1)
}
run(databaseUrl).then(
  (said) => process.stdout.write(`${said}\n`),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exit(1)
  },
)
