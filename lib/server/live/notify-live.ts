import { sql } from 'drizzle-orm'
import type { Db } from '@/db/client'

/**
 * What can change under a reader's eyes. A topic is `kind:id`; query keys of the client begin with the same two words.
 * run: a tour's days, shows, hires. kit, plot, patch: a rig's. advance, bench: a show's or hire's. gauge: the party's.
 */
export type LiveTopic = `${'run' | 'kit' | 'plot' | 'patch' | 'revision' | 'advance' | 'bench' | 'directory' | 'gauge' | 'party'}:${string}`

export const liveChannel = 'hoopwright_live'

/** Tells every process, when the transaction commits, that something of the party changed. Carries no data. */
export async function notifyLive(tx: Db, partyId: string, topics: readonly LiveTopic[]): Promise<void> {
  await tx.execute(sql`select pg_notify(${liveChannel}, ${JSON.stringify({ partyId, topics })})`)
}
