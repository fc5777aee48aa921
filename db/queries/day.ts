import { and, asc, eq, inArray, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { day, show } from '@/db/schema/tour'
import type { DayInput, DayKind } from '@/lib/contracts/tour'

const columns = {
  id: day.id,
  tourId: day.tourId,
  date: day.date,
  kind: day.kind,
  remark: day.remark,
  version: day.version,
}

/** A tour's days in order; a run is at most a few hundred. */
export async function listDays(db: Db, scope: Scope, tourId: string) {
  return db
    .select(columns)
    .from(day)
    .where(and(eq(day.partyId, scope.partyId), eq(day.tourId, tourId)))
    .orderBy(asc(day.date))
    .limit(2000)
}

export async function findDay(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(day)
    .where(and(eq(day.partyId, scope.partyId), eq(day.id, id)))
    .limit(1)
  return rows[0]
}

/** Holds a day against other writers, so that two shows added at once are counted one after the other. */
export async function lockDay(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(day)
    .where(and(eq(day.partyId, scope.partyId), eq(day.id, id)))
    .limit(1)
    .for('update')
  return rows[0]
}

/** Makes the days that are not there yet; a date that is there is left as it is. */
export async function insertDays(
  db: Db,
  scope: Scope,
  input: { tourId: string; dates: readonly string[]; kind: DayKind; remark: string },
) {
  const rows = await db
    .insert(day)
    .values(
      input.dates.map((date) => ({
        partyId: scope.partyId,
        tourId: input.tourId,
        date,
        kind: input.kind,
        remark: input.remark,
      })),
    )
    .onConflictDoNothing({ target: [day.tourId, day.date] })
    .returning(columns)
  return rows.sort((a, b) => a.date.localeCompare(b.date))
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateDay(db: Db, scope: Scope, input: { id: string; version: number; day: DayInput }) {
  const rows = await db
    .update(day)
    .set({ ...input.day, version: sql`${day.version} + 1` })
    .where(and(eq(day.partyId, scope.partyId), eq(day.id, input.id), eq(day.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** A day that gets a show is a show day. */
export async function makeShowDay(db: Db, scope: Scope, id: string): Promise<void> {
  await db
    .update(day)
    .set({ kind: 'show', version: sql`${day.version} + 1` })
    .where(and(eq(day.partyId, scope.partyId), eq(day.id, id), inArray(day.kind, ['travel', 'off', 'rehearsal'])))
}

/** False when the version is no longer the one that was seen. */
export async function deleteDay(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(day)
    .where(and(eq(day.partyId, scope.partyId), eq(day.id, input.id), eq(day.version, input.version)))
    .returning({ id: day.id })
  return rows.length > 0
}

export async function countShowsOfDay(
  db: Db,
  scope: Scope,
  dayId: string,
  exceptShowId: string | null,
): Promise<number> {
  const rows = await db
    .select({ id: show.id })
    .from(show)
    .where(and(eq(show.partyId, scope.partyId), eq(show.dayId, dayId)))
    .limit(10)
  return rows.filter((row) => row.id !== exceptShowId).length
}
