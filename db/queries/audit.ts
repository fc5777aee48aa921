import { and, asc, desc, eq, inArray, lt, sql } from 'drizzle-orm'
import { unionAll } from 'drizzle-orm/pg-core'
import type { Db, Scope } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { contact, stage, supplier, venue } from '@/db/schema/directory'
import { grant } from '@/db/schema/grant'
import { hire } from '@/db/schema/hire'
import { kitEntry } from '@/db/schema/kit'
import { player } from '@/db/schema/party'
import { person } from '@/db/schema/person'
import { rig, show } from '@/db/schema/tour'

export type AuditRow = typeof auditEvent.$inferInsert

export async function insertAuditEvent(db: Db, row: AuditRow): Promise<void> {
  await db.insert(auditEvent).values(row)
}

/** Newest first, a page at a time: `before` is the last id of the page above. Names are as they are now. */
export async function listAuditEvents(
  db: Db,
  scope: Scope,
  input: { before?: number | undefined; person?: string | undefined; action?: string | undefined; limit: number },
) {
  return (
    db
      .select({
        id: auditEvent.id,
        actorKind: auditEvent.actorKind,
        actorId: auditEvent.actorId,
        personName: person.name,
        recipientName: grant.recipientName,
        action: auditEvent.action,
        subjectType: auditEvent.subjectType,
        subjectId: auditEvent.subjectId,
        detail: auditEvent.detail,
        address: auditEvent.address,
        at: auditEvent.at,
      })
      .from(auditEvent)
      // Actor ids are text because a job is named by a word; the cast stands on their side so that the keys' indexes serve.
      .leftJoin(
        person,
        sql`${person.id} = case when ${auditEvent.actorKind} = 'person' then ${auditEvent.actorId}::uuid end`,
      )
      .leftJoin(
        grant,
        and(
          eq(grant.partyId, scope.partyId),
          sql`${grant.id} = case when ${auditEvent.actorKind} = 'link' then ${auditEvent.actorId}::uuid end`,
        ),
      )
      .where(
        and(
          eq(auditEvent.partyId, scope.partyId),
          input.before ? lt(auditEvent.id, input.before) : undefined,
          input.person ? and(eq(auditEvent.actorKind, 'person'), eq(auditEvent.actorId, input.person)) : undefined,
          input.action ? eq(auditEvent.action, input.action) : undefined,
        ),
      )
      .orderBy(desc(auditEvent.id))
      .limit(Math.min(input.limit, 200))
  )
}

/** Every action in the party's trail, for the filter. */
export async function listAuditActions(db: Db, scope: Scope): Promise<string[]> {
  const rows = await db
    .selectDistinct({ action: auditEvent.action })
    .from(auditEvent)
    .where(eq(auditEvent.partyId, scope.partyId))
    .orderBy(asc(auditEvent.action))
    .limit(200)
  return rows.map((row) => row.action)
}

/** What the things of the trail are called now, by id; what is gone has no name any more. A show goes by its venue, a hire by its supplier. */
export async function listAuditNames(db: Db, scope: Scope, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map()
  const wanted = [...new Set(ids)]
  const named = (
    table: typeof contact | typeof player | typeof supplier | typeof venue | typeof rig | typeof kitEntry,
  ) =>
    db
      .select({ id: table.id, name: table.name })
      .from(table)
      .where(and(eq(table.partyId, scope.partyId), inArray(table.id, wanted)))
  const shows = db
    .select({ id: show.id, name: venue.name })
    .from(show)
    .innerJoin(stage, and(eq(stage.partyId, show.partyId), eq(stage.id, show.stageId)))
    .innerJoin(venue, and(eq(venue.partyId, stage.partyId), eq(venue.id, stage.venueId)))
    .where(and(eq(show.partyId, scope.partyId), inArray(show.id, wanted)))
  const hires = db
    .select({ id: hire.id, name: supplier.name })
    .from(hire)
    .innerJoin(supplier, and(eq(supplier.partyId, hire.partyId), eq(supplier.id, hire.supplierId)))
    .where(and(eq(hire.partyId, scope.partyId), inArray(hire.id, wanted)))
  const links = db
    .select({ id: grant.id, name: grant.recipientName })
    .from(grant)
    .where(and(eq(grant.partyId, scope.partyId), inArray(grant.id, wanted)))
  const rows = await unionAll(
    named(contact),
    named(player),
    named(supplier),
    named(venue),
    named(rig),
    named(kitEntry),
    shows,
    hires,
    links,
  ).limit(wanted.length)
  return new Map(rows.map(({ id, name }) => [id, name]))
}
