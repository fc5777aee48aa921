import { and, asc, desc, eq, lt, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'
import { grant } from '@/db/schema/grant'
import { person } from '@/db/schema/person'

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
  return db
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
    .leftJoin(person, sql`${person.id} = case when ${auditEvent.actorKind} = 'person' then ${auditEvent.actorId}::uuid end`)
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
