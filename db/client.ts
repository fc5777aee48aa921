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
  kept.hoopwrightPool ??= openPool()
  return kept.hoopwrightPool
}

function openPool(): pg.Pool {
  const made = new pg.Pool({ connectionString: env().DATABASE_URL, max: 12, idleTimeoutMillis: 30_000 })
  // Without listeners a connection that the server closes would end the process; whoever uses it is told by its query.
  made.on('error', () => undefined)
  made.on('connect', (client) => client.on('error', () => undefined))
  return made
}

let opened: NodePgDatabase<Record<string, never>> | undefined

export function db(): NodePgDatabase<Record<string, never>> {
  opened ??= drizzle({ client: pool() })
  return opened
}
