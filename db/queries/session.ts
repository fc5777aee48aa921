import { and, eq, gt, isNull, ne, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { membership, party, standIn } from '@/db/schema/party'
import { person, session } from '@/db/schema/person'

/** Sessions stand above parties: they are found by their own id or by the person's. */
export async function insertSession(
  db: Db,
  row: { id?: string; personId: string; activePartyId: string | null; device: string; expiresAt: Date },
): Promise<string> {
  const rows = await db.insert(session).values(row).returning({ id: session.id })
  const made = rows[0]
  if (!made) throw new Error('no session row came back')
  return made.id
}

/** The live session with its person, the party in hand and every role in force there, in one statement. */
export async function findLiveSession(db: Db, sessionId: string) {
  const rows = await db
    .select({
      id: session.id,
      personId: session.personId,
      name: person.name,
      email: person.email,
      locale: person.locale,
      lastSeenAt: session.lastSeenAt,
      partyId: membership.partyId,
      partyName: party.name,
      roles: membership.roles,
      lent: sql<string[]>`coalesce((
        select array_agg(distinct ${standIn.role}) from ${standIn}
        where ${standIn.partyId} = ${membership.partyId} and ${standIn.personId} = ${membership.personId}
          and ${standIn.endedAt} is null and ${standIn.fromAt} <= now() and ${standIn.untilAt} > now()
      ), '{}')`,
    })
    .from(session)
    .innerJoin(person, eq(person.id, session.personId))
    .leftJoin(membership, and(eq(membership.partyId, session.activePartyId), eq(membership.personId, session.personId)))
    .leftJoin(party, eq(party.id, membership.partyId))
    .where(and(eq(session.id, sessionId), isNull(session.endedAt), gt(session.expiresAt, sql`now()`)))
    .limit(1)
  return rows[0]
}

export async function touchSession(db: Db, sessionId: string): Promise<void> {
  await db.update(session).set({ lastSeenAt: sql`now()` }).where(eq(session.id, sessionId))
}

export async function listParties(db: Db, personId: string) {
  return db
    .select({ id: party.id, name: party.name, roles: membership.roles })
    .from(membership)
    .innerJoin(party, eq(party.id, membership.partyId))
    .where(eq(membership.personId, personId))
    .orderBy(party.name, party.id)
    .limit(100)
}

/** Switches the party of one device; false when the person is not in that party. */
export async function switchParty(db: Db, input: { sessionId: string; personId: string; partyId: string }): Promise<boolean> {
  const rows = await db
    .update(session)
    .set({ activePartyId: input.partyId })
    .where(
      and(
        eq(session.id, input.sessionId),
        eq(session.personId, input.personId),
        sql`exists (select 1 from ${membership} where ${membership.partyId} = ${input.partyId} and ${membership.personId} = ${input.personId})`,
      ),
    )
    .returning({ id: session.id })
  return rows.length === 1
}

/** False when it was no live session of that person. */
export async function endSession(db: Db, input: { sessionId: string; personId: string }): Promise<boolean> {
  const rows = await db
    .update(session)
    .set({ endedAt: sql`now()` })
    .where(and(eq(session.id, input.sessionId), eq(session.personId, input.personId), isNull(session.endedAt)))
    .returning({ id: session.id })
  return rows.length === 1
}

export async function endAllSessions(db: Db, personId: string): Promise<number> {
  const rows = await db
    .update(session)
    .set({ endedAt: sql`now()` })
    .where(and(eq(session.personId, personId), isNull(session.endedAt)))
    .returning({ id: session.id })
  return rows.length
}

export async function listSessions(db: Db, personId: string) {
  return db
    .select({ id: session.id, device: session.device, createdAt: session.createdAt, lastSeenAt: session.lastSeenAt })
    .from(session)
    .where(and(eq(session.personId, personId), isNull(session.endedAt), gt(session.expiresAt, sql`now()`)))
    .orderBy(sql`${session.lastSeenAt} desc`, session.id)
    .limit(100)
}

/** Signs a person out everywhere but on one device. */
export async function endOtherSessions(db: Db, input: { personId: string; sessionId: string }): Promise<void> {
  await db
    .update(session)
    .set({ endedAt: sql`now()` })
    .where(and(eq(session.personId, input.personId), ne(session.id, input.sessionId), isNull(session.endedAt)))
}
