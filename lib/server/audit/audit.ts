import type { Db } from '@/db/client'
import { insertAuditEvent } from '@/db/queries/audit'
import type { Actor } from '@/lib/server/auth/actor'

export type Subject = { readonly type: string; readonly id: string }

function actorId(actor: Actor): string {
  switch (actor.kind) {
    case 'person':
      return actor.personId
    case 'link':
      return actor.grantId
    case 'job':
      return actor.job
  }
}

/** Writes who did what on which thing, in the transaction of the change itself. Detail holds what changed, never secrets. */
export async function audit(
  tx: Db,
  actor: Actor,
  action: string,
  subject: Subject,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await insertAuditEvent(tx, {
    partyId: actor.partyId,
    actorKind: actor.kind,
    actorId: actorId(actor),
    action,
    subjectType: subject.type,
    subjectId: subject.id,
    detail,
    address: actor.address,
  })
}
