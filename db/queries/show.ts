import { and, asc, eq, exists, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { answerEvent, pack } from '@/db/schema/advance'
import { reading, signOff } from '@/db/schema/bench'
import { stage, venue } from '@/db/schema/directory'
import { grant } from '@/db/schema/grant'
import { hireShow } from '@/db/schema/hire'
import { player } from '@/db/schema/party'
import { plot } from '@/db/schema/plot'
import { day, rig, show } from '@/db/schema/tour'

const columns = {
  id: show.id,
  tourId: show.tourId,
  dayId: show.dayId,
  date: day.date,
  name: show.name,
  rigId: show.rigId,
  rigName: rig.name,
  stageId: show.stageId,
  stageName: stage.name,
  venueId: venue.id,
  venueName: venue.name,
  town: venue.town,
  playerId: show.playerId,
  playerName: player.name,
  zone: show.zone,
  loadInTime: show.loadInTime,
  showTime: show.showTime,
  showDayOffset: show.showDayOffset,
  answersDueAt: show.answersDueAt,
  slot: show.slot,
  sharedKit: show.sharedKit,
  version: show.version,
}

function showsWithNames(db: Db) {
  return db
    .select(columns)
    .from(show)
    .innerJoin(day, and(eq(day.partyId, show.partyId), eq(day.id, show.dayId)))
    .innerJoin(rig, and(eq(rig.partyId, show.partyId), eq(rig.id, show.rigId)))
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .innerJoin(player, and(eq(player.partyId, show.partyId), eq(player.id, show.playerId)))
    .$dynamic()
}

export type ShowRow = Awaited<ReturnType<typeof listShows>>[number]

/** A tour's shows in the order they are played. */
export async function listShows(db: Db, scope: Scope, tourId: string) {
  return showsWithNames(db)
    .where(and(eq(show.partyId, scope.partyId), eq(show.tourId, tourId)))
    .orderBy(asc(day.date), asc(show.showDayOffset), asc(show.showTime), asc(show.createdAt), asc(show.id))
    .limit(1000)
}

export async function findShow(db: Db, scope: Scope, id: string) {
  const rows = await showsWithNames(db)
    .where(and(eq(show.partyId, scope.partyId), eq(show.id, id)))
    .limit(1)
  return rows[0]
}

type ShowValues = Omit<typeof show.$inferInsert, 'id' | 'partyId' | 'tourId' | 'version' | 'createdAt'>

/** False when the id is taken already. */
export async function insertShow(
  db: Db,
  scope: Scope,
  row: ShowValues & { id: string; tourId: string },
): Promise<boolean> {
  const rows = await db
    .insert(show)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: show.id })
    .returning({ id: show.id })
  return rows.length > 0
}

/** False when the version is no longer the one that was seen. */
export async function updateShow(
  db: Db,
  scope: Scope,
  input: { id: string; version: number; show: ShowValues },
): Promise<boolean> {
  const rows = await db
    .update(show)
    .set({ ...input.show, version: sql`${show.version} + 1` })
    .where(and(eq(show.partyId, scope.partyId), eq(show.id, input.id), eq(show.version, input.version)))
    .returning({ id: show.id })
  return rows.length > 0
}

/** False when the version is no longer the one that was seen. */
export async function deleteShow(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(show)
    .where(and(eq(show.partyId, scope.partyId), eq(show.id, input.id), eq(show.version, input.version)))
    .returning({ id: show.id })
  return rows.length > 0
}

/** The shows on a venue's stages, held against other writers: they follow when its zone is learnt. */
export async function lockShowsOfVenue(db: Db, scope: Scope, venueId: string) {
  return db
    .select({ id: show.id, tourId: show.tourId, zone: show.zone, answersDueAt: show.answersDueAt })
    .from(show)
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .where(and(eq(show.partyId, scope.partyId), eq(stage.venueId, venueId)))
    .orderBy(asc(show.id))
    .limit(1000)
    .for('update', { of: show })
}

export async function setShowZone(
  db: Db,
  scope: Scope,
  input: { id: string; zone: string | null; answersDueAt: Date | null },
): Promise<void> {
  await db
    .update(show)
    .set({ zone: input.zone, answersDueAt: input.answersDueAt, version: sql`${show.version} + 1` })
    .where(and(eq(show.partyId, scope.partyId), eq(show.id, input.id)))
}

/** Holds a show until the transaction ends, so that nothing comes to hang on it while it is being taken away. */
export async function lockShow(db: Db, scope: Scope, id: string): Promise<void> {
  await db
    .select({ id: show.id })
    .from(show)
    .where(and(eq(show.partyId, scope.partyId), eq(show.id, id)))
    .limit(1)
    .for('update')
}

/** What hangs on a show and would be lost with it. */
export async function findShowHangers(db: Db, scope: Scope, id: string) {
  const { partyId } = scope
  const rows = await db
    .select({
      hires: sql<boolean>`${exists(
        db
          .select({ id: hireShow.hireId })
          .from(hireShow)
          .where(and(eq(hireShow.partyId, partyId), eq(hireShow.showId, id))),
      )}`,
      packs: sql<boolean>`${exists(
        db
          .select({ id: pack.id })
          .from(pack)
          .where(and(eq(pack.partyId, partyId), eq(pack.showId, id))),
      )}`,
      grants: sql<boolean>`${exists(
        db
          .select({ id: grant.id })
          .from(grant)
          .where(and(eq(grant.partyId, partyId), eq(grant.showId, id))),
      )}`,
      answers: sql<boolean>`${exists(
        db
          .select({ id: answerEvent.id })
          .from(answerEvent)
          .where(and(eq(answerEvent.partyId, partyId), eq(answerEvent.showId, id))),
      )}`,
      readings: sql<boolean>`${exists(
        db
          .select({ id: reading.id })
          .from(reading)
          .where(and(eq(reading.partyId, partyId), eq(reading.showId, id))),
      )}`,
      signOffs: sql<boolean>`${exists(
        db
          .select({ id: signOff.id })
          .from(signOff)
          .where(and(eq(signOff.partyId, partyId), eq(signOff.showId, id))),
      )}`,
      moves: sql<boolean>`${exists(
        db
          .select({ id: plot.id })
          .from(plot)
          .where(and(eq(plot.partyId, partyId), eq(plot.showId, id))),
      )}`,
    })
    .from(show)
    .where(and(eq(show.partyId, partyId), eq(show.id, id)))
    .limit(1)
  return rows[0]
}
