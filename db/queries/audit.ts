import { desc, eq, lt, and } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { auditEvent } from '@/db/schema/audit'

export type AuditRow = typeof auditEvent.$inferInsert

export async function insertAuditEvent(db: Db, row: AuditRow): Promise<void> {
  await db.insert(auditEvent).values(row)
}

/** Newest first, a page at a time: `before` is the last id of the page above. */
export async function listAuditEvents(db: Db, scope: Scope, input: { before?: number | undefined; limit: number }) {
  return db
    .select({
      id: auditEvent.id,
      actorKind: auditEvent.actorKind,
      actorId: auditEvent.actorId,
      action: auditEvent.action,
      subjectType: auditEvent.subjectType,
      subjectId: auditEvent.subjectId,
      detail: auditEvent.detail,
      at: auditEvent.at,
    })
    .from(auditEvent)
    .where(and(eq(auditEvent.partyId, scope.partyId), input.before ? lt(auditEvent.id, input.before) : undefined))
    .orderBy(desc(auditEvent.id))
    .limit(Math.min(input.limit, 200))
}
