import { and, asc, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { stage, venue } from '@/db/schema/directory'
import { show } from '@/db/schema/tour'
import type { StageInput } from '@/lib/contracts/directory'

const columns = {
  id: stage.id,
  venueId: stage.venueId,
  name: stage.name,
  widthM: stage.widthM,
  depthM: stage.depthM,
  heightM: stage.heightM,
  access: stage.access,
  volts: stage.volts,
  mainsHz: stage.mainsHz,
  inlets: stage.inlets,
  version: stage.version,
}

export async function listStages(db: Db, scope: Scope, venueId: string) {
  return db
    .select(columns)
    .from(stage)
    .where(and(eq(stage.partyId, scope.partyId), eq(stage.venueId, venueId)))
    .orderBy(asc(stage.name), asc(stage.id))
    .limit(200)
}

/** Every stage of the party with its venue, for a choice. */
export async function listStageChoices(db: Db, scope: Scope) {
  return db
    .select({ id: stage.id, stageName: stage.name, venueName: venue.name, town: venue.town, zone: venue.zone })
    .from(stage)
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .where(eq(stage.partyId, scope.partyId))
    .orderBy(asc(venue.name), asc(stage.name), asc(stage.id))
    .limit(2000)
}

export async function findStage(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(stage)
    .where(and(eq(stage.partyId, scope.partyId), eq(stage.id, id)))
    .limit(1)
  return rows[0]
}

/** A stage's venue and its zone; undefined when there is no such stage in the party. */
export async function findStageVenue(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select({ venueId: stage.venueId, zone: venue.zone })
    .from(stage)
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .where(and(eq(stage.partyId, scope.partyId), eq(stage.id, id)))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken already. */
export async function insertStage(
  db: Db,
  scope: Scope,
  row: StageInput & { id?: string | undefined; venueId: string },
) {
  const rows = await db
    .insert(stage)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: stage.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateStage(db: Db, scope: Scope, input: { id: string; version: number; stage: StageInput }) {
  const rows = await db
    .update(stage)
    .set({ ...input.stage, version: sql`${stage.version} + 1` })
    .where(and(eq(stage.partyId, scope.partyId), eq(stage.id, input.id), eq(stage.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteStage(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(stage)
    .where(and(eq(stage.partyId, scope.partyId), eq(stage.id, input.id), eq(stage.version, input.version)))
    .returning({ id: stage.id })
  return rows.length > 0
}

export async function stageHasShows(db: Db, scope: Scope, stageId: string): Promise<boolean> {
  const rows = await db
    .select({ id: show.id })
    .from(show)
    .where(and(eq(show.partyId, scope.partyId), eq(show.stageId, stageId)))
    .limit(1)
  return rows.length > 0
}
