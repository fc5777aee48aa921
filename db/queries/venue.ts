import { and, asc, desc, eq, ilike, inArray, isNull, notExists, or, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { contact, stage, venue } from '@/db/schema/directory'
import { show } from '@/db/schema/tour'
import type { VenueInput, VenueListQuery } from '@/lib/contracts/directory'
import { pageSize } from '@/lib/contracts/list'
import { containing } from './containing'

const columns = {
  id: venue.id,
  name: venue.name,
  town: venue.town,
  country: venue.country,
  zone: venue.zone,
  remark: venue.remark,
  version: venue.version,
}
const sorts = { name: venue.name, town: venue.town, country: venue.country }

export async function listVenues(db: Db, scope: Scope, query: VenueListQuery) {
  const stages = db
    .select({ venueId: stage.venueId, stages: sql<number>`count(*)::int`.as('stages') })
    .from(stage)
    .where(eq(stage.partyId, scope.partyId))
    .groupBy(stage.venueId)
    .as('stages')
  const contacts = db
    .select({ venueId: contact.venueId, contacts: sql<number>`count(*)::int`.as('contacts') })
    .from(contact)
    .where(eq(contact.partyId, scope.partyId))
    .groupBy(contact.venueId)
    .as('contacts')
  const pattern = containing(query.q)
  const filters = {
    all: undefined,
    'no-zone': isNull(venue.zone),
    'no-stage': isNull(stages.venueId),
    'no-contact': isNull(contacts.venueId),
  }
  const way = query.order === 'up' ? asc : desc
  const rows = await db
    .select({
      ...columns,
      stages: sql<number>`coalesce(${stages.stages}, 0)`,
      contacts: sql<number>`coalesce(${contacts.contacts}, 0)`,
      total: sql<number>`(count(*) over ())::int`,
    })
    .from(venue)
    .leftJoin(stages, eq(stages.venueId, venue.id))
    .leftJoin(contacts, eq(contacts.venueId, venue.id))
    .where(
      and(
        eq(venue.partyId, scope.partyId),
        filters[query.filter],
        query.q ? or(ilike(venue.name, pattern), ilike(venue.town, pattern), ilike(venue.country, pattern)) : undefined,
      ),
    )
    .orderBy(way(sql`lower(${sorts[query.sort]})`), asc(venue.name), asc(venue.id))
    .limit(pageSize)
    .offset((query.page - 1) * pageSize)
  return { rows: rows.map(({ total: _total, ...row }) => row), total: rows[0]?.total ?? 0 }
}

export async function findVenue(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(venue)
    .where(and(eq(venue.partyId, scope.partyId), eq(venue.id, id)))
    .limit(1)
  return rows[0]
}

/** Undefined when the id is taken already. */
export async function insertVenue(db: Db, scope: Scope, row: VenueInput & { id?: string | undefined }) {
  const rows = await db
    .insert(venue)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: venue.id })
    .returning(columns)
  return rows[0]
}

/** Undefined when the version is no longer the one that was seen. */
export async function updateVenue(db: Db, scope: Scope, input: { id: string; version: number; venue: VenueInput }) {
  const rows = await db
    .update(venue)
    .set({ ...input.venue, version: sql`${venue.version} + 1` })
    .where(and(eq(venue.partyId, scope.partyId), eq(venue.id, input.id), eq(venue.version, input.version)))
    .returning(columns)
  return rows[0]
}

/** False when the version is no longer the one that was seen. */
export async function deleteVenue(db: Db, scope: Scope, input: { id: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(venue)
    .where(and(eq(venue.partyId, scope.partyId), eq(venue.id, input.id), eq(venue.version, input.version)))
    .returning({ id: venue.id })
  return rows.length > 0
}

export async function venueHasShows(db: Db, scope: Scope, venueId: string): Promise<boolean> {
  const rows = await db
    .select({ id: show.id })
    .from(show)
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .where(and(eq(show.partyId, scope.partyId), eq(stage.venueId, venueId)))
    .limit(1)
  return rows.length > 0
}

/** The venues of these that have nobody to write to. */
export async function listVenuesWithoutContact(db: Db, scope: Scope, venueIds: readonly string[]): Promise<string[]> {
  if (venueIds.length === 0) return []
  const rows = await db
    .select({ id: venue.id })
    .from(venue)
    .where(
      and(
        eq(venue.partyId, scope.partyId),
        inArray(venue.id, [...venueIds]),
        notExists(
          db
            .select({ id: contact.id })
            .from(contact)
            .where(and(eq(contact.partyId, scope.partyId), eq(contact.venueId, venue.id))),
        ),
      ),
    )
    .orderBy(asc(venue.id))
    .limit(1000)
  return rows.map((row) => row.id)
}
