import { and, asc, eq, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { membership } from '@/db/schema/party'
import { person } from '@/db/schema/person'
import type { Role } from '@/lib/contracts/common'

const columns = {
  personId: membership.personId,
  name: person.name,
  email: person.email,
  roles: membership.roles,
  version: membership.version,
}

export async function listMembers(db: Db, scope: Scope) {
  return db
    .select(columns)
    .from(membership)
    .innerJoin(person, eq(person.id, membership.personId))
    .where(eq(membership.partyId, scope.partyId))
    .orderBy(asc(sql`lower(${person.name})`), asc(membership.personId))
    .limit(500)
}

export async function findMember(db: Db, scope: Scope, personId: string) {
  const rows = await db
    .select(columns)
    .from(membership)
    .innerJoin(person, eq(person.id, membership.personId))
    .where(and(eq(membership.partyId, scope.partyId), eq(membership.personId, personId)))
    .limit(1)
  return rows[0]
}

/** False when the person is a member already. */
export async function insertMembership(db: Db, scope: Scope, row: { personId: string; roles: Role[] }): Promise<boolean> {
  const rows = await db
    .insert(membership)
    .values({ partyId: scope.partyId, ...row })
    .onConflictDoNothing()
    .returning({ personId: membership.personId })
  return rows.length === 1
}

/** False when the version is stale. */
export async function updateMemberRoles(
  db: Db,
  scope: Scope,
  input: { personId: string; version: number; roles: Role[] },
): Promise<boolean> {
  const rows = await db
    .update(membership)
    .set({ roles: input.roles, version: sql`${membership.version} + 1` })
    .where(
      and(
        eq(membership.partyId, scope.partyId),
        eq(membership.personId, input.personId),
        eq(membership.version, input.version),
      ),
    )
    .returning({ personId: membership.personId })
  return rows.length === 1
}

/** False when the version is stale. Roles lent to the member go with it. */
export async function deleteMember(db: Db, scope: Scope, input: { personId: string; version: number }): Promise<boolean> {
  const rows = await db
    .delete(membership)
    .where(
      and(
        eq(membership.partyId, scope.partyId),
        eq(membership.personId, input.personId),
        eq(membership.version, input.version),
      ),
    )
    .returning({ personId: membership.personId })
  return rows.length === 1
}

/** Owners in their own right other than one person. */
export async function countOtherOwners(db: Db, scope: Scope, personId: string): Promise<number> {
  const rows = await db
    .select({ count: sql<number>`count(*)::int` })
    .from(membership)
    .where(
      and(
        eq(membership.partyId, scope.partyId),
        sql`${membership.personId} <> ${personId}`,
        sql`'owner' = any(${membership.roles})`,
      ),
    )
  return rows[0]?.count ?? 0
}
