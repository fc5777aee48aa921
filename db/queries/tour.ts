import { and, asc, desc, eq, exists, gte, ilike, lt, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { day, rig, show, tour } from '@/db/schema/tour'
import { revision } from '@/db/schema/revision'
import { hire } from '@/db/schema/hire'
import type { TourInput, TourListQuery } from '@/lib/contracts/tour'
import { pageSize } from '@/lib/contracts/list'
import { containing } from './containing'

const columns = { id: tour.id, name: tour.name, version: tour.version }

export async function findTour(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(tour)
    .where(and(eq(tour.partyId, scope.partyId), eq(tour.id, id)))
    .limit(1)
  return rows[0]
}

/** Holds the tour against other writers of its run until the transaction ends; undefined when it is not the party's. */
export async function lockTour(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(tour)
    .where(and(eq(tour.partyId, scope.partyId), eq(tour.id, id)))
    .limit(1)
    .for('update')
  return rows[0]
}

export async function listTours(db: Db, scope: Scope, query: TourListQuery & { today: string }) {
  const days = db
    .select({
      tourId: day.tourId,
      first: sql<string | null>`min(${day.date})::text`.as('first'),
      last: sql<string | null>`max(${day.date})::text`.as('last'),
      days: sql<number>`count(*)::int`.as('days'),
    })
    .from(day)
    .where(eq(day.partyId, scope.partyId))
    .groupBy(day.tourId)
    .as('days')
  const shows = db
    .select({ tourId: show.tourId, shows: sql<number>`count(*)::int`.as('shows') })
    .from(show)
    .where(eq(show.partyId, scope.partyId))
    .groupBy(show.tourId)
    .as('shows')
  const ahead = or(gte(days.last, query.today), sql`${days.last} is null`)
  const where = and(
    eq(tour.partyId, scope.partyId),
    query.q ? ilike(tour.name, containing(query.q)) : undefined,
    query.filter === 'ahead' ? ahead : query.filter === 'over' ? lt(days.last, query.today) : undefined,
  )
  const way = query.order === 'up' ? asc : desc
  const rows = await db
    .select({
      ...columns,
      first: days.first,
      last: days.last,
      days: sql<number>`coalesce(${days.days}, 0)`,
      shows: sql<number>`coalesce(${shows.shows}, 0)`,
      total: sql<number>`(count(*) over ())::int`,
    })
    .from(tour)
    .leftJoin(days, eq(days.tourId, tour.id))
    .leftJoin(shows, eq(shows.tourId, tour.id))
    .where(where)
    .orderBy(way(query.sort === 'name' ? sql`lower(${tour.name})` : days.first), asc(tour.name), asc(tour.id))
    .limit(pageSize)
    .offset((query.page - 1) * pageSize)
  return { rows: rows.map(({ total: _total, ...row }) => row), total: rows[0]?.total ?? 0 }
}

/** Undefined when the id is taken already. */
export async function insertTour(db: Db, scope: Scope, row: TourInput & { id?: string | undefined }) {
  const rows = await db
    .insert(tour)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: tour.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateTour(db: Db, scope: Scope, input: { id: string; version: number; tour: TourInput }) {
  const rows = await db
    .update(tour)
    .set({ ...input.tour, version: sql`${tour.version} + 1` })
    .where(and(eq(tour.partyId, scope.partyId), eq(tour.id, input.id), eq(tour.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteTour(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(tour)
    .where(and(eq(tour.partyId, scope.partyId), eq(tour.id, input.id), eq(tour.version, input.version)))
    .returning({ id: tour.id })
  return rows.length > 0
}

/** What hangs on a tour and would go with it. */
export async function findTourHangers(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select({
      shows: sql<boolean>`${exists(
        db
          .select({ id: show.id })
          .from(show)
          .where(and(eq(show.partyId, scope.partyId), eq(show.tourId, id))),
      )}`,
      hires: sql<boolean>`${exists(
        db
          .select({ id: hire.id })
          .from(hire)
          .where(and(eq(hire.partyId, scope.partyId), eq(hire.tourId, id))),
      )}`,
      revisions: sql<boolean>`${exists(
        db
          .select({ id: revision.id })
          .from(revision)
          .innerJoin(rig, and(eq(rig.partyId, revision.partyId), eq(rig.id, revision.rigId)))
          .where(and(eq(revision.partyId, scope.partyId), eq(rig.tourId, id))),
      )}`,
    })
    .from(tour)
    .where(and(eq(tour.partyId, scope.partyId), eq(tour.id, id)))
    .limit(1)
  return rows[0]
}
