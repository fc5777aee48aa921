import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { invitation, party } from '@/db/schema/party'
import { person } from '@/db/schema/person'

const columns = {
  id: invitation.id,
  partyId: invitation.partyId,
  partyName: party.name,
  email: invitation.email,
  roles: invitation.roles,
  invitedBy: person.name,
  createdAt: invitation.createdAt,
  expiresAt: invitation.expiresAt,
  acceptedAt: invitation.acceptedAt,
  withdrawnAt: invitation.withdrawnAt,
}

export async function insertInvitation(db: Db, scope: Scope, row: Omit<typeof invitation.$inferInsert, 'partyId'>): Promise<boolean> {
  const rows = await db
    .insert(invitation)
    .values({ ...row, partyId: scope.partyId })
    .onConflictDoNothing({ target: invitation.id })
    .returning({ id: invitation.id })
  return rows.length === 1
}

export async function findInvitation(db: Db, scope: Scope, id: string) {
  const rows = await db
    .select(columns)
    .from(invitation)
    .innerJoin(party, eq(party.id, invitation.partyId))
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .where(and(eq(invitation.partyId, scope.partyId), eq(invitation.id, id)))
    .limit(1)
  return rows[0]
}

/** Neither accepted nor withdrawn, oldest first; expired ones too, which can be sent again. */
export async function listOpenInvitations(db: Db, scope: Scope) {
  return db
    .select(columns)
    .from(invitation)
    .innerJoin(party, eq(party.id, invitation.partyId))
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .where(and(eq(invitation.partyId, scope.partyId), isNull(invitation.acceptedAt), isNull(invitation.withdrawnAt)))
    .orderBy(asc(invitation.createdAt), asc(invitation.id))
    .limit(200)
}

/** The one look-up without a party: the token's hash is what finds it. `lock` holds the row for the one who accepts. */
export async function findInvitationByTokenHash(db: Db, tokenHash: string, options: { lock: boolean }) {
  const query = db
    .select(columns)
    .from(invitation)
    .innerJoin(party, eq(party.id, invitation.partyId))
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .where(eq(invitation.tokenHash, tokenHash))
    .limit(1)
  const rows = await (options.lock ? query.for('update', { of: invitation }) : query)
  return rows[0]
}

export async function markInvitationAccepted(db: Db, scope: Scope, id: string): Promise<void> {
  await db
    .update(invitation)
    .set({ acceptedAt: sql`now()` })
    .where(and(eq(invitation.partyId, scope.partyId), eq(invitation.id, id)))
}

/** False when it is not open any more. */
export async function withdrawInvitation(db: Db, scope: Scope, id: string): Promise<boolean> {
  const rows = await db
    .update(invitation)
    .set({ withdrawnAt: sql`now()` })
    .where(
      and(
        eq(invitation.partyId, scope.partyId),
        eq(invitation.id, id),
        isNull(invitation.acceptedAt),
        isNull(invitation.withdrawnAt),
      ),
    )
    .returning({ id: invitation.id })
  return rows.length === 1
}

/** Withdraws whatever is open for an address, before it is asked anew. */
export async function withdrawInvitationsTo(db: Db, scope: Scope, email: string): Promise<void> {
  await db
    .update(invitation)
    .set({ withdrawnAt: sql`now()` })
    .where(
      and(
        eq(invitation.partyId, scope.partyId),
        sql`lower(${invitation.email}) = lower(${email})`,
        isNull(invitation.acceptedAt),
        isNull(invitation.withdrawnAt),
      ),
    )
}

/** False when it is not open any more. */
export async function extendInvitation(db: Db, scope: Scope, input: { id: string; expiresAt: Date }): Promise<boolean> {
  const rows = await db
    .update(invitation)
    .set({ expiresAt: input.expiresAt })
    .where(
      and(
        eq(invitation.partyId, scope.partyId),
        eq(invitation.id, input.id),
        isNull(invitation.acceptedAt),
        isNull(invitation.withdrawnAt),
      ),
    )
    .returning({ id: invitation.id })
  return rows.length === 1
}
