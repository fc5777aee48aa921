import { and, asc, eq, ne, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { channel } from '@/db/schema/plot'
import { rig } from '@/db/schema/tour'
import type { ChannelInput } from '@/lib/contracts/channel'

const columns = {
  id: channel.id,
  rigId: channel.rigId,
  number: channel.number,
  name: channel.name,
  pieceId: channel.pieceId,
  output: channel.output,
  stand: channel.stand,
  phantom: channel.phantom,
  version: channel.version,
}

/** Holds the rig's patch against other writers until the transaction ends; false when the rig is not the party's. */
export async function lockPatch(db: Db, scope: Scope, rigId: string): Promise<boolean> {
  const rows = await db
    .select({ id: rig.id })
    .from(rig)
    .where(and(eq(rig.partyId, scope.partyId), eq(rig.id, rigId)))
    .limit(1)
    .for('update')
  return rows.length > 0
}

/** By number; numbers are unique in a rig, so the order is total. */
export async function listChannels(db: Db, scope: Scope, rigId: string) {
  return db
    .select(columns)
    .from(channel)
    .where(and(eq(channel.partyId, scope.partyId), eq(channel.rigId, rigId)))
    .orderBy(asc(channel.number))
    .limit(512)
}

export async function findChannel(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(channel)
    .where(and(eq(channel.partyId, scope.partyId), eq(channel.id, id)))
    .limit(1)
  return rows[0]
}

/** Another channel of the rig that has this number or takes this output. */
export async function findClashingChannel(
  db: Db,
  scope: Scope,
  input: { rigId: string; exceptId: string | null; number: number; pieceId: string | null; output: string },
) {
  const rows = await db
    .select(columns)
    .from(channel)
    .where(
      and(
        eq(channel.partyId, scope.partyId),
        eq(channel.rigId, input.rigId),
        input.exceptId === null ? undefined : ne(channel.id, input.exceptId),
        or(
          eq(channel.number, input.number),
          input.pieceId === null
            ? undefined
            : and(eq(channel.pieceId, input.pieceId), eq(channel.output, input.output)),
        ),
      ),
    )
    .orderBy(asc(channel.number))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken by a channel elsewhere. */
export async function insertChannel(
  db: Db,
  scope: Scope,
  row: ChannelInput & { id?: string | undefined; rigId: string },
) {
  const rows = await db
    .insert(channel)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: channel.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateChannel(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; channel: ChannelInput },
) {
  const rows = await db
    .update(channel)
    .set({ ...input.channel, version: sql`${channel.version} + 1` })
    .where(and(eq(channel.partyId, scope.partyId), eq(channel.id, input.id), eq(channel.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteChannel(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(channel)
    .where(and(eq(channel.partyId, scope.partyId), eq(channel.id, input.id), eq(channel.version, input.version)))
    .returning({ id: channel.id })
  return rows.length > 0
}
