import { drizzle } from 'drizzle-orm/node-postgres'
import type { NodePgDatabase, NodePgQueryResultHKT } from 'drizzle-orm/node-postgres'
import type { PgDatabase } from 'drizzle-orm/pg-core'
import pg from 'pg'
import { env } from '@/lib/env'

/** A connection or a transaction: queries take either. */
export type Db = PgDatabase<NodePgQueryResultHKT, Record<string, never>>

/** The party that every statement of a query is bound to. */
export type Scope = { readonly partyId: string }

// One pool a process, kept across hot reloads in development.
const kept = globalThis as typeof globalThis & { hoopwrightPool?: pg.Pool }

export function pool(): pg.Pool {
  kept.hoopwrightPool ??= new pg.Pool({ connectionString: env().DATABASE_URL, max: 12, idleTimeoutMillis: 30_000 })
  // Without a listener an idle connection that the server closes would end the process.
  if (kept.hoopwrightPool.listenerCount('error') === 0) kept.hoopwrightPool.on('error', () => undefined)
  return kept.hoopwrightPool
}

let opened: NodePgDatabase<Record<string, never>> | undefined

export function db(): NodePgDatabase<Record<string, never>> {
  opened ??= drizzle({ client: pool() })
  return opened
}
