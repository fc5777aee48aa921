import { and, asc, desc, eq, ilike, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { player } from '@/db/schema/party'
import { show } from '@/db/schema/tour'
import { pageSize } from '@/lib/contracts/list'
import type { PlayerInput, PlayerListQuery } from '@/lib/contracts/player'
import { containing } from './containing'

const columns = {
  id: player.id,
  name: player.name,
  hand: player.hand,
  throneHeightM: player.throneHeightM,
  version: player.version,
}

export async function listPlayers(db: Db, scope: Scope, query: PlayerListQuery) {
  const way = query.order === 'up' ? asc : desc
  const rows = await db
    .select({ ...columns, total: sql<number>`(count(*) over ())::int` })
    .from(player)
    .where(
      and(
        eq(player.partyId, scope.partyId),
        query.q ? ilike(player.name, containing(query.q)) : undefined,
        query.filter === 'all' ? undefined : eq(player.hand, query.filter),
      ),
    )
    .orderBy(way(query.sort === 'name' ? sql`lower(${player.name})` : player.hand), asc(player.name), asc(player.id))
    .limit(pageSize)
    .offset((query.page - 1) * pageSize)
  return { rows: rows.map(({ total: _total, ...row }) => row), total: rows[0]?.total ?? 0 }
}

/** Every player by name, for a choice. */
export async function listPlayerNames(db: Db, scope: Scope) {
  return db
    .select({ id: player.id, name: player.name })
    .from(player)
    .where(eq(player.partyId, scope.partyId))
    .orderBy(asc(player.name), asc(player.id))
    .limit(500)
}

export async function findPlayer(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(player)
    .where(and(eq(player.partyId, scope.partyId), eq(player.id, id)))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken already. */
export async function insertPlayer(db: Db, scope: Scope, row: PlayerInput & { id?: string | undefined }) {
  const rows = await db
    .insert(player)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: player.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updatePlayer(db: Db, scope: Scope, input: { id: string; version: number; player: PlayerInput }) {
  const rows = await db
    .update(player)
    .set({ ...input.player, version: sql`${player.version} + 1` })
    .where(and(eq(player.partyId, scope.partyId), eq(player.id, input.id), eq(player.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deletePlayer(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(player)
    .where(and(eq(player.partyId, scope.partyId), eq(player.id, input.id), eq(player.version, input.version)))
    .returning({ id: player.id })
  return rows.length > 0
}

export async function playerHasShows(db: Db, scope: Scope, playerId: string): Promise<boolean> {
  const rows = await db
    .select({ id: show.id })
    .from(show)
    .where(and(eq(show.partyId, scope.partyId), eq(show.playerId, playerId)))
    .limit(1)
  return rows.length > 0
}
